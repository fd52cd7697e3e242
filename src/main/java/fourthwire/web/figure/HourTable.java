package fourthwire.web.figure;

import java.util.List;
import java.util.function.DoubleFunction;
import java.util.function.IntToDoubleFunction;

/**
 * A week in figures, a table of seven rows of 24 cells that is its own picture: the larger a
 * figure, the darker its cell, faint enough for ink to stand on it. On a narrow page its hours run
 * down.
 */
public final class HourTable {
  private static final int DAYS = 7;
  private static final int HOURS = 24;
  private static final int TINTS = 12;

  private HourTable() {}

  /**
   * The table.
   *
   * @param classes of the cells' colour
   * @param byHour a figure for each of the 168 hours, Monday 0 o'clock first; NaN: none
   * @param low the figure that is lightest
   * @param high the figure that is darkest
   * @param figure a value's text
   * @param days names of the seven rows
   * @param caption what it shows, for who does not see the page around it
   */
  public static String draw(
      String classes,
      IntToDoubleFunction byHour,
      double low,
      double high,
      DoubleFunction<String> figure,
      List<String> days,
      String caption) {
    StringBuilder out = new StringBuilder("<table class=\"week-hours ").append(classes);
    out.append("\"><caption class=\"aside-text\">").append(Svg.escaped(caption));
    out.append("</caption><thead><tr><td></td>");
    for (int hour = 0; hour < HOURS; hour++) {
      out.append("<th scope=\"col\">").append("%02d".formatted(hour)).append("</th>");
    }
    out.append("</tr></thead><tbody>");
    for (int day = 0; day < DAYS; day++) {
      out.append("<tr><th scope=\"row\">").append(Svg.escaped(days.get(day))).append("</th>");
      for (int hour = 0; hour < HOURS; hour++) {
        cell(out, byHour.applyAsDouble(day * HOURS + hour), low, high, figure);
      }
      out.append("</tr>");
    }
    return out.append("</tbody></table>").toString();
  }

  private static void cell(
      StringBuilder out, double value, double low, double high, DoubleFunction<String> figure) {
    if (Double.isNaN(value)) {
      out.append("<td></td>");
      return;
    }
    double part = high > low ? (value - low) / (high - low) : 0;
    out.append("<td class=\"t").append(Math.round((TINTS - 1) * part)).append("\">");
    out.append(Svg.escaped(figure.apply(value))).append("</td>");
  }
}
