package fourthwire.web.support;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/** Writes numbers: three significant digits, a proper minus, digits in groups of three. */
public final class Numbers {
  /** Between groups of digits, and between a number and its unit. */
  public static final char THIN_SPACE = '\u202f';

  /** As wide as a digit. */
  static final char FIGURE_SPACE = '\u2007';

  /** As wide as a decimal point. */
  static final char PUNCTUATION_SPACE = '\u2008';

  private static final char MINUS = '\u2212';
  private static final int SIGNIFICANT = 3;
  private static final double SMALLEST = 0.0005;

  private Numbers() {}

  /**
   * The number with three significant digits; whole numbers above 999 keep all their digits. What
   * is not zero but under a half of 0.001 is written as under 0.001.
   */
  public static String of(double value) {
    double magnitude = Math.abs(value);
    if (magnitude == 0) {
      return "0";
    }
    if (magnitude < SMALLEST) {
      return "<" + THIN_SPACE + "0.001";
    }
    BigDecimal rounded =
        BigDecimal.valueOf(magnitude)
            .round(new MathContext(SIGNIFICANT, RoundingMode.HALF_UP))
            .stripTrailingZeros();
    int whole = rounded.precision() - rounded.scale();
    int decimals = Math.max(0, Math.min(SIGNIFICANT, SIGNIFICANT - whole));
    return withDecimals(value, decimals);
  }

  /** The number with so many decimals. */
  public static String withDecimals(double value, int decimals) {
    String plain =
        BigDecimal.valueOf(Math.abs(value))
            .setScale(decimals, RoundingMode.HALF_UP)
            .toPlainString();
    boolean zero = plain.chars().noneMatch(c -> c >= '1' && c <= '9');
    return (value < 0 && !zero ? String.valueOf(MINUS) : "") + grouped(plain);
  }

  /** The number with its unit after a thin space. */
  public static String of(double value, String unit) {
    return unit.isEmpty() ? of(value) : of(value) + THIN_SPACE + unit;
  }

  /** The number without trailing zeros, with its unit: limits, ratings, counts. */
  public static String plain(double value, String unit) {
    String text = of(value);
    if (text.indexOf('.') >= 0) {
      text = text.replaceAll("0+$", "").replaceAll("\\.$", "");
    }
    return unit.isEmpty() ? text : text + THIN_SPACE + unit;
  }

  /** An order of the fundamental as an ordinal: 1st, 3rd, 11th. */
  public static String ordinal(int order) {
    int tens = order % 100;
    if (tens >= 11 && tens <= 13) {
      return order + "th";
    }
    return order
        + switch (order % 10) {
          case 1 -> "st";
          case 2 -> "nd";
          case 3 -> "rd";
          default -> "th";
        };
  }

  private static String grouped(String plain) {
    int point = plain.indexOf('.');
    String whole = point < 0 ? plain : plain.substring(0, point);
    String rest = point < 0 ? "" : plain.substring(point);
    if (whole.length() < 5) {
      return plain;
    }
    return whole.replaceAll("(?<=\\d)(?=(\\d{3})+$)", String.valueOf(THIN_SPACE)) + rest;
  }
}
