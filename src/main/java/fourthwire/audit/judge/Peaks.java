package fourthwire.audit.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.function.IntToDoubleFunction;

/**
 * Peaks of an impedance that is known at equal steps. Near a resonance 1/|Z|² is a parabola of the
 * order; its vertex gives order and height between the steps.
 */
final class Peaks {
  private Peaks() {}

  /** A peak between steps: how many steps past the middle one, and how high. */
  record Vertex(double steps, double ohm) {}

  /** The vertex through three neighbouring magnitudes, the middle one the largest. */
  static Vertex vertex(double before, double middle, double after) {
    double a = 1 / (before * before);
    double b = 1 / (middle * middle);
    double c = 1 / (after * after);
    double bend = a - 2 * b + c;
    if (!(bend > 0)) {
      return new Vertex(0, middle);
    }
    double steps = (a - c) / (2 * bend);
    double least = b - (a - c) * (a - c) / (8 * bend);
    return new Vertex(steps, least > 0 ? 1 / Math.sqrt(least) : middle);
  }

  /** Where the magnitudes have a maximum inside 0 to count - 1. */
  static List<Integer> maxima(int count, IntToDoubleFunction ohm) {
    List<Integer> at = new ArrayList<>();
    for (int k = 1; k < count - 1; k++) {
      double z = ohm.applyAsDouble(k);
      if (z > ohm.applyAsDouble(k - 1) && z >= ohm.applyAsDouble(k + 1)) {
        at.add(k);
      }
    }
    return at;
  }
}
