package fourthwire.metering.capture;

import fourthwire.metering.capture.fit.HarmonicFit;
import fourthwire.metering.capture.wave.Samples;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Channels of a record too short or too uneven for the standard windows: orders fitted to the
 * samples of its largest whole number of cycles.
 */
final class FitChannels {
  private FitChannels() {}

  static Channels of(Capture capture, Extent extent) {
    Map<String, HarmonicFit> fits = new LinkedHashMap<>();
    for (Capture.Channel c : capture.channels()) {
      double[] t = capture.time().first(extent.samples());
      for (int k = 0; k < t.length && c.lateS() != 0; k++) {
        t[k] += c.lateS();
      }
      fits.put(c.quantity(), fit(capture.of(c), t, extent));
    }
    for (Channels.Sum sum : Channels.sums(List.copyOf(fits.keySet()))) {
      fits.put(
          sum.quantity(),
          fit(samples(capture, sum), capture.time().first(extent.samples()), extent));
    }
    double reference =
        Channels.reference(List.copyOf(fits.keySet()))
            .map(q -> java.util.Objects.requireNonNull(fits.get(q)).at(1).degrees())
            .orElse(0.0);
    Map<String, ChannelFigures> figures = new LinkedHashMap<>();
    fits.forEach(
        (quantity, f) ->
            figures.put(
                quantity,
                new ChannelFigures(
                    f.direct(), f.peak(), f.alternatingRms(), f.spectrum(reference))));
    return new Channels(
        figures,
        (a, b) ->
            java.util.Objects.requireNonNull(fits.get(a))
                .activePower(java.util.Objects.requireNonNull(fits.get(b))));
  }

  private static HarmonicFit fit(Samples x, double[] timesS, Extent extent) {
    int n = extent.samples();
    return HarmonicFit.of(timesS, x.first(n), n, extent.frequencyHz(), extent.orders());
  }

  /** Sample by sample the sum of channels. */
  static Samples samples(Capture capture, Channels.Sum sum) {
    List<Samples> of = new ArrayList<>();
    sum.of().forEach(q -> of.add(capture.find(q).orElseThrow()));
    return Samples.sum(of, sum.factors().stream().mapToDouble(f -> f).toArray());
  }
}
