package fourthwire.web.reading.series;

import fourthwire.metering.reduce.TimeSteps;
import fourthwire.web.support.Words;
import java.time.Duration;
import java.time.Period;
import java.time.temporal.TemporalAmount;

/** Lengths of time in words: 10 minutes, 6 hours, day, week, month. */
final class StepWords {
  private StepWords() {}

  /** So many units. */
  private record Length(String unit, long count) {}

  /** A length. */
  static String of(TemporalAmount length, Words words) {
    Length l = length(length);
    return l.count() == 1
        ? words.of("series.length.one." + l.unit())
        : words.of("series.length." + l.unit(), l.count());
  }

  /** So many steps: 365 days, 720 steps of 20 minutes. */
  static String counted(int count, TimeSteps steps, Words words) {
    Length l = length(steps.length());
    return l.count() == 1
        ? words.of("series.length." + l.unit(), count)
        : words.of("series.length.steps", count, of(steps.length(), words));
  }

  private static Length length(TemporalAmount length) {
    if (length instanceof Period p) {
      long months = p.toTotalMonths();
      if (months > 0) {
        return months % 12 == 0 ? new Length("years", months / 12) : new Length("months", months);
      }
      return p.getDays() % 7 == 0
          ? new Length("weeks", p.getDays() / 7)
          : new Length("days", p.getDays());
    }
    long millis = ((Duration) length).toMillis();
    if (millis % 1000 != 0) {
      return new Length("milliseconds", millis);
    }
    long seconds = millis / 1000;
    if (seconds % 3600 == 0) {
      return new Length("hours", seconds / 3600);
    }
    return seconds % 60 == 0 ? new Length("minutes", seconds / 60) : new Length("seconds", seconds);
  }
}
