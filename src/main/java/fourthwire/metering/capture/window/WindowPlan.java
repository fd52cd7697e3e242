package fourthwire.metering.capture.window;

import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.List;

/**
 * How a record is cut into windows and what is formed in each.
 *
 * @param band the channels
 * @param late of each channel, samples after the common instant
 * @param signals what is analysed: the channels, and sums of them
 * @param pairs signals whose mean product is wanted
 * @param track the fundamental's clock
 * @param rateHz samples a second
 * @param cycles of a full window: 10 at 50 Hz, 12 at 60 Hz
 * @param totalCycles whole cycles in the record
 * @param orders highest order that the sampling resolves, at most 50
 * @param resampler reads the channels at a window's points
 */
record WindowPlan(
    Band band,
    List<Double> late,
    List<Signal> signals,
    List<Pair> pairs,
    PhaseTrack track,
    double rateHz,
    int cycles,
    int totalCycles,
    int orders,
    Resampler resampler) {
  /** What a sampled signal can hold: a hair less than half a cycle a sample. */
  private static final double HIGHEST = 0.4935;

  /**
   * Orders fitted beyond the ends: all where samples are few; where they stand close, repeating the
   * nearest does for the higher ones.
   */
  private static final double FITTED_SAMPLES = 6400;

  private static final int FITTED_LEAST = 15;

  /** Two signals by index. */
  record Pair(int first, int second) {}

  static WindowPlan of(
      List<Signal.Channel> channels,
      List<Signal> sums,
      List<List<String>> products,
      PhaseTrack track,
      double rateHz,
      int cycles,
      int totalCycles) {
    double samplesPerCycle = track.samplesPerCycle();
    int orders = orders(samplesPerCycle);
    double pass = (orders + 0.5) / samplesPerCycle;
    double folded = WindowPass.POINTS / (cycles * samplesPerCycle) - pass;
    Resampler resampler = Resampler.of(pass, Math.min(folded, 1 - pass));
    List<Signal> signals = new ArrayList<>();
    for (int c = 0; c < channels.size(); c++) {
      signals.add(Signal.of(channels.get(c).quantity(), c));
    }
    signals.addAll(sums);
    int beyond = resampler.reach() + (int) Math.ceil(samplesPerCycle / 10) + 4;
    Band band =
        new Band(
            channels.stream().map(Signal.Channel::samples).toList(),
            samplesPerCycle,
            beyond,
            Math.min(orders, Math.max(FITTED_LEAST, (int) (FITTED_SAMPLES / samplesPerCycle))));
    return new WindowPlan(
        band,
        channels.stream().map(c -> c.lateS() * rateHz).toList(),
        List.copyOf(signals),
        pairs(signals, products),
        track,
        rateHz,
        cycles,
        totalCycles,
        orders,
        resampler);
  }

  /** Highest order whose group still stands below half a cycle a sample. */
  static int orders(double samplesPerCycle) {
    return Math.min(Spectrum.HIGHEST_ORDER, (int) Math.floor(HIGHEST * samplesPerCycle - 0.5));
  }

  private static List<Pair> pairs(List<Signal> signals, List<List<String>> products) {
    List<String> names = signals.stream().map(Signal::quantity).toList();
    return products.stream()
        .map(p -> new Pair(names.indexOf(p.get(0)), names.indexOf(p.get(1))))
        .toList();
  }

  /** Bins of a full window up to the highest order's group. */
  int bins() {
    return orders * cycles + cycles / 2 + 1;
  }

  double lateSamples(int channel) {
    return late.get(channel);
  }

  /** Full windows in the record. */
  int windows() {
    return totalCycles / cycles;
  }

  WindowSums sums() {
    return new WindowSums(signals.size(), pairs.size(), bins());
  }

  /** Position where this cycle begins, from the first sample on. */
  double position(int cycle) {
    return track.positionAt(cycle);
  }
}
