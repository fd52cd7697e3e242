package fourthwire.intake.reading.table;

import java.util.Locale;

/** The order in which day, month and year are written. */
public enum DateOrder {
  YEAR_MONTH_DAY("yyyy-MM-dd"),
  DAY_MONTH_YEAR("dd/MM/yyyy"),
  MONTH_DAY_YEAR("MM/dd/yyyy");

  private final String pattern;

  DateOrder(String pattern) {
    this.pattern = pattern;
  }

  /** The order as a pattern; any separators are read. */
  public String pattern() {
    return pattern;
  }

  /**
   * The order a pattern asks for, by its letters y, M and d.
   *
   * @throws TableException where a letter is missing
   */
  public static DateOrder of(String pattern) {
    int y = pattern.toLowerCase(Locale.ROOT).indexOf('y');
    int m = pattern.indexOf('M');
    int d = pattern.indexOf('d');
    if (y >= 0 && y < m && m < d) {
      return YEAR_MONTH_DAY;
    }
    if (d >= 0 && d < m && m < y) {
      return DAY_MONTH_YEAR;
    }
    if (m >= 0 && m < d && d < y) {
      return MONTH_DAY_YEAR;
    }
    throw new TableException(
        "the time format \""
            + pattern
            + "\" is not understood: write yyyy-MM-dd, dd/MM/yyyy or MM/dd/yyyy, with HH:mm:ss or"
            + " hh:mm:ss a behind it");
  }
}
