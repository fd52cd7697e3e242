package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.SWAPPED_LINES;

import fourthwire.metering.Correction;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Lines under each other's names, day by day: amps or volts that fit the powers in another order,
 * clamps on each other's conductors. Thresholds are common practice, no source.
 */
final class LineOrder {
  private static final int[][] ORDERS = {{1, 0, 2}, {0, 2, 1}, {2, 1, 0}, {1, 2, 0}, {2, 0, 1}};
  private static final int[] STRAIGHT = {0, 1, 2};

  /** How far power factors wander about their medians at least where lines are mixed up. */
  private static final double LEAST_WANDER = 0.06;

  private static final double MOST_STEADY = 0.05;
  private static final double LEAST_FACTOR = 0.3;
  private static final double MOST_FACTOR = 1.03;

  private final FlaggedDays flagged;

  LineOrder(FlaggedDays flagged) {
    this.flagged = flagged;
  }

  /** Whether they are; what was found is flagged. */
  boolean isWrong(LogDay day) {
    return swapped(day) || crossed(day);
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
    Optional<double[][]> expected =
        power.or(
            () ->
                lines
                    .all("active_w")
                    .filter(p -> factor.isPresent())
                    .map(p -> quotient(p, factor.get())));
    if (expected.isEmpty()) {
      return lines
          .all("active_w")
          .filter(p -> unsteady(day, p, volts.get(), amps.get()))
          .isPresent();
    }
    double[][] s = expected.get();
    return swapped(day, "currents", order -> misfit(s, volts.get(), amps.get(), order, false))
        || swapped(day, "voltages", order -> misfit(s, volts.get(), amps.get(), order, true));
  }

  /** Without apparent powers: each line's power factor is steady in one order, as it stands not. */
  private boolean unsteady(LogDay day, double[][] watts, double[][] volts, double[][] amps) {
    Misfit wander = order -> misfit(apparent(watts, volts, amps, order), volts, amps, order, false);
    double straight = wander.of(STRAIGHT);
    int[] best = best(wander);
    double least = wander.of(best);
    boolean wrong = straight > LEAST_WANDER && least < straight / 2.5 && least < MOST_STEADY;
    if (wrong) {
      double[] factors = factors(watts, volts, amps, best);
      flag(day, "currents", best, (other, row) -> fits(other, row, best, factors));
    }
    return wrong;
  }

  /** What the watts of each line would be as apparent power, at its usual power factor. */
  private static double[][] apparent(
      double[][] watts, double[][] volts, double[][] amps, int[] order) {
    double[] factors = factors(watts, volts, amps, order);
    double[][] made = new double[watts.length][];
    for (int line = 0; line < made.length; line++) {
      boolean likely = factors[line] > LEAST_FACTOR && factors[line] < MOST_FACTOR;
      double factor = likely || order == STRAIGHT ? factors[line] : Double.NaN;
      made[line] = java.util.Arrays.stream(watts[line]).map(p -> p / factor).toArray();
    }
    return made;
  }

  private static double[] factors(
      double[][] watts, double[][] volts, double[][] amps, int[] order) {
    double[] factors = new double[watts.length];
    java.util.Arrays.setAll(
        factors,
        line ->
            Rows.loaded(
                amps[order[line]], k -> watts[line][k] / (volts[line][k] * amps[order[line]][k])));
    return factors;
  }

  /**
   * 1 where a row's power factors are nearer the usual ones in this order, -1 where as it stands.
   */
  private static int fits(LogDay day, int row, int[] order, double[] factors) {
    double nearer = 0;
    for (int line = 0; line < order.length; line++) {
      String name = LineDay.LINES[line];
      double volts = at(day, name + ".rms_v", row);
      double expected = at(day, name + ".active_w", row) / factors[line];
      nearer +=
          Math.abs(volts * at(day, name + ".rms_a", row) / expected - 1)
              - Math.abs(
                  volts * at(day, LineDay.LINES[order[line]] + ".rms_a", row) / expected - 1);
    }
    return (int) Math.signum(nearer);
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

  /** 1 where a row fits its powers better in this order of the lines, -1 where as it stands. */
  private static int fits(LogDay day, int row, int[] order, boolean voltsMoved) {
    double straight = misfit(day, row, STRAIGHT, voltsMoved);
    double moved = misfit(day, row, order, voltsMoved);
    return moved < straight ? 1 : moved > straight ? -1 : 0;
  }

  private static double misfit(LogDay day, int row, int[] order, boolean voltsMoved) {
    double sum = 0;
    for (int line = 0; line < order.length; line++) {
      String name = LineDay.LINES[line];
      String other = LineDay.LINES[order[line]];
      double volts = at(day, (voltsMoved ? other : name) + ".rms_v", row);
      double amps = at(day, (voltsMoved ? name : other) + ".rms_a", row);
      double apparent = at(day, name + ".apparent_va", row);
      double made =
          Math.abs(at(day, name + ".active_w", row) / at(day, name + ".power_factor", row));
      sum += Math.abs(volts * amps / (Double.isNaN(apparent) ? made : apparent) - 1);
    }
    return sum;
  }

  private static double at(LogDay day, String quantity, int row) {
    return day.find(quantity).map(x -> x[row]).orElse(Double.NaN);
  }

  /** How badly an order of the lines fits; NaN where nothing is known. */
  private interface Misfit {
    double of(int[] order);
  }

  private boolean swapped(LogDay day, String what, Misfit misfit) {
    double straight = misfit.of(STRAIGHT);
    if (!(straight > 0.0015)) {
      return false;
    }
    int[] best = best(misfit);
    double least = misfit.of(best);
    boolean wrong = least < straight / 3 && least < 0.03;
    if (wrong) {
      flag(day, what, best, (other, row) -> fits(other, row, best, what.equals("voltages")));
    }
    return wrong;
  }

  private static int[] best(Misfit misfit) {
    int[] best = ORDERS[0];
    double least = misfit.of(best);
    for (int[] order : ORDERS) {
      double other = misfit.of(order);
      boolean better = other < least || Double.isNaN(least);
      best = better ? order : best;
      least = better ? other : least;
    }
    return best;
  }

  private void flag(LogDay day, String what, int[] order, RowTest rows) {
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
                LineDay.LINES[order[2]]),
            reordered(day, what.equals("currents"), order),
            rows));
  }

  private static Offers.Of reordered(LogDay day, boolean currents, int[] order) {
    Offers offers = new Offers(day.quantities());
    String rms = currents ? "rms_a" : "rms_v";
    String first = currents ? "current_h1_a" : "voltage_h1_v";
    boolean all = moveTogether(new LineDay(day), rms, first, order);
    List<String> measures =
        all ? offers.measures(rms, currents ? "current_" : "voltage_") : offers.measures(rms);
    String sentence =
        Offers.exchanged(order)
            + (all ? " (" + (currents ? "currents" : "voltages") : " (" + rms)
            + ")";
    return rows -> List.of(Correction.of(sentence, offers.reorder(order, measures, rows)));
  }

  /** Whether the harmonics stand under the same names as the rms: then they move with it. */
  private static boolean moveTogether(LineDay lines, String rms, String first, int[] order) {
    Optional<double[][]> totals = lines.all(rms);
    Optional<double[][]> fundamentals = lines.all(first);
    if (totals.isEmpty() || fundamentals.isEmpty()) {
      return true;
    }
    double straight = 0;
    double moved = 0;
    for (int line = 0; line < order.length; line++) {
      double[] h = fundamentals.get()[line];
      double[] same = totals.get()[line];
      double[] other = totals.get()[order[line]];
      straight += Rows.median(h.length, k -> Math.abs(h[k] / same[k] - 0.95));
      moved += Rows.median(h.length, k -> Math.abs(h[k] / other[k] - 0.95));
    }
    return straight <= moved;
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
          Rows.loaded(
              amps.get()[k],
              row -> watts.get()[k][row] / (volts.get()[k][row] * amps.get()[k][row]));
    }
    for (int k = 0; k < 3; k++) {
      int straight = k;
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
                    pair),
                uncrossed(day, a, b),
                (other, row) -> crossed(other, row, straight, a, b)));
        return true;
      }
    }
    return false;
  }

  /** Two crossed lines share -V·I·cos φ, straight ones 2 V·I·cos φ: which is nearer in a row. */
  private static int crossed(LogDay day, int row, int straight, int a, int b) {
    double half = cosine(day, row, straight) / 2;
    return (int) Math.signum(half - cosine(day, row, a) - cosine(day, row, b));
  }

  private static double cosine(LogDay day, int row, int line) {
    String name = LineDay.LINES[line];
    return at(day, name + ".active_w", row)
        / (at(day, name + ".rms_v", row) * at(day, name + ".rms_a", row));
  }

  /** Amps go where they belong; what the instrument formed from them with other volts is lost. */
  private static Offers.Of uncrossed(LogDay day, int a, int b) {
    Offers offers = new Offers(day.quantities());
    int[] order = {0, 1, 2};
    order[a] = b;
    order[b] = a;
    boolean summed = PowerRelations.totalIsSum(day);
    List<String> lost =
        day.quantities().stream()
            .filter(
                q ->
                    q.matches(
                        "("
                            + LineDay.LINES[a]
                            + "|"
                            + LineDay.LINES[b]
                            + (summed ? "|total" : "")
                            + ")\\.(active_w|reactive_var|apparent_va|power_factor"
                            + "|displacement_factor|energy_wh).*"))
            .toList();
    return rows ->
        List.of(
            Correction.of(
                Offers.exchanged(order) + " (currents), and leave out the powers formed from them",
                offers.reorder(order, offers.measures("rms_a", "current_"), rows),
                new Correction.LeaveOut(lost, rows)));
  }

  private static boolean isCrossed(double one, double other, double angle) {
    double third = 2 * Math.PI / 3;
    double low = Math.cos(third + angle);
    double high = Math.cos(third - angle);
    return Math.abs(Math.min(one, other) - Math.min(low, high)) < 0.15
        && Math.abs(Math.max(one, other) - Math.max(low, high)) < 0.15;
  }
}
