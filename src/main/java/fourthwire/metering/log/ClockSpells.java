package fourthwire.metering.log;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/**
 * A clock that was set and later set back by as much: a gap and an overlap of one length. Only the
 * rows between are at wrong times.
 */
final class ClockSpells {
  private static final int MOST_STEPS = 500;

  private final List<Step> steps = new ArrayList<>();
  private final Set<Long> told = new HashSet<>();

  /**
   * A step that is not the interval.
   *
   * @param row number of the row after it
   * @param before end of the row ahead of it
   * @param at time of the row after it
   */
  record Step(long row, long before, long at) {
    /** How much later than due the row is. */
    long millis() {
      return at - before;
    }
  }

  void add(Step step) {
    if (steps.size() < MOST_STEPS) {
      steps.add(step);
    }
  }

  /** What was found; each step back with the last before it that it undoes. */
  List<QualityFinding> findings(long nearMillis) {
    List<QualityFinding> found = new ArrayList<>();
    for (int to = 1; to < steps.size(); to++) {
      for (int from = to - 1; from >= 0; from--) {
        if (isUndone(steps.get(from), steps.get(to), nearMillis)) {
          told.add(steps.get(from).row());
          told.add(steps.get(to).row());
          found.add(finding(steps.get(from), steps.get(to)));
          break;
        }
      }
    }
    return found;
  }

  private boolean isUndone(Step from, Step to, long nearMillis) {
    return !told.contains(from.row())
        && Long.signum(from.millis()) == -Long.signum(to.millis())
        && Math.abs(from.millis() + to.millis()) <= nearMillis;
  }

  /** Whether the step ahead of a row is part of what was found. */
  boolean tells(long row) {
    return told.contains(row);
  }

  private static QualityFinding finding(Step from, Step to) {
    boolean ahead = from.millis() > 0;
    String by = LogClock.words(Math.abs(from.millis()));
    return new QualityFinding(
        QualityFinding.CLOCK_JUMP,
        Optional.of(new Period(Instant.ofEpochMilli(from.at()), Instant.ofEpochMilli(to.before()))),
        "These rows stand at wrong times: some times seem to be missing, others count twice.",
        String.format(
            Locale.ROOT,
            "Rows %d to %d of the data are %s %s: the clock was set %s ahead of them and %s by as"
                + " much after them, for a gap and an overlap are of one length.",
            from.row() + 1,
            to.row(),
            by,
            ahead ? "late" : "early",
            ahead ? "forward" : "back",
            ahead ? "back" : "forward"),
        List.of(
            Correction.of(
                "Set these "
                    + (to.row() - from.row())
                    + " rows "
                    + by
                    + (ahead ? " earlier" : " later"),
                new Correction.ShiftClock(
                    -from.millis(), new Correction.Rows(from.row(), to.row())))));
  }
}
