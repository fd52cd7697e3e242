package fourthwire.metering.log;

import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Steps that are a little longer or shorter than the interval all along: a clock that runs fast or
 * slow. Thresholds are common practice, no source: crystals keep time to a few seconds a day.
 */
final class ClockDrift {
  private static final int FEWEST_DAYS = 3;
  private static final long[] ROUND_MINUTES = {1, 2, 3, 5, 10, 15, 20, 30, 60};
  private static final double NEAR = 0.005;
  private static final double LEAST_MILLIS = 60_000;
  private static final double LEAST_MILLIS_A_DAY = 10_000;
  private static final double DAY_MILLIS = Duration.ofDays(1).toMillis();

  /** How far the half of it may be from the middle. */
  private static final double STEADY = 0.2;

  private final List<Long> afterDays = new ArrayList<>();
  private long drift;
  private long elapsed;

  /** A step that jitter alone does not make otherwise than the interval. */
  void take(long step, long interval) {
    drift += step - Math.round((double) step / interval) * meant(interval);
    elapsed += step;
  }

  /** What a step that is usual was meant to be: a round part of an hour where one is near. */
  private static long meant(long interval) {
    for (long minutes : ROUND_MINUTES) {
      if (Math.abs(interval - 60_000 * minutes) < NEAR * interval) {
        return 60_000 * minutes;
      }
    }
    return interval;
  }

  void endDay() {
    afterDays.add(drift);
  }

  /** Of a log between these times; empty where steps are the interval but for jitter. */
  Optional<QualityFinding> finding(long from, long to) {
    double rate = drift / (elapsed / DAY_MILLIS);
    int days = afterDays.size();
    boolean large = Math.abs(drift) >= LEAST_MILLIS && Math.abs(rate) >= LEAST_MILLIS_A_DAY;
    if (days < FEWEST_DAYS || !large) {
      return Optional.empty();
    }
    double middle = (double) afterDays.get(days / 2 - 1) / drift * days / (days / 2);
    if (Math.abs(middle - 1) > STEADY) {
      return Optional.empty();
    }
    return Optional.of(
        new QualityFinding(
            QualityFinding.CLOCK_JUMP,
            Optional.of(new Period(Instant.ofEpochMilli(from), Instant.ofEpochMilli(to))),
            "If it is the clock, rows stand at times more and more wrong, by "
                + LogClock.words(Math.abs(drift))
                + " in the end.",
            String.format(
                Locale.ROOT,
                "Steps are %s than the interval all along, by %.0f s a day: the clock runs %s, or"
                    + " the instrument's intervals are not what they are meant to be.",
                drift > 0 ? "longer" : "shorter",
                Math.abs(rate) / 1000,
                drift > 0 ? "fast" : "slow")));
  }
}
