package fourthwire.web.figure;

/**
 * How sure a figure is: a bed from 0, a dark line from P5 to P95, a stroke at P50, a ring at the
 * computed figure, and a dashed mark at the limit where there is one.
 */
public final class RangeBar {
  private static final double HEIGHT_PX = 18;
  private static final double HEADROOM = 1.08;

  private RangeBar() {}

  /**
   * The bar.
   *
   * @param computed the figure as surveyed
   * @param limit NaN: none
   */
  public static String draw(
      double p5, double p50, double p95, double computed, double limit, String alternative) {
    double end = HEADROOM * Math.max(p95, Math.max(computed, Double.isNaN(limit) ? 0 : limit));
    Svg svg = Svg.picture("range", alternative);
    double middle = HEIGHT_PX / 2;
    svg.add("rect", "class", "bed", "x", 0, "y", middle - 5, "width", "100%", "height", 10);
    if (!(end > 0)) {
      return svg.done();
    }
    String low = Svg.share(Math.max(0, p5 / end));
    String high = Svg.share(p95 / end);
    String half = Svg.share(p50 / end);
    svg.add("line", "class", "span", "x1", low, "x2", high, "y1", middle, "y2", middle);
    svg.add("line", "class", "half", "x1", half, "x2", half, "y1", middle - 7, "y2", middle + 7);
    svg.add("circle", "class", "computed", "cx", Svg.share(computed / end), "cy", middle, "r", 4.5);
    if (!Double.isNaN(limit)) {
      String at = Svg.share(limit / end);
      svg.add("line", "class", "full-mark", "x1", at, "x2", at, "y1", -1, "y2", HEIGHT_PX + 1);
    }
    return svg.done();
  }
}
