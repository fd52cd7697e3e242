package fourthwire.load.control;

/** Nodes and weights of Gauss-Legendre quadrature on [-1, 1], by Newton on the recurrence. */
final class GaussLegendre {
  private GaussLegendre() {}

  /** Nodes in [0], weights in [1]. */
  static double[][] rule(int points) {
    double[][] rule = new double[2][points];
    for (int k = 0; k < points; k++) {
      double x = Math.cos(Math.PI * (k + 0.75) / (points + 0.5));
      double derivative = 0;
      for (int n = 0; n < 8; n++) {
        double previous = 1;
        double value = x;
        for (int d = 2; d <= points; d++) {
          double next = ((2 * d - 1) * x * value - (d - 1) * previous) / d;
          previous = value;
          value = next;
        }
        derivative = points * (x * value - previous) / (x * x - 1);
        x -= value / derivative;
      }
      rule[0][k] = x;
      rule[1][k] = 2 / ((1 - x * x) * derivative * derivative);
    }
    return rule;
  }
}
