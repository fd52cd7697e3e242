package fourthwire.metering.log;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What is offered where a power is not volts times amps: another ratio of the amps, or of it. */
final class RatioOffers {
  /** How near lines of a board are in power factor, as a rule. */
  private static final double NEAR = 1.06;

  private static final Duration A_DAY = Duration.ofDays(1);

  private final LogDay day;
  private final LineRatio which;

  RatioOffers(LogDay day, LineRatio which) {
    this.day = day;
    this.which = which;
  }

  /** The power where the ratio is a prefix of its unit; else the amps, or the power. */
  Offers.Of ofLine(String line, double median) {
    if (!(median > 0)) {
      return rows -> List.of();
    }
    double ratio = which == LineRatio.APPARENT ? median : againstOthers(line, median);
    if (totalProves(line, median)) {
      List<String> powers = powers(line);
      return rows -> List.of(Offers.scale(powers, ratio, rows));
    }
    return either(amps(line), powers(line), ratio);
  }

  /** Whether a total of active power is the sum of the lines but for this one's ratio. */
  boolean totalProves(String line, double median) {
    Optional<double[]> total = day.find("total.active_w");
    Optional<double[][]> lines = new LineDay(day).all("active_w");
    if (which != LineRatio.ACTIVE || total.isEmpty() || lines.isEmpty()) {
      return false;
    }
    double ratio = LikelyRatio.of(againstOthers(line, median));
    double[] own = day.find(which.of(line)).orElseThrow();
    double[][] p = lines.get();
    double off =
        Rows.median(
            day.rows(),
            k -> {
              double sum = p[0][k] + p[1][k] + p[2][k] - own[k] + own[k] / ratio;
              return isOff(line, k, median) ? Math.abs(total.get()[k] / sum - 1) : Double.NaN;
            });
    return off < 0.02;
  }

  /** Whether a row has the ratio, of a day on which it may begin or end. */
  private boolean isOff(String line, int row, double ratio) {
    return RowTest.ofRatio((d, k) -> which.at(d, line, k), ratio).of(day, row) > 0;
  }

  /** The same for all lines at once, N with them where it is the amps. */
  Offers.Of ofAllLines(double median) {
    if (!(median > 0)) {
      return rows -> List.of();
    }
    double ratio = likely(median);
    List<String> powers = new ArrayList<>();
    List<String> amps = new ArrayList<>();
    for (String line : LineDay.LINES) {
      powers.addAll(powers(line));
      amps.addAll(amps(line));
    }
    day.quantities().stream()
        .filter(q -> q.equals("N.rms_a") || isHarmonic(q, "N") && harmonicsAgree("L1"))
        .filter(q -> !neutralIsAbove(median))
        .forEach(amps::add);
    return either(amps, powers, ratio);
  }

  /** Whether N is above the lines' sum where these are off: then it is right, and they are not. */
  private boolean neutralIsAbove(double ratio) {
    Optional<double[]> neutral = day.find("N.rms_a");
    Optional<double[][]> lines = new LineDay(day).all("rms_a");
    if (neutral.isEmpty() || lines.isEmpty()) {
      return false;
    }
    double[][] l = lines.get();
    int there = 0;
    int above = 0;
    for (int k = 0; k < day.rows(); k++) {
      if (isOff("L1", k, ratio)) {
        there++;
        above += neutral.get()[k] > 1.03 * (l[0][k] + l[1][k] + l[2][k]) + 0.1 ? 1 : 0;
      }
    }
    return 5 * above > there;
  }

  /** Whether a neutral is told to be no sum only where the amps of all lines are wrong, not it. */
  static boolean explains(QualityFinding of, QualityFinding neutral) {
    boolean told = of.code().equals(QualityFinding.WRONG_RATIO) && !of.corrections().isEmpty();
    if (!told || !neutral.code().equals(QualityFinding.NEUTRAL_NOT_SUM)) {
      return false;
    }
    boolean allLines =
        of.corrections().get(0).steps().get(0) instanceof Correction.Scale scale
            && scale.quantities().containsAll(List.of("L1.rms_a", "L2.rms_a", "L3.rms_a"))
            && !scale.quantities().contains("N.rms_a");
    Period lines = of.period().orElseThrow();
    Period sum = neutral.period().orElseThrow();
    return allLines
        && !sum.from().isBefore(lines.from().minus(A_DAY))
        && !sum.to().isAfter(lines.to().plus(A_DAY));
  }

  /** Without a power factor or apparent power: the instrument's ratio beyond a likely one. */
  double likely(double ratio) {
    boolean known = day.find("L1.power_factor").isPresent();
    return which != LineRatio.ACTIVE || known ? ratio : LikelyRatio.beyondPowerFactor(ratio);
  }

  /** What is to be known of the day is found out now, so that a fault does not hold its rows. */
  private Offers.Of either(List<String> amps, List<String> powers, double ratio) {
    boolean follows = which != LineRatio.APPARENT && PowerRelations.totalIsSum(day);
    Offers offers = new Offers(day.quantities());
    // Where the apparent power fits volts and amps, the active power alone is wrong.
    boolean alone = isActive() && powers.stream().allMatch(this::hasApparent);
    boolean ofPowersOnly = alone || LikelyRatio.isPrefix(ratio);
    return rows -> {
      Correction ofPowers = offers.rescale(powers, ratio, follows, rows);
      return ofPowersOnly
          ? List.of(ofPowers)
          : List.of(Offers.scale(amps, 1 / ratio, rows), ofPowers);
    };
  }

  private List<String> powers(String line) {
    return which == LineRatio.FUNDAMENTAL
        ? List.of(which.of(line), line + ".reactive_var")
        : List.of(which.of(line));
  }

  private boolean isActive() {
    return which == LineRatio.ACTIVE;
  }

  private boolean hasApparent(String power) {
    return day.find(LineRatio.APPARENT.of(power.substring(0, power.indexOf('.')))).isPresent();
  }

  /** Amps of a line, and those of its harmonics where they are of one ratio. */
  private List<String> amps(String line) {
    List<String> amps = new ArrayList<>(List.of(line + ".rms_a"));
    day.quantities().stream()
        .filter(q -> isHarmonic(q, line) && harmonicsAgree(line))
        .forEach(amps::add);
    return amps;
  }

  private static boolean isHarmonic(String quantity, String conductor) {
    return quantity.matches(conductor + "\\.current_h\\d+_a");
  }

  /** Without a power factor: held against the ratio that the other lines have. */
  private double againstOthers(String line, double ratio) {
    if (day.find(line + ".power_factor").isPresent()) {
      return ratio;
    }
    double sum = 0;
    int count = 0;
    for (String other : LineDay.LINES) {
      double usual = other.equals(line) ? Double.NaN : which.usual(day, other);
      if (usual > 0.3 && usual < 1.05) {
        sum += usual;
        count++;
      }
    }
    double beside = ratio * count / sum;
    return count == 0
        ? likely(ratio)
        : LikelyRatio.usual(beside / NEAR, beside * NEAR).orElse(beside);
  }

  /** Whether amps and fundamental are of one ratio. */
  private boolean harmonicsAgree(String line) {
    Optional<double[]> first = day.find(line + ".current_h1_a");
    Optional<double[]> amps = day.find(line + ".rms_a");
    if (first.isEmpty() || amps.isEmpty()) {
      return true;
    }
    double ratio = Rows.median(day.rows(), k -> first.get()[k] / amps.get()[k]);
    return ratio > 0.6 && ratio < 1.05;
  }
}
