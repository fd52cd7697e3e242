package fourthwire.metering.capture.window;

/**
 * Groups of a signal's lines, rms over all full windows, amps or volts (IEC 61000-4-7:2002+A1:2008,
 * 5.6 and annex A). Of order h: the harmonic group, the harmonic subgroup, and between h and h + 1
 * the interharmonic group and the centred interharmonic subgroup.
 */
public final class Groups {
  private final double[] meanSquare;
  private final int cycles;
  private final int orders;

  Groups(double[] meanSquare, int cycles, int orders) {
    this.meanSquare = meanSquare;
    this.cycles = cycles;
    this.orders = orders;
  }

  /** Highest order that has groups. */
  public int orders() {
    return orders;
  }

  /** Harmonic group of an order: half of the lines midway to its neighbours, all between. */
  public double group(int order) {
    int half = cycles / 2;
    int at = order * cycles;
    double edges = (meanSquare[at - half] + meanSquare[at + half]) / 2;
    return Math.sqrt(edges + sum(at - half + 1, at + half - 1));
  }

  /** Harmonic subgroup of an order: its line and the two beside it. */
  public double subgroup(int order) {
    return Math.sqrt(sum(order * cycles - 1, order * cycles + 1));
  }

  /** All lines between an order, from 0, and the next. */
  public double interharmonicGroup(int order) {
    return Math.sqrt(sum(order * cycles + 1, (order + 1) * cycles - 1));
  }

  /** Likewise without the two lines beside the orders, which belong to their subgroups. */
  public double interharmonicSubgroup(int order) {
    return Math.sqrt(sum(order * cycles + 2, (order + 1) * cycles - 2));
  }

  /** One line, at so many periods a window. */
  public double line(int bin) {
    return Math.sqrt(meanSquare[bin]);
  }

  private double sum(int from, int to) {
    double sum = 0;
    for (int k = from; k <= to; k++) {
      sum += meanSquare[k];
    }
    return sum;
  }
}
