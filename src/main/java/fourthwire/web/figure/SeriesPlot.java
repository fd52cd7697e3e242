package fourthwire.web.figure;

import fourthwire.metering.reduce.StepValues;
import fourthwire.metering.reduce.TimeSteps;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;

/**
 * Quantities over time: of each step the room between its least and largest value filled, its mean
 * a line; each on a strip of its own under one time axis, or all on one. A step without any value
 * is a gap.
 */
public final class SeriesPlot {
  private static final double HEAD_PX = 22;
  private static final double STRIP_PX = 84;
  private static final double TOGETHER_PX = 220;
  private static final double GAP_PX = 10;
  private static final double LANE_PX = 13;
  private static final double LANES_GAP_PX = 8;
  private static final double AXIS_PX = 26;
  private static final int STEPS = 3;
  private static final double FURTHEST_LIMIT = 2;
  private static final double FURTHEST_BEFORE = 3;
  private static final int UNITS_A_PX = 4;
  private static final int MOST_LANES = 5;
  private static final int PASSED_UNITS = 14;
  private static final double OVERVIEW_PX = 34;
  private static final double LABEL_PX = 12;

  private final Scale scale;
  private final Manner manner;
  private final Svg svg;
  private final List<Label> labels = new ArrayList<>();

  /** Written over the curves at the end of a limit's line. */
  private record Label(String text, double y) {}

  /**
   * A quantity.
   *
   * @param name written above its strip
   * @param about its figures, written beside the name
   * @param brief the same for a narrow picture
   * @param classes {@code l1} to {@code n}, or others
   * @param before the same before it was corrected, its mean drawn as a thin line where it lies
   *     near the values
   * @param bounds drawn where they are not far off the values
   */
  public record Strip(
      String name,
      String about,
      String brief,
      String classes,
      StepValues values,
      Optional<StepValues> before,
      List<Bound> bounds) {}

  /** A limit; steps that pass it are marked along the top of the strip. */
  public record Bound(double value, boolean upper, String label) {
    /** Whether a step passes it. */
    public boolean isPassed(StepValues values, int step) {
      return upper ? values.max(step) > value : values.min(step) < value;
    }
  }

  /**
   * How all strips are drawn.
   *
   * @param factor what their values are multiplied by to be in {@code unit}
   * @param together all on one axis
   */
  public record Manner(ZoneId zone, double factor, String unit, boolean together) {}

  /** A stretch of time marked below the strips with a number. */
  public record Note(String number, long from, long to) {}

  private SeriesPlot(Scale scale, Manner manner, Svg svg) {
    this.scale = scale;
    this.manner = manner;
    this.svg = svg;
  }

  /**
   * The picture.
   *
   * @param notes stretches marked below the strips
   * @param alternative what it shows, in words
   */
  public static String draw(
      List<Strip> strips, List<Note> notes, Manner manner, String alternative) {
    TimeSteps steps = strips.get(0).values().steps();
    TimeAxis axis = new TimeAxis(steps.from(), steps.to(), manner.zone());
    List<List<Note>> lanes = lanes(notes, axis);
    double drawn =
        manner.together()
            ? HEAD_PX + TOGETHER_PX
            : strips.size() * (HEAD_PX + STRIP_PX + GAP_PX) - GAP_PX;
    double depth = drawn + (lanes.isEmpty() ? 0 : LANES_GAP_PX) + LANE_PX * lanes.size();
    Svg svg =
        brushed(
            manner.together() ? "plot series together" : "plot series",
            alternative,
            depth + AXIS_PX,
            axis);
    axis.draw(svg, depth);
    scale(strips, manner.factor()).ifPresent(s -> new SeriesPlot(s, manner, svg).strips(strips));
    for (int lane = 0; lane < lanes.size(); lane++) {
      notes(svg, axis, lanes.get(lane), drawn + LANES_GAP_PX + LANE_PX * lane);
    }
    return svg.done();
  }

  /**
   * A whole log in the height of a line, with the part framed that is shown larger elsewhere.
   *
   * @param from first instant of that part, milliseconds of the epoch
   * @param to the instant after its last
   */
  public static String overview(
      StepValues whole, String classes, long from, long to, ZoneId zone, String alternative) {
    TimeSteps steps = whole.steps();
    TimeAxis axis = new TimeAxis(steps.from(), steps.to(), zone);
    Svg svg = brushed("plot overview", alternative, OVERVIEW_PX + AXIS_PX, axis);
    axis.draw(svg, OVERVIEW_PX);
    Manner manner = new Manner(zone, 1, "", false);
    Strip strip = new Strip("", "", "", classes, whole, Optional.empty(), List.of());
    scale(List.of(strip), 1)
        .ifPresent(s -> new SeriesPlot(s, manner, svg).values(strip, 0, OVERVIEW_PX));
    double left = Math.max(0, axis.at(from));
    double width = Math.max(0.003, Math.min(1, axis.at(to)) - left);
    svg.add(
        "rect",
        "class",
        "window",
        "x",
        Svg.share(left),
        "y",
        -3,
        "width",
        Svg.share(width),
        "height",
        OVERVIEW_PX + 6);
    return svg.done();
  }

  private static Svg brushed(String classes, String alternative, double height, TimeAxis axis) {
    return Svg.picture(
        classes, alternative, "height", height, "data-from", axis.from(), "data-to", axis.to());
  }

  private static Optional<Scale> scale(List<Strip> strips, double factor) {
    DoubleStream lows = strips.stream().mapToDouble(s -> factor * s.values().min());
    DoubleStream highs = strips.stream().mapToDouble(s -> factor * s.values().max());
    double low = lows.filter(v -> !Double.isNaN(v)).min().orElse(Double.NaN);
    double high = highs.filter(v -> !Double.isNaN(v)).max().orElse(Double.NaN);
    double from = low;
    double to = high;
    for (double mean : means(strips, factor)) {
      boolean near = Math.max(mean, high) - Math.min(mean, low) <= FURTHEST_BEFORE * (high - low);
      to = near ? Math.max(to, mean) : to;
      from = near ? Math.min(from, mean) : from;
    }
    for (Strip strip : strips) {
      for (Bound bound : strip.bounds()) {
        double value = factor * bound.value();
        to = value > high && value <= FURTHEST_LIMIT * high ? Math.max(to, value) : to;
        from = value < low && value >= low / FURTHEST_LIMIT ? Math.min(from, value) : from;
      }
    }
    return Scale.holding(from, to, STEPS);
  }

  /** The means before corrections. */
  private static double[] means(List<Strip> strips, double factor) {
    return strips.stream()
        .flatMap(s -> s.before().stream())
        .flatMapToDouble(b -> IntStream.range(0, b.steps().count()).mapToDouble(b::mean))
        .filter(v -> !Double.isNaN(v))
        .map(v -> factor * v)
        .toArray();
  }

  /** Whether the strips' picture shows a limit: those far off the values are not drawn. */
  public static boolean draws(List<Strip> strips, Bound bound, double factor) {
    return scale(strips, factor).filter(s -> s.holds(factor * bound.value())).isPresent();
  }

  private void strips(List<Strip> strips) {
    double top = HEAD_PX;
    double height = manner.together() ? TOGETHER_PX : STRIP_PX;
    for (int k = 0; k < strips.size(); k++) {
      Strip strip = strips.get(k);
      if (k == 0 || !manner.together()) {
        scale.draw(svg, top, height, manner.unit());
      }
      if (!manner.together()) {
        head(strip, top - 7);
      }
      bounds(strip, top, height);
      values(strip, top, height);
      top += manner.together() ? 0 : HEAD_PX + STRIP_PX + GAP_PX;
    }
    labels();
  }

  private void head(Strip strip, double y) {
    svg.text(strip.name(), "class", "name", "x", 0, "y", y);
    if (strip.brief().equals(strip.about())) {
      svg.text(strip.about(), "x", "100%", "y", y, "text-anchor", "end");
    } else {
      svg.text(strip.about(), "class", "roomy", "x", "100%", "y", y, "text-anchor", "end");
      svg.text(strip.brief(), "class", "brief", "x", "100%", "y", y, "text-anchor", "end");
    }
  }

  private void bounds(Strip strip, double top, double height) {
    for (Bound bound : strip.bounds()) {
      double value = manner.factor() * bound.value();
      if (scale.holds(value)) {
        double y = top + scale.down(value, height);
        svg.add("line", "class", "full-mark", "x1", 0, "x2", "100%", "y1", y, "y2", y);
        labels.add(new Label(bound.label(), y - top < LABEL_PX ? y + LABEL_PX : y - 3));
      }
    }
  }

  /** Limits' names, over the curves, once where several strips share one. */
  private void labels() {
    labels.stream()
        .distinct()
        .forEach(
            l ->
                svg.text(
                    l.text(),
                    "class",
                    "limit-label",
                    "x",
                    "100%",
                    "y",
                    l.y(),
                    "text-anchor",
                    "end"));
  }

  private void values(Strip strip, double top, double height) {
    StepValues v = strip.values();
    StepPath path = new StepPath(v.steps(), x -> depth(manner.factor() * x, height));
    svg.stretched(
        top, height, path.width(), Math.round(UNITS_A_PX * height), "class", strip.classes());
    svg.add("path", "class", "spread", "d", path.band(v::max, v::min));
    strip
        .before()
        .ifPresent(b -> svg.add("path", "class", "before", "d", path.line(k -> onScale(b, k))));
    svg.add("path", "class", "trace", "d", path.line(v::mean));
    String passed =
        path.bars(k -> strip.bounds().stream().anyMatch(b -> b.isPassed(v, k)), PASSED_UNITS);
    if (!passed.isEmpty()) {
      svg.add("path", "class", "passed", "d", passed);
    }
    svg.close();
  }

  /** A mean before corrections; NaN beyond the picture. */
  private double onScale(StepValues before, int step) {
    double mean = before.mean(step);
    return scale.holds(manner.factor() * mean) ? mean : Double.NaN;
  }

  private long depth(double value, double height) {
    return Math.round(UNITS_A_PX * scale.down(value, height));
  }

  /** Notes that overlap go into lanes below each other; what finds no lane is left to the list. */
  private static List<List<Note>> lanes(List<Note> notes, TimeAxis axis) {
    List<List<Note>> lanes = new ArrayList<>();
    for (Note note : notes) {
      if (note.to() > axis.from() && note.from() < axis.to()) {
        List<Note> lane =
            lanes.stream()
                .filter(l -> l.stream().allMatch(n -> clear(n, note, axis)))
                .findFirst()
                .orElseGet(ArrayList::new);
        lane.add(note);
        if (lane.size() == 1 && lanes.size() < MOST_LANES) {
          lanes.add(lane);
        }
      }
    }
    return lanes;
  }

  private static boolean clear(Note a, Note b, TimeAxis axis) {
    double room = 0.04;
    return axis.at(a.to()) + room < axis.at(b.from()) || axis.at(b.to()) + room < axis.at(a.from());
  }

  private static void notes(Svg svg, TimeAxis axis, List<Note> notes, double top) {
    for (Note note : notes) {
      double from = Math.max(0, axis.at(note.from()));
      double to = Math.min(1, axis.at(note.to()));
      svg.add(
          "rect",
          "class",
          "note-bar",
          "x",
          Svg.share(from),
          "y",
          top + 3,
          "width",
          Svg.share(Math.max(to - from, 0.002)),
          "height",
          4.0);
      boolean left = to > 0.97;
      svg.text(
          note.number(),
          "class",
          "note",
          "x",
          Svg.share(left ? from : Math.max(to, from + 0.002)),
          "dx",
          left ? -4 : 4,
          "y",
          top + 9,
          "text-anchor",
          left ? "end" : "start");
    }
  }
}
