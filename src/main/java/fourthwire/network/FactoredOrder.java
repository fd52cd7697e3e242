package fourthwire.network;

/**
 * A network eliminated at one order, to be solved for any number of excitations. Immutable: several
 * threads may solve at once, each with its own excitation and solution.
 */
public final class FactoredOrder {
  private final Layout layout;
  private final double order;
  private final Elimination factors;

  FactoredOrder(Layout layout, double order) {
    this.layout = layout;
    this.order = order;
    factors = new Elimination(layout, order);
    factors.run();
  }

  /** The order. */
  public double order() {
    return order;
  }

  /** Solves for an excitation, into a new solution. */
  public OrderSolution solve(Excitation excitation) {
    OrderSolution solution = new OrderSolution(excitation.network(), layout.largest);
    solve(excitation, solution);
    return solution;
  }

  /**
   * Solves for an excitation, into a solution of the same network made before; nothing is
   * allocated.
   */
  public void solve(Excitation excitation, OrderSolution into) {
    if (excitation.network().layout() != layout || into.network().layout() != layout) {
      throw new IllegalArgumentException("the excitation or the solution is another network's");
    }
    System.arraycopy(excitation.injected, 0, into.current, 0, into.current.length);
    for (int n = layout.nodes - 1; n > 0; n--) {
      condense(n, into);
      passUp(n, into.current);
    }
    condense(0, into);
    System.arraycopy(excitation.emf, 0, into.potential, 0, excitation.emf.length);
    descend(0, into);
    for (int n = 1; n < layout.nodes; n++) {
      takeIdealPotential(n, into.potential);
      descend(n, into);
    }
  }

  /** J becomes S = J - Q·Z·J, in place. */
  private void condense(int n, OrderSolution s) {
    switch (layout.role[n]) {
      case Layout.PAIR -> condensePair(n, s.current);
      case Layout.FULL -> {
        int at = 2 * layout.first[n];
        clear(s.work, 2 * layout.size(n));
        addImpedanceTimes(1, n, s.current, s.work, 0);
        Blocks.addProduct(
            -1, factors.blocks, layout.block[n], layout.size(n), s.work, 0, s.current, at);
      }
      default -> {
        // Q = 0: S = J
      }
    }
  }

  private void condensePair(int n, double[] j) {
    int from = 2 * layout.pairFrom[n];
    int to = 2 * layout.pairTo[n];
    double[] z = factors.series;
    double re =
        z[from] * j[from] - z[from + 1] * j[from + 1] - z[to] * j[to] + z[to + 1] * j[to + 1];
    double im =
        z[from] * j[from + 1] + z[from + 1] * j[from] - z[to] * j[to + 1] - z[to + 1] * j[to];
    addPairCurrent(n, -1, re, im, j, from, to);
  }

  private void addPairCurrent(
      int n, double sign, double re, double im, double[] current, int from, int to) {
    double qRe = sign * factors.blocks[layout.block[n]];
    double qIm = sign * factors.blocks[layout.block[n] + 1];
    double addRe = qRe * re - qIm * im;
    double addIm = qRe * im + qIm * re;
    current[from] += addRe;
    current[from + 1] += addIm;
    current[to] -= addRe;
    current[to + 1] -= addIm;
  }

  /** The parent's injection grows by Aᵀ·S. */
  private void passUp(int n, double[] current) {
    int first = layout.first[n];
    int end = layout.first[n + 1];
    if (layout.isFeeder(n)) {
      for (int k = first; k < end; k++) {
        int to = 2 * layout.joinedTo[k];
        current[to] += current[2 * k];
        current[to + 1] += current[2 * k + 1];
      }
      return;
    }
    double[] a = layout.turns[layout.transformerOf[n]];
    int parentFirst = layout.first[layout.parent[n]];
    int parentEnd = layout.first[layout.parent[n] + 1];
    int at = 0;
    for (int k = first; k < end; k++) {
      for (int to = parentFirst; to < parentEnd; to++) {
        current[2 * to] += a[at] * current[2 * k];
        current[2 * to + 1] += a[at] * current[2 * k + 1];
        at++;
      }
    }
  }

  /** U = A·V of the parent, into the node's place in the potentials. */
  private void takeIdealPotential(int n, double[] v) {
    int first = layout.first[n];
    int end = layout.first[n + 1];
    if (layout.isFeeder(n)) {
      for (int k = first; k < end; k++) {
        int from = 2 * layout.joinedTo[k];
        v[2 * k] = v[from];
        v[2 * k + 1] = v[from + 1];
      }
      return;
    }
    double[] a = layout.turns[layout.transformerOf[n]];
    int parentFirst = layout.first[layout.parent[n]];
    int parentEnd = layout.first[layout.parent[n] + 1];
    int at = 0;
    for (int k = first; k < end; k++) {
      double re = 0;
      double im = 0;
      for (int from = parentFirst; from < parentEnd; from++) {
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
    switch (layout.role[n]) {
      case Layout.PAIR -> {
        int a = 2 * layout.pairFrom[n];
        int b = 2 * layout.pairTo[n];
        double[] u = s.potential;
        addPairCurrent(n, 1, u[a] - u[b], u[a + 1] - u[b + 1], s.current, a, b);
      }
      case Layout.FULL ->
          Blocks.addProduct(
              1,
              factors.blocks,
              layout.block[n],
              layout.size(n),
              s.potential,
              from,
              s.current,
              from);
      default -> {
        // Q = 0: I = -S
      }
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
    double[] z = factors.series;
    int shift = yAt - at;
    for (int k = at; k < 2 * layout.first[n + 1]; k += 2) {
      y[k + shift] += sign * (z[k] * x[k] - z[k + 1] * x[k + 1]);
      y[k + shift + 1] += sign * (z[k] * x[k + 1] + z[k + 1] * x[k]);
    }
  }

  private static void clear(double[] work, int length) {
    for (int k = 0; k < length; k++) {
      work[k] = 0;
    }
  }

  /** The impedance between a node's conductors and earth, as an injected current meets it. */
  public DrivingPoint drivingPoint(int node) {
    return new DrivingPoints(layout, factors).at(node);
  }

  /** The driving-point impedances of every node, worked out once, in linear time. */
  public DrivingPoints drivingPoints() {
    DrivingPoints all = new DrivingPoints(layout, factors);
    all.all();
    return all;
  }

  /** Kirchhoff's laws and the balance of power of a solution of this order. */
  public SolutionCheck check(Excitation excitation, OrderSolution solution) {
    return SolutionCheck.of(layout, factors, order, excitation, solution);
  }
}
