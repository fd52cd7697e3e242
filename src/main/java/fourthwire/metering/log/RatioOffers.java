package fourthwire.metering.log;

import fourthwire.metering.Correction;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What is offered where a power is not volts times amps: another ratio of the amps, or of it. */
final class RatioOffers {
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
    return either(amps(line), powers(line), ratio);
  }

  /** The same for all lines at once, N with them where it is the amps. */
  Offers.Of ofAllLines(double ratio) {
    if (!(ratio > 0)) {
      return rows -> List.of();
    }
    List<String> powers = new ArrayList<>();
    List<String> amps = new ArrayList<>();
    for (String line : LineDay.LINES) {
      powers.addAll(powers(line));
      amps.addAll(amps(line));
    }
    day.quantities().stream()
        .filter(q -> q.equals("N.rms_a") || isHarmonic(q, "N") && harmonicsAgree("L1"))
        .forEach(amps::add);
    return either(amps, powers, ratio);
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
    return count == 0 ? ratio : ratio * count / sum;
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
