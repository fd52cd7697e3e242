package fourthwire.intake.survey;

import java.math.BigDecimal;
import java.util.regex.Pattern;

/** Numbers as survey tables write them: plain decimals, without units or thousands separators. */
final class Numbers {
  private static final Pattern DECIMAL =
      Pattern.compile("[+-]?(\\d+([.,]\\d*)?|[.,]\\d+)([eE][+-]?\\d{1,4})?");
  private static final int LONGEST_PLAIN_DIGITS = 15;

  private Numbers() {}

  /**
   * Reads a number.
   *
   * @param decimalComma whether a comma may be the decimal sign
   * @throws IllegalArgumentException saying what is accepted
   */
  static double parse(String text, boolean decimalComma) {
    if (!DECIMAL.matcher(text).matches()) {
      throw new IllegalArgumentException(
          "This is not a number. Write digits with a decimal point, such as 1234.5, without unit"
              + " or thousands separator.");
    }
    if (text.contains(",") && !decimalComma) {
      throw new IllegalArgumentException(
          "A decimal comma can't stand in a table whose separator is the comma. Write a decimal"
              + " point, or separate the columns by semicolons or tabs.");
    }
    double value = Double.parseDouble(text.replace(',', '.'));
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException("This number is too large.");
    }
    return value == 0 ? 0 : value;
  }

  /** The canonical text: exact, as short as the number allows, an exponent only far from 1. */
  static String print(double value) {
    BigDecimal exact = new BigDecimal(Double.toString(value)).stripTrailingZeros();
    boolean plain =
        exact.scale() <= LONGEST_PLAIN_DIGITS
            && exact.precision() - exact.scale() <= LONGEST_PLAIN_DIGITS;
    return plain ? exact.toPlainString() : exact.toString();
  }
}
