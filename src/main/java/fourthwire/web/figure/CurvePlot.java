package fourthwire.web.figure;

import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;

/**
 * A few curves over one quantity, told apart by their strokes; a gap where there is no value, and a
 * short stroke where one stands between gaps.
 */
public final class CurvePlot {
  private static final int UNITS_WIDE = 1000;

  /** Half the stroke of a value by itself. */
  private static final double ALONE = 8;

  private CurvePlot() {}

  /** How a curve is drawn. */
  public enum Style {
    SOLID,
    DASHED,
    DOTTED;

    /** Its class in the style sheet. */
    String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  /**
   * A curve.
   *
   * @param values one for each place, empty where there is none
   */
  public record Curve(Style style, List<OptionalDouble> values) {}

  /**
   * Where values stand on the axis below.
   *
   * @param at share of the width, 0 to 1
   * @param label written there, empty for none
   */
  public record Place(double at, String label) {}

  /**
   * What values are read from: an axis from zero to a round value.
   *
   * @param classes of the picture in the style sheet, which sets its height
   * @param heightPx from zero to the end, pixels
   * @param steps about so many
   * @param least the axis reaches at least to this
   * @param unit of the values
   */
  private record Axis(String classes, double heightPx, int steps, double least, String unit) {}

  private static final Axis PERCENT = new Axis("plot curves", 168, 4, 0, "%");
  private static final Axis FACTOR = new Axis("plot curves low", 70, 2, 1, "");

  /**
   * The picture of percentages.
   *
   * @param here share of the width at which a line marks the state that is shown; empty: none
   */
  public static String draw(
      List<Place> places, List<Curve> curves, OptionalDouble here, String alternative) {
    return draw(PERCENT, places, curves, here, alternative);
  }

  /** A low picture of a factor from 0 to 1, to stand under another over the same places. */
  public static String drawFactor(
      List<Place> places, Curve curve, OptionalDouble here, String alternative) {
    return draw(FACTOR, places, List.of(curve), here, alternative);
  }

  private static String draw(
      Axis axis, List<Place> places, List<Curve> curves, OptionalDouble here, String alternative) {
    double highest =
        curves.stream()
            .flatMap(c -> c.values().stream())
            .flatMapToDouble(OptionalDouble::stream)
            .max()
            .orElse(0);
    Ticks ticks = Ticks.upTo(Math.max(axis.least(), highest), axis.steps());
    Svg svg = Svg.picture(axis.classes(), alternative);
    rules(svg, axis, ticks);
    places.forEach(p -> label(svg, axis, p));
    here.ifPresent(
        x ->
            svg.add(
                "line",
                "class",
                "here",
                "x1",
                Svg.share(x),
                "x2",
                Svg.share(x),
                "y1",
                0,
                "y2",
                axis.heightPx()));
    svg.stretched(UNITS_WIDE, axis.heightPx());
    curves.forEach(
        c ->
            svg.add(
                "path",
                "class",
                "curve " + c.style().word(),
                "d",
                path(places, c, v -> y(axis, ticks, v))));
    return svg.done();
  }

  private static void label(Svg svg, Axis axis, Place place) {
    if (!place.label().isEmpty()) {
      String anchor = place.at() == 0 ? "start" : place.at() == 1 ? "end" : "middle";
      svg.text(
          place.label(),
          "x",
          Svg.share(place.at()),
          "y",
          axis.heightPx() + 18,
          "text-anchor",
          anchor);
    }
  }

  private static void rules(Svg svg, Axis axis, Ticks ticks) {
    for (double value : ticks.values()) {
      double y = y(axis, ticks, value);
      String classes = value == 0 ? "axis" : "rule";
      svg.add("line", "class", classes, "x1", 0, "x2", "100%", "y1", y, "y2", y);
      boolean named = value == ticks.end() && !axis.unit().isEmpty();
      String text = ticks.text(value) + (named ? "\u202f" + axis.unit() : "");
      svg.text(text, "x", 0, "dx", -6, "y", y + 4, "text-anchor", "end");
    }
  }

  private static String path(List<Place> places, Curve curve, DoubleUnaryOperator y) {
    StringBuilder d = new StringBuilder();
    for (int i = 0; i < places.size(); i++) {
      OptionalDouble value = curve.values().get(i);
      if (value.isPresent()) {
        double x = UNITS_WIDE * places.get(i).at();
        double height = y.applyAsDouble(value.getAsDouble());
        boolean before = has(curve, i - 1);
        if (before || has(curve, i + 1)) {
          point(d, before ? 'L' : 'M', x, height);
        } else {
          point(d, 'M', Math.max(0, x - ALONE), height);
          point(d, 'L', Math.min(UNITS_WIDE, x + ALONE), height);
        }
      }
    }
    return d.toString();
  }

  private static boolean has(Curve curve, int place) {
    return place >= 0 && place < curve.values().size() && curve.values().get(place).isPresent();
  }

  private static void point(StringBuilder d, char stroke, double x, double y) {
    d.append(stroke).append(Svg.rounded(x, 1)).append(' ').append(Svg.rounded(y, 1));
  }

  private static double y(Axis axis, Ticks ticks, double value) {
    return axis.heightPx() * (1 - value / ticks.end());
  }
}
