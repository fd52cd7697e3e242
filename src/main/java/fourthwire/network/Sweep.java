package fourthwire.network;

import java.util.Arrays;

/**
 * The two sweeps of a solution after elimination (see {@link Elimination}): injections are gathered
 * from the leaves to the source, S = J - Q·Z·J; potentials and currents follow from the source to
 * the leaves, U = A·V<sub>parent</sub>, I = Q·U - S, V = U - Z·I. All in the solution's own arrays:
 * the currents hold J, then S, then I; the potentials hold U, then V.
 *
 * <p>Circuits, the many leaves, are swept conductor by conductor. Their J is read where it was
 * injected. A pair with the admittance q (see {@link Elimination}) sees the voltage w that would
 * stand across it without its own current, and draws q·w.
 */
final class Sweep {
  private final Layout layout;
  private final Plan plan;
  private final Elimination factors;

  Sweep(Layout layout, Plan plan, Elimination factors) {
    this.layout = layout;
    this.plan = plan;
    this.factors = factors;
  }

  void run(Excitation excitation, OrderSolution s) {
    double[] injected = excitation.injected;
    for (int k = 0; k < plan.span.length - 1; k++) {
      int n = plan.span[k];
      if (!plan.isSimple(n)) {
        int at = 2 * layout.first[n];
        System.arraycopy(injected, at, s.current, at, 2 * layout.size(n));
      }
    }
    for (int k = plan.span.length - 2; k >= 0; k--) {
      int n = plan.span[k];
      if (plan.isSimple(n)) {
        gatherCircuits(k, injected, s.current);
      } else {
        gather(n, s);
      }
    }
    System.arraycopy(excitation.emf, 0, s.potential, 0, excitation.emf.length);
    descend(0, s);
    for (int k = 1; k < plan.span.length - 1; k++) {
      int n = plan.span[k];
      if (plan.isSimple(n)) {
        descendCircuits(k, injected, s);
      } else {
        takeIdealPotential(n, s.potential);
        descend(n, s);
      }
    }
  }

  /** Likewise over a part of the nodes, the others carrying no injection. */
  void run(Excitation excitation, OrderSolution s, Trunk trunk) {
    int[] nodes = trunk.nodes;
    for (int n : nodes) {
      int at = 2 * layout.first[n];
      System.arraycopy(excitation.injected, at, s.current, at, 2 * layout.size(n));
    }
    for (int k = nodes.length - 1; k >= 0; k--) {
      if (plan.role[nodes[k]] == Plan.PAIR) {
        gatherPair(nodes[k], s.current, s.current);
      }
      gather(nodes[k], s);
    }
    System.arraycopy(excitation.emf, 0, s.potential, 0, excitation.emf.length);
    for (int n : nodes) {
      if (n > 0) {
        takeIdealPotential(n, s.potential);
      }
      descend(n, s);
      if (plan.role[n] == Plan.PAIR) {
        descendPair(n, s.potential, s.current);
      }
    }
  }

  private void gatherCircuits(int span, double[] injected, double[] current) {
    int end = layout.first[plan.span[span + 1]];
    passUp(layout.first[plan.span[span]], end, injected, current);
    for (int p = plan.firstPairOfSpan[span]; p < plan.firstPairOfSpan[span + 1]; p++) {
      gatherPair(plan.pairs[p], injected, current);
    }
  }

  /** A pair takes q·(z_a·J_a - z_b·J_b) off what its circuit injects. */
  private void gatherPair(int n, double[] injected, double[] current) {
    int a = plan.pairFrom[n];
    int b = plan.pairTo[n];
    double re =
        factors.resistance(a) * injected[2 * a]
            - factors.reactance(a) * injected[2 * a + 1]
            - factors.resistance(b) * injected[2 * b]
            + factors.reactance(b) * injected[2 * b + 1];
    double im =
        factors.resistance(a) * injected[2 * a + 1]
            + factors.reactance(a) * injected[2 * a]
            - factors.resistance(b) * injected[2 * b + 1]
            - factors.reactance(b) * injected[2 * b];
    double qRe = factors.blocks[plan.block[n]];
    double qIm = factors.blocks[plan.block[n] + 1];
    double drawnRe = qRe * re - qIm * im;
    double drawnIm = qRe * im + qIm * re;
    int from = 2 * layout.joinedTo[a];
    int to = 2 * layout.joinedTo[b];
    current[from] -= drawnRe;
    current[from + 1] -= drawnIm;
    current[to] += drawnRe;
    current[to + 1] += drawnIm;
  }

  /** Adds feeder conductors' S to what they are joined to. */
  private void passUp(int firstConductor, int endConductor, double[] from, double[] current) {
    int[] joinedTo = layout.joinedTo;
    for (int k = firstConductor; k < endConductor; k++) {
      int to = 2 * joinedTo[k];
      current[to] += from[2 * k];
      current[to + 1] += from[2 * k + 1];
    }
  }

  /** V and I of circuits: as if without admittance, then what each pair draws besides. */
  private void descendCircuits(int span, double[] injected, OrderSolution s) {
    double[] v = s.potential;
    double[] i = s.current;
    int end = layout.first[plan.span[span + 1]];
    for (int k = layout.first[plan.span[span]]; k < end; k++) {
      int from = 2 * layout.joinedTo[k];
      double r = factors.resistance(k);
      double x = factors.reactance(k);
      double re = injected[2 * k];
      double im = injected[2 * k + 1];
      v[2 * k] = v[from] + r * re - x * im;
      v[2 * k + 1] = v[from + 1] + r * im + x * re;
      i[2 * k] = -re;
      i[2 * k + 1] = -im;
    }
    for (int p = plan.firstPairOfSpan[span]; p < plan.firstPairOfSpan[span + 1]; p++) {
      descendPair(plan.pairs[p], v, i);
    }
  }

  private void descendPair(int n, double[] v, double[] i) {
    int a = plan.pairFrom[n];
    int b = plan.pairTo[n];
    double re = v[2 * a] - v[2 * b];
    double im = v[2 * a + 1] - v[2 * b + 1];
    double qRe = factors.blocks[plan.block[n]];
    double qIm = factors.blocks[plan.block[n] + 1];
    double drawnRe = qRe * re - qIm * im;
    double drawnIm = qRe * im + qIm * re;
    addCurrent(a, drawnRe, drawnIm, v, i);
    addCurrent(b, -drawnRe, -drawnIm, v, i);
  }

  private void addCurrent(int conductor, double re, double im, double[] v, double[] i) {
    double r = factors.resistance(conductor);
    double x = factors.reactance(conductor);
    int at = 2 * conductor;
    i[at] += re;
    i[at + 1] += im;
    v[at] -= r * re - x * im;
    v[at + 1] -= r * im + x * re;
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
      passUp(layout.first[n], layout.first[n + 1], s.current, s.current);
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

  /** y += sign·Z·I with the node's currents; y from yAt. */
  private void addImpedanceTimes(double sign, int n, double[] current, double[] y, int yAt) {
    int at = 2 * layout.first[n];
    if (!layout.isFeeder(n)) {
      Blocks.addProduct(sign, factors.denseImpedance(n), 0, layout.size(n), current, at, y, yAt);
      return;
    }
    for (int k = 0; k < layout.size(n); k++) {
      double r = sign * factors.resistance(layout.first[n] + k);
      double x = sign * factors.reactance(layout.first[n] + k);
      double re = current[at + 2 * k];
      double im = current[at + 2 * k + 1];
      y[yAt + 2 * k] += r * re - x * im;
      y[yAt + 2 * k + 1] += r * im + x * re;
    }
  }
}
