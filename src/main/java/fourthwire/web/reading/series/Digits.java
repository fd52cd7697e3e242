package fourthwire.web.reading.series;

import fourthwire.web.support.Numbers;
import java.util.OptionalInt;

/**
 * How figures of one quantity are written: three significant digits; where they lie far from zero
 * and close together, so many decimals that they can be told apart.
 */
public record Digits(OptionalInt decimals) {
  private static final int MOST = 3;

  /** For figures from one to another. */
  public static Digits of(double low, double high) {
    boolean nearZero = low <= 0 || low < high / 2 || !(high > low);
    return new Digits(nearZero ? OptionalInt.empty() : OptionalInt.of(decimals(high - low)));
  }

  /** Alike in every cell of a picture, as few as tell its cells apart. */
  static Digits ofCells(double low, double high) {
    boolean nearZero = low <= 0 || low < high / 2;
    return new Digits(OptionalInt.of(nearZero ? decimals(high) : decimals(10 * (high - low))));
  }

  private static int decimals(double range) {
    int magnitude = range > 0 ? (int) Math.floor(Math.log10(range)) : 0;
    return Math.max(0, Math.min(MOST, 2 - magnitude));
  }

  String text(double value) {
    return decimals.isPresent()
        ? Numbers.withDecimals(value, decimals.getAsInt())
        : Numbers.of(value);
  }

  String text(double value, String unit) {
    return unit.isEmpty() ? text(value) : text(value) + Numbers.THIN_SPACE + unit;
  }
}
