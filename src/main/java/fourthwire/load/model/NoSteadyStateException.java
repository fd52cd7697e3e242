package fourthwire.load.model;

import java.math.BigDecimal;
import java.math.MathContext;

/** The equipment has no periodic steady state at this voltage, or none was found; says why. */
public final class NoSteadyStateException extends RuntimeException {
  private static final long serialVersionUID = 1L;
  private static final MathContext FOUR_DIGITS = new MathContext(4);

  /** What stands in the way of a steady state. */
  public enum Why {
    /** The current does not repeat from cycle to cycle. */
    NO_REPEAT,
    /** The source cannot give what the equipment asks for. */
    TOO_MUCH,
    /** Neither is known. */
    OTHER
  }

  private Why why = Why.OTHER;

  /** The same, knowing what stands in the way. */
  public NoSteadyStateException since(Why reason) {
    why = reason;
    return this;
  }

  /** What stands in the way. */
  public Why why() {
    return why;
  }

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
