package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.CLOCK_JUMP;
import static fourthwire.metering.QualityFinding.GAP;
import static fourthwire.metering.QualityFinding.REPEATED_ROWS;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.series.Series;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** What the times of a log's rows tell: gaps, repeats, a clock that was set. */
final class LogClock implements DayCheck {
  /** Longest gaps told one by one; the rest are counted. */
  private static final int MOST_GAPS = 10;

  private static final int MOST_JUMPS = 50;

  private static final long HOUR_MILLIS = Duration.ofHours(1).toMillis();

  /** A step off the grid that is longer is a pause as well. */
  private static final long LONGEST_SET_MILLIS = Duration.ofDays(1).toMillis();

  /** Steps back that are looked at for a block written twice. */
  private static final int MOST_BLOCKS = 100;

  private final EarlierRows earlier;
  private final List<Correction.Rows> blocks = new ArrayList<>();
  private int stepsBack;
  private long blocksFrom = Long.MAX_VALUE;
  private long blocksTo = Long.MIN_VALUE;

  private final List<Jump> jumps = new ArrayList<>();
  private final ClockSpells spells = new ClockSpells();
  private final ClockDrift drift = new ClockDrift();
  private long jitter;
  private final List<Gap> gaps = new ArrayList<>();
  private long gapCount;
  private long missing;
  private long first = Long.MIN_VALUE;
  private long before = Long.MIN_VALUE;
  private double[] rowBefore = new double[0];
  private final Repeats run = new Repeats();

  private static final class Repeats {
    private int same;
    private int different;
    private long from;
    private long to;
    private long fromRow;
    private long toRow;
  }

  private record Gap(long row, long from, long to) {
    long length() {
      return to - from;
    }
  }

  private record Jump(long row, QualityFinding finding) {}

  /** Of a log whose rows it may look up again. */
  LogClock(Series series) {
    this.earlier = new EarlierRows(series);
  }

  @Override
  public void take(LogDay day) {
    for (int row = 0; row < day.rows(); row++) {
      long at = day.startMillis(row);
      if (isRepeated(day, row, at)) {
        continue;
      }
      if (before == Long.MIN_VALUE) {
        first = at;
      } else {
        step(day, row, at);
      }
      before = at;
    }
    drift.endDay();
    rowBefore = row(day, day.rows() - 1);
  }

  /** Whether a row is of a block that is written twice; it then tells nothing of the clock. */
  private boolean isRepeated(LogDay day, int row, long at) {
    long number = day.firstRow() + row;
    if (at < before && number >= blocksEnd() && stepsBack < MOST_BLOCKS) {
      stepsBack++;
      long rows = earlier.repeated(number, at);
      if (rows > 0) {
        blocks.add(new Correction.Rows(number, number + rows));
      }
    }
    boolean repeated = number < blocksEnd();
    if (repeated) {
      blocksFrom = Math.min(blocksFrom, at);
      blocksTo = Math.max(blocksTo, at + day.intervalMillis());
    }
    return repeated;
  }

  private long blocksEnd() {
    return blocks.isEmpty() ? 0 : blocks.get(blocks.size() - 1).to();
  }

  private static double[] row(LogDay day, int row) {
    double[] values = new double[day.quantities().size()];
    for (int q = 0; q < values.length; q++) {
      values[q] = day.of(q)[row];
    }
    return values;
  }

  private void step(LogDay day, int row, long at) {
    long interval = day.intervalMillis();
    long step = at - before;
    // Loggers stamp to the second: a step off the grid by less than a tenth is jitter.
    long off = Math.abs(step - Math.round((double) step / interval) * interval);
    boolean onGrid = off <= interval / 10;
    boolean usual = onGrid && Math.abs(step - interval) <= interval / 2;
    if (step != 0 && !usual) {
      spells.add(new ClockSpells.Step(day.firstRow() + row, before + interval, at));
    }
    if (usual) {
      drift.take(step, interval);
    }
    jitter = interval / 10;
    if (step == 0) {
      repeat(day, row, at);
    } else if (step < 0) {
      setBack(day.firstRow() + row, at, interval);
    } else if (!onGrid) {
      offGrid(day.firstRow() + row, at, interval);
    }
    if (step - interval > interval / 2 && (onGrid || step > LONGEST_SET_MILLIS)) {
      gap(new Gap(day.firstRow() + row, before + interval, at));
      hourOn(day.firstRow() + row, at, interval);
    }
  }

  /** An hour without rows is what a clock leaves that is set to summer time. */
  private void hourOn(long row, long at, long interval) {
    if (at - before - interval == HOUR_MILLIS && 2 * interval <= HOUR_MILLIS) {
      jump(
          row,
          before + interval,
          at,
          "Rows from then on may be an hour late.",
          "Rows of exactly one hour are missing: the logging paused, or the clock was set forward"
              + " by 1 h.",
          Offers.shift(-HOUR_MILLIS, 0, row));
    }
  }

  private void setBack(long row, long at, long interval) {
    long by = interval - (at - before);
    jump(
        row,
        at,
        before,
        "Rows overlap: the same time is counted twice.",
        String.format(
            Locale.ROOT,
            "Row %d of the data is %s before the row ahead of it, where a step of %s is due: the"
                + " clock was set back by %s.",
            row + 1,
            words(before - at),
            words(interval),
            words(by)),
        Offers.shift(by, 0, row));
  }

  /** Nothing need be missing; or rows are, and the clock is off by what is no whole interval. */
  private void offGrid(long row, long at, long interval) {
    long step = at - before;
    List<Correction> offers = new ArrayList<>();
    if (step <= LONGEST_SET_MILLIS) {
      offers.addAll(Offers.shift(interval - step, 0, row));
    }
    long whole = onGrid(step, interval);
    if (whole > interval || offers.isEmpty()) {
      offers.addAll(Offers.shift(whole - step, whole - interval, row));
    }
    jump(
        row,
        before,
        at,
        "One interval is not of the stated length.",
        String.format(
            Locale.ROOT,
            "The step after row %d of the data is %s, no multiple of the interval of %s: the clock"
                + " was set %s by %s, or the logging began anew.",
            row,
            words(step),
            words(interval),
            step > interval ? "forward" : "back",
            words(Math.abs(step - interval))),
        offers);
  }

  /** The nearest step of whole intervals. */
  private static long onGrid(long step, long interval) {
    return interval * Math.max(1, Math.round((double) step / interval));
  }

  private void jump(
      long row, long from, long to, String effect, String sentence, List<Correction> corrections) {
    if (jumps.size() < MOST_JUMPS) {
      jumps.add(new Jump(row, finding(CLOCK_JUMP, from, to, effect, sentence, corrections)));
    }
  }

  private void gap(Gap gap) {
    gapCount++;
    missing += gap.length();
    gaps.add(gap);
    if (gaps.size() > 4 * MOST_GAPS) {
      gaps.sort(Comparator.comparingLong(Gap::length).reversed());
      gaps.subList(MOST_GAPS, gaps.size()).clear();
    }
  }

  private void repeat(LogDay day, int row, long at) {
    boolean alike = java.util.Arrays.equals(row(day, row), row > 0 ? row(day, row - 1) : rowBefore);
    run.same += alike ? 1 : 0;
    run.different += alike ? 0 : 1;
    boolean begins = run.same + run.different == 1;
    run.from = begins ? at : run.from;
    run.fromRow = begins ? day.firstRow() + row : run.fromRow;
    run.to = at + day.intervalMillis();
    run.toRow = day.firstRow() + row + 1;
  }

  @Override
  public List<QualityFinding> findings() {
    List<QualityFinding> all = new ArrayList<>(spells.findings(jitter));
    jumps.stream().filter(j -> !spells.tells(j.row())).forEach(j -> all.add(j.finding()));
    drift.finding(first, before).ifPresent(all::add);
    for (Gap gap : gaps) {
      gapCount -= spells.tells(gap.row()) ? 1 : 0;
      missing -= spells.tells(gap.row()) ? gap.length() : 0;
    }
    gaps.removeIf(gap -> spells.tells(gap.row()));
    gaps.sort(Comparator.comparingLong(Gap::length).reversed());
    for (Gap gap : gaps.subList(0, Math.min(MOST_GAPS, gaps.size()))) {
      all.add(
          finding(
              GAP,
              gap.from(),
              gap.to(),
              "Nothing is known of this time; it counts in no statistic.",
              "No rows for " + words(gap.length()) + ".",
              List.of()));
    }
    if (gapCount > MOST_GAPS) {
      all.add(
          finding(
              GAP,
              first,
              before,
              "Nothing is known of these times; they count in no statistic.",
              gapCount + " gaps in all, " + words(missing) + " together; the longest are listed.",
              List.of()));
    }
    repeats(all);
    return all;
  }

  private void repeats(List<QualityFinding> all) {
    if (!blocks.isEmpty()) {
      long rows = blocks.stream().mapToLong(Correction.Rows::count).sum();
      all.add(
          finding(
              REPEATED_ROWS,
              blocksFrom,
              blocksTo,
              "They count twice in statistics over the rows as read.",
              String.format(
                  Locale.ROOT,
                  "%d %s in the file a second time, the first at row %d of the data: the same times"
                      + " with the same values.",
                  rows,
                  rows == 1 ? "row stands" : "rows stand",
                  blocks.get(0).from() + 1),
              List.of(Offers.dropRows(blocks))));
    }
    if (run.same + run.different > 0) {
      all.add(
          finding(
              REPEATED_ROWS,
              run.from,
              run.to,
              "They count twice in statistics over the rows as read.",
              String.format(
                  Locale.ROOT,
                  "%d %s the time of the row before: %d with the same values, %d with others.",
                  run.same + run.different,
                  run.same + run.different == 1 ? "row repeats" : "rows repeat",
                  run.same,
                  run.different),
              List.of(Offers.dropRepeats(new Correction.Rows(run.fromRow, run.toRow)))));
    }
  }

  private static QualityFinding finding(
      String code,
      long from,
      long to,
      String effect,
      String sentence,
      List<Correction> corrections) {
    return new QualityFinding(
        code,
        Optional.of(
            new Period(
                Instant.ofEpochMilli(Math.min(from, to)),
                Instant.ofEpochMilli(Math.max(from, to)))),
        effect,
        sentence,
        corrections);
  }

  /** A length in the largest unit that leaves it readable. */
  static String words(long millis) {
    Duration d = Duration.ofMillis(millis);
    if (d.toMinutes() < 1) {
      return String.format(Locale.ROOT, "%.3g s", millis / 1000.0);
    }
    String days = d.toDays() > 0 ? d.toDays() + " d " : "";
    String hours = d.toHours() > 0 ? d.toHoursPart() + " h " : "";
    return (days + hours + d.toMinutesPart() + " min").replaceAll(" 0 min$", "").trim();
  }
}
