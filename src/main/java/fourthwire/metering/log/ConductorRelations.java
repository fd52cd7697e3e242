package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.WRONG_RATIO;

import fourthwire.metering.QualityFinding;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * What the currents and voltages tell about each other day by day: {@link NeutralRelation}, {@link
 * HarmonicRelation}, and volts that are not those of the other lines or not those between them.
 * Thresholds are common practice, no source.
 */
final class ConductorRelations implements DayCheck {
  private static final int FEWEST_ROWS = 4;

  private final FlaggedDays flagged = new FlaggedDays();
  private final NeutralRelation neutral;
  private final HarmonicRelation harmonics;
  private final NeutralSteps steps = new NeutralSteps();

  ConductorRelations(List<String> names) {
    this.neutral = new NeutralRelation(names, flagged);
    this.harmonics = new HarmonicRelation(names, flagged);
  }

  @Override
  public void take(LogDay day) {
    look(day);
    flagged.endDay(day);
    steps.take(day);
  }

  private void look(LogDay day) {
    if (day.rows() < FEWEST_ROWS) {
      return;
    }
    neutral.look(day);
    betweenLines(day);
    harmonics.look(day);
  }

  /** Volts between lines are √3 times those to the neutral where these are alike. */
  private void betweenLines(LogDay day) {
    Optional<double[][]> lines = new LineDay(day).all("rms_v");
    if (lines.isEmpty()) {
      return;
    }
    double[] usual = new double[3];
    for (int k = 0; k < 3; k++) {
      usual[k] = Rows.median(lines.get()[k]);
    }
    double mean = (usual[0] + usual[1] + usual[2]) / 3;
    for (int k = 0; k < 3; k++) {
      double others = (3 * mean - usual[k]) / 2;
      // One line far off while the other two agree: an interruption does not last a day.
      boolean agree = Math.abs(usual[(k + 1) % 3] - usual[(k + 2) % 3]) < 0.05 * others;
      if (agree && Math.abs(usual[k] / others - 1) > 0.15) {
        flag(
            day,
            LineDay.LINES[k] + ".rms_v",
            "Volts of this line, and what is formed from them, are wrong by that factor.",
            String.format(
                Locale.ROOT,
                "Volts of %s are %.3g times those of the other lines (median of the day).",
                LineDay.LINES[k],
                usual[k] / others),
            scaled(List.of(LineDay.LINES[k] + ".rms_v"), usual[k] / others));
      }
    }
    Optional<double[]> pair = day.find("L1-L2.rms_v");
    if (pair.isPresent()) {
      double ratio = Rows.median(pair.get()) / mean;
      if (ratio < 1.5 || ratio > 2.1) {
        flag(
            day,
            "L1-L2.rms_v",
            "Either the volts between lines or those to the neutral are wrong.",
            String.format(
                Locale.ROOT,
                "Volts between lines are %.3g times those to the neutral, not about 1.73.",
                ratio),
            rows -> List.of());
      }
    }
  }

  private void flag(
      LogDay day, String subject, String effect, String sentence, Offers.Of corrections) {
    flagged.add(day, new FlaggedDays.Fault(WRONG_RATIO, subject, effect, sentence, corrections));
  }

  private static Offers.Of scaled(List<String> quantities, double ratio) {
    return rows ->
        List.of(
            ratio > 0 ? Offers.scale(quantities, ratio, rows) : Offers.leaveOut(quantities, rows));
  }

  @Override
  public List<QualityFinding> findings() {
    return steps.findings(flagged.findings());
  }
}
