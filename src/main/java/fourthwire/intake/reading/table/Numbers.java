package fourthwire.intake.reading.table;

import java.util.Locale;
import java.util.Set;

/** Numbers as cells hold them. */
final class Numbers {
  /** What a blank, or a mark for "not measured", is read as. */
  static final double BLANK = Double.NaN;

  /** What a text that is neither number nor blank is read as. */
  static final double UNREADABLE = Double.NEGATIVE_INFINITY;

  private static final Set<String> MARKS =
      Set.of(
          "",
          "-",
          "--",
          "---",
          "*",
          "**",
          "***",
          "n/a",
          "na",
          "#n/a",
          "nan",
          "null",
          "none",
          "nil",
          "ol",
          "ovl",
          "overload",
          "over",
          "overrange",
          "ovf",
          "inf",
          "-inf",
          "invalid",
          "?",
          ".");

  private static final double[] POWERS = new double[23];

  static {
    POWERS[0] = 1;
    for (int k = 1; k < POWERS.length; k++) {
      POWERS[k] = POWERS[k - 1] * 10;
    }
  }

  private Numbers() {}

  /**
   * The number in these characters.
   *
   * <p>Up to 15 digits the result is one exact division or product, hence correctly rounded
   * (Clinger, 1990); anything longer or stranger takes the slow way.
   */
  static double parse(char[] text, int from, int to, boolean decimalComma) {
    char mark = decimalComma ? ',' : '.';
    int k = from;
    int end = to;
    while (k < end && text[k] <= ' ') {
      k++;
    }
    while (end > k && text[end - 1] <= ' ') {
      end--;
    }
    int first = k;
    boolean negative = k < end && text[k] == '-';
    k += k < end && (negative || text[k] == '+') ? 1 : 0;
    long digits = 0;
    int count = 0;
    int decimals = -1;
    for (; k < end; k++) {
      char c = text[k];
      if (c >= '0' && c <= '9' && count < 15) {
        digits = 10 * digits + (c - '0');
        count++;
        decimals += decimals >= 0 ? 1 : 0;
      } else if (c == mark && decimals < 0) {
        decimals = 0;
      } else {
        return slow(new String(text, first, end - first), decimalComma);
      }
    }
    if (count == 0) {
      return slow(new String(text, first, end - first), decimalComma);
    }
    double value = decimals > 0 ? digits / POWERS[decimals] : digits;
    return negative ? -value : value;
  }

  private static double slow(String text, boolean decimalComma) {
    if (MARKS.contains(text.toLowerCase(Locale.ROOT))) {
      return BLANK;
    }
    String plain = text.replace("\u00A0", "").replace("\u2212", "-").replace(" ", "");
    plain = decimalComma ? plain.replace(".", "").replace(',', '.') : plain.replace(",", "");
    if (plain.endsWith("%")) {
      plain = plain.substring(0, plain.length() - 1);
    }
    if (!plain.matches("[+-]?(\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d{1,3})?")) {
      return UNREADABLE;
    }
    double value = Double.parseDouble(plain);
    return Double.isFinite(value) ? value : UNREADABLE;
  }
}
