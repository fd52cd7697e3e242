package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.REVERSED_CLAMP;
import static fourthwire.metering.QualityFinding.WRONG_RATIO;

import fourthwire.metering.Correction;
import fourthwire.metering.QualityFinding;
import java.util.ArrayList;
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
  private static final double RATIOS_ALIKE = 0.03;
  private static final String ACTIVE = "Active";

  private final FlaggedDays flagged = new FlaggedDays();
  private final LineOrder order = new LineOrder(flagged);
  private final TurnedRuns runs = new TurnedRuns();

  @Override
  public void take(LogDay day) {
    look(day);
    flagged.endDay(day);
    runs.take(day);
  }

  private void look(LogDay day) {
    if (day.rows() < FEWEST_ROWS) {
      return;
    }
    if (order.isWrong(day)) {
      return;
    }
    boolean[] turned = new boolean[3];
    double[] wrong = new double[3];
    for (int k = 0; k < 3; k++) {
      turned[k] = mostlyNegative(day, LineDay.LINES[k]);
    }
    for (int k = 0; k < 3; k++) {
      if (turned[k]) {
        reversed(day, LineDay.LINES[k], turned[0] && turned[1] && turned[2]);
      }
      wrong[k] = ratio(day, LineDay.LINES[k]);
    }
    neutralToo(day, wrong);
    if (!turned[0] && !turned[1] && !turned[2]) {
      total(day);
    }
  }

  private static boolean mostlyNegative(LogDay day, String line) {
    return negative(
        day.find(line + ".active_w")
            .or(() -> day.find(line + ".power_factor"))
            .orElse(new double[0]));
  }

  private static boolean negative(double[] values) {
    int negative = 0;
    int there = 0;
    for (double p : values) {
      there += Double.isNaN(p) || p == 0 ? 0 : 1;
      negative += p < 0 ? 1 : 0;
    }
    return there >= FEWEST_ROWS && negative > 0.8 * there;
  }

  private void reversed(LogDay day, String line, boolean all) {
    Offers offers = new Offers(day.quantities());
    List<String> turned =
        offers
            .logged(
                line + ".active_w",
                line + ".power_factor",
                line + ".displacement_factor",
                line + ".reactive_var")
            .stream()
            .filter(q -> negative(day.find(q).orElseThrow()))
            .toList();
    boolean follows = totalIsSum(day);
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
                    : ": its clamp points the wrong way, or this line feeds power back."),
            rows -> List.of(offers.turn(turned, follows, rows)),
            (other, row) -> negative(other, line, row)));
  }

  /** Whether a line's power is below zero in a row. */
  private static int negative(LogDay day, String line, int row) {
    Optional<double[]> power =
        day.find(line + ".active_w").or(() -> day.find(line + ".power_factor"));
    return (int) -Math.signum(power.map(p -> p[row]).filter(p -> !p.isNaN()).orElse(0.0));
  }

  /** Whether the total was formed from the lines as they stand. */
  static boolean totalIsSum(LogDay day) {
    Optional<double[]> total = day.find("total.active_w");
    Optional<double[][]> lines = new LineDay(day).all("active_w");
    if (total.isEmpty() || lines.isEmpty()) {
      return false;
    }
    double[][] p = lines.get();
    double off =
        Rows.median(
            day.rows(),
            k ->
                Math.abs(total.get()[k] - p[0][k] - p[1][k] - p[2][k])
                    / (Math.abs(p[0][k]) + Math.abs(p[1][k]) + Math.abs(p[2][k])));
    return off < 0.02;
  }

  /** How far the median of a ratio stands from one, where that is too far; else NaN. */
  private double ratio(LogDay day, String line) {
    LineDay lines = new LineDay(day);
    Optional<double[]> volts = lines.volts(line);
    Optional<double[]> amps = day.find(line + ".rms_a");
    if (volts.isEmpty() || amps.isEmpty()) {
      return Double.NaN;
    }
    double[] v = volts.get();
    double[] a = amps.get();
    Optional<double[]> apparent = day.find(line + ".apparent_va");
    if (apparent.isPresent()) {
      double median = median(a, k -> apparent.get()[k] / (v[k] * a[k]));
      boolean wrong = median < 0.93 || median > 1.07;
      judge(day, line, "Apparent", median, "volts times amps", wrong);
      if (wrong) {
        return median;
      }
    }
    Optional<double[]> watts = day.find(line + ".active_w");
    if (watts.isEmpty()) {
      return Double.NaN;
    }
    Optional<double[]> factor = day.find(line + ".power_factor");
    if (factor.isPresent()) {
      double median = median(a, k -> Math.abs(watts.get()[k] / (v[k] * a[k] * factor.get()[k])));
      boolean wrong = median < 0.9 || median > 1.1;
      judge(day, line, ACTIVE, median, "volts times amps times power factor", wrong);
      return wrong ? median : Double.NaN;
    }
    double median = median(a, k -> Math.abs(watts.get()[k] / (v[k] * a[k])));
    judge(day, line, ACTIVE, median, "volts times amps", median > 1.05 || median < 0.02);
    return Double.NaN;
  }

  /**
   * Where the amps of all lines are off by one factor, those of N, which no power tells of, were
   * read by the same instrument.
   */
  private void neutralToo(LogDay day, double[] wrong) {
    double ratio = (wrong[0] + wrong[1] + wrong[2]) / 3;
    boolean alike =
        java.util.Arrays.stream(wrong).allMatch(r -> Math.abs(r / ratio - 1) < RATIOS_ALIKE);
    if (!alike || isPrefix(ratio) || day.find("N.rms_a").isEmpty()) {
      return;
    }
    List<String> amps =
        day.quantities().stream()
            .filter(
                q ->
                    q.equals("N.rms_a")
                        || q.matches("N\\.current_h\\d+_a") && harmonicsAgree(day, "L1"))
            .toList();
    String line = LineDay.LINES[0];
    String which = day.find(line + ".apparent_va").isPresent() ? "Apparent" : ACTIVE;
    flagged.add(
        day,
        new FlaggedDays.Fault(
            WRONG_RATIO,
            "N.rms_a",
            "If the amps of the lines are wrong by that factor, those of N are too.",
            String.format(
                Locale.ROOT,
                "All three lines are off by one factor (%.3g): if it is that of their amps, N has"
                    + " it too, which no power can show. Correct N together with the lines.",
                ratio),
            rows -> List.of(Offers.scale(amps, 1 / ratio, rows)),
            RowTest.ofRatio((other, row) -> ratio(other, line, which, row), ratio)));
  }

  /** Rows of next to no current have no ratio: their digits are too few. */
  static double median(double[] amps, java.util.function.IntToDoubleFunction ratio) {
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
                  of),
              rows -> rescaled(day, line, which, median, rows),
              RowTest.ofRatio((other, row) -> ratio(other, line, which, row), median)));
    }
  }

  /** A power on volts times amps in a row; the active on that times power factor if logged. */
  private static double ratio(LogDay day, String line, String which, int row) {
    Optional<double[]> volts = new LineDay(day).volts(line);
    Optional<double[]> amps = day.find(line + ".rms_a");
    Optional<double[]> power = day.find(line + measure(which));
    if (volts.isEmpty() || amps.isEmpty() || power.isEmpty()) {
      return Double.NaN;
    }
    double factor =
        which.equals(ACTIVE)
            ? day.find(line + ".power_factor").map(f -> Math.abs(f[row])).orElse(1.0)
            : 1;
    return Math.abs(power.get()[row]) / (volts.get()[row] * amps.get()[row] * factor);
  }

  private static String measure(String which) {
    return which.equals(ACTIVE) ? ".active_w" : ".apparent_va";
  }

  /** The power where the ratio is a prefix of its unit; else the amps, or the power. */
  private static List<Correction> rescaled(
      LogDay day, String line, String which, double median, Correction.Rows rows) {
    Offers offers = new Offers(day.quantities());
    boolean active = which.equals(ACTIVE);
    double ratio = active ? againstOthers(day, line, median) : median;
    Correction ofPower =
        offers.rescale(line + measure(which), ratio, active && totalIsSum(day), rows);
    List<String> amps = new ArrayList<>(List.of(line + ".rms_a"));
    day.quantities().stream()
        .filter(q -> q.matches(line + "\\.current_h\\d+_a") && harmonicsAgree(day, line))
        .forEach(amps::add);
    // Where the apparent power fits volts and amps, the active power alone is wrong.
    boolean alone = active && day.find(line + ".apparent_va").isPresent();
    return alone || isPrefix(ratio)
        ? List.of(ofPower)
        : List.of(Offers.scale(amps, 1 / ratio, rows), ofPower);
  }

  /** A ratio of more than can be, without a power factor: held against that of the other lines. */
  private static double againstOthers(LogDay day, String line, double ratio) {
    if (day.find(line + ".power_factor").isPresent()) {
      return ratio;
    }
    double sum = 0;
    int count = 0;
    for (String other : LineDay.LINES) {
      double usual =
          other.equals(line)
              ? Double.NaN
              : Rows.median(day.rows(), row -> ratio(day, other, ACTIVE, row));
      if (usual > 0.3 && usual < 1.05) {
        sum += usual;
        count++;
      }
    }
    return count == 0 ? ratio : ratio * count / sum;
  }

  private static boolean isPrefix(double ratio) {
    double likely = Offers.likely(ratio);
    return likely >= 1000 || likely <= 0.001;
  }

  /** Whether amps and fundamental are of one ratio. */
  private static boolean harmonicsAgree(LogDay day, String line) {
    Optional<double[]> first = day.find(line + ".current_h1_a");
    Optional<double[]> amps = day.find(line + ".rms_a");
    if (first.isEmpty() || amps.isEmpty()) {
      return true;
    }
    double ratio = Rows.median(day.rows(), k -> first.get()[k] / amps.get()[k]);
    return ratio > 0.6 && ratio < 1.05;
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
                      median),
                  rows -> totalled(measure, median, rows)));
        }
      }
    }
  }

  private static List<Correction> totalled(String measure, double ratio, Correction.Rows rows) {
    if (isPrefix(ratio)) {
      return List.of(Offers.scale(List.of("total." + measure), ratio, rows));
    }
    return measure.equals("active_w") ? List.of(Offers.sum(measure, rows)) : List.of();
  }

  @Override
  public List<QualityFinding> findings() {
    List<QualityFinding> all = new ArrayList<>(flagged.findings());
    all.addAll(runs.findings(all));
    return all;
  }
}
