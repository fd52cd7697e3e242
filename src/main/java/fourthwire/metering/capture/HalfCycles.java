package fourthwire.metering.capture;

import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.window.PhaseTrack;

/**
 * The rms of one cycle, refreshed every half cycle from a zero crossing of the channel's own
 * fundamental on: Urms(1/2) of IEC 61000-4-30:2015, 5.2.1.
 */
final class HalfCycles {
  private final PhaseTrack track;
  private final double offset;
  private final double[] rms;

  private HalfCycles(PhaseTrack track, double offset, double[] rms) {
    this.track = track;
    this.offset = offset;
    this.rms = rms;
  }

  static HalfCycles of(Samples x, PhaseTrack track) {
    double offset = crossing(x, track);
    int halves = (int) Math.floor(2 * (track.cyclesAt(x.count() - 1.0) - offset));
    double[] rms = new double[Math.max(0, halves - 1)];
    double before = 0;
    for (int h = 0; h < halves; h++) {
      double from = track.positionAt(offset + h / 2.0);
      double to = track.positionAt(offset + (h + 1) / 2.0);
      double square = meanSquare(x, from, to);
      if (h > 0) {
        rms[h - 1] = Math.sqrt((before + square) / 2);
      }
      before = square;
    }
    return new HalfCycles(track, offset, rms);
  }

  /** Cycles from the first sample to the first zero crossing of the first cycle's fundamental. */
  private static double crossing(Samples x, PhaseTrack track) {
    int n = (int) Math.min(x.count(), Math.ceil(track.positionAt(1)));
    double sine = 0;
    double cosine = 0;
    for (int k = 0; k < n; k++) {
      double angle = 2 * Math.PI * track.cyclesAt(k);
      sine += x.at(k) * Math.sin(angle);
      cosine += x.at(k) * Math.cos(angle);
    }
    double ahead = Math.atan2(cosine, sine) / (2 * Math.PI);
    return 0.5 * (Math.ceil(2 * ahead) - 2 * ahead);
  }

  /** Mean of the squares between two positions, linear between samples. */
  private static double meanSquare(Samples x, double from, double to) {
    int low = (int) Math.ceil(from);
    int high = (int) Math.floor(to);
    double sum = 0;
    for (int k = low; k <= high; k++) {
      double value = x.at(k);
      sum += value * value;
    }
    sum += edge(x, low, low - 1, low - from) + edge(x, high, high + 1, to - high);
    return sum / (to - from);
  }

  private static double edge(Samples x, int last, int next, double part) {
    double square = x.at(last) * x.at(last);
    double beyond = next >= 0 && next < x.count() ? x.at(next) * x.at(next) : square;
    return -square / 2 + part * (square + part * (beyond - square) / 2);
  }

  /** How many there are. */
  int count() {
    return rms.length;
  }

  /** The rms of the cycle that begins with this half. */
  double rms(int k) {
    return rms[k];
  }

  /** Where that cycle ends, in samples: the instant the value is known. */
  double endPosition(int k) {
    return track.positionAt(offset + k / 2.0 + 1);
  }

  /** The middle one by size. */
  double median() {
    double[] sorted = rms.clone();
    java.util.Arrays.sort(sorted);
    return sorted.length == 0 ? 0 : sorted[sorted.length / 2];
  }
}
