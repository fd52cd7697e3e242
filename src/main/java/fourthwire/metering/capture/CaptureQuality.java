package fourthwire.metering.capture;

import static fourthwire.metering.QualityFinding.CLIPPED;
import static fourthwire.metering.QualityFinding.DIRECT_COMPONENT;
import static fourthwire.metering.QualityFinding.FLAT_LINE;
import static fourthwire.metering.QualityFinding.MISSING_VALUES;
import static fourthwire.metering.QualityFinding.NEUTRAL_NOT_SUM;
import static fourthwire.metering.QualityFinding.REVERSED_CLAMP;
import static fourthwire.metering.QualityFinding.SHORT_RECORD;
import static fourthwire.metering.QualityFinding.SWAPPED_LINES;

import fourthwire.metering.Amount;
import fourthwire.metering.QualityFinding;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * What is wrong with a capture, worst first. The thresholds are common practice, no source: a
 * finding is a question to the person who held the clamps, not a verdict.
 */
final class CaptureQuality {
  /** A line carrying less than this share of the mean is too small to judge its angle. */
  private static final double IDLE = 0.02;

  private static final double DIRECT = 0.01;
  private static final int FLAT_TOP = 4;

  private final Capture capture;
  private final Window window;
  private final Fits fits;
  private final Neutral neutral;
  private final List<QualityFinding> findings = new ArrayList<>();

  CaptureQuality(Capture capture, Window window, Fits fits, Neutral neutral) {
    this.capture = capture;
    this.window = window;
    this.fits = fits;
    this.neutral = neutral;
  }

  /** Every finding. */
  List<QualityFinding> findings() {
    neutralChannel();
    voltageLeads();
    clamps();
    for (Capture.Channel channel : capture.channels()) {
      double[] x = capture.find(channel.quantity()).orElseThrow();
      missing(channel, x);
      if (!flat(channel, x)) {
        clipped(channel, x);
        direct(channel);
      }
    }
    shortRecord();
    return List.copyOf(findings);
  }

  private void add(String code, String effect, String sentence, Object... values) {
    findings.add(
        new QualityFinding(
            code, Optional.empty(), effect, String.format(Locale.ROOT, sentence, values)));
  }

  private String name(String quantity) {
    return capture.nameOf(quantity).orElse(quantity);
  }

  private static String amount(Capture.Channel channel, double value) {
    return Amount.of(value, Amount.unit(channel.quantity()));
  }

  private void neutralChannel() {
    if (neutral.agreement() == Neutral.Agreement.OPPOSITE) {
      add(
          REVERSED_CLAMP,
          "N is taken from the sum of the line currents.",
          "Channel %s, mapped as N, is the sum of the line currents with its sign turned: its clamp"
              + " points the wrong way.",
          name("N.i"));
    } else if (neutral.agreement() == Neutral.Agreement.DIFFERENT) {
      add(
          NEUTRAL_NOT_SUM,
          "N is taken from the sum of the line currents; the channel is not used.",
          "Channel %s, mapped as N, reads %.2f A rms, but the three line currents sum to %.2f A rms:"
              + " it is not the neutral of these lines.",
          name("N.i"),
          neutral.channel().orElseThrow().alternatingRms(),
          fits.sumOfLines().orElseThrow().alternatingRms());
    }
  }

  private void voltageLeads() {
    List<Phasor> v = new ArrayList<>();
    Fits.LINES.forEach(l -> fits.voltage(l).ifPresent(f -> v.add(f.at(1))));
    if (v.size() == 3 && Wiring.voltagesRunBackwards(v)) {
      add(
          SWAPPED_LINES,
          "Positive and negative sequence stand exchanged: Q1+, unbalance and displacement factor"
              + " of all lines together are not to be trusted.",
          "The voltages follow each other as L1, L3, L2: two voltage leads are exchanged, or the"
              + " supply turns the other way.");
    }
  }

  private void clamps() {
    List<Conductor> lines =
        fits.linesWithPower().stream()
            .filter(l -> magnitude(fits.current(l)) > IDLE * fits.meanLineA())
            .filter(l -> magnitude(fits.voltage(l)) > 0)
            .toList();
    if (lines.isEmpty()) {
      return;
    }
    Optional<Wiring.Clamps> mended =
        Wiring.mended(
            lines,
            l -> fits.voltage(l).orElseThrow().at(1),
            l -> fits.current(l).orElseThrow().at(1));
    if (mended.isPresent()) {
      mended.ifPresent(this::clamps);
    } else {
      lines.stream().filter(this::feedsBack).forEach(this::reversed);
    }
  }

  private static double magnitude(Optional<HarmonicFit> fit) {
    return fit.map(f -> f.at(1).magnitude()).orElse(0.0);
  }

  private boolean feedsBack(Conductor line) {
    return fits.voltage(line).orElseThrow().activePower(fits.current(line).orElseThrow()) < 0;
  }

  private void clamps(Wiring.Clamps clamps) {
    List<Conductor> exchanged = clamps.exchanged();
    if (!exchanged.isEmpty()) {
      add(
          SWAPPED_LINES,
          "Power and power factor of these lines are wrong; their rms and THD stand under the wrong"
              + " names.",
          "By their angles to the voltages, the current channels of %s are exchanged: %s.",
          exchanged.stream().map(Conductor::name).collect(Collectors.joining(", ")),
          exchanged.stream()
              .map(l -> name(l + ".i") + " fits the voltage of " + clamps.onLine().get(l))
              .collect(Collectors.joining(", ")));
    }
    clamps.turned().forEach(this::reversed);
  }

  private void reversed(Conductor line) {
    add(
        REVERSED_CLAMP,
        "Power, power factor and the sum of the lines are wrong until its sign is turned.",
        "The current of %s (channel %s) runs against its voltage, active power %s: its clamp"
            + " points the wrong way, or this line feeds power back.",
        line,
        name(line + ".i"),
        Amount.of(
            fits.voltage(line).orElseThrow().activePower(fits.current(line).orElseThrow()), "W"));
  }

  private void missing(Capture.Channel channel, double[] x) {
    int missing = 0;
    for (double value : x) {
      missing += Double.isNaN(value) ? 1 : 0;
    }
    if (missing > 0) {
      add(
          MISSING_VALUES,
          "The figures are formed from the samples that are there.",
          "Channel %s: %d of %d samples were not recorded.",
          channel.name(),
          missing,
          x.length);
    }
  }

  private boolean flat(Capture.Channel channel, double[] x) {
    double first = x[0];
    for (double value : x) {
      if (value != first && !Double.isNaN(value)) {
        return false;
      }
    }
    add(
        FLAT_LINE,
        "Its figures are of a channel that was not connected.",
        "Channel %s reads %s in every sample.",
        channel.name(),
        amount(channel, first));
    return true;
  }

  /** Runs of equal samples at the very top or bottom: an input at the end of its range. */
  private void clipped(Capture.Channel channel, double[] x) {
    double highest = Double.NEGATIVE_INFINITY;
    double lowest = Double.POSITIVE_INFINITY;
    double step = Double.POSITIVE_INFINITY;
    for (int k = 0; k < x.length; k++) {
      highest = Double.isNaN(x[k]) ? highest : Math.max(highest, x[k]);
      lowest = Double.isNaN(x[k]) ? lowest : Math.min(lowest, x[k]);
      double moved = k == 0 ? 0 : Math.abs(x[k] - x[k - 1]);
      step = moved > 0 ? Math.min(step, moved) : step;
    }
    int length = FLAT_TOP + crestSamples(step, (highest - lowest) / 2);
    int runs = runs(x, highest, length) + runs(x, lowest, length);
    // One flat crest is chance; a clipped wave has one in most cycles.
    if (runs > Math.max(1, window.cycles() / 2)) {
      add(
          CLIPPED,
          "Peaks are cut off: rms reads low and the odd orders high.",
          "Channel %s stands still at %s or %s for %d samples or more, %d times.",
          channel.name(),
          amount(channel, highest),
          amount(channel, lowest),
          length,
          runs);
    }
  }

  /** How many samples the crest of a sine stays within one step of the instrument's resolution. */
  private int crestSamples(double step, double amplitude) {
    double angle = 2 * Math.acos(Math.max(-1, 1 - step / amplitude));
    return (int) Math.ceil(angle / (2 * Math.PI) * window.samples() / window.cycles());
  }

  private static int runs(double[] x, double level, int least) {
    int runs = 0;
    int length = 0;
    for (double value : x) {
      length = value == level ? length + 1 : 0;
      runs += length == least ? 1 : 0;
    }
    return runs;
  }

  private void direct(Capture.Channel channel) {
    HarmonicFit fit = fits.find(channel.quantity()).orElseThrow();
    if (channel.quantity().startsWith("L")
        && Math.abs(fit.direct()) > DIRECT * fit.alternatingRms()) {
      add(
          DIRECT_COMPONENT,
          "It is left out of rms and power.",
          "Channel %s has a direct component of %s, %.1f %% of its alternating rms.",
          channel.name(),
          amount(channel, fit.direct()),
          100 * Math.abs(fit.direct()) / fit.alternatingRms());
    }
  }

  private void shortRecord() {
    if (window.cycles() < window.standardCycles()) {
      add(
          SHORT_RECORD,
          "The figures are of these cycles only, a snapshot.",
          "%s, so no standard aggregation: the measuring window of IEC 61000-4-30 is %d cycles.",
          window.count(),
          window.standardCycles());
    }
  }
}
