package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.FLAT_LINE;

import fourthwire.metering.Amount;
import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * Values that stand still although they usually move. How often a quantity moves by more than its
 * last digits from row to row is counted by the level it stands at, so that a small load printed in
 * few digits may rest: a run is a fault when chance would hold the value so long less than once in
 * a hundred million.
 */
final class FlatLines implements DayCheck {
  private static final int FEWEST_ROWS = 8;
  private static final long SHORTEST_MILLIS = 60_000;
  private static final int MOST_RUNS = 2000;
  private static final int LEVELS = 128;
  private static final double CHANCE = 1e-8;

  private static final int SEVERAL = 3;

  /** A load of fewer last digits may rest. */
  private static final double FEWEST_DIGITS = 10;

  /** Rows by which columns that stand still together may differ. */
  private static final long BY_CHANCE = 3;

  /** A quantity that moves by a digit or two at a time may well rest on one value. */
  private static final double FEW_STEPS = 2.5;

  private final List<String> names;
  private final Column[] columns;

  private static final class Column {
    private final int[] rested = new int[LEVELS];
    private final int[] moved = new int[LEVELS];
    private final List<Run> runs = new ArrayList<>();
    private final boolean ofLoad;
    private double before = Double.NaN;
    private double leastStep = Double.MAX_VALUE;
    private long runRows;
    private long runFrom;
    private long runFromRow;
    private long end;
    private long last;

    Column(String name) {
      this.ofLoad = name.matches(".*_(a|w|va|var)");
    }
  }

  private record Run(double value, long rows, long from, long to, Correction.Rows in) {}

  FlatLines(List<String> names) {
    this.names = names;
    this.columns = new Column[names.size()];
    Arrays.setAll(columns, k -> new Column(names.get(k)));
  }

  @Override
  public void take(LogDay day) {
    for (int q = 0; q < columns.length; q++) {
      if (isWatched(names.get(q))) {
        take(day, columns[q], day.of(q));
      }
    }
  }

  private static boolean isWatched(String name) {
    return !name.contains("energy_wh") && !name.endsWith("_deg") && !name.contains("_h1_percent");
  }

  private static void take(LogDay day, Column c, double[] x) {
    findLeastStep(c, x);
    double few = FEW_STEPS * c.leastStep;
    double before = c.before;
    for (int row = 0; row < x.length; row++) {
      double v = x[row];
      if (v == before) {
        if (day.startMillis(row) != before(day, c, row)) {
          c.runRows++;
        }
      } else {
        if (c.runRows >= FEWEST_ROWS) {
          c.last = before(day, c, row);
          endRun(c, day.firstRow() + row, day.intervalMillis());
        }
        c.before = v;
        c.runRows = 1;
        c.runFrom = day.startMillis(row);
        c.runFromRow = day.firstRow() + row;
      }
      if (!Double.isNaN(v)) {
        (Math.abs(v - before) > few ? c.moved : c.rested)[level(v)]++;
      }
      before = v;
    }
    if (x.length > 0) {
      c.last = day.startMillis(x.length - 1);
      c.end = day.firstRow() + x.length;
    }
  }

  private static long before(LogDay day, Column c, int row) {
    return row > 0 ? day.startMillis(row - 1) : c.last;
  }

  /** The last digit of the column, as its smallest step shows. */
  private static void findLeastStep(Column c, double[] x) {
    for (int row = 1; row < x.length; row++) {
      double step = Math.abs(x[row] - x[row - 1]);
      if (step > 0 && step < c.leastStep) {
        c.leastStep = step;
      }
    }
  }

  /** Levels a factor of two apart. */
  private static int level(double v) {
    return Math.max(0, Math.min(LEVELS - 1, Math.getExponent(v) + LEVELS / 2));
  }

  /** Notes a run that ends before this row. */
  private static void endRun(Column c, long end, long intervalMillis) {
    long to = c.last + intervalMillis;
    // A load that is off reads nothing for hours; an interruption is no fault of the meter.
    boolean lasting = c.runRows >= FEWEST_ROWS && to - c.runFrom >= SHORTEST_MILLIS;
    if (lasting && c.before != 0 && !Double.isNaN(c.before) && c.runs.size() < MOST_RUNS) {
      c.runs.add(
          new Run(
              c.before,
              c.runRows,
              c.runFrom,
              Math.max(c.runFrom, to),
              new Correction.Rows(c.runFromRow, end)));
    }
  }

  @Override
  public List<QualityFinding> findings() {
    Map<Correction.Rows, List<String>> together = new LinkedHashMap<>();
    Map<Correction.Rows, Run> runs = new LinkedHashMap<>();
    for (int q = 0; q < columns.length; q++) {
      endRun(columns[q], columns[q].end, 0);
      for (Run run : columns[q].runs) {
        if (isFault(columns[q], run)) {
          together.computeIfAbsent(run.in(), k -> new ArrayList<>()).add(names.get(q));
          runs.putIfAbsent(run.in(), run);
        }
      }
    }
    List<QualityFinding> findings = new ArrayList<>();
    joined(together)
        .forEach((rows, all) -> findings.add(finding(runs.get(rows), withAlike(rows, all))));
    return findings;
  }

  /** Where several stand still, one that alone might rest by chance does not. */
  private List<String> withAlike(Correction.Rows rows, List<String> all) {
    List<String> still = new ArrayList<>(all);
    for (int q = 0; q < columns.length && all.size() >= SEVERAL; q++) {
      boolean rests = columns[q].runs.stream().anyMatch(run -> covers(run.in(), rows));
      if (rests && !all.contains(names.get(q))) {
        still.add(names.get(q));
      }
    }
    return still;
  }

  /** Where a meter stands still, a column that rested a row longer by chance is one of them. */
  private static Map<Correction.Rows, List<String>> joined(
      Map<Correction.Rows, List<String>> together) {
    Map<Correction.Rows, List<String>> joined = new LinkedHashMap<>();
    together.forEach(
        (rows, all) ->
            joined
                .computeIfAbsent(
                    together.keySet().stream()
                        .filter(other -> isNear(rows, other))
                        .max(
                            Comparator.comparingInt(
                                other -> together.getOrDefault(other, List.of()).size()))
                        .orElse(rows),
                    k -> new ArrayList<>())
                .addAll(all));
    return joined;
  }

  private static boolean covers(Correction.Rows a, Correction.Rows b) {
    return a.from() <= b.from() + BY_CHANCE && a.to() >= b.to() - BY_CHANCE;
  }

  private static boolean isNear(Correction.Rows a, Correction.Rows b) {
    return Math.abs(a.from() - b.from()) <= BY_CHANCE && Math.abs(a.to() - b.to()) <= BY_CHANCE;
  }

  /** Other rows at this level, or where there are few all others, tell how often it moves. */
  private static boolean isFault(Column c, Run run) {
    if (c.ofLoad && Math.abs(run.value()) < FEWEST_DIGITS * c.leastStep) {
      return false;
    }
    int level = level(run.value());
    double still = c.rested[level] - (run.rows() - 1.0);
    double moved = c.moved[level];
    if (still + moved < 30) {
      still = Arrays.stream(c.rested).sum() - (run.rows() - 1.0);
      moved = Arrays.stream(c.moved).sum();
    }
    double rest = (Math.max(0, still) + 0.5) / (Math.max(0, still) + moved + 1);
    return moved > 20 && Math.pow(rest, run.rows() - 1.0) < CHANCE;
  }

  private static QualityFinding finding(
      @org.jspecify.annotations.Nullable Run found, List<String> names) {
    Run run = java.util.Objects.requireNonNull(found);
    String what =
        names.size() == 1
            ? names.get(0) + " stands still at " + Amount.read(run.value(), names.get(0))
            : names.size() + " quantities stand still, the first " + names.get(0);
    return new QualityFinding(
        FLAT_LINE,
        Optional.of(new Period(Instant.ofEpochMilli(run.from()), Instant.ofEpochMilli(run.to()))),
        "The instrument repeated its last value: nothing is known of this time.",
        String.format(Locale.ROOT, "%s for %d rows.", what, run.rows()),
        List.of(Offers.leaveOut(names, run.in())));
  }
}
