package fourthwire.site;

import java.util.List;

/**
 * A row of {@code schedules}: one kind of day of a profile.
 *
 * @param shares 24 shares of the demand, 0 to 1, from hour 0
 */
public record Schedule(String name, Days days, List<Double> shares) {
  /** Which days a row holds for. */
  public enum Days {
    WEEKDAY("weekday"),
    SATURDAY("saturday"),
    SUNDAY("sunday"),
    ALL("all");

    private final String word;

    Days(String word) {
      this.word = word;
    }

    /** The word used in survey tables. */
    public String word() {
      return word;
    }
  }
}
