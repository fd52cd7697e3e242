package fourthwire.metering.reduce;

import fourthwire.metering.series.WeekClock;
import java.time.ZoneId;

/** Means of a quantity by local hour of the week, Monday 00 h first. */
public final class HourMeans implements RowTaker {
  private final WeekClock clock;
  private final long from;
  private final long to;
  private final double[] sum = new double[WeekClock.HOURS];
  private final int[] count = new int[WeekClock.HOURS];

  /** None yet; rows that begin from one instant to before the other are taken. */
  public HourMeans(long fromMillis, long toMillis, ZoneId zone) {
    this.clock = new WeekClock(zone);
    this.from = fromMillis;
    this.to = toMillis;
  }

  @Override
  public void take(long[] startMillis, double[] values) {
    for (int row = 0; row < values.length; row++) {
      long t = startMillis[row];
      if (t >= from && t < to && !Double.isNaN(values[row])) {
        int hour = clock.hourOfWeek(t);
        sum[hour] += values[row];
        count[hour]++;
      }
    }
  }

  /** The mean of an hour of the week; NaN without any value. */
  public double mean(int hour) {
    return count[hour] == 0 ? Double.NaN : sum[hour] / count[hour];
  }
}
