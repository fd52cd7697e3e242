package fourthwire.metering.assess;

import fourthwire.metering.series.Series;
import fourthwire.metering.series.WeekClock;
import fourthwire.quantity.Figure;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZonedDateTime;
import java.util.List;
import java.util.Locale;

/**
 * The maximum demand load current I_L of a log: the largest demand of each of the twelve months
 * before its end, added up and divided by twelve (IEEE 519-2022, 3.1: the current at fundamental
 * frequency; demand over 15 or 30 minutes).
 *
 * <p>Demand is the mean over a quarter of an hour of the clock, or half an hour where the rows do
 * not divide the quarter; of the lines the largest counts. A month of which a tenth of the demand
 * intervals is missing may have had its largest there: then there is no figure.
 *
 * @param amps fundamental, rms; unknown with the reason where the log does not tell it
 * @param basis from what it was formed, one sentence; empty where there is no figure
 */
public record DemandCurrent(Figure amps, String basis) {
  private static final int MONTHS = 12;
  private static final double LEAST_SHARE = 0.9;
  private static final long QUARTER = Duration.ofMinutes(15).toMillis();
  private static final List<String> LINES = List.of("L1", "L2", "L3");

  /**
   * Of a log.
   *
   * @param interval length of a row
   * @param zone in which months begin
   */
  public static DemandCurrent of(Series log, Duration interval, ZoneId zone) {
    long row = interval.toMillis();
    long block = QUARTER % row == 0 ? QUARTER : 2 * QUARTER;
    if (block % row != 0) {
      return unknown(
          "its rows of " + interval.toSeconds() + " s do not make 15 or 30 min of demand");
    }
    List<LineFundamental> lines =
        LINES.stream().flatMap(line -> LineFundamental.find(log, line).stream()).toList();
    if (lines.isEmpty() || log.rows() == 0) {
      return unknown("it has no line current");
    }
    long[] months = months(log, row, zone);
    long first = log.startMillis(0)[0];
    if (first > months[0] + Duration.ofDays(1).toMillis()) {
      return unknown(
          String.format(
              Locale.ROOT,
              "it covers %.1f of the twelve months",
              (months[MONTHS] - first) / (double) Duration.ofDays(1).toMillis() / 30.44));
    }
    return new Months(months, block, row, zone).demand(log, lines);
  }

  private static DemandCurrent unknown(String why) {
    return new DemandCurrent(Figure.unknown(why), "");
  }

  /** When the twelve months before the log's end begin, and its end. */
  private static long[] months(Series log, long row, ZoneId zone) {
    long[] last = log.startMillis(log.chunks() - 1);
    ZonedDateTime end = Instant.ofEpochMilli(last[last.length - 1] + row).atZone(zone);
    long[] begins = new long[MONTHS + 1];
    for (int k = 0; k <= MONTHS; k++) {
      begins[k] = end.minusMonths(MONTHS - (long) k).toInstant().toEpochMilli();
    }
    return begins;
  }

  /** Gathers demand by month. */
  private static final class Months {
    private final long[] begins;
    private final long block;
    private final long row;
    private final WeekClock clock;
    private final double[] largest = new double[MONTHS];
    private final long[] whole = new long[MONTHS];
    private double[] sum = new double[0];
    private int rows;
    private long current = Long.MIN_VALUE;
    private int month = -1;

    Months(long[] begins, long block, long row, ZoneId zone) {
      this.begins = begins;
      this.block = block;
      this.row = row;
      this.clock = new WeekClock(zone);
    }

    DemandCurrent demand(Series log, List<LineFundamental> lines) {
      sum = new double[lines.size()];
      for (int chunk = 0; chunk < log.chunks(); chunk++) {
        long[] times = log.startMillis(chunk);
        double[][] amps = new double[lines.size()][];
        for (int line = 0; line < amps.length; line++) {
          amps[line] = lines.get(line).amps(log, chunk);
        }
        for (int k = 0; k < times.length; k++) {
          take(times[k], amps, k);
        }
      }
      endBlock();
      return figure(lines.get(0).basis());
    }

    private void take(long at, double[][] amps, int k) {
      long in = Math.floorDiv(clock.local(at), block);
      if (in != current) {
        endBlock();
        current = in;
        month = monthOf(at);
      }
      double all = 0;
      for (double[] line : amps) {
        all += line[k];
      }
      if (!Double.isNaN(all)) {
        rows++;
        for (int line = 0; line < sum.length; line++) {
          sum[line] += amps[line][k];
        }
      }
    }

    private int monthOf(long at) {
      int found = -1;
      for (int k = 0; k < MONTHS; k++) {
        found = at >= begins[k] && at < begins[k + 1] ? k : found;
      }
      return found;
    }

    /** Only a demand interval with all its rows counts. */
    private void endBlock() {
      if (month >= 0 && rows >= block / row) {
        whole[month]++;
        for (double s : sum) {
          largest[month] = Math.max(largest[month], s / rows);
        }
      }
      java.util.Arrays.fill(sum, 0);
      rows = 0;
    }

    private DemandCurrent figure(String of) {
      double all = 0;
      double least = 1;
      for (int k = 0; k < MONTHS; k++) {
        double share = whole[k] * block / (double) (begins[k + 1] - begins[k]);
        least = Math.min(least, share);
        all += largest[k];
      }
      if (least < LEAST_SHARE) {
        return unknown(
            String.format(
                Locale.ROOT,
                "in one of its months only %.0f %% of the demand is there",
                100 * least));
      }
      return new DemandCurrent(
          Figure.of(all / MONTHS),
          String.format(
              Locale.ROOT,
              "the largest %d min demand of each of the twelve months to its end, divided by twelve"
                  + " (IEEE 519-2022), %s",
              block / 60_000,
              of));
    }
  }
}
