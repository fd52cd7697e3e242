package fourthwire.metering.capture;

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

  private final Capture capture;
  private final Extent extent;
  private final Channels channels;
  private final Neutral neutral;
  private final List<QualityFinding> findings = new ArrayList<>();

  CaptureQuality(Capture capture, Extent extent, Channels channels, Neutral neutral) {
    this.capture = capture;
    this.extent = extent;
    this.channels = channels;
    this.neutral = neutral;
  }

  /** Every finding. */
  List<QualityFinding> findings() {
    neutralChannel();
    voltageLeads();
    clamps();
    for (Capture.Channel channel : capture.channels()) {
      findings.addAll(
          new ChannelQuality(
                  channel,
                  capture.of(channel),
                  channels.find(channel.quantity()).orElseThrow(),
                  extent)
              .findings());
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
          "Channel %s, mapped as N, reads %.2f A rms, but the three line currents sum to %.2f A"
              + " rms: it is not the neutral of these lines.",
          name("N.i"),
          neutral.channel().orElseThrow().rms(),
          channels.sumOfLines().orElseThrow().rms());
    }
  }

  private void voltageLeads() {
    List<Phasor> v = new ArrayList<>();
    Channels.LINES.forEach(l -> channels.voltage(l).ifPresent(f -> v.add(f.spectrum().at(1))));
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
        channels.linesWithPower().stream()
            .filter(l -> magnitude(channels.current(l)) > IDLE * channels.meanLineA())
            .filter(l -> magnitude(channels.voltage(l)) > 0)
            .toList();
    if (lines.isEmpty()) {
      return;
    }
    Optional<Wiring.Clamps> mended =
        Wiring.mended(
            lines,
            l -> channels.voltage(l).orElseThrow().spectrum().at(1),
            l -> channels.current(l).orElseThrow().spectrum().at(1));
    if (mended.isPresent()) {
      mended.ifPresent(this::clamps);
    } else {
      lines.stream().filter(this::feedsBack).forEach(this::reversed);
    }
  }

  private static double magnitude(Optional<ChannelFigures> fit) {
    return fit.map(f -> f.spectrum().at(1).magnitude()).orElse(0.0);
  }

  private boolean feedsBack(Conductor line) {
    return channels.activeW(line) < 0;
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
        Amount.of(channels.activeW(line), "W"));
  }

  private void shortRecord() {
    if (extent.cycles() < extent.standardCycles()) {
      add(
          SHORT_RECORD,
          "The figures are of these cycles only, a snapshot.",
          "%s, so no standard aggregation: the measuring window of IEC 61000-4-30 is %d cycles.",
          extent.count(),
          extent.standardCycles());
    }
  }
}
