package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.CLOCK_JUMP;
import static fourthwire.metering.QualityFinding.GAP;
import static fourthwire.metering.QualityFinding.REPEATED_ROWS;

import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** What the times of a log's rows tell: gaps, repeats, a clock that was set. */
final class LogClock {
  /** Longest gaps told one by one; the rest are counted. */
  private static final int MOST_GAPS = 10;

  private final IntervalLog log;
  private final List<QualityFinding> findings = new ArrayList<>();

  LogClock(IntervalLog log) {
    this.log = log;
  }

  List<QualityFinding> findings() {
    jumps();
    gaps();
    repeats();
    return findings;
  }

  private static Instant at(long millis) {
    return Instant.ofEpochMilli(millis);
  }

  private void add(String code, long from, long to, String effect, String sentence) {
    findings.add(
        new QualityFinding(
            code, Optional.of(new Period(at(from), at(Math.max(from, to)))), effect, sentence));
  }

  /** Time that runs back, or a step that is no whole number of intervals. */
  private void jumps() {
    long interval = log.intervalMillis();
    for (int k = 1; k < log.rows(); k++) {
      long before = log.startMillis(k - 1);
      long step = log.startMillis(k) - before;
      // Loggers stamp to the second: a step off the grid by less than a tenth is jitter.
      long off = Math.abs(step - Math.round((double) step / interval) * interval);
      if (step < 0) {
        add(
            CLOCK_JUMP,
            log.startMillis(k),
            before,
            "Rows overlap: the same time is counted twice.",
            "The clock runs back by " + words(-step) + " after row " + k + " of the data.");
      } else if (off > interval / 10) {
        add(
            CLOCK_JUMP,
            before,
            log.startMillis(k),
            "One interval is not of the stated length.",
            "The step after row "
                + k
                + " of the data is "
                + words(step)
                + ", no multiple of the interval of "
                + words(interval)
                + ": the clock was set, or the logging began anew.");
      }
    }
  }

  private record Gap(long from, long to) {
    long length() {
      return to - from;
    }
  }

  private void gaps() {
    List<Gap> gaps = new ArrayList<>();
    for (int k = 1; k < log.rows(); k++) {
      long end = log.startMillis(k - 1) + log.intervalMillis();
      if (log.startMillis(k) - end > log.intervalMillis() / 2) {
        gaps.add(new Gap(end, log.startMillis(k)));
      }
    }
    long missing = gaps.stream().mapToLong(Gap::length).sum();
    gaps.sort(Comparator.comparingLong(Gap::length).reversed());
    for (Gap gap : gaps.subList(0, Math.min(MOST_GAPS, gaps.size()))) {
      add(
          GAP,
          gap.from(),
          gap.to(),
          "Nothing is known of this time; it counts in no statistic.",
          "No rows for " + words(gap.length()) + ".");
    }
    if (gaps.size() > MOST_GAPS) {
      add(
          GAP,
          log.startMillis(0),
          log.startMillis(log.rows() - 1),
          "Nothing is known of these times; they count in no statistic.",
          gaps.size() + " gaps in all, " + words(missing) + " together; the longest are listed.");
    }
  }

  private void repeats() {
    int same = 0;
    int different = 0;
    int first = -1;
    int last = -1;
    for (int k = 1; k < log.rows(); k++) {
      if (log.startMillis(k) == log.startMillis(k - 1)) {
        first = first < 0 ? k : first;
        last = k;
        if (alike(k)) {
          same++;
        } else {
          different++;
        }
      }
    }
    if (first >= 0) {
      add(
          REPEATED_ROWS,
          log.startMillis(first),
          log.startMillis(last) + log.intervalMillis(),
          "They count twice in statistics over the rows as read.",
          String.format(
              Locale.ROOT,
              "%d rows repeat the time of the row before: %d with the same values, %d with others.",
              same + different,
              same,
              different));
    }
  }

  private boolean alike(int row) {
    for (String quantity : log.quantities()) {
      if (Double.compare(log.at(quantity, row), log.at(quantity, row - 1)) != 0) {
        return false;
      }
    }
    return true;
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
