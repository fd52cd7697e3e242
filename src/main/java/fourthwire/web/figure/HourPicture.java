package fourthwire.web.figure;

import java.util.List;
import java.util.function.IntToDoubleFunction;

/**
 * A week as seven rows of 24 cells: the darker a cell, the larger its hour's figure; a cell over
 * the limit is crossed, so that it shows without colour too.
 */
public final class HourPicture {
  private static final int DAYS = 7;
  private static final int HOURS = 24;
  private static final int EVERY = 6;
  private static final double ROW_PX = 22;
  private static final double GAP_PX = 2;
  private static final double LIGHTEST = 0.07;

  private HourPicture() {}

  /**
   * The picture.
   *
   * @param classes of the cells' colour
   * @param byHour a figure for each of the 168 hours, Monday 0 o'clock first; NaN: none
   * @param end the figure that is darkest
   * @param limit over which a cell is crossed; NaN: none
   * @param days names of the seven rows
   */
  public static String draw(
      String classes,
      IntToDoubleFunction byHour,
      double end,
      double limit,
      List<String> days,
      String alternative) {
    Svg svg = Svg.picture("plot hours " + classes, alternative);
    for (int day = 0; day < DAYS; day++) {
      double top = day * ROW_PX;
      svg.text(days.get(day), "x", 0, "dx", -6, "y", top + 15, "text-anchor", "end");
      for (int hour = 0; hour < HOURS; hour++) {
        double value = byHour.applyAsDouble(day * HOURS + hour);
        if (!Double.isNaN(value)) {
          cell(svg, hour, top, end > 0 ? Math.min(1, Math.max(0, value / end)) : 0, value > limit);
        }
      }
    }
    for (int hour = 0; hour <= HOURS; hour += EVERY) {
      String anchor = hour == 0 ? "start" : hour == HOURS ? "end" : "middle";
      svg.text(
          "%02d".formatted(hour),
          "x",
          Svg.share((double) hour / HOURS),
          "y",
          DAYS * ROW_PX + 16,
          "text-anchor",
          anchor);
    }
    return svg.done();
  }

  private static void cell(Svg svg, int hour, double top, double part, boolean over) {
    String left = Svg.share((double) hour / HOURS);
    String right = Svg.share((hour + 0.94) / HOURS);
    double bottom = top + ROW_PX - GAP_PX;
    svg.add(
        "rect",
        "class",
        "fill",
        "x",
        left,
        "y",
        top,
        "width",
        Svg.share(0.94 / HOURS),
        "height",
        ROW_PX - GAP_PX,
        "fill-opacity",
        Svg.rounded(LIGHTEST + (1 - LIGHTEST) * part, 3));
    if (over) {
      svg.add("line", "class", "over", "x1", left, "x2", right, "y1", bottom, "y2", top);
    }
  }
}
