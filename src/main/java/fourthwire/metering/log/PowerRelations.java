package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.REVERSED_CLAMP;
import static fourthwire.metering.QualityFinding.SWAPPED_LINES;
import static fourthwire.metering.QualityFinding.WRONG_RATIO;

import fourthwire.metering.QualityFinding;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * What powers, volts and amps tell about each other day by day: a clamp that points the wrong way,
 * lines under each other's names, a ratio or unit that is wrong. Each judges a day's median, so
 * that a strange row is no finding. Thresholds are common practice, no source; the relations are P
 * = V·I·power factor and S = V·I of a line (IEEE 1459-2010, 3.1.2).
 */
final class PowerRelations implements DayCheck {
  private static final int FEWEST_ROWS = 4;
  private static final int[][] ORDERS = {{1, 0, 2}, {0, 2, 1}, {2, 1, 0}, {1, 2, 0}, {2, 0, 1}};

  private final FlaggedDays flagged = new FlaggedDays();

  @Override
  public void take(LogDay day) {
    if (day.rows() < FEWEST_ROWS) {
      return;
    }
    if (swapped(day) || crossed(day)) {
      return;
    }
    boolean[] turned = new boolean[3];
    for (int k = 0; k < 3; k++) {
      turned[k] = mostlyNegative(day, LineDay.LINES[k]);
    }
    for (int k = 0; k < 3; k++) {
      if (turned[k]) {
        reversed(day, LineDay.LINES[k], turned[0] && turned[1] && turned[2]);
      }
      ratio(day, LineDay.LINES[k]);
    }
    if (!turned[0] && !turned[1] && !turned[2]) {
      total(day);
    }
  }

  private static boolean mostlyNegative(LogDay day, String line) {
    Optional<double[]> watts =
        day.find(line + ".active_w").or(() -> day.find(line + ".power_factor"));
    int negative = 0;
    int there = 0;
    for (double p : watts.orElse(new double[0])) {
      there += Double.isNaN(p) || p == 0 ? 0 : 1;
      negative += p < 0 ? 1 : 0;
    }
    return there >= FEWEST_ROWS && negative > 0.8 * there;
  }

  private void reversed(LogDay day, String line, boolean all) {
    flagged.add(
        day,
        new FlaggedDays.Fault(
            REVERSED_CLAMP,
            line,
            "Active power of this line, the total and its power factor are wrong until its sign is"
                + " turned.",
            "Active power of "
                + line
                + " is negative in most rows"
                + (all
                    ? ", as on all lines: all clamps point the wrong way, or the site feeds power"
                        + " back."
                    : ": its clamp points the wrong way, or this line feeds power back.")));
  }

  /** How far the median of a ratio may stand from one. */
  private void ratio(LogDay day, String line) {
    LineDay lines = new LineDay(day);
    Optional<double[]> volts = lines.volts(line);
    Optional<double[]> amps = day.find(line + ".rms_a");
    if (volts.isEmpty() || amps.isEmpty()) {
      return;
    }
    double[] v = volts.get();
    double[] a = amps.get();
    Optional<double[]> apparent = day.find(line + ".apparent_va");
    if (apparent.isPresent()) {
      double median = median(a, k -> apparent.get()[k] / (v[k] * a[k]));
      judge(day, line, "Apparent", median, "volts times amps", median < 0.93 || median > 1.07);
      return;
    }
    Optional<double[]> watts = day.find(line + ".active_w");
    if (watts.isEmpty()) {
      return;
    }
    Optional<double[]> factor = day.find(line + ".power_factor");
    if (factor.isPresent()) {
      double median = median(a, k -> Math.abs(watts.get()[k] / (v[k] * a[k] * factor.get()[k])));
      judge(
          day,
          line,
          "Active",
          median,
          "volts times amps times power factor",
          median < 0.9 || median > 1.1);
    } else {
      double median = median(a, k -> Math.abs(watts.get()[k] / (v[k] * a[k])));
      judge(day, line, "Active", median, "volts times amps", median > 1.05 || median < 0.02);
    }
  }

  /** Rows of next to no current have no ratio: their digits are too few. */
  private static double median(double[] amps, java.util.function.IntToDoubleFunction ratio) {
    double least = 0.1 * Rows.median(amps);
    return Rows.median(amps.length, k -> amps[k] > least ? ratio.applyAsDouble(k) : Double.NaN);
  }

  private void judge(
      LogDay day, String line, String which, double median, String of, boolean wrong) {
    if (wrong && !Double.isNaN(median)) {
      flagged.add(
          day,
          new FlaggedDays.Fault(
              WRONG_RATIO,
              line,
              "Amps, volts or watts of this line are wrong by that factor.",
              String.format(
                  Locale.ROOT,
                  "%s power of %s is %.3g times %s (median of the day): a ratio, unit or factor is"
                      + " wrong.",
                  which,
                  line,
                  median,
                  of)));
    }
  }

  private void total(LogDay day) {
    for (String measure : List.of("active_w", "apparent_va")) {
      Optional<double[]> total = day.find("total." + measure);
      Optional<double[][]> lines = new LineDay(day).all(measure);
      if (total.isPresent() && lines.isPresent()) {
        double[][] p = lines.get();
        double median =
            Rows.median(day.rows(), k -> total.get()[k] / (p[0][k] + p[1][k] + p[2][k]));
        // The effective apparent power of three lines is no sum: it may be larger by a half.
        double most = measure.equals("active_w") ? 1.05 : 1.6;
        if (median < 0.95 || median > most) {
          flagged.add(
              day,
              new FlaggedDays.Fault(
                  WRONG_RATIO,
                  "total." + measure,
                  "The total, or one of the lines, is wrong.",
                  String.format(
                      Locale.ROOT,
                      "The total of %s is %.3g times the sum of the lines (median of the day).",
                      measure,
                      median)));
        }
      }
    }
  }

  /** Amps, volts or watts fit each other far better in another order of the lines. */
  private boolean swapped(LogDay day) {
    LineDay lines = new LineDay(day);
    Optional<double[][]> amps = lines.all("rms_a");
    Optional<double[][]> volts = lines.all("rms_v");
    Optional<double[][]> power = lines.all("apparent_va");
    Optional<double[][]> factor = lines.all("power_factor");
    if (amps.isEmpty() || volts.isEmpty()) {
      return false;
    }
    double[][] expected =
        power.orElseGet(
            () ->
                lines
                    .all("active_w")
                    .filter(p -> factor.isPresent())
                    .map(p -> quotient(p, factor.get()))
                    .orElse(new double[0][]));
    if (expected.length == 0) {
      return false;
    }
    return swapped(
            day, "currents", order -> misfit(expected, volts.get(), amps.get(), order, false))
        || swapped(
            day, "voltages", order -> misfit(expected, volts.get(), amps.get(), order, true));
  }

  private static double[][] quotient(double[][] p, double[][] factor) {
    double[][] s = new double[p.length][];
    for (int k = 0; k < p.length; k++) {
      int line = k;
      s[k] = new double[p[k].length];
      java.util.Arrays.setAll(s[k], row -> Math.abs(p[line][row] / factor[line][row]));
    }
    return s;
  }

  /** How badly an order of the lines fits; NaN where nothing is known. */
  private interface Misfit {
    double of(int[] order);
  }

  private boolean swapped(LogDay day, String what, Misfit misfit) {
    double straight = misfit.of(new int[] {0, 1, 2});
    int[] best = ORDERS[0];
    for (int[] order : ORDERS) {
      best = misfit.of(order) < misfit.of(best) ? order : best;
    }
    boolean wrong = straight > 0.0015 && misfit.of(best) < straight / 3 && misfit.of(best) < 0.03;
    if (wrong) {
      int[] order = best;
      flagged.add(
          day,
          new FlaggedDays.Fault(
              SWAPPED_LINES,
              what,
              "Figures of single lines belong to other lines; sums are right.",
              String.format(
                  Locale.ROOT,
                  "The %s under L1, L2 and L3 fit the powers as those of %s, %s and %s: lines stand"
                      + " under each other's names.",
                  what,
                  LineDay.LINES[order[0]],
                  LineDay.LINES[order[1]],
                  LineDay.LINES[order[2]])));
    }
    return wrong;
  }

  private static double misfit(
      double[][] expected, double[][] volts, double[][] amps, int[] order, boolean voltsMoved) {
    double sum = 0;
    for (int line = 0; line < 3; line++) {
      double[] v = volts[voltsMoved ? order[line] : line];
      double[] a = amps[voltsMoved ? line : order[line]];
      double[] s = expected[line];
      sum += Rows.median(s.length, k -> s[k] > 0 ? Math.abs(v[k] * a[k] / s[k] - 1) : Double.NaN);
    }
    return sum / 3;
  }

  /**
   * Clamps of two lines on each other's conductors: the instrument then takes each current against
   * a voltage a third of a cycle away, and finds V·I·cos(120° + φ) and V·I·cos(120° - φ).
   */
  private boolean crossed(LogDay day) {
    LineDay lines = new LineDay(day);
    Optional<double[][]> watts = lines.all("active_w");
    Optional<double[][]> amps = lines.all("rms_a");
    Optional<double[][]> volts = lines.all("rms_v");
    if (watts.isEmpty() || amps.isEmpty() || volts.isEmpty()) {
      return false;
    }
    double[] cosine = new double[3];
    for (int line = 0; line < 3; line++) {
      int k = line;
      cosine[k] =
          median(
              amps.get()[k],
              row -> watts.get()[k][row] / (volts.get()[k][row] * amps.get()[k][row]));
    }
    for (int straight = 0; straight < 3; straight++) {
      int a = (straight + 1) % 3;
      int b = (straight + 2) % 3;
      if (cosine[straight] > 0.7
          && isCrossed(cosine[a], cosine[b], Math.acos(Math.min(1, cosine[straight])))) {
        String pair = LineDay.LINES[Math.min(a, b)] + " and " + LineDay.LINES[Math.max(a, b)];
        flagged.add(
            day,
            new FlaggedDays.Fault(
                SWAPPED_LINES,
                pair,
                "Powers and power factors of these lines are wrong.",
                String.format(
                    Locale.ROOT,
                    "Active powers of %s are %.2f and %.2f of their volts times amps, of %s %.2f:"
                        + " the clamps of %s stand on each other's conductors.",
                    pair,
                    cosine[Math.min(a, b)],
                    cosine[Math.max(a, b)],
                    LineDay.LINES[straight],
                    cosine[straight],
                    pair)));
        return true;
      }
    }
    return false;
  }

  private static boolean isCrossed(double one, double other, double angle) {
    double third = 2 * Math.PI / 3;
    double low = Math.cos(third + angle);
    double high = Math.cos(third - angle);
    return Math.abs(Math.min(one, other) - Math.min(low, high)) < 0.15
        && Math.abs(Math.max(one, other) - Math.max(low, high)) < 0.15;
  }

  @Override
  public List<QualityFinding> findings() {
    return flagged.findings();
  }
}
