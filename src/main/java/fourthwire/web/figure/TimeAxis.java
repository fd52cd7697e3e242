package fourthwire.web.figure;

import fourthwire.metering.reduce.TimeSteps;
import java.time.Duration;
import java.time.Instant;
import java.time.Period;
import java.time.ZoneId;
import java.time.ZonedDateTime;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * A span of time along the width, its marks at round local times.
 *
 * @param from first instant, milliseconds of the epoch
 * @param to the instant after the last
 */
public record TimeAxis(long from, long to, ZoneId zone) {
  private static final int MOST_MARKS = 14;
  private static final long MINUTE = 60_000;

  /** What a letter needs, on the distance of marks. */
  private static final double ROOM = 0.16;

  private static final double FIRST_ROOM = 0.22;

  private static final double FIRST = 0.02;
  private static final double LAST = 0.97;

  /** A mark: where, as a share of the width, and what is written there. */
  record Mark(double at, String text) {}

  /** Where an instant stands, as a share of the width. */
  double at(long millis) {
    return (double) (millis - from) / (to - from);
  }

  /** At most so many marks, some without a text where it would run into the one before. */
  List<Mark> marks(int most) {
    TimeSteps steps = TimeSteps.of(from, to, MINUTE, most, zone);
    List<Mark> marks = new ArrayList<>();
    double free = 0;
    for (int k = 0; k <= steps.count(); k++) {
      long edge = steps.edge(k);
      if (edge >= from && edge < to) {
        double at = at(edge);
        String text = text(edge, steps, marks.isEmpty());
        boolean room = at >= free;
        double letters = at < FIRST ? FIRST_ROOM : ROOM;
        free = room ? at + letters * text.length() / most : free;
        marks.add(new Mark(at, room ? text : ""));
      }
    }
    return marks;
  }

  private String text(long edge, TimeSteps steps, boolean first) {
    ZonedDateTime time = Instant.ofEpochMilli(edge).atZone(zone);
    boolean midnight = time.toLocalTime().toSecondOfDay() == 0;
    if (steps.length() instanceof Duration && !midnight) {
      return pattern(first ? "d MMM HH:mm" : "HH:mm", time);
    }
    boolean months = steps.length() instanceof Period p && p.toTotalMonths() > 0;
    if (!months) {
      return pattern("d MMM", time);
    }
    boolean year = ((Period) steps.length()).toTotalMonths() >= 12;
    boolean named = first || time.getMonthValue() == 1;
    return pattern(year ? "uuuu" : named ? "MMM uuuu" : "MMM", time);
  }

  private static String pattern(String pattern, ZonedDateTime time) {
    return DateTimeFormatter.ofPattern(pattern, Locale.ENGLISH).format(time);
  }

  /** Draws the marks as hairlines down to a depth, their texts below it. */
  void draw(Svg svg, double depthPx) {
    draw(svg, depthPx, MOST_MARKS);
  }

  /** The same with at most so many marks. */
  void draw(Svg svg, double depthPx, int most) {
    List<Mark> marks = marks(most);
    for (int k = 0; k < marks.size(); k++) {
      Mark mark = marks.get(k);
      String x = Svg.share(mark.at());
      svg.add("line", "class", "rule", "x1", x, "x2", x, "y1", 0, "y2", depthPx + 4);
      if (!mark.text().isEmpty() && mark.at() < LAST) {
        svg.text(
            mark.text(),
            "class",
            k % 3 != 0 && marks.size() > 5 ? "crowded" : "time",
            "x",
            x,
            "y",
            depthPx + 18,
            "text-anchor",
            mark.at() < FIRST ? "start" : "middle");
      }
    }
  }
}
