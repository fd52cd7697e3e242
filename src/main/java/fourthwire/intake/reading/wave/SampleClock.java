package fourthwire.intake.reading.wave;

import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The times of a waveform's samples in a table, told from those of a log by how close they stand:
 * elapsed time in a column of any name that rises evenly, or clock times a few milliseconds apart.
 */
public final class SampleClock {
  private static final int LOOK_ROWS = 400;

  /** No waveform is sampled so slowly: two samples a cycle of 50 Hz. */
  private static final double SLOWEST_S = 0.01;

  private static final double FASTEST_S = 1e-9;
  private static final Pattern NAMED =
      Pattern.compile(
          "(?:elapsed|relative)?[\\s_]*(?:t|x|time|times|second|seconds|sec|secs|zeit|tijd|temps"
              + "|tiempo|tempo|x[\\s_-]*axis)(?:[\\s_,;:(\\[]+(s|sec|seconds?|ms|msec|[uµμ]s|usec|ns)"
              + "[)\\]]?)?");

  private final List<double[]> rows = new ArrayList<>();
  private final List<String> headings;

  private SampleClock(TextTable table) {
    this.headings = table.headings();
    table.forEach(
        row -> {
          double[] values = new double[headings.size()];
          for (int k = 0; k < values.length; k++) {
            values[k] = row.value(k);
          }
          rows.add(values);
          return rows.size() < LOOK_ROWS;
        });
  }

  /** An elapsed time that no heading settled; empty where no column is one. */
  public static Optional<TimeColumns> find(TextTable table) {
    SampleClock clock = new SampleClock(table);
    for (int k = 0; k < clock.headings.size(); k++) {
      double unit = clock.unitS(k);
      if (unit > 0) {
        return Optional.of(new TimeColumns(List.of(k), TimeColumns.Kind.ELAPSED, unit));
      }
    }
    return Optional.empty();
  }

  /** Unit of a column of evenly rising numbers, seconds; 0 where it is no time of samples. */
  private double unitS(int column) {
    double step = step(column);
    if (Double.isNaN(step)) {
      return 0;
    }
    Matcher named = NAMED.matcher(headings.get(column).toLowerCase(Locale.ROOT).trim());
    boolean isNamed = named.matches();
    if (isNamed && named.group(1) != null) {
      return unitS(named.group(1));
    }
    // Whole steps of one are a count of samples, unless the heading says time.
    boolean counts = !isNamed && (column > 0 || step == Math.rint(step));
    return counts ? 0 : likelyUnitS(step);
  }

  private static double unitS(String unit) {
    return switch (unit.charAt(0)) {
      case 'm' -> 1e-3;
      case 'n' -> 1e-9;
      case 's' -> 1;
      default -> 1e-6;
    };
  }

  /** The largest unit in which the samples stand close enough for a waveform. */
  private static double likelyUnitS(double step) {
    for (double unit : new double[] {1, 1e-3, 1e-6, 1e-9}) {
      if (step * unit < SLOWEST_S / 2) {
        return step * unit > FASTEST_S ? unit : 0;
      }
    }
    return 0;
  }

  /** The step of an evenly rising column; NaN where it is none. */
  private double step(int column) {
    int n = rows.size();
    double first = n < 3 ? Double.NaN : rows.get(0)[column];
    double step = n < 3 ? Double.NaN : (rows.get(n - 1)[column] - first) / (n - 1);
    double rounding = 0;
    for (int k = 1; k < n; k++) {
      double moved = rows.get(k)[column] - rows.get(k - 1)[column];
      if (!(moved > 0)) {
        return Double.NaN;
      }
      rounding = Math.max(rounding, Math.abs(rows.get(k)[column] - first - k * step));
    }
    // Times printed to few digits jitter by their last one, by less than the step itself.
    return rounding < step ? step : Double.NaN;
  }

  /** Whether the first rows' elapsed times are too far apart for samples, or are no numbers. */
  public static boolean isOfALog(TextTable table, TimeColumns time) {
    double[] at = {Double.NaN, Double.NaN};
    int[] rows = {0};
    table.forEach(
        row -> {
          at[rows[0]++] = row.value(time.columns().get(0)) * time.unitS();
          return rows[0] < 2;
        });
    return !(at[1] - at[0] <= SLOWEST_S);
  }

  /** Whether clock times stand so close that the rows are samples of a waveform. */
  public static boolean isOfAWaveform(TextTable table, TimeColumns time) {
    boolean clock = time.isCalendar() && !time.columns().isEmpty();
    return clock
        && Arrays.stream(DateOrder.values()).anyMatch(order -> isClose(table, time, order));
  }

  private static boolean isClose(TextTable table, TimeColumns time, DateOrder order) {
    List<Long> nanos = new ArrayList<>();
    table.forEach(
        row -> {
          time.at(row, order).ifPresent(at -> nanos.add(at.local().toLocalTime().toNanoOfDay()));
          return nanos.size() < 2 && row.number() < LOOK_ROWS;
        });
    double step = nanos.size() < 2 ? 0 : (nanos.get(1) - nanos.get(0)) * 1e-9;
    return step > 0 && step < SLOWEST_S;
  }
}
