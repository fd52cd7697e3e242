package fourthwire.metering.capture.window;

import fourthwire.quantity.Phasor;

/** What windows come to over one interval: roots of mean squares (IEC 61000-4-30:2015, 4.5). */
public final class Interval {
  /** Lengths of the standard. */
  public enum Length {
    /** 150 or 180 cycles, 3 s. */
    VERY_SHORT,
    /** Ten minutes of the clock. */
    TEN_MINUTES,
    /** Two hours of the clock. */
    TWO_HOURS
  }

  private final WindowPlan plan;
  private final Length length;
  private final int fromCycle;
  private final int toCycle;
  private final WindowSums sums;

  Interval(WindowPlan plan, Intervals.Stretch stretch, WindowSums sums) {
    this(plan, Length.VERY_SHORT, stretch.fromCycle(), stretch.toCycle(), sums);
  }

  Interval(WindowPlan plan, Length length, int fromCycle, int toCycle, WindowSums sums) {
    this.plan = plan;
    this.length = length;
    this.fromCycle = fromCycle;
    this.toCycle = toCycle;
    this.sums = sums;
  }

  /** Which length it is of. */
  public Length length() {
    return length;
  }

  /** When it begins, seconds after the first sample. */
  public double fromS() {
    return plan.position(fromCycle) / plan.rateHz();
  }

  /** When it ends, likewise. */
  public double toS() {
    return plan.position(toCycle) / plan.rateHz();
  }

  /** Mean frequency. */
  public double frequencyHz() {
    return sums.cycles / sums.seconds;
  }

  /** Rms of a signal, without the direct component. */
  public double rms(int signal) {
    return sums.rms(signal);
  }

  /** Rms of an order, at its mean angle. */
  public Phasor order(int signal, int order) {
    return sums.order(signal, order);
  }

  int fromCycle() {
    return fromCycle;
  }

  int toCycle() {
    return toCycle;
  }

  int windows() {
    return sums.fullWindows;
  }

  WindowSums sums() {
    return sums;
  }
}
