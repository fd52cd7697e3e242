package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.FLAT_LINE;
import static fourthwire.metering.QualityFinding.IMPOSSIBLE_VALUE;
import static fourthwire.metering.QualityFinding.MISSING_VALUES;

import fourthwire.metering.Amount;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.DoublePredicate;

/**
 * What the values of a log tell by themselves: blanks, values that can't be, values that stand
 * still. Thresholds are common practice, no source.
 */
final class LogValues {
  /** A value must stand still for this many rows and this long. */
  private static final int FLAT_ROWS = 12;

  private static final long FLAT_MILLIS = 30 * 60_000L;

  private final IntervalLog log;
  private final double nominalHz;
  private final List<QualityFinding> findings = new ArrayList<>();

  LogValues(IntervalLog log, double nominalHz) {
    this.log = log;
    this.nominalHz = nominalHz;
  }

  List<QualityFinding> findings() {
    for (String quantity : log.quantities()) {
      double[] x = log.values(quantity);
      impossible(quantity, x);
      flat(quantity, x);
    }
    missing();
    return findings;
  }

  private void add(String code, int first, int last, String effect, String sentence) {
    findings.add(
        new QualityFinding(
            code,
            Optional.of(
                new Period(
                    earlier(first, last), later(first, last).plusMillis(log.intervalMillis()))),
            effect,
            sentence));
  }

  private Instant earlier(int a, int b) {
    return log.start(a).isBefore(log.start(b)) ? log.start(a) : log.start(b);
  }

  private Instant later(int a, int b) {
    return log.start(a).isBefore(log.start(b)) ? log.start(b) : log.start(a);
  }

  private void impossible(String quantity, double[] x) {
    DoublePredicate can = possible(quantity, x);
    int count = 0;
    int first = -1;
    int last = -1;
    for (int k = 0; k < x.length; k++) {
      if (!Double.isNaN(x[k]) && !can.test(x[k])) {
        count++;
        first = first < 0 ? k : first;
        last = k;
      }
    }
    if (count > 0) {
      add(
          IMPOSSIBLE_VALUE,
          first,
          last,
          "They stand in the statistics over the rows as read.",
          String.format(
              Locale.ROOT,
              "%s: %d %s can't be, as %s.",
              quantity,
              count,
              count == 1 ? "value" : "values",
              Amount.read(x[first], quantity)));
    }
  }

  private DoublePredicate possible(String quantity, double[] x) {
    if (quantity.endsWith("_factor")) {
      return v -> Math.abs(v) <= 1.005;
    }
    if (quantity.equals("frequency_hz")) {
      return v -> Math.abs(v - nominalHz) <= 0.15 * nominalHz;
    }
    if (quantity.endsWith("_deg")) {
      return v -> Math.abs(v) <= 360;
    }
    if (quantity.contains(".rms_v")) {
      double usual = Statistics.median(x);
      return v -> v >= 0 && !(v > 2 * usual);
    }
    if (quantity.contains(".active_w") || quantity.contains(".reactive_var")) {
      double bound = bound(Arrays.stream(x).map(Math::abs).toArray());
      return v -> Math.abs(v) <= bound;
    }
    if (quantity.contains(".energy_wh")) {
      return Double::isFinite;
    }
    double bound = quantity.contains(".rms_a") || quantity.contains("apparent_va") ? bound(x) : 1e6;
    return v -> v >= 0 && v <= bound;
  }

  /** Far above all the rest: an overflow mark, not a load. */
  private static double bound(double[] x) {
    double[] sorted = Statistics.sorted(x);
    return sorted.length < 20 ? 1e12 : 20 * Math.max(Statistics.percentile(sorted, 98), 1);
  }

  /** A value that usually moves from row to row and stands still while the log goes on. */
  private void flat(String quantity, double[] x) {
    if (!quantity.matches(".*\\.(rms_a|rms_v|active_w|apparent_va)") || !usuallyMoves(x)) {
      return;
    }
    int from = 0;
    for (int k = 1; k <= x.length; k++) {
      if (k == x.length || Double.compare(x[k], x[from]) != 0) {
        flatRun(quantity, x, from, k - 1);
        from = k;
      }
    }
  }

  private void flatRun(String quantity, double[] x, int from, int to) {
    int rows = to - from + 1;
    // A current of nothing is a load that is off; a voltage of nothing is an interruption.
    boolean off = x[from] == 0;
    long millis = log.startMillis(to) - log.startMillis(from) + log.intervalMillis();
    if (!Double.isNaN(x[from]) && !off && rows >= FLAT_ROWS && millis >= FLAT_MILLIS) {
      add(
          FLAT_LINE,
          from,
          to,
          "The instrument repeated its last value: nothing is known of this time.",
          String.format(
              Locale.ROOT,
              "%s stands still at %s for %d rows.",
              quantity,
              Amount.read(x[from], quantity),
              rows));
    }
  }

  private static boolean usuallyMoves(double[] x) {
    int moved = 0;
    for (int k = 1; k < x.length; k++) {
      moved += Double.compare(x[k], x[k - 1]) != 0 ? 1 : 0;
    }
    return moved > 0.7 * x.length;
  }

  private void missing() {
    long blanks = 0;
    int first = -1;
    int last = -1;
    for (String quantity : log.quantities()) {
      double[] x = log.values(quantity);
      for (int k = 0; k < x.length; k++) {
        if (Double.isNaN(x[k])) {
          blanks++;
          first = first < 0 ? k : Math.min(first, k);
          last = Math.max(last, k);
        }
      }
    }
    if (blanks > 0) {
      add(
          MISSING_VALUES,
          first,
          last,
          "They are left out of the statistics.",
          String.format(
              Locale.ROOT,
              "%d of %d values are blank or marked as not measured.",
              blanks,
              (long) log.rows() * log.quantities().size()));
    }
  }
}
