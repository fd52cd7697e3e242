package fourthwire.web.figure;

import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.function.IntFunction;

/**
 * Magnitudes by order: for every order one bar a series, the neutral's the heavier, and a short
 * line where a limit stands.
 */
public final class SpectrumPlot {
  private static final double HEIGHT_PX = 208;
  private static final int STEPS = 5;
  private static final double BARS_SHARE = 0.72;

  private SpectrumPlot() {}

  /**
   * One order.
   *
   * @param order 1 to 50
   * @param values one per series, in their order
   * @param limit over the first series' bar; empty: none
   */
  public record Group(int order, List<Double> values, OptionalDouble limit) {}

  /**
   * The picture.
   *
   * @param series whose bars stand side by side
   * @param ordinal writes an order below its bars
   */
  public static String draw(
      List<Conductor> series,
      List<Group> groups,
      IntFunction<String> ordinal,
      String unit,
      String alternative) {
    return draw(series, groups, 0, ordinal, unit, alternative);
  }

  /**
   * The picture with room for limits.
   *
   * @param room times its tallest bar that the picture grows to hold a limit; a limit above that is
   *     not drawn
   */
  public static String draw(
      List<Conductor> series,
      List<Group> groups,
      double room,
      IntFunction<String> ordinal,
      String unit,
      String alternative) {
    double highest = highest(groups);
    Ticks ticks = Ticks.upTo(Math.max(highest, tallestLimit(groups, room * highest)), STEPS);
    Svg svg = Svg.picture("plot spectrum", alternative);
    rules(svg, ticks, unit);
    for (int i = 0; i < groups.size(); i++) {
      group(svg, ticks, series, groups.get(i), (double) i / groups.size(), 1.0 / groups.size());
      String written = ordinal.apply(groups.get(i).order());
      if (!written.isEmpty()) {
        svg.ordinal(written, Svg.share((i + 0.5) / groups.size()), HEIGHT_PX + 18);
      }
    }
    return svg.done();
  }

  private static double highest(List<Group> groups) {
    return groups.stream()
        .flatMap(g -> g.values().stream())
        .mapToDouble(Double::doubleValue)
        .max()
        .orElse(0);
  }

  private static double tallestLimit(List<Group> groups, double most) {
    return groups.stream()
        .flatMapToDouble(g -> g.limit().stream())
        .filter(limit -> limit <= most)
        .max()
        .orElse(0);
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

  private static void group(
      Svg svg, Ticks ticks, List<Conductor> series, Group group, double from, double room) {
    double start = from + room * (1 - BARS_SHARE) / 2;
    double width = room * BARS_SHARE / series.size();
    for (int i = 0; i < series.size(); i++) {
      double top = y(ticks, group.values().get(i));
      double left = start + i * width;
      svg.add(
          "rect",
          "class",
          "fill " + series.get(i).name().toLowerCase(Locale.ROOT),
          "x",
          Svg.share(left),
          "y",
          top,
          "width",
          Svg.share(width * 0.94),
          "height",
          Math.max(0, HEIGHT_PX - top));
    }
    if (group.limit().isPresent() && group.limit().getAsDouble() <= ticks.end()) {
      double y = y(ticks, group.limit().getAsDouble());
      svg.add(
          "line",
          "class",
          "limit",
          "x1",
          Svg.share(start - room * 0.07),
          "x2",
          Svg.share(start + width + room * 0.07),
          "y1",
          y,
          "y2",
          y);
    }
  }

  private static double y(Ticks ticks, double value) {
    return HEIGHT_PX * (1 - value / ticks.end());
  }
}
