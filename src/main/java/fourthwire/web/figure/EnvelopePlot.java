package fourthwire.web.figure;

import fourthwire.metering.WaveformPicture;
import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.Locale;

/**
 * Waveforms over the whole record: each conductor's lowest and highest sample of every short
 * stretch. A record of a few cycles shows its curves, a long one the outlines of the bands they run
 * in.
 */
public final class EnvelopePlot {
  private static final double HEIGHT_PX = 208;
  private static final int UNITS_WIDE = 1000;
  private static final int STEPS = 3;
  private static final int TIME_STEPS = 4;
  private static final double MILLISECONDS_BELOW_S = 0.5;
  private static final double CURVES_BELOW_S = 0.25;

  private EnvelopePlot() {}

  /** One conductor's trace; of two lines, the first's. */
  public record Trace(Conductor conductor, WaveformPicture.Trace values) {}

  /**
   * The picture.
   *
   * @param traces drawn in this order
   * @param stepS length of a stretch, seconds
   * @param unit of the values, {@code A} or {@code V}
   */
  public static String draw(List<Trace> traces, double stepS, String unit, String alternative) {
    double highest =
        traces.stream()
            .flatMapToDouble(t -> t.values().highest().stream().mapToDouble(Math::abs))
            .max()
            .orElse(0);
    double lowest =
        traces.stream()
            .flatMapToDouble(t -> t.values().lowest().stream().mapToDouble(Math::abs))
            .max()
            .orElse(0);
    Ticks ticks = Ticks.upTo(Math.max(highest, lowest), STEPS);
    Svg svg = Svg.picture("plot cycle", alternative);
    rules(svg, ticks, unit);
    int stretches = traces.isEmpty() ? 0 : traces.get(0).values().lowest().size();
    seconds(svg, stretches * stepS);
    svg.stretched(UNITS_WIDE, HEIGHT_PX);
    boolean curves = stretches * stepS < CURVES_BELOW_S;
    for (Trace t : traces) {
      String classes = "trace " + t.conductor().name().toLowerCase(Locale.ROOT);
      String path = curves ? curve(t.values(), ticks.end()) : outline(t.values(), ticks.end());
      svg.add("path", "class", classes, "d", path);
    }
    return svg.close().done();
  }

  private static void rules(Svg svg, Ticks ticks, String unit) {
    for (double value : ticks.values()) {
      rule(svg, ticks, value, unit);
      if (value > 0) {
        rule(svg, ticks, -value, "");
      }
    }
  }

  private static void rule(Svg svg, Ticks ticks, double value, String unit) {
    double y = y(value, ticks.end());
    String classes = value == 0 ? "axis" : "rule";
    svg.add("line", "class", classes, "x1", 0, "x2", "100%", "y1", y, "y2", y);
    String text = value == ticks.end() ? ticks.text(value) + "\u202f" + unit : ticks.text(value);
    svg.text(text, "x", 0, "dx", -6, "y", y + 4, "text-anchor", "end");
  }

  private static void seconds(Svg svg, double lengthS) {
    boolean milli = lengthS < MILLISECONDS_BELOW_S;
    double length = milli ? 1000 * lengthS : lengthS;
    Ticks ticks = Ticks.upTo(length, TIME_STEPS);
    for (double t : ticks.values()) {
      if (t <= length) {
        String unit = t == 0 ? "" : "\u202f" + (milli ? "ms" : "s");
        String anchor = t == 0 ? "start" : t > 0.97 * length ? "end" : "middle";
        svg.text(
            ticks.text(t) + unit,
            "x",
            Svg.share(t / length),
            "y",
            HEIGHT_PX + 18,
            "text-anchor",
            anchor);
      }
    }
  }

  /** Through the middle of each stretch. */
  private static String curve(WaveformPicture.Trace trace, double end) {
    int n = trace.lowest().size();
    StringBuilder d = new StringBuilder("M");
    for (int k = 0; k < n; k++) {
      point(d, k, n, (trace.lowest().get(k) + trace.highest().get(k)) / 2, end);
    }
    return d.toString();
  }

  /** Along the highest, and along the lowest. */
  private static String outline(WaveformPicture.Trace trace, double end) {
    int n = trace.lowest().size();
    StringBuilder d = new StringBuilder("M");
    for (int k = 0; k < n; k++) {
      point(d, k, n, trace.highest().get(k), end);
    }
    for (int k = 0; k < n; k++) {
      d.append(k == 0 ? "M" : "");
      point(d, k, n, trace.lowest().get(k), end);
    }
    return d.toString();
  }

  private static void point(StringBuilder d, int k, int n, double value, double end) {
    double x = UNITS_WIDE * (k + 0.5) / n;
    d.append(d.charAt(d.length() - 1) == 'M' ? "" : "L").append(Svg.rounded(x, 1));
    d.append(' ').append(Svg.rounded(y(value, end), 1));
  }

  private static double y(double value, double end) {
    return HEIGHT_PX / 2 * (1 - value / end);
  }
}
