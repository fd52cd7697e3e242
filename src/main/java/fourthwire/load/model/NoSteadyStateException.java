package fourthwire.load.model;

import java.math.BigDecimal;
import java.math.MathContext;

/** The equipment has no periodic steady state at this voltage, or none was found; says why. */
public final class NoSteadyStateException extends RuntimeException {
  private static final long serialVersionUID = 1L;
  private static final MathContext FOUR_DIGITS = new MathContext(4);

  /** With the reason as a sentence a user can read. */
  public NoSteadyStateException(String reason) {
    super(reason);
  }

  /**
   * With the reason as a sentence whose figures stand as {@code %s}: written to four digits,
   * without an exponent.
   */
  public static NoSteadyStateException of(String reason, Object... parts) {
    Object[] words = parts.clone();
    for (int k = 0; k < words.length; k++) {
      if (words[k] instanceof Double figure && Double.isFinite(figure)) {
        words[k] = new BigDecimal(figure, FOUR_DIGITS).stripTrailingZeros().toPlainString();
      }
    }
    return new NoSteadyStateException(String.format(reason, words));
  }
}
