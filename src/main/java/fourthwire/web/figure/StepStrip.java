package fourthwire.web.figure;

import fourthwire.metering.reduce.TimeSteps;
import java.time.ZoneId;
import java.util.OptionalDouble;
import java.util.function.IntToDoubleFunction;

/** One quantity over time in the height of a table's row: filled from zero, a gap where none is. */
public final class StepStrip {
  private static final int UNITS_HIGH = 100;
  private static final int AXIS_MARKS = 8;

  private StepStrip() {}

  /**
   * The strip.
   *
   * @param classes of its colour
   * @param values one for each step; NaN for none
   * @param end the value that is as high as the strip; above 0
   * @param limit drawn as a dashed line where the strip is so high
   */
  public static String draw(
      String classes,
      TimeSteps steps,
      IntToDoubleFunction values,
      double end,
      OptionalDouble limit,
      String alternative) {
    StepPath path =
        new StepPath(steps, v -> Math.round(UNITS_HIGH * (1 - Math.min(1, Math.max(0, v / end)))));
    Svg svg = Svg.picture("strip " + classes, alternative);
    svg.add("line", "class", "axis", "x1", 0, "x2", "100%", "y1", "100%", "y2", "100%");
    svg.open(
        "svg",
        "width",
        "100%",
        "height",
        "100%",
        "viewBox",
        "0 0 " + path.width() + " " + UNITS_HIGH,
        "preserveAspectRatio",
        "none");
    svg.add("path", "class", "spread", "d", path.band(values, k -> 0));
    svg.add("path", "class", "trace", "d", path.line(values)).close();
    limit.stream()
        .filter(l -> l <= end)
        .mapToObj(l -> Svg.share(1 - l / end))
        .forEach(
            y -> svg.add("line", "class", "full-mark", "x1", 0, "x2", "100%", "y1", y, "y2", y));
    return svg.done();
  }

  /** The time axis under such strips. */
  public static String axis(TimeSteps steps, ZoneId zone, String alternative) {
    Svg svg = Svg.picture("plot strip-axis", alternative, "height", 26);
    new TimeAxis(steps.from(), steps.to(), zone).draw(svg, 2, AXIS_MARKS);
    return svg.done();
  }
}
