package fourthwire.network;

import java.util.Arrays;

/**
 * How well a solution obeys the laws it was not computed from: each residual relative to the
 * largest amount of its kind at that order, 0 where there is none.
 *
 * @param currentLaw Kirchhoff's current law at every conductor of every node, relative to the
 *     largest current
 * @param voltageLaw potential drop over every feeder, transformer and the source, relative to the
 *     largest potential
 * @param power complex power of the source and the injections less that of every impedance and
 *     admittance, relative to the sum of their magnitudes
 */
public record SolutionCheck(double currentLaw, double voltageLaw, double power) {
  /** The largest of the residuals. */
  public double worst() {
    return Math.max(currentLaw, Math.max(voltageLaw, power));
  }

  static SolutionCheck of(
      Layout layout, Elimination factors, double order, Excitation excitation, OrderSolution s) {
    return new Run(layout, factors, order, excitation, s).result();
  }

  /** The sums as they build up over the nodes. */
  private static final class Run {
    private final Layout layout;
    private final Elimination factors;
    private final double order;
    private final Excitation excitation;
    private final OrderSolution solution;

    /** Currents that leave each conductor less those that enter it. */
    private final double[] leaving;

    private double largestDrop;
    private double powerRe;
    private double powerIm;
    private double powerSum;

    Run(
        Layout layout,
        Elimination factors,
        double order,
        Excitation excitation,
        OrderSolution solution) {
      this.layout = layout;
      this.factors = factors;
      this.order = order;
      this.excitation = excitation;
      this.solution = solution;
      leaving = new double[solution.current.length];
    }

    SolutionCheck result() {
      double largestCurrent = Math.max(largest(solution.current), largest(excitation.injected));
      for (int n = layout.nodes - 1; n >= 0; n--) {
        addShunts(n);
        addFeed(n);
      }
      for (int k = 0; k < leaving.length; k++) {
        leaving[k] -= excitation.injected[k];
      }
      countPower(excitation.injected, solution.potential, leaving.length, 1);
      countPower(solution.current, excitation.emf, excitation.emf.length, 1);
      double potential = Math.max(largest(solution.potential), largest(excitation.emf));
      return new SolutionCheck(
          ratio(largest(leaving), largestCurrent),
          ratio(largestDrop, potential),
          ratio(Math.hypot(powerRe, powerIm), powerSum));
    }

    private void addShunts(int n) {
      int size = layout.size(n);
      double[] y = new double[2 * size * size];
      Stamp stamp = new Stamp().on(y, 0, size);
      for (int k = layout.firstShunt[n]; k < layout.firstShunt[n + 1]; k++) {
        stamp.add(layout.shunts[k], order);
      }
      double[] taken = new double[2 * size];
      int at = 2 * layout.first[n];
      Blocks.addProduct(1, y, 0, size, solution.potential, at, taken, 0);
      double[] v = Arrays.copyOfRange(solution.potential, at, at + 2 * size);
      for (int k = 0; k < 2 * size; k++) {
        leaving[at + k] += taken[k];
      }
      countPower(taken, v, 2 * size, -1);
    }

    private void addFeed(int n) {
      int size = layout.size(n);
      int at = 2 * layout.first[n];
      double[] current = Arrays.copyOfRange(solution.current, at, at + 2 * size);
      double[] drop = drop(n, current);
      double[] ideal = ideal(n);
      for (int k = 0; k < 2 * size; k++) {
        leaving[at + k] -= current[k];
        double residual = ideal[k] - drop[k] - solution.potential[at + k];
        largestDrop = Math.max(largestDrop, Math.abs(residual));
      }
      countPower(current, drop, 2 * size, -1);
      if (n > 0) {
        leaveParent(n, current);
      }
    }

    private double[] drop(int n, double[] current) {
      int size = layout.size(n);
      double[] drop = new double[2 * size];
      if (!layout.isFeeder(n)) {
        Blocks.addProduct(1, factors.denseImpedance(n), 0, size, current, 0, drop, 0);
        return drop;
      }
      for (int k = 0; k < size; k++) {
        double re = factors.resistance(layout.first[n] + k);
        double im = factors.reactance(layout.first[n] + k);
        drop[2 * k] = re * current[2 * k] - im * current[2 * k + 1];
        drop[2 * k + 1] = re * current[2 * k + 1] + im * current[2 * k];
      }
      return drop;
    }

    private double[] ideal(int n) {
      double[] ideal = new double[2 * layout.size(n)];
      if (n == 0) {
        System.arraycopy(excitation.emf, 0, ideal, 0, ideal.length);
        return ideal;
      }
      int parentFirst = layout.first[layout.parent[n]];
      int parentSize = layout.size(layout.parent[n]);
      for (int k = 0; k < layout.size(n); k++) {
        for (int m = 0; m < parentSize; m++) {
          double factor = layout.coupling(n, k, m);
          ideal[2 * k] += factor * solution.potential[2 * (parentFirst + m)];
          ideal[2 * k + 1] += factor * solution.potential[2 * (parentFirst + m) + 1];
        }
      }
      return ideal;
    }

    private void leaveParent(int n, double[] current) {
      int parentFirst = layout.first[layout.parent[n]];
      int parentSize = layout.size(layout.parent[n]);
      for (int k = 0; k < layout.size(n); k++) {
        for (int m = 0; m < parentSize; m++) {
          double factor = layout.coupling(n, k, m);
          leaving[2 * (parentFirst + m)] += factor * current[2 * k];
          leaving[2 * (parentFirst + m) + 1] += factor * current[2 * k + 1];
        }
      }
    }

    /** Adds Σ V·I*, conductor by conductor. */
    private void countPower(double[] current, double[] potential, int length, double sign) {
      for (int k = 0; k < length; k += 2) {
        double re = potential[k] * current[k] + potential[k + 1] * current[k + 1];
        double im = potential[k + 1] * current[k] - potential[k] * current[k + 1];
        powerRe += sign * re;
        powerIm += sign * im;
        powerSum += Math.hypot(re, im);
      }
    }

    private static double largest(double[] phasors) {
      double largest = 0;
      for (int k = 0; k < phasors.length; k += 2) {
        largest = Math.max(largest, Math.hypot(phasors[k], phasors[k + 1]));
      }
      return largest;
    }

    private static double ratio(double residual, double scale) {
      return residual == 0 ? 0 : residual / scale;
    }
  }
}
