package fourthwire.metering.log;

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
  record Fault(String code, String subject, String effect, String sentence) {}

  private static final class Stretch {
    final Fault fault;
    final Instant from;
    Instant to;

    Stretch(Fault fault, Instant from, Instant to) {
      this.fault = fault;
      this.from = from;
      this.to = to;
    }
  }

  /** A fault of a whole day. */
  void add(LogDay day, Fault fault) {
    add(day.from(), day.to(), fault);
  }

  /** A fault of a stretch of time; the first sentence of joined stretches is told. */
  void add(Instant from, Instant to, Fault fault) {
    List<Stretch> all =
        byFault.computeIfAbsent(fault.code() + fault.subject(), key -> new ArrayList<>());
    Stretch last = all.isEmpty() ? null : all.get(all.size() - 1);
    if (last != null && !from.isAfter(last.to.plus(APART))) {
      last.to = to.isAfter(last.to) ? to : last.to;
    } else {
      all.add(new Stretch(fault, from.isBefore(to) ? from : to, to));
    }
  }

  List<QualityFinding> findings() {
    List<QualityFinding> findings = new ArrayList<>();
    for (List<Stretch> all : byFault.values()) {
      for (Stretch s : all.subList(0, Math.min(MOST, all.size()))) {
        findings.add(
            new QualityFinding(
                s.fault.code(),
                Optional.of(new Period(s.from, s.to)),
                s.fault.effect(),
                s.fault.sentence()));
      }
    }
    return findings;
  }
}
