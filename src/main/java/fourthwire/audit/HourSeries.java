package fourthwire.audit;

import fourthwire.quantity.Percentiles;
import java.util.Arrays;

/** One figure at each hour of a week, Monday 0 to 1 o'clock first; not every hour need have one. */
public final class HourSeries {
  /** Hours of a week. */
  public static final int HOURS = 168;

  /** Hours of a day. */
  public static final int HOURS_A_DAY = 24;

  private final double[] byHour;
  private final double[] sorted;

  private HourSeries(double[] byHour) {
    this.byHour = byHour;
    this.sorted = Arrays.stream(byHour).filter(x -> !Double.isNaN(x)).sorted().toArray();
  }

  /** A figure for each of the 168 hours; NaN where it is not known. */
  public static HourSeries of(double[] byHour) {
    if (byHour.length != HOURS) {
      throw new IllegalArgumentException("a week has 168 hours, not " + byHour.length);
    }
    return new HourSeries(byHour.clone());
  }

  /** At an hour, 0 to 167; NaN where it is not known. */
  public double at(int hour) {
    return byHour[hour];
  }

  /** Whether any hour has a figure. */
  public boolean isKnown() {
    return sorted.length > 0;
  }

  /** Percentile over the hours that have a figure, linear between them; at least one has. */
  public double percentile(double percent) {
    return Percentiles.linear(sorted, percent);
  }

  /** Mean of the hours that have a figure. */
  public double mean() {
    return Arrays.stream(sorted).sum() / sorted.length;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof HourSeries s && Arrays.equals(byHour, s.byHour);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(byHour);
  }

  @Override
  public String toString() {
    return "HourSeries[largest " + (isKnown() ? percentile(100) : Double.NaN) + "]";
  }
}
