package fourthwire.json;

import java.math.BigDecimal;
import java.math.MathContext;

/** Figures to so many significant digits. */
final class Digits {
  /** Powers of ten are exact doubles up to here. */
  private static final int HIGHEST_EXACT_POWER = 22;

  private static final double[] POWERS_OF_TEN = new double[HIGHEST_EXACT_POWER + 1];

  static {
    for (int n = 0; n <= HIGHEST_EXACT_POWER; n++) {
      POWERS_OF_TEN[n] = Double.parseDouble("1e" + n);
    }
  }

  private Digits() {}

  /** The double nearest to a figure's first significant digits; rounds many in little time. */
  static double rounded(double value, int digits) {
    if (value == 0 || !Double.isFinite(value)) {
      return value;
    }
    int shift = digits - 1 - (int) Math.floor(Math.log10(Math.abs(value)));
    if (shift < 0 || shift > HIGHEST_EXACT_POWER) {
      return new BigDecimal(value).round(new MathContext(digits)).doubleValue();
    }
    return Math.rint(value * POWERS_OF_TEN[shift]) / POWERS_OF_TEN[shift];
  }
}
