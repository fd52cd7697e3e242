package fourthwire.web.figure;

import java.util.List;

/**
 * Which days were measured, a line a month, a cell a day: filled as high as the share of the day
 * that has readings; a day outside the readings is left empty; a diamond where there is a capture.
 */
public final class CoveragePicture {
  private static final int DAYS = 31;
  private static final int CELL = 20;
  private static final int GAP = 4;
  private static final double ROW_PX = 17;
  private static final double CELL_PX = 12;
  private static final int UNITS_A_PX = 4;
  private static final int EVERY = 7;
  private static final double AXIS_PX = 18;

  private CoveragePicture() {}

  /**
   * A month.
   *
   * @param label its name
   * @param shares of its days, 0 to 1; NaN where no log was running; empty days do not exist
   * @param captures days, from 1, on which a waveform was captured
   */
  public record Month(String label, List<Double> shares, List<Integer> captures) {}

  /** The picture. */
  public static String draw(List<Month> months, String alternative) {
    double depth = months.size() * ROW_PX;
    Svg svg = Svg.picture("plot coverage", alternative, "height", depth + AXIS_PX);
    for (int k = 0; k < months.size(); k++) {
      month(svg, months.get(k), k * ROW_PX);
    }
    for (int day = 1; day <= DAYS; day += EVERY) {
      svg.text(
          String.valueOf(day),
          "x",
          Svg.share((day - 0.5) / DAYS),
          "y",
          depth + 12,
          "text-anchor",
          "middle");
    }
    return svg.done();
  }

  private static void month(Svg svg, Month month, double top) {
    svg.text(month.label(), "x", 0, "dx", -8, "y", top + CELL_PX - 2, "text-anchor", "end");
    StringBuilder bed = new StringBuilder();
    StringBuilder fill = new StringBuilder();
    int height = (int) (UNITS_A_PX * CELL_PX);
    for (int day = 0; day < month.shares().size(); day++) {
      double share = month.shares().get(day);
      if (!Double.isNaN(share)) {
        cell(bed, day, height, height);
        cell(fill, day, height, (int) Math.ceil(share * height));
      }
    }
    svg.stretched(top, CELL_PX, DAYS * CELL, height);
    svg.add("path", "class", "bed", "d", bed).add("path", "class", "measured", "d", fill).close();
    for (int day : month.captures()) {
      svg.open("svg", "x", Svg.share((day - 0.5) / DAYS), "y", top + CELL_PX / 2)
          .add("path", "class", "diamond", "d", "M0-5L5 0L0 5L-5 0Z")
          .close();
    }
  }

  /** A cell filled from below. */
  private static void cell(StringBuilder d, int day, int whole, int filled) {
    int width = CELL - GAP;
    d.append('M').append(day * CELL).append(' ').append(whole - filled);
    d.append('h').append(width).append('v').append(filled).append('h').append(-width).append('z');
  }
}
