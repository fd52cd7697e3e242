package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.NEUTRAL_NOT_SUM;
import static fourthwire.metering.QualityFinding.REVERSED_CLAMP;
import static fourthwire.metering.QualityFinding.WRONG_RATIO;

import fourthwire.metering.Amount;
import fourthwire.metering.QualityFinding;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * What quantities of a log tell about each other: a clamp that points the wrong way, a ratio or
 * unit that is wrong, a neutral that the lines can't add up to. Thresholds are common practice, no
 * source; each judges the greater part of the rows, so that one strange row is no finding.
 */
final class LogWiring {
  static final List<String> LINES = List.of("L1", "L2", "L3");

  private static final double MOST_ROWS = 0.8;

  private final IntervalLog log;
  private final List<QualityFinding> findings = new ArrayList<>();

  LogWiring(IntervalLog log) {
    this.log = log;
  }

  List<QualityFinding> findings() {
    reversed();
    LINES.forEach(this::ratio);
    neutral();
    return findings;
  }

  private void add(String code, String effect, String sentence, Object... values) {
    findings.add(
        new QualityFinding(
            code, Optional.empty(), effect, String.format(Locale.ROOT, sentence, values)));
  }

  private void reversed() {
    List<String> lines = LINES.stream().filter(l -> log.has(l + ".active_w")).toList();
    List<String> negative = lines.stream().filter(this::mostlyNegative).toList();
    for (String line : negative) {
      add(
          REVERSED_CLAMP,
          "Active power of this line, the total and its power factor are wrong until its sign is"
              + " turned.",
          negative.size() == lines.size() && lines.size() > 1
              ? "Active power of %s is negative in most rows, as on all lines: all clamps point the"
                  + " wrong way, or the site feeds power back. Median %s."
              : "Active power of %s is negative in most rows, median %s: its clamp points the"
                  + " wrong way, or this line feeds power back.",
          line,
          Amount.of(Statistics.median(log.values(line + ".active_w")), "W"));
    }
  }

  private boolean mostlyNegative(String line) {
    int negative = 0;
    int there = 0;
    for (double p : log.values(line + ".active_w")) {
      there += Double.isNaN(p) || p == 0 ? 0 : 1;
      negative += p < 0 ? 1 : 0;
    }
    return there > 0 && negative > MOST_ROWS * there;
  }

  /** P = V·I·power factor, and never above V·I. */
  private void ratio(String line) {
    if (!log.has(line + ".active_w") || !log.has(line + ".rms_v") || !log.has(line + ".rms_a")) {
      return;
    }
    boolean factor = log.has(line + ".power_factor");
    double[] ratio = new double[log.rows()];
    for (int k = 0; k < ratio.length; k++) {
      double expected =
          log.at(line + ".rms_v", k)
              * log.at(line + ".rms_a", k)
              * (factor ? Math.abs(log.at(line + ".power_factor", k)) : 1);
      ratio[k] = expected > 0 ? Math.abs(log.at(line + ".active_w", k)) / expected : Double.NaN;
    }
    double median = Statistics.median(ratio);
    boolean wrong = factor ? median < 0.9 || median > 1.1 : median > 1.05 || median < 0.05;
    if (wrong) {
      add(
          WRONG_RATIO,
          "Amps, volts or watts of this line are wrong by that factor.",
          "Active power of %s is %.3g times %s (median): a ratio, unit or factor is wrong.",
          line,
          median,
          factor ? "volts times amps times power factor" : "volts times amps");
    }
  }

  /** For any waveforms the rms of a sum lies between the largest less the rest, and the sum. */
  private void neutral() {
    if (!log.has("N.rms_a") || !LINES.stream().allMatch(l -> log.has(l + ".rms_a"))) {
      return;
    }
    int there = 0;
    int above = 0;
    int below = 0;
    for (int k = 0; k < log.rows(); k++) {
      double n = log.at("N.rms_a", k);
      double a = log.at("L1.rms_a", k);
      double b = log.at("L2.rms_a", k);
      double c = log.at("L3.rms_a", k);
      double sum = a + b + c;
      double least = Math.max(0, 2 * Math.max(a, Math.max(b, c)) - sum);
      if (!Double.isNaN(sum + n)) {
        there++;
        above += n > 1.03 * sum + 0.1 ? 1 : 0;
        below += n < 0.9 * least - 0.02 * sum ? 1 : 0;
      }
    }
    if (there > 0 && above + below > (1 - MOST_ROWS) * there) {
      add(
          NEUTRAL_NOT_SUM,
          "The column mapped as N is not to be trusted.",
          "N.rms_a can't be the sum of the line currents: above all three together in %d of %d rows,"
              + " below what they must leave in %d.",
          above,
          there,
          below);
    }
  }
}
