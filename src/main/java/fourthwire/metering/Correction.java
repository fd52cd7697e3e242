package fourthwire.metering;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * What mends a fault of a log: steps that make a second set of values beside the rows as read,
 * which stay. Steps name columns and rows of the file as it was read, so that no correction changes
 * what another one means, and any may be taken back without the others.
 *
 * @param sentence what it does, said as it is asked for
 * @param steps at least one
 */
public record Correction(String sentence, List<Step> steps) {
  /** Copies the steps. */
  public Correction {
    steps = List.copyOf(steps);
    if (steps.isEmpty()) {
      throw new IllegalArgumentException("a correction needs a step");
    }
  }

  /** Of these steps. */
  public static Correction of(String sentence, Step... steps) {
    return new Correction(sentence, List.of(steps));
  }

  /**
   * Rows of a log in the file's order.
   *
   * @param from number of the first, from 0
   * @param to number after the last
   */
  public record Rows(long from, long to) {
    /** All of a log. */
    public static final Rows ALL = new Rows(0, Long.MAX_VALUE);

    /** Refuses rows that end before they begin. */
    public Rows {
      if (from < 0 || to < from) {
        throw new IllegalArgumentException("rows from " + from + " can't end before " + to);
      }
    }

    /** How many they are. */
    public long count() {
      return to - from;
    }
  }

  /** One thing done to some columns in some rows. */
  public sealed interface Step {}

  /** Nothing is known of these quantities in these rows. */
  public record LeaveOut(List<String> quantities, Rows rows) implements Step {
    /** Copies the list. */
    public LeaveOut {
      quantities = List.copyOf(quantities);
    }
  }

  /** Values below or above these, in the quantity's unit, are left out of the whole log. */
  public record KeepWithin(String quantity, double low, double high) implements Step {}

  /** Rows that repeat the time of the row before are left out. */
  public record DropRepeats(Rows rows) implements Step {}

  /** These rows are left out. */
  public record DropRows(Rows rows) implements Step {}

  /** Rows are so many milliseconds later than they say; earlier below zero. */
  public record ShiftClock(long millis, Rows rows) implements Step {}

  /** These quantities with their lowest and highest are of the other sign. */
  public record TurnSign(List<String> quantities, Rows rows) implements Step {
    /** Copies the list. */
    public TurnSign {
      quantities = List.copyOf(quantities);
    }
  }

  /** These quantities are so many times what is written; the factor is above zero. */
  public record Scale(List<String> quantities, double factor, Rows rows) implements Step {
    /** Copies the list. */
    public Scale {
      quantities = List.copyOf(quantities);
      if (!(factor > 0) || Double.isInfinite(factor)) {
        throw new IllegalArgumentException("factor " + factor + ", must be above 0");
      }
    }
  }

  /** Quantities take the values that stand under other names. */
  public record Reorder(Map<String, String> from, Rows rows) implements Step {
    /** Copies the map, order kept. */
    public Reorder {
      from = Collections.unmodifiableMap(new LinkedHashMap<>(from));
    }
  }

  /** The total of a measure such as {@code active_w} is the sum of the lines. */
  public record SumLines(String measure, Rows rows) implements Step {}

  /** A distortion such as {@code L1.current_thd_percent} is what the harmonics make. */
  public record FormDistortion(String quantity, Rows rows) implements Step {}
}
