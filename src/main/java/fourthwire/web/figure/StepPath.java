package fourthwire.web.figure;

import fourthwire.metering.reduce.TimeSteps;
import java.util.function.DoubleToLongFunction;
import java.util.function.IntPredicate;
import java.util.function.IntToDoubleFunction;

/**
 * Paths of values that hold for a step each, in few characters: whole units, each move told by how
 * far it goes. Along the width a unit is the longest time that fits every step.
 */
final class StepPath {
  private final long[] x;
  private final DoubleToLongFunction y;

  /**
   * Over these steps.
   *
   * @param y how far down a value stands, whole units
   */
  StepPath(TimeSteps steps, DoubleToLongFunction y) {
    this.y = y;
    this.x = new long[steps.count() + 1];
    long unit = 0;
    for (int k = 0; k < steps.count(); k++) {
      unit = divisor(unit, steps.edge(k + 1) - steps.edge(k));
    }
    for (int k = 0; k < x.length; k++) {
      x[k] = (steps.edge(k) - steps.from()) / Math.max(1, unit);
    }
  }

  private static long divisor(long a, long b) {
    return b == 0 ? a : divisor(b, a % b);
  }

  /** Units of the whole width. */
  long width() {
    return x[x.length - 1];
  }

  /** Along the values; a gap where there is none. */
  String line(IntToDoubleFunction values) {
    StringBuilder d = new StringBuilder();
    long at = Long.MIN_VALUE;
    for (int k = 0; k < x.length - 1; k++) {
      double v = values.applyAsDouble(k);
      if (Double.isNaN(v)) {
        at = Long.MIN_VALUE;
        continue;
      }
      at = to(d, k, at, y.applyAsLong(v));
      along(d, x[k + 1] - x[k]);
    }
    return d.toString();
  }

  /** The room between two values, closed at every gap. */
  String band(IntToDoubleFunction high, IntToDoubleFunction low) {
    StringBuilder d = new StringBuilder();
    int n = x.length - 1;
    for (int k = 0; k < n; k++) {
      int from = k;
      while (k < n && !Double.isNaN(high.applyAsDouble(k))) {
        k++;
      }
      if (k > from) {
        piece(d, from, k, high, low);
      }
    }
    return d.toString();
  }

  private void piece(
      StringBuilder d, int from, int to, IntToDoubleFunction high, IntToDoubleFunction low) {
    long at = Long.MIN_VALUE;
    for (int k = from; k < to; k++) {
      at = to(d, k, at, y.applyAsLong(high.applyAsDouble(k)));
      along(d, x[k + 1] - x[k]);
    }
    for (int k = to - 1; k >= from; k--) {
      at = to(d, k, at, y.applyAsLong(low.applyAsDouble(k)));
      along(d, x[k] - x[k + 1]);
    }
    d.append('z');
  }

  /** Bars so high along the top of the steps that meet a test. */
  String bars(IntPredicate test, int height) {
    StringBuilder d = new StringBuilder();
    int n = x.length - 1;
    for (int k = 0; k < n; k++) {
      int from = k;
      while (k < n && test.test(k)) {
        k++;
      }
      if (k > from) {
        long width = x[k] - x[from];
        d.append('M').append(x[from]).append(" 0h").append(width);
        d.append('v').append(height).append('h').append(-width).append('z');
      }
    }
    return d.toString();
  }

  /** Up or down to a value, or to a new beginning. */
  private long to(StringBuilder d, int k, long at, long next) {
    if (at == Long.MIN_VALUE) {
      d.append('M').append(x[k]).append(' ').append(next);
    } else if (next != at) {
      d.append('v').append(next - at);
    }
    return next;
  }

  private static void along(StringBuilder d, long units) {
    d.append('h').append(units);
  }
}
