package fourthwire.load.control;

/**
 * Values and zero crossings of a wave given by its phasors; angles in radians of the fundamental.
 */
final class Crossing {
  private static final double FARTHEST = Math.PI / 6;

  private Crossing() {}

  /** The wave over √2 at an angle, to an order. */
  private static double value(double[] re, double[] im, double at, int highest) {
    double sin1 = Math.sin(at);
    double cos1 = Math.cos(at);
    double s = 0;
    double c = 1;
    double sum = 0;
    for (int h = 1; h <= highest; h++) {
      double next = s * cos1 + c * sin1;
      c = c * cos1 - s * sin1;
      s = next;
      sum += re[h] * s + im[h] * c;
    }
    return sum;
  }

  /**
   * The zero crossing nearest a guess (the fundamental's crossing), by Newton; where the wave rings
   * so that none is found within 30°, the guess itself.
   *
   * @param highest orders above this are left out
   */
  static double near(double[] re, double[] im, double guess, int highest) {
    double x = guess;
    for (int n = 0; n < 30; n++) {
      double by = value(re, im, x, highest) / slope(re, im, x, highest);
      x -= by;
      if (!(Math.abs(x - guess) < FARTHEST)) {
        return guess;
      }
      if (Math.abs(by) < 1e-13) {
        return x;
      }
    }
    return x;
  }

  private static double slope(double[] re, double[] im, double at, int highest) {
    double sin1 = Math.sin(at);
    double cos1 = Math.cos(at);
    double s = 0;
    double c = 1;
    double sum = 0;
    for (int h = 1; h <= highest; h++) {
      double next = s * cos1 + c * sin1;
      c = c * cos1 - s * sin1;
      s = next;
      sum += h * (re[h] * c - im[h] * s);
    }
    return sum;
  }
}
