package fourthwire.metering.capture.window;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;

/**
 * Sums over windows, each weighted by its cycles, of what aggregation takes the root mean square of
 * (IEC 61000-4-30:2015, 4.4 and 4.5). A hot-path work block: filled in place while windows pass.
 */
final class WindowSums {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER + 1;

  final double[] direct;
  final double[] square;
  final double[][] orderSquare;
  final double[][] re;
  final double[][] im;
  final double[][] binSquare;
  final double[] products;
  double cycles;
  double seconds;
  int fullWindows;

  WindowSums(int signals, int pairs, int bins) {
    this.direct = new double[signals];
    this.square = new double[signals];
    this.orderSquare = new double[signals][ORDERS];
    this.re = new double[signals][ORDERS];
    this.im = new double[signals][ORDERS];
    this.binSquare = new double[signals][bins];
    this.products = new double[pairs];
  }

  /** Adds another's windows. */
  void add(WindowSums other) {
    addOrders(other);
    for (int s = 0; s < direct.length; s++) {
      add(binSquare[s], other.binSquare[s]);
    }
  }

  /** Adds all but the bins. */
  void addOrders(WindowSums other) {
    add(direct, other.direct);
    add(square, other.square);
    add(products, other.products);
    for (int s = 0; s < direct.length; s++) {
      add(orderSquare[s], other.orderSquare[s]);
      add(re[s], other.re[s]);
      add(im[s], other.im[s]);
    }
    cycles += other.cycles;
    seconds += other.seconds;
    fullWindows += other.fullWindows;
  }

  private static void add(double[] into, double[] x) {
    for (int k = 0; k < x.length; k++) {
      into[k] += x[k];
    }
  }

  /** The same without the bins, for what is kept of every interval. */
  WindowSums withoutBins() {
    WindowSums kept = new WindowSums(direct.length, products.length, 0);
    kept.addOrders(this);
    return kept;
  }

  double direct(int signal) {
    return direct[signal] / cycles;
  }

  /** Rms without the direct component. */
  double rms(int signal) {
    double mean = direct(signal);
    return Math.sqrt(Math.max(0, square[signal] / cycles - mean * mean));
  }

  /** Rms of an order over the windows, at its mean angle; t = 0 where a window begins. */
  Phasor order(int signal, int h) {
    double magnitude = Math.sqrt(orderSquare[signal][h] / cycles);
    double length = Math.hypot(re[signal][h], im[signal][h]);
    return length > 0
        ? new Phasor(re[signal][h], im[signal][h]).times(magnitude / length)
        : Phasor.ZERO;
  }

  /** Mean product of two signals that were paired. */
  double product(int pair) {
    return products[pair] / cycles;
  }
}
