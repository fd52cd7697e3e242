package fourthwire.site.check;

import java.util.List;

/**
 * A table as read.
 *
 * @param name its name in the contract
 * @param state whether it is there at all
 * @param rows those that hold anything
 */
public record DraftTable<T>(String name, State state, List<DraftRow<T>> rows) {
  /** How much of a table there is. */
  public enum State {
    /** The survey has no such table. */
    ABSENT,
    /** It is there and some or all of its rows can't be told; that is reported already. */
    UNREADABLE,
    /** Every row was read. */
    PRESENT
  }

  /** Copies the list. */
  public DraftTable {
    rows = List.copyOf(rows);
  }

  /** Whether every cell of it could be read. */
  public boolean isSound() {
    return state != State.UNREADABLE && rows.stream().allMatch(r -> r.damaged().isEmpty());
  }

  /** Whether a name that is looked for here and not found may be one of those not readable. */
  boolean mayHide(String nameColumn) {
    return state == State.UNREADABLE || rows.stream().anyMatch(r -> !r.sound(nameColumn));
  }

  List<T> contents() {
    return rows.stream().map(DraftRow::content).toList();
  }
}
