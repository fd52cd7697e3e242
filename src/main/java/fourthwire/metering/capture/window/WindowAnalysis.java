package fourthwire.metering.capture.window;

import fourthwire.quantity.Phasor;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;

/**
 * A record in gapless synchronous windows from its first sample on, and what they come to over the
 * whole of it and over the standard intervals.
 *
 * <p>The whole cycles left after the last full window count in the figures of the whole record by
 * their number, and in nothing else; their orders are those of the full window that ends with them.
 */
public final class WindowAnalysis {
  /** Windows of a very short interval: 150 or 180 cycles, 3 s (IEC 61000-4-30:2015, 4.4). */
  static final int IN_VERY_SHORT = 15;

  private static final int AT_ONCE = 32;

  private final WindowPlan plan;
  private final WindowSums whole;
  private final List<Interval> intervals;

  private WindowAnalysis(WindowPlan plan, WindowSums whole, List<Interval> intervals) {
    this.plan = plan;
    this.whole = whole;
    this.intervals = List.copyOf(intervals);
  }

  /**
   * What is asked of a record.
   *
   * @param channels at least one
   * @param sums further signals, sample by sample sums of channels
   * @param products pairs of signals whose mean product is wanted
   * @param track the fundamental's clock
   * @param rateHz samples a second
   * @param cycles of a full window
   * @param secondsToEvenHour from the first sample to the next full even hour of the clock, from
   *     which ten minutes and two hours are counted both ways; 0 where the record has no clock
   */
  public record Request(
      List<Signal.Channel> channels,
      List<Signal> sums,
      List<List<String>> products,
      PhaseTrack track,
      double rateHz,
      int cycles,
      int totalCycles,
      double secondsToEvenHour) {}

  /** Analyses a record of at least one full window. */
  public static WindowAnalysis of(Request r) {
    WindowPlan plan =
        WindowPlan.of(
            r.channels(),
            r.sums(),
            r.products(),
            r.track(),
            r.rateHz(),
            r.cycles(),
            r.totalCycles());
    Intervals intervals = new Intervals(plan, r.secondsToEvenHour());
    WindowSums whole = plan.sums();
    List<Interval> kept = new ArrayList<>();
    List<Intervals.Stretch> stretches = intervals.stretches();
    for (int from = 0; from < stretches.size(); from += AT_ONCE) {
      List<Intervals.Stretch> some =
          stretches.subList(from, Math.min(stretches.size(), from + AT_ONCE));
      List<WindowSums> sums =
          IntStream.range(0, some.size())
              .parallel()
              .mapToObj(k -> sums(plan, some.get(k)))
              .toList();
      for (int k = 0; k < some.size(); k++) {
        whole.add(sums.get(k));
        kept.add(new Interval(plan, some.get(k), sums.get(k).withoutBins()));
      }
    }
    return new WindowAnalysis(plan, whole, intervals.standard(kept));
  }

  private static WindowSums sums(WindowPlan plan, Intervals.Stretch stretch) {
    WindowPass pass = new WindowPass(plan);
    WindowSums sums = plan.sums();
    int cycle = stretch.fromCycle();
    for (; cycle + plan.cycles() <= stretch.toCycle(); cycle += plan.cycles()) {
      pass.addFull(cycle, sums);
    }
    if (cycle < stretch.toCycle()) {
      pass.addRest(cycle, sums);
    }
    return sums;
  }

  /**
   * Highest order that windows of a sampling can hold, at most 50; below 1 where they hold none.
   *
   * @param samplesPerCycle of the fundamental
   */
  public static int ordersAt(double samplesPerCycle) {
    return WindowPlan.orders(samplesPerCycle);
  }

  /** Full windows. */
  public int windows() {
    return plan.windows();
  }

  /** Highest order that the sampling resolves, at most 50. */
  public int orders() {
    return plan.orders();
  }

  /** Mean of a signal over the whole record. */
  public double direct(String quantity) {
    return whole.direct(index(quantity));
  }

  /** Rms over the whole record, without the direct component. */
  public double rms(String quantity) {
    return whole.rms(index(quantity));
  }

  /** Rms of an order over the whole record, at its mean angle where windows begin. */
  public Phasor order(String quantity, int order) {
    return order > plan.orders() ? Phasor.ZERO : whole.order(index(quantity), order);
  }

  /** Mean product of a pair that was asked for, direct components left out. */
  public double product(String first, String second) {
    return whole.product(plan.pairs().indexOf(new WindowPlan.Pair(index(first), index(second))));
  }

  /** Groups of a signal. */
  public Groups groups(String quantity) {
    double[] sums = whole.binSquare[index(quantity)];
    double[] mean = Arrays.stream(sums).map(x -> x / whole.fullWindows).toArray();
    return new Groups(mean, plan.cycles(), plan.orders());
  }

  /** The standard intervals that lie whole within the record: 3 s, 10 min, 2 h. */
  public List<Interval> intervals() {
    return intervals;
  }

  private int index(String quantity) {
    for (int s = 0; s < plan.signals().size(); s++) {
      if (plan.signals().get(s).quantity().equals(quantity)) {
        return s;
      }
    }
    throw new IllegalArgumentException(quantity + " was not analysed");
  }
}
