package fourthwire.metering.log;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Joins days of the same fault into periods. */
final class FlaggedDays {
  /** Days apart by no more are one period: in between the fault may not show. */
  private static final Duration APART = Duration.ofHours(50);

  private static final int MOST = 12;

  private final Map<String, List<Stretch>> byFault = new LinkedHashMap<>();

  /** What one day shows of a fault. */
  record Fault(
      String code,
      String subject,
      String effect,
      String sentence,
      Offers.Of corrections,
      RowTest rows) {
    /** One of whole days. */
    Fault(String code, String subject, String effect, String sentence, Offers.Of corrections) {
      this(code, subject, effect, sentence, corrections, RowTest.NONE);
    }
  }

  private static final class Stretch {
    final Fault fault;
    final Instant from;
    final long fromRow;
    Instant to = Instant.MIN;
    Instant end = Instant.MIN;
    long toRow;
    Optional<LogDay> last = Optional.empty();

    Stretch(Fault fault, LogDay before, LogDay day) {
      this.fault = fault;
      this.fromRow = RowTest.begin(fault.rows(), before, day, day.firstRow());
      this.from = start(fromRow, before, day).orElse(day.from());
      add(day);
    }

    void add(LogDay day) {
      to = day.to().isAfter(to) ? day.to() : to;
      last = Optional.of(day);
    }

    /** The day after its last, or that itself where the log ends. */
    void end(LogDay after) {
      LogDay day = last.orElse(after);
      long whole = day.firstRow() + day.rows();
      toRow = Math.max(fromRow, RowTest.end(fault.rows(), day, after, whole));
      Duration interval = Duration.ofMillis(day.intervalMillis());
      end = start(toRow - 1, day, after).map(t -> t.plus(interval)).orElse(to);
      last = Optional.empty();
    }

    /** From the first row that has the fault to the last, as its correction has it. */
    Period period() {
      return from.isBefore(end) ? new Period(from, end) : new Period(end, from);
    }

    private static Optional<Instant> start(long row, LogDay... days) {
      for (LogDay day : days) {
        long k = row - day.firstRow();
        if (k >= 0 && k < day.rows()) {
          return Optional.of(Instant.ofEpochMilli(day.startMillis((int) k)));
        }
      }
      return Optional.empty();
    }
  }

  private Optional<LogDay> before = Optional.empty();

  /** A fault of a whole day; the first sentence of joined days is told. */
  void add(LogDay day, Fault fault) {
    List<Stretch> all =
        byFault.computeIfAbsent(fault.code() + fault.subject(), key -> new ArrayList<>());
    Stretch last = all.isEmpty() ? null : all.get(all.size() - 1);
    if (last != null && !day.from().isAfter(last.to.plus(APART))) {
      last.add(day);
    } else {
      if (all.size() > MOST) {
        // One that began after those that are told only marks where the fault was seen last.
        all.remove(MOST);
      }
      all.add(new Stretch(fault, before.orElse(day), day));
    }
  }

  /** A day has been looked at: what was not seen on it has ended on it or the day before. */
  void endDay(LogDay day) {
    for (List<Stretch> all : byFault.values()) {
      Stretch s = all.get(all.size() - 1);
      if (s.last.isPresent() && s.last.get() != day) {
        s.end(day);
      }
    }
    before = Optional.of(day);
  }

  List<QualityFinding> findings() {
    List<QualityFinding> findings = new ArrayList<>();
    for (List<Stretch> all : byFault.values()) {
      for (Stretch s : all.subList(0, Math.min(MOST, all.size()))) {
        s.last.ifPresent(s::end);
        findings.add(
            new QualityFinding(
                s.fault.code(),
                Optional.of(s.period()),
                s.fault.effect(),
                s.fault.sentence(),
                s.fault.corrections().rows(new Correction.Rows(s.fromRow, s.toRow))));
      }
    }
    return findings;
  }
}
