package fourthwire.network;

import java.util.Arrays;

/**
 * The two sweeps of a solution after elimination (see {@link Elimination}): injections are gathered
 * from the leaves to the source, S = J - Q·Z·J; potentials and currents follow from the source to
 * the leaves, U = A·V<sub>parent</sub>, I = Q·U - S, V = U - Z·I. All in the solution's own arrays:
 * the currents hold J, then S, then I; the potentials hold U, then V.
 */
final class Sweep {
  private final Layout layout;
  private final Plan plan;
  private final Elimination factors;
  private final double[] series;

  Sweep(Layout layout, Plan plan, Elimination factors) {
    this.layout = layout;
    this.plan = plan;
    this.factors = factors;
    series = factors.series;
  }

  void run(Excitation excitation, OrderSolution s) {
    System.arraycopy(excitation.injected, 0, s.current, 0, s.current.length);
    for (int k = plan.span.length - 2; k >= 0; k--) {
      int n = plan.span[k];
      if (plan.isSimple(n)) {
        gatherRun(k, s.current);
      } else {
        gather(n, s);
      }
    }
    System.arraycopy(excitation.emf, 0, s.potential, 0, excitation.emf.length);
    descend(0, s);
    for (int k = 1; k < plan.span.length - 1; k++) {
      int n = plan.span[k];
      if (plan.isSimple(n)) {
        descendRun(k, s);
      } else {
        takeIdealPotential(n, s.potential);
        descend(n, s);
      }
    }
  }

  /** S of a run of simple feeders: J but for the pairs, which are leaves. */
  private void gatherRun(int span, double[] current) {
    for (int p = plan.firstPairOfSpan[span]; p < plan.firstPairOfSpan[span + 1]; p++) {
      condensePair(plan.pairs[p], current);
    }
    passUp(layout.first[plan.span[span]], layout.first[plan.span[span + 1]], current);
  }

  private void condensePair(int n, double[] j) {
    int a = 2 * plan.pairFrom[n];
    int b = 2 * plan.pairTo[n];
    double[] z = series;
    double re = z[a] * j[a] - z[a + 1] * j[a + 1] - z[b] * j[b] + z[b + 1] * j[b + 1];
    double im = z[a] * j[a + 1] + z[a + 1] * j[a] - z[b] * j[b + 1] - z[b + 1] * j[b];
    double qRe = factors.blocks[plan.block[n]];
    double qIm = factors.blocks[plan.block[n] + 1];
    double wRe = qRe * re - qIm * im;
    double wIm = qRe * im + qIm * re;
    j[a] -= wRe;
    j[a + 1] -= wIm;
    j[b] += wRe;
    j[b + 1] += wIm;
  }

  /** Adds feeder conductors' S to what they are joined to, the last conductor first. */
  private void passUp(int firstConductor, int endConductor, double[] current) {
    int[] joinedTo = layout.joinedTo;
    for (int k = endConductor - 1; k >= firstConductor; k--) {
      int to = 2 * joinedTo[k];
      current[to] += current[2 * k];
      current[to + 1] += current[2 * k + 1];
    }
  }

  /** V and I of a run: as if without admittance, then what each pair draws besides. */
  private void descendRun(int span, OrderSolution s) {
    int[] joinedTo = layout.joinedTo;
    double[] v = s.potential;
    double[] i = s.current;
    int end = 2 * layout.first[plan.span[span + 1]];
    for (int k = 2 * layout.first[plan.span[span]]; k < end; k += 2) {
      int from = 2 * joinedTo[k >> 1];
      double re = i[k];
      double im = i[k + 1];
      v[k] = v[from] + series[k] * re - series[k + 1] * im;
      v[k + 1] = v[from + 1] + series[k] * im + series[k + 1] * re;
      i[k] = -re;
      i[k + 1] = -im;
    }
    for (int p = plan.firstPairOfSpan[span]; p < plan.firstPairOfSpan[span + 1]; p++) {
      descendPair(plan.pairs[p], v, i);
    }
  }

  private void descendPair(int n, double[] v, double[] i) {
    int a = plan.pairFrom[n];
    int b = plan.pairTo[n];
    int from = 2 * layout.joinedTo[a];
    int to = 2 * layout.joinedTo[b];
    double uRe = v[from] - v[to];
    double uIm = v[from + 1] - v[to + 1];
    double qRe = factors.blocks[plan.block[n]];
    double qIm = factors.blocks[plan.block[n] + 1];
    addCurrent(2 * a, qRe * uRe - qIm * uIm, qRe * uIm + qIm * uRe, v, i);
    addCurrent(2 * b, qIm * uIm - qRe * uRe, -qRe * uIm - qIm * uRe, v, i);
  }

  private void addCurrent(int at, double re, double im, double[] v, double[] i) {
    i[at] += re;
    i[at + 1] += im;
    v[at] -= series[at] * re - series[at + 1] * im;
    v[at + 1] -= series[at] * im + series[at + 1] * re;
  }

  private void gather(int n, OrderSolution s) {
    if (plan.role[n] == Plan.FULL) {
      int at = 2 * layout.first[n];
      Arrays.fill(s.work, 0, 2 * layout.size(n), 0);
      addImpedanceTimes(1, n, s.current, s.work, 0);
      Blocks.addProduct(
          -1, factors.blocks, plan.block[n], layout.size(n), s.work, 0, s.current, at);
    }
    if (layout.isFeeder(n)) {
      passUp(layout.first[n], layout.first[n + 1], s.current);
    } else if (n > 0) {
      passUpTransformer(n, s.current);
    }
  }

  /** The parent's J grows by Aᵀ·S. */
  private void passUpTransformer(int n, double[] current) {
    double[] a = layout.turns[layout.transformerOf[n]];
    int parent = layout.parent[n];
    int at = 0;
    for (int k = layout.first[n]; k < layout.first[n + 1]; k++) {
      for (int to = layout.first[parent]; to < layout.first[parent + 1]; to++) {
        current[2 * to] += a[at] * current[2 * k];
        current[2 * to + 1] += a[at] * current[2 * k + 1];
        at++;
      }
    }
  }

  /** U = A·V of the parent, into the node's place in the potentials. */
  private void takeIdealPotential(int n, double[] v) {
    if (layout.isFeeder(n)) {
      for (int k = layout.first[n]; k < layout.first[n + 1]; k++) {
        int from = 2 * layout.joinedTo[k];
        v[2 * k] = v[from];
        v[2 * k + 1] = v[from + 1];
      }
      return;
    }
    double[] a = layout.turns[layout.transformerOf[n]];
    int parent = layout.parent[n];
    int at = 0;
    for (int k = layout.first[n]; k < layout.first[n + 1]; k++) {
      double re = 0;
      double im = 0;
      for (int from = layout.first[parent]; from < layout.first[parent + 1]; from++) {
        re += a[at] * v[2 * from];
        im += a[at] * v[2 * from + 1];
        at++;
      }
      v[2 * k] = re;
      v[2 * k + 1] = im;
    }
  }

  /** From S and U: I = Q·U - S, V = U - Z·I, in place. */
  private void descend(int n, OrderSolution s) {
    int from = 2 * layout.first[n];
    int to = 2 * layout.first[n + 1];
    for (int k = from; k < to; k++) {
      s.current[k] = -s.current[k];
    }
    if (plan.role[n] == Plan.FULL) {
      int size = layout.size(n);
      Blocks.addProduct(1, factors.blocks, plan.block[n], size, s.potential, from, s.current, from);
    }
    addImpedanceTimes(-1, n, s.current, s.potential, from);
  }

  /** y += sign·Z·x, x being a whole-network array, y from yAt. */
  private void addImpedanceTimes(double sign, int n, double[] x, double[] y, int yAt) {
    int at = 2 * layout.first[n];
    if (!layout.isFeeder(n)) {
      Blocks.addProduct(sign, factors.denseImpedance(n), 0, layout.size(n), x, at, y, yAt);
      return;
    }
    int shift = yAt - at;
    for (int k = at; k < 2 * layout.first[n + 1]; k += 2) {
      y[k + shift] += sign * (series[k] * x[k] - series[k + 1] * x[k + 1]);
      y[k + shift + 1] += sign * (series[k] * x[k + 1] + series[k + 1] * x[k]);
    }
  }
}
