package fourthwire.metering.capture;

import static fourthwire.metering.QualityFinding.CLIPPED;
import static fourthwire.metering.QualityFinding.DIRECT_COMPONENT;
import static fourthwire.metering.QualityFinding.FLAT_LINE;
import static fourthwire.metering.QualityFinding.MISSING_VALUES;

import fourthwire.metering.Amount;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.capture.wave.Extremes;
import fourthwire.metering.capture.wave.Samples;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** What is wrong with one channel of a capture. The thresholds are common practice, no source. */
final class ChannelQuality {
  private static final double DIRECT = 0.01;
  private static final int FLAT_TOP = 4;

  private final Capture.Channel channel;
  private final Samples x;
  private final Extremes range;
  private final ChannelFigures figures;
  private final Extent extent;
  private final List<QualityFinding> findings = new ArrayList<>();

  ChannelQuality(Capture.Channel channel, Samples x, ChannelFigures figures, Extent extent) {
    this.channel = channel;
    this.x = x;
    this.range = x.extremes();
    this.figures = figures;
    this.extent = extent;
  }

  List<QualityFinding> findings() {
    missing();
    if (range.isFlat()) {
      flat();
    } else {
      clipped();
      direct();
    }
    return findings;
  }

  private void add(String code, String effect, String sentence, Object... values) {
    findings.add(
        new QualityFinding(
            code, Optional.empty(), effect, String.format(Locale.ROOT, sentence, values)));
  }

  private String amount(double value) {
    return Amount.of(value, Amount.unit(channel.quantity()));
  }

  private void missing() {
    if (range.missing() > 0) {
      add(
          MISSING_VALUES,
          "The figures are formed from the samples that are there.",
          "Channel %s: %d of %d samples were not recorded.",
          channel.name(),
          range.missing(),
          x.count());
    }
  }

  private void flat() {
    add(
        FLAT_LINE,
        "Its figures are of a channel that was not connected.",
        "Channel %s reads %s in every sample.",
        channel.name(),
        amount(range.highest()));
  }

  /** Runs of equal samples at the very top or bottom: an input at the end of its range. */
  private void clipped() {
    // One flat crest is chance; a clipped wave has one in most cycles.
    int most = Math.max(1, extent.cycles() / 2);
    if (range.atEnds() < most * FLAT_TOP) {
      return;
    }
    int length = FLAT_TOP + crestSamples((range.highest() - range.lowest()) / 2);
    int runs = runs(range.highest(), length) + runs(range.lowest(), length);
    if (runs > most) {
      add(
          CLIPPED,
          "Peaks are cut off: rms reads low and the odd orders high.",
          "Channel %s stands still at %s or %s for %d samples or more, %d times.",
          channel.name(),
          amount(range.highest()),
          amount(range.lowest()),
          length,
          runs);
    }
  }

  /** How many samples the crest of a sine stays within one step of the instrument's resolution. */
  private int crestSamples(double amplitude) {
    double step = Double.POSITIVE_INFINITY;
    for (int k = 1; k < x.count(); k++) {
      double moved = Math.abs(x.at(k) - x.at(k - 1));
      step = moved > 0 ? Math.min(step, moved) : step;
    }
    double angle = 2 * Math.acos(Math.max(-1, 1 - step / amplitude));
    return (int) Math.ceil(angle / (2 * Math.PI) * extent.samples() / extent.cycles());
  }

  private int runs(double level, int least) {
    int runs = 0;
    int length = 0;
    for (int k = 0; k < x.count(); k++) {
      length = x.at(k) == level ? length + 1 : 0;
      runs += length == least ? 1 : 0;
    }
    return runs;
  }

  private void direct() {
    if (channel.quantity().startsWith("L") && Math.abs(figures.direct()) > DIRECT * figures.rms()) {
      add(
          DIRECT_COMPONENT,
          "It is left out of rms and power.",
          "Channel %s has a direct component of %s, %.1f %% of its alternating rms.",
          channel.name(),
          amount(figures.direct()),
          100 * Math.abs(figures.direct()) / figures.rms());
    }
  }
}
