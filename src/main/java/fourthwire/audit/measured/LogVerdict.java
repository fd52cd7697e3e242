package fourthwire.audit.measured;

import fourthwire.limits.distortion.MeasuredBand;
import fourthwire.metering.assess.PeriodFigures.Outcome;
import java.time.Instant;
import java.util.Comparator;
import java.util.List;

/**
 * What one limit says of a log, day by day, week by week or year by year.
 *
 * @param code word of what is held against it
 * @param band the limit; of single orders that of the worst period's order
 * @param unit of figure and limit
 * @param periods in time, each with the conductor and order that come nearest to their limit
 */
public record LogVerdict(String code, MeasuredBand band, String unit, List<Period> periods) {
  /** Word of the rms of a voltage, which no audit's finding has. */
  public static final String RMS_VOLTAGE = "rms-voltage";

  /** Word of a supply's frequency, likewise. */
  public static final String FREQUENCY = "frequency";

  /** Copies the list. */
  public LogVerdict {
    periods = List.copyOf(periods);
  }

  /**
   * A day, week or year.
   *
   * @param place conductor or pair, empty text for all lines together
   * @param order of a harmonic; 0 otherwise
   * @param figure the percentile of what was there; of a band with two ends the share of values
   *     outside it, percent
   * @param limit what it is held against
   * @param sharePercent of the period's values that were there
   */
  public record Period(
      Instant from,
      String place,
      int order,
      double figure,
      double limit,
      double sharePercent,
      Outcome outcome) {
    /** How far the limit is used. */
    double ofLimit() {
      return limit > 0 ? figure / limit : figure > 0 ? Double.MAX_VALUE : 0;
    }
  }

  /** Over where any period is; within where any is and none is over; else open. */
  public Outcome outcome() {
    return count(Outcome.OVER) > 0
        ? Outcome.OVER
        : count(Outcome.WITHIN) > 0 ? Outcome.WITHIN : Outcome.OPEN;
  }

  /** How many periods came out so. */
  public long count(Outcome outcome) {
    return periods.stream().filter(p -> p.outcome() == outcome).count();
  }

  /** The period that stands for all: of those of the outcome the one nearest to its limit. */
  public Period worst() {
    return periods.stream()
        .filter(p -> p.outcome() == outcome())
        .max(Comparator.comparingDouble(Period::ofLimit))
        .orElseThrow();
  }
}
