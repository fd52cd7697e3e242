package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.REVERSED_CLAMP;
import static fourthwire.metering.QualityFinding.SWAPPED_LINES;

import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What powers, volts and amps tell about each other day by day: a clamp that points the wrong way,
 * lines under each other's names, and {@link PowerRatios} and {@link TotalRatios}. Each judges a
 * day's median, so that a strange row is no finding. Thresholds are common practice, no source.
 */
final class PowerRelations implements DayCheck {
  private static final int FEWEST_ROWS = 4;

  private final FlaggedDays flagged = new FlaggedDays();
  private final LineOrder order = new LineOrder(flagged);
  private final PowerRatios ratios = new PowerRatios(flagged);
  private final TotalRatios totals = new TotalRatios(flagged);
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
    for (int k = 0; k < 3; k++) {
      turned[k] = mostlyNegative(day, LineDay.LINES[k]);
    }
    for (int k = 0; k < 3; k++) {
      if (turned[k]) {
        reversed(day, LineDay.LINES[k], turned[0] && turned[1] && turned[2]);
      }
    }
    boolean proven = ratios.look(day);
    if (!proven && !turned[0] && !turned[1] && !turned[2]) {
      totals.look(day);
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
        offers.signed(line).stream().filter(q -> negative(day.find(q).orElseThrow())).toList();
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

  /** Whether a finding is what lines under each other's names leave at either end of their time. */
  private static boolean isOfSwap(QualityFinding f, QualityFinding swap) {
    if (f.code().equals(SWAPPED_LINES) || !swap.code().equals(SWAPPED_LINES)) {
      return false;
    }
    Period of = f.period().orElseThrow();
    Period within = swap.period().orElseThrow();
    Instant from = of.from().isAfter(within.from()) ? of.from() : within.from();
    Instant to = of.to().isBefore(within.to()) ? of.to() : within.to();
    Duration shared = Duration.between(from, to);
    return shared.multipliedBy(2).compareTo(Duration.between(of.from(), of.to())) > 0;
  }

  @Override
  public List<QualityFinding> findings() {
    List<QualityFinding> found = flagged.findings();
    List<QualityFinding> all = new ArrayList<>(found);
    all.removeIf(f -> found.stream().anyMatch(other -> isOfSwap(f, other)));
    all.addAll(runs.findings(all));
    return all;
  }
}
