package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.REVERSED_CLAMP;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * A clamp that was turned for some hours: the power of one line is below zero while its current
 * flows and the other lines take power, and it is as large right before and after. Power fed back
 * grows from nothing and fades, or comes at the same hours each day; that of all lines is no clamp.
 * Thresholds are common practice, no source.
 */
final class TurnedRuns {
  private static final long SHORTEST_MILLIS = 3 * 3_600_000L;
  private static final long DAY_MILLIS = 24 * 3_600_000L;
  private static final long SAME_HOUR_MILLIS = 5_400_000;
  private static final int FEWEST_ROWS = 4;
  private static final int MOST_RUNS = 200;

  /** How alike powers before and after a clamp is turned are at least, in size. */
  private static final double ALIKE = 0.5;

  private final Line[] lines = {new Line(), new Line(), new Line()};

  private static final class Line {
    private final List<Run> runs = new ArrayList<>();
    private Optional<LogDay> begun = Optional.empty();
    private double before = Double.NaN;
    private double first;
    private double last;
    private long from;
    private long to;
    private long fromRow;
    private long toRow;
    private int rows;
  }

  /** A stretch of rows and the day on which it began. */
  private record Run(LogDay day, Correction.Rows rows, long from, long to) {}

  void take(LogDay day) {
    Optional<double[][]> watts = new LineDay(day).all("active_w");
    Optional<double[][]> amps = new LineDay(day).all("rms_a");
    if (watts.isEmpty() || amps.isEmpty()) {
      return;
    }
    for (int line = 0; line < lines.length; line++) {
      double[] p = watts.get()[line];
      double[] a = amps.get()[line];
      double least = 0.1 * Rows.median(a);
      for (int row = 0; row < day.rows(); row++) {
        if (a[row] > least && p[row] != 0 && !Double.isNaN(p[row])) {
          boolean turned = p[row] < 0 && othersTake(watts.get(), line, row);
          take(lines[line], day, row, p[row], turned);
        }
      }
    }
  }

  private static boolean othersTake(double[][] watts, int line, int row) {
    return watts[(line + 1) % 3][row] > 0 && watts[(line + 2) % 3][row] > 0;
  }

  private static void take(Line line, LogDay day, int row, double watts, boolean turned) {
    if (!turned) {
      end(line, watts);
      line.before = watts;
      return;
    }
    if (line.rows == 0) {
      line.begun = Optional.of(day);
      line.first = watts;
      line.from = day.startMillis(row);
      line.fromRow = day.firstRow() + row;
    }
    line.rows++;
    line.last = watts;
    line.to = day.startMillis(row) + day.intervalMillis();
    line.toRow = day.firstRow() + row + 1;
  }

  /** The run ends before a row of other sign; NaN where the log ends. */
  private static void end(Line line, double after) {
    boolean lasting = line.rows >= FEWEST_ROWS && line.to - line.from >= SHORTEST_MILLIS;
    if (lasting
        && isTurn(line.before, line.first)
        && isTurn(after, line.last)
        && line.runs.size() < MOST_RUNS) {
      line.begun.ifPresent(
          day ->
              line.runs.add(
                  new Run(day, new Correction.Rows(line.fromRow, line.toRow), line.from, line.to)));
    }
    line.rows = 0;
    line.begun = Optional.empty();
  }

  private static boolean isTurn(double right, double turned) {
    return Double.isNaN(right) || right > -ALIKE * turned && right < -turned / ALIKE;
  }

  /** What was found beside what whole days have told. */
  List<QualityFinding> findings(List<QualityFinding> told) {
    List<QualityFinding> findings = new ArrayList<>();
    for (int k = 0; k < lines.length; k++) {
      String name = LineDay.LINES[k];
      end(lines[k], Double.NaN);
      for (Run run : lines[k].runs) {
        boolean known = told.stream().anyMatch(f -> tells(f, run, name));
        if (!known && !isDaily(run, lines[k].runs)) {
          findings.add(finding(name, run));
        }
      }
    }
    return findings;
  }

  /** At the same hours of another day: a source of its own on this line, no clamp. */
  private static boolean isDaily(Run run, List<Run> all) {
    return all.stream()
        .anyMatch(
            other ->
                other != run
                    && isSameHour(other.from(), run.from())
                    && isSameHour(other.to(), run.to()));
  }

  private static boolean isSameHour(long a, long b) {
    long apart = Math.floorMod(a - b, DAY_MILLIS);
    return Math.min(apart, DAY_MILLIS - apart) <= SAME_HOUR_MILLIS;
  }

  /** Whether a finding of days says it, or that lines stand under each other's names then. */
  private static boolean tells(QualityFinding f, Run run, String line) {
    boolean shared =
        f.period()
            .filter(p -> p.from().toEpochMilli() < run.to() && p.to().toEpochMilli() > run.from())
            .isPresent();
    boolean same = f.code().equals(REVERSED_CLAMP) && f.sentence().contains(" " + line + " ");
    return shared && (same || f.code().equals(QualityFinding.SWAPPED_LINES));
  }

  private static QualityFinding finding(String line, Run run) {
    Offers offers = new Offers(run.day().quantities());
    int begins = (int) (run.rows().from() - run.day().firstRow());
    List<String> turned =
        offers.signed(line).stream()
            .filter(q -> run.day().find(q).orElseThrow()[begins] < 0)
            .toList();
    return new QualityFinding(
        REVERSED_CLAMP,
        Optional.of(new Period(Instant.ofEpochMilli(run.from()), Instant.ofEpochMilli(run.to()))),
        "Active power of this line, the total and its power factor are wrong until its sign is"
            + " turned.",
        String.format(
            Locale.ROOT,
            "Active power of %s is negative for %s, at once and as large as before and after, while"
                + " the other lines take power: its clamp pointed the wrong way.",
            line,
            LogClock.words(run.to() - run.from())),
        List.of(offers.turn(turned, PowerRelations.totalIsSum(run.day()), run.rows())));
  }
}
