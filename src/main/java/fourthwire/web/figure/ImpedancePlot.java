package fourthwire.web.figure;

import java.util.List;
import java.util.function.IntFunction;
import java.util.function.IntToDoubleFunction;

/**
 * Impedance against the order on a logarithmic scale, above the currents that would excite it: a
 * peak that stands over a tall bar is trouble.
 */
public final class ImpedancePlot {
  private static final double CURVE_PX = 150;
  private static final double BARS_PX = 52;
  private static final double BETWEEN_PX = 10;
  private static final double LAST_ORDER = 50;
  private static final int[] WRITTEN = {1, 5, 7, 11, 13, 17, 19, 23, 25, 31, 37, 43, 49};
  private static final double LEAST_GAP = 3;

  private ImpedancePlot() {}

  /**
   * What is drawn.
   *
   * @param points how many of the curve
   * @param order of a point
   * @param ohm of a point
   * @param amps of each whole order from 2 on, index 0 for order 2
   * @param peaks orders at which a mark stands
   */
  public record Curve(
      int points,
      IntToDoubleFunction order,
      IntToDoubleFunction ohm,
      List<Double> amps,
      List<Double> peaks) {}

  /** The picture. */
  public static String draw(Curve c, IntFunction<String> ordinal, String alternative) {
    double low = Double.POSITIVE_INFINITY;
    double high = 0;
    for (int k = 0; k < c.points(); k++) {
      low = Math.min(low, c.ohm().applyAsDouble(k));
      high = Math.max(high, c.ohm().applyAsDouble(k));
    }
    int first = (int) Math.floor(Math.log10(Math.max(low, Double.MIN_NORMAL)));
    int last = Math.max(first + 1, (int) Math.ceil(Math.log10(Math.max(high, low))));
    Svg svg = Svg.picture("plot impedance", alternative);
    for (int decade = first; decade <= last; decade++) {
      double y = y(decade, first, last);
      svg.add("line", "class", "rule", "x1", 0, "x2", "100%", "y1", y, "y2", y);
      String unit = decade == last ? "\u202fΩ" : "";
      String text = Svg.rounded(Math.pow(10, decade), 9) + unit;
      svg.text(text, "x", 0, "dx", -6, "y", y + 4, "text-anchor", "end");
    }
    for (double peak : c.peaks()) {
      String x = Svg.share(x(peak));
      double bottom = CURVE_PX + BETWEEN_PX + BARS_PX;
      svg.add("line", "class", "full-mark", "x1", x, "x2", x, "y1", 0, "y2", bottom);
    }
    curve(svg, c, first, last);
    bars(svg, c.amps());
    orders(svg, ordinal);
    return svg.done();
  }

  private static void curve(Svg svg, Curve c, int first, int last) {
    svg.open(
        "svg",
        "viewBox",
        "0 0 1000 " + (int) CURVE_PX,
        "preserveAspectRatio",
        "none",
        "width",
        "100%",
        "height",
        CURVE_PX);
    StringBuilder path = new StringBuilder();
    for (int k = 0; k < c.points(); k++) {
      double x = 1000 * x(c.order().applyAsDouble(k));
      double y = y(Math.log10(c.ohm().applyAsDouble(k)), first, last);
      path.append(k == 0 ? 'M' : 'L').append(Svg.rounded(x, 1)).append(' ');
      path.append(Svg.rounded(y, 1));
    }
    svg.add("path", "class", "curve", "d", path.toString()).close();
  }

  private static void bars(Svg svg, List<Double> amps) {
    double base = CURVE_PX + BETWEEN_PX + BARS_PX;
    double most = amps.stream().mapToDouble(Double::doubleValue).max().orElse(0);
    svg.add("line", "class", "axis", "x1", 0, "x2", "100%", "y1", base, "y2", base);
    for (int k = 0; k < amps.size(); k++) {
      double height = most > 0 ? BARS_PX * amps.get(k) / most : 0;
      svg.add(
          "line",
          "class",
          "order-bar",
          "x1",
          Svg.share(x(k + 2)),
          "x2",
          Svg.share(x(k + 2)),
          "y1",
          base - height,
          "y2",
          base);
    }
  }

  private static void orders(Svg svg, IntFunction<String> ordinal) {
    double before = -LEAST_GAP;
    for (int order : WRITTEN) {
      if (order - before >= LEAST_GAP) {
        svg.ordinal(
            ordinal.apply(order), Svg.share(x(order)), CURVE_PX + BETWEEN_PX + BARS_PX + 18);
        before = order;
      }
    }
  }

  private static double x(double order) {
    return (order - 1) / (LAST_ORDER - 1);
  }

  private static double y(double decade, int first, int last) {
    return CURVE_PX * (1 - (decade - first) / (last - first));
  }
}
