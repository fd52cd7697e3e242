package fourthwire.quantity;

import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;

/** A figure of an audit: either a known number or the reason why it can't be computed. */
public sealed interface Figure {
  /** A figure that is known; it must be finite. */
  static Figure of(double value) {
    return new Known(value);
  }

  /** A figure that can't be computed, and one short sentence why. */
  static Figure unknown(String reason) {
    return new Unknown(reason);
  }

  /** The value, empty if unknown. */
  OptionalDouble value();

  /** Why it is unknown; empty text if it is known. */
  String reason();

  /** This figure with the function applied to its value, if known. */
  default Figure map(DoubleUnaryOperator f) {
    return value().isPresent() ? of(f.applyAsDouble(value().getAsDouble())) : this;
  }

  /** A known figure. */
  record Known(double number) implements Figure {
    /** Refuses what is no number: nothing fails silently. */
    public Known {
      if (!Double.isFinite(number)) {
        throw new ArithmeticException("a figure came out as " + number);
      }
    }

    @Override
    public OptionalDouble value() {
      return OptionalDouble.of(number);
    }

    @Override
    public String reason() {
      return "";
    }
  }

  /** An unknown figure. */
  record Unknown(String reason) implements Figure {
    @Override
    public OptionalDouble value() {
      return OptionalDouble.empty();
    }
  }
}
