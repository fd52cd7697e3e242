package fourthwire.web.figure;

import fourthwire.metering.reduce.ValuesBySize;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Quantities in order of size: for what share of the time each was above a value, with the
 * percentiles that limits are written for marked.
 */
public final class DurationPlot {
  private static final double HEIGHT_PX = 220;
  private static final int STEPS = 4;
  private static final int UNITS_WIDE = 2000;
  private static final int UNITS_A_PX = 4;
  private static final int POINTS = 400;
  private static final int[] MARKED = {99, 95, 50, 5};
  private static final int SHARE_STEP = 25;
  private static final double FURTHEST_LIMIT = 2;

  private DurationPlot() {}

  /**
   * A quantity.
   *
   * @param classes {@code l1} to {@code n}, or others
   */
  public record Curve(String classes, ValuesBySize values) {}

  /**
   * The picture.
   *
   * @param factor what values and limits are multiplied by to be in {@code unit}
   * @param bounds drawn where they are not far off the values
   */
  public static String draw(
      List<Curve> curves,
      List<SeriesPlot.Bound> bounds,
      double factor,
      String unit,
      String alternative) {
    Svg svg = Svg.picture("plot duration", alternative, "height", HEIGHT_PX + 66);
    Optional<Scale> scale = scale(curves, bounds, factor);
    scale.ifPresent(s -> s.draw(svg, 0, HEIGHT_PX, unit));
    marks(svg);
    scale.ifPresent(
        s -> {
          bounds.forEach(b -> limit(svg, s, factor * b.value(), b.label()));
          svg.stretched(0, HEIGHT_PX, UNITS_WIDE, Math.round(UNITS_A_PX * HEIGHT_PX));
          curves.stream()
              .filter(c -> c.values().count() > 0)
              .forEach(
                  c ->
                      svg.add(
                          "path",
                          "class",
                          "trace " + c.classes().toLowerCase(Locale.ROOT),
                          "d",
                          path(c.values(), s, factor)));
        });
    return svg.done();
  }

  /** Whether the curves' picture shows a limit: those far off the values are not drawn. */
  public static boolean draws(List<Curve> curves, SeriesPlot.Bound bound, double factor) {
    return scale(curves, List.of(bound), factor)
        .filter(s -> s.holds(factor * bound.value()))
        .isPresent();
  }

  private static Optional<Scale> scale(
      List<Curve> curves, List<SeriesPlot.Bound> bounds, double factor) {
    double low = extreme(curves, 0, factor).min().orElse(Double.NaN);
    double high = extreme(curves, 100, factor).max().orElse(Double.NaN);
    double to =
        bounds.stream()
            .mapToDouble(b -> factor * b.value())
            .filter(l -> l <= FURTHEST_LIMIT * high)
            .reduce(high, Math::max);
    return Scale.holding(low, to, STEPS);
  }

  private static java.util.stream.DoubleStream extreme(
      List<Curve> curves, int percent, double factor) {
    return curves.stream()
        .mapToDouble(c -> factor * c.values().percentile(percent))
        .filter(v -> !Double.isNaN(v));
  }

  /** The percentiles above the picture, the shares of the time below it. */
  private static void marks(Svg svg) {
    for (int percent : MARKED) {
      String x = Svg.share((100 - percent) / 100.0);
      double up = percent == MARKED[0] ? -20 : -6;
      svg.add("line", "class", "here", "x1", x, "x2", x, "y1", up + 3, "y2", HEIGHT_PX);
      svg.text("P" + percent, "x", x, "y", up, "text-anchor", "middle");
    }
    for (int share = 0; share <= 100; share += SHARE_STEP) {
      svg.text(
          share + "\u202f%",
          "x",
          share + "%",
          "y",
          HEIGHT_PX + 18,
          "text-anchor",
          share == 0 ? "start" : share == 100 ? "end" : "middle");
    }
  }

  private static void limit(Svg svg, Scale scale, double value, String label) {
    if (scale.holds(value)) {
      double y = scale.down(value, HEIGHT_PX);
      svg.add("line", "class", "full-mark", "x1", 0, "x2", "100%", "y1", y, "y2", y);
      svg.text(label, "class", "limit-label", "x", "100%", "y", y + 13, "text-anchor", "end");
    }
  }

  /** Largest value first; closer points near the ends, where limits are. */
  private static String path(ValuesBySize values, Scale scale, double factor) {
    StringBuilder d = new StringBuilder();
    for (int k = 0; k <= POINTS; k++) {
      double part = (1 - Math.cos(Math.PI * k / POINTS)) / 2;
      double value = factor * values.percentile(100 * (1 - part));
      d.append(k == 0 ? 'M' : 'L').append(Math.round(UNITS_WIDE * part)).append(' ');
      d.append(Math.round(UNITS_A_PX * scale.down(value, HEIGHT_PX)));
    }
    return d.toString();
  }
}
