package fourthwire.metering.capture;

import fourthwire.metering.capture.wave.Extremes;
import fourthwire.metering.capture.window.PhaseTrack;
import fourthwire.metering.capture.window.Signal;
import fourthwire.metering.capture.window.WindowAnalysis;
import fourthwire.quantity.Spectrum;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Channels of a record that holds standard windows. */
final class WindowChannels {
  private static final long TWO_HOURS_S = 7200;

  private WindowChannels() {}

  static WindowAnalysis analysis(Capture capture, Extent extent, PhaseTrack track) {
    List<String> names = capture.channels().stream().map(Capture.Channel::quantity).toList();
    List<Signal> sums = new ArrayList<>();
    for (Channels.Sum s : Channels.sums(names)) {
      sums.add(new Signal(s.quantity(), s.of().stream().map(names::indexOf).toList(), s.factors()));
    }
    List<String> all = new ArrayList<>(names);
    sums.forEach(s -> all.add(s.quantity()));
    return WindowAnalysis.of(
        new WindowAnalysis.Request(
            capture.channels().stream()
                .map(c -> new Signal.Channel(c.quantity(), capture.of(c), c.lateS()))
                .toList(),
            sums,
            Channels.products(all),
            track,
            capture.time().rateHz().orElseThrow(),
            extent.standardCycles(),
            extent.cycles(),
            capture.start().map(WindowChannels::secondsToEvenHour).orElse(0.0)));
  }

  /** From a moment to the next full even hour (UTC): two hours begin there (IEC 61000-4-30). */
  private static double secondsToEvenHour(Instant at) {
    double into = Math.floorMod(at.getEpochSecond(), TWO_HOURS_S) + at.getNano() * 1e-9;
    return into == 0 ? 0 : TWO_HOURS_S - into;
  }

  static Channels of(WindowAnalysis windows, Capture capture) {
    Map<String, Double> peaks = new LinkedHashMap<>();
    for (Capture.Channel c : capture.channels()) {
      peaks.put(c.quantity(), peak(windows, c.quantity(), capture.of(c).extremes()));
    }
    for (Channels.Sum s : Channels.sums(List.copyOf(peaks.keySet()))) {
      // Only the sum of currents is shown with its crest.
      boolean shown = s.quantity().equals(Channels.SUM);
      peaks.put(
          s.quantity(),
          shown ? peak(windows, s.quantity(), FitChannels.samples(capture, s).extremes()) : 0.0);
    }
    double turn =
        Channels.reference(List.copyOf(peaks.keySet()))
            .map(q -> windows.order(q, 1).degrees())
            .orElse(0.0);
    Map<String, ChannelFigures> figures = new LinkedHashMap<>();
    peaks.forEach(
        (q, peak) ->
            figures.put(
                q,
                new ChannelFigures(
                    windows.direct(q),
                    peak,
                    windows.rms(q),
                    Spectrum.of(h -> windows.order(q, h).turned(-h * turn)))));
    return new Channels(figures, windows::product);
  }

  private static double peak(WindowAnalysis windows, String quantity, Extremes e) {
    double direct = windows.direct(quantity);
    return Math.max(Math.abs(e.highest() - direct), Math.abs(e.lowest() - direct));
  }
}
