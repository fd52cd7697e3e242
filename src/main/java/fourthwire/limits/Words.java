package fourthwire.limits;

import java.math.BigDecimal;
import java.math.MathContext;

/** How numbers stand in the sentences of findings. */
public final class Words {
  private Words() {}

  /** Three significant digits at most, never in powers of ten; whole numbers from 100 up. */
  public static String number(double value) {
    if (value == 0) {
      return "0";
    }
    int digits = Math.abs(value) >= 100 ? (int) Math.log10(Math.abs(value)) + 1 : 3;
    return new BigDecimal(value)
        .round(new MathContext(digits))
        .stripTrailingZeros()
        .toPlainString();
  }

  /** 1st, 2nd, 3rd, 4th … 11th, 12th, 13th … 21st. */
  public static String ordinal(int order) {
    int tens = order / 10 % 10;
    return switch (tens == 1 ? 0 : order % 10) {
      case 1 -> order + "st";
      case 2 -> order + "nd";
      case 3 -> order + "rd";
      default -> order + "th";
    };
  }
}
