package fourthwire.metering;

import java.math.BigDecimal;
import java.math.MathContext;

/** A value with its unit as sentences write it: four digits, a true minus sign. */
public final class Amount {
  private static final MathContext DIGITS = new MathContext(4);
  private static final double PLAIN_FROM = 1e-4;
  private static final double PLAIN_TO = 1e12;

  private Amount() {}

  /** A value in a unit; an empty unit leaves the bare number. */
  public static String of(double value, String unit) {
    return withUnit(Double.isFinite(value) ? rounded(value) : Double.toString(value), unit);
  }

  /** A value as it was read, all its digits, in the unit of a quantity such as {@code L1.rms_a}. */
  public static String read(double value, String quantity) {
    boolean whole = Math.rint(value) == value && Math.abs(value) < PLAIN_TO;
    return withUnit(whole ? Long.toString((long) value) : Double.toString(value), unit(quantity));
  }

  /** The unit that a quantity's name ends on; empty for a ratio. */
  public static String unit(String quantity) {
    String name = quantity.replaceFirst("\\.(min|max)$", "");
    String measure = name.substring(name.lastIndexOf('.') + 1);
    return switch (measure.substring(measure.lastIndexOf('_') + 1)) {
      case "a", "i" -> "A";
      case "v" -> "V";
      case "w" -> "W";
      case "var" -> "var";
      case "va" -> "VA";
      case "wh" -> "Wh";
      case "percent" -> "%";
      case "deg" -> "°";
      case "hz" -> "Hz";
      default -> "";
    };
  }

  private static String rounded(double value) {
    double size = Math.abs(value);
    BigDecimal digits = new BigDecimal(value).round(DIGITS).stripTrailingZeros();
    return size == 0
        ? "0"
        : size >= PLAIN_FROM && size < PLAIN_TO ? digits.toPlainString() : digits.toString();
  }

  private static String withUnit(String number, String unit) {
    String signed = number.replace('-', '\u2212');
    return unit.isEmpty() ? signed : unit.equals("°") ? signed + unit : signed + " " + unit;
  }
}
