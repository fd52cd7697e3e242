package fourthwire.quantity;

/** Percentiles of values in rising order. */
public final class Percentiles {
  private Percentiles() {}

  /**
   * Of a whole population (a week's hours, a log's rows): linear between the ordered values, at
   * position (n - 1)·p/100 counted from 0. Source: Hyndman and Fan, "Sample quantiles in
   * statistical packages", The American Statistician 50 (1996), definition 7.
   *
   * @param sorted rising, at least one
   */
  public static double linear(double[] sorted, double percent) {
    return at(sorted, (sorted.length - 1) * percent / 100);
  }

  /**
   * Estimated from draws: at position (n + 1)·p/100 counted from 1, so that a new draw falls below
   * it with that probability however few draws there are (the same source, definition 6); the
   * smallest or largest draw where that lies outside.
   *
   * @param sorted rising, at least one
   */
  public static double expected(double[] sorted, double percent) {
    return at(sorted, (sorted.length + 1) * percent / 100 - 1);
  }

  private static double at(double[] sorted, double position) {
    double inside = Math.max(0, Math.min(sorted.length - 1, position));
    int below = (int) inside;
    int above = Math.min(below + 1, sorted.length - 1);
    return sorted[below] + (inside - below) * (sorted[above] - sorted[below]);
  }
}
