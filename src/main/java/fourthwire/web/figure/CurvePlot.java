package fourthwire.web.figure;

import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;

/** A few curves over one quantity, told apart by their strokes; a gap where there is no value. */
public final class CurvePlot {
  private static final double HEIGHT_PX = 168;
  private static final int STEPS = 4;
  private static final int UNITS_WIDE = 1000;

  private CurvePlot() {}

  /** How a curve is drawn. */
  public enum Style {
    SOLID,
    DASHED,
    DOTTED,
    HEAVY;

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
   * The picture.
   *
   * @param here share of the width at which a line marks the state that is shown; empty: none
   * @param unit of the values
   */
  public static String draw(
      List<Place> places,
      List<Curve> curves,
      OptionalDouble here,
      String unit,
      String alternative) {
    double highest =
        curves.stream()
            .flatMap(c -> c.values().stream())
            .flatMapToDouble(OptionalDouble::stream)
            .max()
            .orElse(0);
    Ticks ticks = Ticks.upTo(highest, STEPS);
    Svg svg = Svg.picture("plot curves", alternative);
    rules(svg, ticks, unit);
    places.forEach(p -> label(svg, p));
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
                HEIGHT_PX));
    svg.stretched(UNITS_WIDE, HEIGHT_PX);
    curves.forEach(
        c -> svg.add("path", "class", "curve " + c.style().word(), "d", path(places, c, ticks)));
    return svg.done();
  }

  private static void label(Svg svg, Place place) {
    if (!place.label().isEmpty()) {
      String anchor = place.at() == 0 ? "start" : place.at() == 1 ? "end" : "middle";
      svg.text(
          place.label(), "x", Svg.share(place.at()), "y", HEIGHT_PX + 18, "text-anchor", anchor);
    }
  }

  private static void rules(Svg svg, Ticks ticks, String unit) {
    for (double value : ticks.values()) {
      double y = y(ticks, value);
      String classes = value == 0 ? "axis" : "rule";
      svg.add("line", "class", classes, "x1", 0, "x2", "100%", "y1", y, "y2", y);
      String text = value == ticks.end() ? ticks.text(value) + "\u202f" + unit : ticks.text(value);
      svg.text(text, "x", 0, "dx", -6, "y", y + 4, "text-anchor", "end");
    }
  }

  private static String path(List<Place> places, Curve curve, Ticks ticks) {
    StringBuilder d = new StringBuilder();
    boolean pen = false;
    for (int i = 0; i < places.size(); i++) {
      OptionalDouble value = curve.values().get(i);
      if (value.isPresent()) {
        d.append(pen ? 'L' : 'M')
            .append(Svg.rounded(UNITS_WIDE * places.get(i).at(), 1))
            .append(' ')
            .append(Svg.rounded(y(ticks, value.getAsDouble()), 1));
      }
      pen = value.isPresent();
    }
    return d.toString();
  }

  private static double y(Ticks ticks, double value) {
    return HEIGHT_PX * (1 - value / ticks.end());
  }
}
