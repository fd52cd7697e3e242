package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.WRONG_RATIO;

import fourthwire.metering.Correction;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.IntToDoubleFunction;

/**
 * Powers against volts times amps, line by line: a ratio or unit that is wrong. Each day is judged
 * by its median, so that a strange row is no finding; what all lines share is one fault. Thresholds
 * are common practice, no source; the relations are P = V·I·power factor and S = V·I of a line
 * (IEEE 1459-2010, 3.1.2).
 */
final class PowerRatios {
  private static final double ALIKE = 0.03;
  private static final String ACTIVE = "Active";

  /** Whole ratios that an instrument may be set to, as exact as that, are no load's own. */
  private static final double WHOLE = 0.04;

  /** Last digits in a current, at least, so that rounding is no ratio. */
  private static final double FEWEST_DIGITS = 10;

  private static final double STEADY = 0.08;
  private static final int MOST_WHOLE = 20;

  private final FlaggedDays flagged;

  PowerRatios(FlaggedDays flagged) {
    this.flagged = flagged;
  }

  /**
   * A ratio that is wrong.
   *
   * @param which power
   * @param median of the day
   * @param of what the power is so many times
   */
  private record Off(String line, String which, double median, String of) {}

  void look(LogDay day) {
    List<Off> off = new ArrayList<>();
    for (String line : LineDay.LINES) {
      off(day, line).ifPresent(off::add);
    }
    if (off.size() == LineDay.LINES.length && isAlike(off)) {
      ofAllLines(day, off);
    } else {
      off.forEach(o -> ofOne(day, o));
    }
  }

  private static boolean isAlike(List<Off> off) {
    Off first = off.get(0);
    return off.stream()
        .allMatch(
            o ->
                o.which().equals(first.which())
                    && Math.abs(o.median() / first.median() - 1) < ALIKE);
  }

  private static Optional<Off> off(LogDay day, String line) {
    Optional<double[]> volts = new LineDay(day).volts(line);
    Optional<double[]> amps = day.find(line + ".rms_a");
    if (volts.isEmpty() || amps.isEmpty()) {
      return Optional.empty();
    }
    double[] v = volts.get();
    double[] a = amps.get();
    Optional<double[]> apparent = day.find(line + ".apparent_va");
    if (apparent.isPresent()) {
      double median = median(a, k -> apparent.get()[k] / (v[k] * a[k]));
      if (median < 0.93 || median > 1.07) {
        return Optional.of(new Off(line, "Apparent", median, "volts times amps"));
      }
    }
    return day.find(line + ".active_w").isPresent()
        ? active(day, line, a, apparent.isPresent())
        : Optional.empty();
  }

  private static Optional<Off> active(
      LogDay day, String line, double[] amps, boolean apparentFits) {
    double median = median(amps, row -> ratio(day, line, ACTIVE, row));
    if (day.find(line + ".power_factor").isPresent()) {
      return median < 0.9 || median > 1.1
          ? Optional.of(new Off(line, ACTIVE, median, "volts times amps times power factor"))
          : Optional.empty();
    }
    boolean beyond = median > 1.05 || median < 0.02;
    boolean unlikeOthers = !beyond && !apparentFits && isWholeAgainstOthers(day, line, amps);
    return beyond || unlikeOthers
        ? Optional.of(
            new Off(
                line,
                ACTIVE,
                median,
                "volts times amps" + (unlikeOthers ? ", that of the other lines far more" : "")))
        : Optional.empty();
  }

  /**
   * Where nothing but volts, amps and watts is logged, a line whose watts are a whole fraction of
   * what they are on the other lines, row by row, has another ratio, not another load.
   */
  private static boolean isWholeAgainstOthers(LogDay day, String line, double[] amps) {
    List<String> others = Arrays.stream(LineDay.LINES).filter(o -> !o.equals(line)).toList();
    double one = usual(day, others.get(0));
    double other = usual(day, others.get(1));
    boolean likely = Math.min(one, other) > 0.6 && Math.max(one, other) < 1.05;
    if (!likely || Math.abs(one / other - 1) > 0.12) {
      return false;
    }
    IntToDoubleFunction times =
        row ->
            (ratio(day, others.get(0), ACTIVE, row) + ratio(day, others.get(1), ACTIVE, row))
                / (2 * ratio(day, line, ACTIVE, row));
    double factor = median(amps, times);
    double whole = Math.rint(factor);
    double apart = median(amps, row -> Math.abs(times.applyAsDouble(row) / factor - 1));
    return whole >= 2
        && whole <= MOST_WHOLE
        && Math.abs(factor / whole - 1) < WHOLE
        && apart < STEADY;
  }

  private static double usual(LogDay day, String line) {
    return day.find(line + ".rms_a")
        .map(a -> median(a, row -> ratio(day, line, ACTIVE, row)))
        .orElse(Double.NaN);
  }

  /** Rows of next to no current have no ratio: their digits are too few. */
  static double median(double[] amps, IntToDoubleFunction ratio) {
    double least = Math.max(0.1 * Rows.median(amps), FEWEST_DIGITS * Rows.digit(amps));
    return Rows.median(
        amps.length,
        k -> {
          double at = amps[k] > least ? ratio.applyAsDouble(k) : Double.NaN;
          return Double.isInfinite(at) ? Double.NaN : at;
        });
  }

  private void ofOne(LogDay day, Off off) {
    flagged.add(
        day,
        new FlaggedDays.Fault(
            WRONG_RATIO,
            off.line(),
            "Amps, volts or watts of this line are wrong by that factor.",
            String.format(
                Locale.ROOT,
                "%s power of %s is %.3g times %s (median of the day): a ratio, unit or factor is"
                    + " wrong.",
                off.which(),
                off.line(),
                off.median(),
                off.of()),
            rows -> rescaled(day, off, rows),
            RowTest.ofRatio(
                (other, row) -> ratio(other, off.line(), off.which(), row), off.median())));
  }

  private void ofAllLines(LogDay day, List<Off> off) {
    Off first = off.get(0);
    double ratio = off.stream().mapToDouble(Off::median).sum() / off.size();
    flagged.add(
        day,
        new FlaggedDays.Fault(
            WRONG_RATIO,
            "all lines",
            "Amps, volts or watts of all lines are wrong by that factor; where it is the amps,"
                + " those of N too, which no power can show.",
            String.format(
                Locale.ROOT,
                "%s power of L1, L2 and L3 is %.3g times %s on each (median of the day): one ratio"
                    + " or unit of the instrument is wrong.",
                first.which(),
                ratio,
                first.of()),
            rows -> allRescaled(day, first.which(), ratio, rows),
            RowTest.ofRatio(
                (other, row) -> ratio(other, first.line(), first.which(), row), ratio)));
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
  private static List<Correction> rescaled(LogDay day, Off off, Correction.Rows rows) {
    if (!(off.median() > 0)) {
      return List.of();
    }
    boolean active = off.which().equals(ACTIVE);
    double ratio = active ? againstOthers(day, off.line(), off.median()) : off.median();
    Correction ofPower =
        new Offers(day.quantities())
            .rescale(
                List.of(off.line() + measure(off.which())),
                ratio,
                active && PowerRelations.totalIsSum(day),
                rows);
    // Where the apparent power fits volts and amps, the active power alone is wrong.
    boolean alone = active && day.find(off.line() + ".apparent_va").isPresent();
    return alone || isPrefix(ratio)
        ? List.of(ofPower)
        : List.of(Offers.scale(amps(day, off.line()), 1 / ratio, rows), ofPower);
  }

  /** The same for all lines at once, N with them where it is the amps. */
  private static List<Correction> allRescaled(
      LogDay day, String which, double ratio, Correction.Rows rows) {
    if (!(ratio > 0)) {
      return List.of();
    }
    boolean active = which.equals(ACTIVE);
    List<String> powers = new ArrayList<>();
    List<String> amps = new ArrayList<>();
    for (String line : LineDay.LINES) {
      powers.add(line + measure(which));
      amps.addAll(amps(day, line));
    }
    day.quantities().stream()
        .filter(q -> q.equals("N.rms_a") || q.matches("N\\.current_h\\d+_a"))
        .filter(q -> q.equals("N.rms_a") || harmonicsAgree(day, "L1"))
        .forEach(amps::add);
    Correction ofPowers =
        new Offers(day.quantities())
            .rescale(powers, ratio, active && PowerRelations.totalIsSum(day), rows);
    boolean alone = active && day.find("L1.apparent_va").isPresent();
    return alone || isPrefix(ratio)
        ? List.of(ofPowers)
        : List.of(Offers.scale(amps, 1 / ratio, rows), ofPowers);
  }

  /** Amps of a line, and those of its harmonics where they are of one ratio. */
  private static List<String> amps(LogDay day, String line) {
    List<String> amps = new ArrayList<>(List.of(line + ".rms_a"));
    day.quantities().stream()
        .filter(q -> q.matches(line + "\\.current_h\\d+_a") && harmonicsAgree(day, line))
        .forEach(amps::add);
    return amps;
  }

  /** Without a power factor: held against the ratio that the other lines have. */
  private static double againstOthers(LogDay day, String line, double ratio) {
    if (day.find(line + ".power_factor").isPresent()) {
      return ratio;
    }
    double sum = 0;
    int count = 0;
    for (String other : LineDay.LINES) {
      double usual = other.equals(line) ? Double.NaN : usual(day, other);
      if (usual > 0.3 && usual < 1.05) {
        sum += usual;
        count++;
      }
    }
    return count == 0 ? ratio : ratio * count / sum;
  }

  static boolean isPrefix(double ratio) {
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
}
