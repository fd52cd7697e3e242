package fourthwire.audit.solve;

import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;

/**
 * Finds a load's slope by small steps of its electromotive force, from where it was solved last.
 */
final class SlopeFinder {
  private static final double THIRD = 2 * Math.PI / 3;

  private final LoadSolver solver;
  private final PortSpectra emf;
  private final PortSpectra drawn;
  private final SeriesOhms series;

  /**
   * A finder.
   *
   * @param emf at which the load was solved last
   * @param drawn what it drew then; used as a work block
   */
  SlopeFinder(LoadSolver solver, PortSpectra emf, PortSpectra drawn, SeriesOhms series) {
    this.solver = solver;
    this.emf = emf;
    this.drawn = drawn;
    this.series = series;
  }

  /**
   * Finds the slope. Of a load on three lines only the first line's columns are stepped: turning
   * all by a third of a cycle gives the others, exactly on a balanced voltage and mostly well
   * enough to iterate with on any other.
   *
   * @param step volts
   * @param wholly steps all lines' columns
   */
  void find(OrdersInPlay orders, double step, boolean wholly, DeviceSlope slope) {
    int size = slope.size();
    double[] before = new double[size];
    double[] after = new double[size];
    orders.copy(drawn, before, 0);
    int columns = wholly ? size : size / emf.ports();
    for (int column = 0; column < columns; column++) {
      int port = column / (2 * orders.count());
      double[] part = column % 2 == 0 ? emf.re[port] : emf.im[port];
      double taken = stepped(part, orders.at(column / 2 % orders.count()), step);
      if (taken != 0) {
        orders.copy(drawn, after, 0);
        for (int row = 0; row < size; row++) {
          slope.set(row, column, (after[row] - before[row]) / taken);
        }
      }
    }
    for (int port = 1; port < emf.ports() && !wholly; port++) {
      turn(slope, orders, port);
    }
  }

  /**
   * Solves with one part of the electromotive force stepped, forwards, else backwards; 0 where the
   * load has no steady state on either side: that part then counts as not felt, which costs passes
   * and no exactness.
   */
  private double stepped(double[] part, int order, double step) {
    double unstepped = part[order];
    for (double signed : new double[] {step, -step}) {
      part[order] = unstepped + signed;
      try {
        solver.solve(emf, series.ohm(), series.henry(), drawn);
        return signed;
      } catch (NoSteadyStateException onThisSide) {
        // The other side is tried.
      } finally {
        part[order] = unstepped;
      }
    }
    return 0;
  }

  /** Columns of a port from those of the port before: delayed by a third of a cycle. */
  private void turn(DeviceSlope slope, OrdersInPlay orders, int port) {
    int perPort = 2 * orders.count();
    for (int row = 0; row < orders.count(); row++) {
      for (int column = 0; column < orders.count(); column++) {
        double out = -orders.at(row) * THIRD;
        double in = -orders.at(column) * THIRD;
        for (int line = 0; line < emf.ports(); line++) {
          int fromRow = Math.floorMod(line - 1, emf.ports()) * perPort + 2 * row;
          int fromColumn = (port - 1) * perPort + 2 * column;
          turnBlock(
              slope,
              fromRow,
              fromColumn,
              line * perPort + 2 * row,
              port * perPort + 2 * column,
              out,
              in);
        }
      }
    }
  }

  /** A two-by-two block B becomes T(out)·B·T(-in), T turning a phasor. */
  private static void turnBlock(
      DeviceSlope s, int fromRow, int fromColumn, int row, int column, double out, double in) {
    double a = s.get(fromRow, fromColumn);
    double b = s.get(fromRow, fromColumn + 1);
    double c = s.get(fromRow + 1, fromColumn);
    double d = s.get(fromRow + 1, fromColumn + 1);
    double co = Math.cos(out);
    double so = Math.sin(out);
    double ci = Math.cos(in);
    double si = Math.sin(in);
    double topRe = co * a - so * c;
    double topIm = co * b - so * d;
    double lowRe = so * a + co * c;
    double lowIm = so * b + co * d;
    s.set(row, column, topRe * ci - topIm * si);
    s.set(row, column + 1, topRe * si + topIm * ci);
    s.set(row + 1, column, lowRe * ci - lowIm * si);
    s.set(row + 1, column + 1, lowRe * si + lowIm * ci);
  }
}
