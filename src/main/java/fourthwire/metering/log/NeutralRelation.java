package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.NEUTRAL_NOT_SUM;

import fourthwire.metering.Correction;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The neutral's current against the lines' it is the sum of. Thresholds are common practice, no
 * source.
 */
final class NeutralRelation {
  private static final int FEWEST_ROWS = 4;

  /**
   * Currents that do not flow at the same time add up to the root of the sum of their squares; more
   * takes third harmonics above 70 % or lines of very different power factor.
   */
  private static final double MOST_OF_ROOT = 1.15;

  /** How near a ratio of instruments one is to be taken for it. */
  private static final double NEAR = 0.15;

  private static final double LEAST_RATIO = 1.5;

  private final List<String> neutralCurrents;
  private final FlaggedDays flagged;

  NeutralRelation(List<String> names, FlaggedDays flagged) {
    this.neutralCurrents = names.stream().filter(n -> n.matches("N\\.(rms_a|current_).*")).toList();
    this.flagged = flagged;
  }

  /** How many rows of a day are how far off. */
  private static final class Count {
    private int there;
    private int above;
    private int beyond;
    private int below;

    /** For any waveforms the rms of a sum lies between the largest less the rest, and the sum. */
    void take(double n, double a, double b, double c) {
      double sum = a + b + c;
      double least = Math.max(0, 2 * Math.max(a, Math.max(b, c)) - sum);
      if (!Double.isNaN(sum + n)) {
        there++;
        above += n > 1.03 * sum + 0.1 ? 1 : 0;
        beyond += n > MOST_OF_ROOT * Math.sqrt(a * a + b * b + c * c) + 0.1 ? 1 : 0;
        below += n < 0.9 * least - 0.02 * sum ? 1 : 0;
      }
    }

    boolean isWrong() {
      return there >= FEWEST_ROWS && (5 * (above + below) > there || 5 * beyond > 4 * there);
    }
  }

  void look(LogDay day) {
    Optional<double[]> neutral = day.find("N.rms_a");
    Optional<double[][]> lines = new LineDay(day).all("rms_a");
    if (neutral.isEmpty() || lines.isEmpty()) {
      return;
    }
    double[][] l = lines.get();
    Count count = new Count();
    for (int k = 0; k < day.rows(); k++) {
      count.take(neutral.get()[k], l[0][k], l[1][k], l[2][k]);
    }
    Optional<String> thirds = thirds(day, neutral.get(), l);
    if (count.isWrong() || thirds.isPresent()) {
      OptionalDouble factor = likely(NeutralOrders.steady(day, neutral.get(), l));
      flag(day, thirds.orElseGet(() -> sentence(count)), factor);
    } else {
      NeutralOrders.off(day, neutral.get(), l).ifPresent(ratio -> ofOrders(day, ratio));
    }
  }

  /** The ratio it was set to wrongly; empty where none is near. */
  private static OptionalDouble likely(Optional<Double> ratio) {
    double r = ratio.orElse(1.0);
    return Math.max(r, 1 / r) < LEAST_RATIO
        ? OptionalDouble.empty()
        : LikelyRatio.usual(r / (1 + NEAR), r * (1 + NEAR));
  }

  private void flag(LogDay day, String sentence, OptionalDouble factor) {
    flagged.add(
        day,
        new FlaggedDays.Fault(
            NEUTRAL_NOT_SUM,
            "N",
            factor.isPresent()
                ? "The column mapped as N is not to be trusted."
                : "The column mapped as N is not to be trusted; what it should be, the currents"
                    + " logged can't tell.",
            sentence,
            rows -> corrections(factor, rows)));
  }

  private List<Correction> corrections(OptionalDouble factor, Correction.Rows rows) {
    List<Correction> offers = new ArrayList<>();
    factor.ifPresent(f -> offers.add(Offers.scale(List.of("N.rms_a"), f, rows)));
    offers.add(Offers.leaveOut(neutralCurrents, rows));
    return offers;
  }

  private void ofOrders(LogDay day, double ratio) {
    flag(
        day,
        String.format(
            Locale.ROOT,
            "N.rms_a is %.3g times what the orders of the lines add up to (median of the day).",
            ratio),
        likely(Optional.of(ratio)));
  }

  private static String sentence(Count count) {
    if (count.above + count.below == 0) {
      return String.format(
          Locale.ROOT,
          "N.rms_a is more than lines of a third of a cycle apart add up to, in %d of %d rows of"
              + " the day: it stands above the root of their squares' sum.",
          count.beyond,
          count.there);
    }
    boolean above = count.above >= count.below;
    return String.format(
        Locale.ROOT,
        "N.rms_a can't be the sum of the line currents: %s in %d of %d rows of the day.",
        above ? "above all three together" : "below what they must leave",
        above ? count.above : count.below,
        count.there);
  }

  /** Third harmonics of the lines add up in the neutral, where they are those of single loads. */
  private static Optional<String> thirds(LogDay day, double[] rms, double[][] amps) {
    Optional<double[][]> third = thirds(day, amps);
    if (third.isEmpty()) {
      return Optional.empty();
    }
    double[][] l = third.get();
    double large =
        Rows.median(
            day.rows(),
            k -> (l[0][k] + l[1][k] + l[2][k]) / (amps[0][k] + amps[1][k] + amps[2][k]));
    Optional<double[]> neutral = day.find("N.current_h3_a");
    double share =
        Rows.median(day.rows(), k -> neutral.orElse(rms)[k] / (l[0][k] + l[1][k] + l[2][k]));
    double own = neutral.map(n -> Rows.loaded(rms, k -> rms[k] / n[k])).orElse(1.0);
    if (own < 0.8) {
      return Optional.of("N.rms_a is below its own third harmonic.");
    }
    if (neutral.isPresent() && share > 1.08) {
      return Optional.of("The third harmonic of N is above that of all lines together.");
    }
    boolean below = large > 0.12 && share < (neutral.isPresent() ? 0.1 : 0.2);
    return below
        ? Optional.of(
            neutral.isPresent()
                ? "The third harmonic of N is far below that of the lines."
                : "N.rms_a is far below the third harmonics of the lines, which add up in it.")
        : Optional.empty();
  }

  /** In amps, as logged or from their percentages. */
  private static Optional<double[][]> thirds(LogDay day, double[][] amps) {
    LineDay lines = new LineDay(day);
    Optional<double[][]> logged = lines.all("current_h3_a");
    if (logged.isPresent()) {
      return logged;
    }
    return lines
        .all("current_h3_percent")
        .map(
            percent -> {
              double[][] made = new double[percent.length][day.rows()];
              for (int line = 0; line < made.length; line++) {
                for (int k = 0; k < day.rows(); k++) {
                  made[line][k] = percent[line][k] / 100 * amps[line][k];
                }
              }
              return made;
            });
  }
}
