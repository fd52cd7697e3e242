package fourthwire.metering.capture;

import fourthwire.metering.WaveformPicture;
import fourthwire.metering.capture.wave.Samples;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Reduces waveforms to what a picture can show. */
final class PictureMaker {
  private static final int MOST_STRETCHES = 600;
  private static final int FEW_CYCLES = 15;
  private static final int CLOSE_UP_CYCLES = 2;

  private PictureMaker() {}

  /** A long record's stretches hold whole cycles, or their ends would dance. */
  static WaveformPicture of(Capture capture, int cycles) {
    return of(
        capture,
        capture.count(),
        cycles > FEW_CYCLES ? Math.min(MOST_STRETCHES, cycles) : MOST_STRETCHES);
  }

  /** The record's first cycles, of a shorter one all. */
  static WaveformPicture closeUp(Capture capture, double frequencyHz) {
    double samples = capture.count() / capture.time().spanS(capture.count()) / frequencyHz;
    return of(
        capture,
        (int) Math.min(capture.count(), Math.ceil(CLOSE_UP_CYCLES * samples) + 1),
        MOST_STRETCHES);
  }

  private static WaveformPicture of(Capture capture, int n, int stretches) {
    int each = (n + stretches - 1) / stretches;
    Map<String, WaveformPicture.Trace> channels = new LinkedHashMap<>();
    List<WaveformPicture.Trace> traces =
        capture.channels().parallelStream().map(c -> trace(capture.of(c), n, each)).toList();
    for (int c = 0; c < traces.size(); c++) {
      channels.put(capture.channels().get(c).quantity(), traces.get(c));
    }
    return new WaveformPicture(each * capture.time().spanS(n) / n, channels);
  }

  private static WaveformPicture.Trace trace(Samples x, int n, int each) {
    List<Double> lowest = new ArrayList<>();
    List<Double> highest = new ArrayList<>();
    for (int from = 0; from < n; from += each) {
      double low = Double.POSITIVE_INFINITY;
      double high = Double.NEGATIVE_INFINITY;
      for (int k = from; k < Math.min(n, from + each); k++) {
        double value = x.at(k);
        low = value < low ? value : low;
        high = value > high ? value : high;
      }
      // A stretch in which nothing was recorded is drawn as the axis.
      lowest.add(low <= high ? rounded(low) : 0);
      highest.add(low <= high ? rounded(high) : 0);
    }
    return new WaveformPicture.Trace(lowest, highest);
  }

  /** Five digits are more than a picture shows. */
  private static double rounded(double value) {
    if (value == 0) {
      return 0;
    }
    double unit = Math.pow(10, Math.floor(Math.log10(Math.abs(value))) - 4);
    return unit >= 1 ? Math.rint(value / unit) * unit : Math.rint(value / unit) / (1 / unit);
  }
}
