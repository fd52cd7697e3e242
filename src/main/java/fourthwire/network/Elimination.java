package fourthwire.network;

import fourthwire.network.element.OrderLaw;
import fourthwire.network.element.Shunt;
import java.util.function.Function;

/**
 * Block elimination of one order, leaves first. A node's subtree, seen from what feeds it, is a
 * Norton equivalent I = Y·V - J; behind the impedance Z of what feeds it, whose ideal end has the
 * potential U, that becomes
 *
 * <pre>  I = Q·U - S,   Q = (1 + Y·Z)⁻¹·Y,   S = J - Q·Z·J,   V = U - Z·I</pre>
 *
 * which needs no inverse of Z or of Y: a feeder without impedance and a section without any
 * reference to earth are ordinary cases. Kept per node is Q alone; where nothing but injections
 * hangs below, Q = 0; where a leaf has one admittance y between two conductors, Q = q·e·eᵀ with e =
 * (1, -1) and q = y/(1 + y·(z_from + z_to)).
 */
final class Elimination {
  private final Layout layout;
  private final Plan plan;
  private final double order;
  private final Stamp stamp = new Stamp();
  private final double[] siemens = new double[6];
  private final double[] left;

  /** Resistance and reactance of every feeder's conductors, side by side. */
  private final double[] series;

  /** Impedance matrices of transformers, by transformer. */
  final double[][] transformers;

  final double[] source;

  /** Q of every node, at the layout's block offsets; Y until the node is reached. */
  final double[] blocks;

  Elimination(Layout layout, Plan plan, double order) {
    this.layout = layout;
    this.plan = plan;
    this.order = order;
    left = new double[2 * plan.largest * plan.largest];
    series = seriesImpedances();
    transformers = new double[layout.transformers.length][];
    for (int k = 0; k < transformers.length; k++) {
      transformers[k] = layout.transformers[k].matrix(order);
    }
    source = layout.source.matrix(order);
    blocks = new double[plan.blocksLength];
  }

  void run() {
    for (int n = layout.nodes - 1; n >= 0; n--) {
      switch (plan.role[n]) {
        case Plan.PAIR -> eliminatePair(n);
        case Plan.FULL -> eliminateFull(n);
        default -> {
          // nothing but injections at or below: Q = 0
        }
      }
    }
  }

  private double[] seriesImpedances() {
    double[] resistanceFactors = factorsOf(NetworkBuilder.Laws::resistance);
    double[] reactanceFactors = factorsOf(NetworkBuilder.Laws::reactance);
    double[] z = new double[2 * layout.conductors()];
    for (int k = 0; k < layout.conductors() && resistanceFactors.length > 0; k++) {
      int law = layout.law[k];
      z[2 * k] = layout.resistance[k] * resistanceFactors[law];
      z[2 * k + 1] = layout.reactance[k] * reactanceFactors[law];
    }
    return z;
  }

  private double[] factorsOf(Function<NetworkBuilder.Laws, OrderLaw> which) {
    double[] factors = new double[layout.laws.length];
    for (int k = 0; k < factors.length; k++) {
      factors[k] = which.apply(layout.laws[k]).factor(order);
      if (!Double.isFinite(factors[k])) {
        throw new ArithmeticException(
            "an impedance's law gives the factor " + factors[k] + " at order " + order);
      }
    }
    return factors;
  }

  /** Resistance of a feeder's conductor at this order, ohms. */
  double resistance(int conductor) {
    return series[2 * conductor];
  }

  /** Reactance of a feeder's conductor at this order, ohms. */
  double reactance(int conductor) {
    return series[2 * conductor + 1];
  }

  private void eliminatePair(int n) {
    double re = 0;
    double im = 0;
    for (int k = layout.firstShunt[n]; k < layout.firstShunt[n + 1]; k++) {
      ((Shunt.TwoTerminal) layout.shunts[k]).admittance().at(order, siemens);
      re += siemens[0];
      im += siemens[1];
    }
    int from = plan.pairFrom[n];
    int to = plan.pairTo[n];
    double zRe = resistance(from) + resistance(to);
    double zIm = reactance(from) + reactance(to);
    double dRe = 1 + re * zRe - im * zIm;
    double dIm = re * zIm + im * zRe;
    double square = dRe * dRe + dIm * dIm;
    double qRe = (re * dRe + im * dIm) / square;
    double qIm = (im * dRe - re * dIm) / square;
    if (!Double.isFinite(qRe) || !Double.isFinite(qIm)) {
      throw new UnsolvableOrderException(order, layout.number[n]);
    }
    blocks[plan.block[n]] = qRe;
    blocks[plan.block[n] + 1] = qIm;
    int p = layout.parent[n];
    int a = layout.joinedTo[from] - layout.first[p];
    int b = layout.joinedTo[to] - layout.first[p];
    stamp.on(blocks, plan.block[p], layout.size(p));
    stamp.addPair(a, b, qRe, qIm);
  }

  private void eliminateFull(int n) {
    int size = layout.size(n);
    int at = plan.block[n];
    stamp.on(blocks, at, size);
    for (int k = layout.firstShunt[n]; k < layout.firstShunt[n + 1]; k++) {
      stamp.add(layout.shunts[k], order);
    }
    boolean impedance = layout.isFeeder(n) ? writeFeederLeft(n) : writeDenseLeft(n);
    boolean solved =
        impedance
            ? Blocks.solve(left, size, blocks, at, size)
            : Blocks.isFinite(blocks, at, 2 * size * size);
    if (!solved) {
      throw new UnsolvableOrderException(order, layout.number[n]);
    }
    if (n > 0) {
      if (layout.isFeeder(n)) {
        addFeederToParent(n);
      } else {
        addTransformerToParent(n);
      }
    }
  }

  /** 1 + Y·Z with diagonal Z; false if Z is zero, so that Q = Y. */
  private boolean writeFeederLeft(int n) {
    int size = layout.size(n);
    int y = plan.block[n];
    boolean any = false;
    for (int column = 0; column < size; column++) {
      double zRe = resistance(layout.first[n] + column);
      double zIm = reactance(layout.first[n] + column);
      any |= zRe != 0 || zIm != 0;
      for (int row = 0; row < size; row++) {
        int at = 2 * (row * size + column);
        left[at] = blocks[y + at] * zRe - blocks[y + at + 1] * zIm + (row == column ? 1 : 0);
        left[at + 1] = blocks[y + at] * zIm + blocks[y + at + 1] * zRe;
      }
    }
    return any;
  }

  private boolean writeDenseLeft(int n) {
    int size = layout.size(n);
    double[] m = Blocks.product(blocks, plan.block[n], denseImpedance(n), 0, size);
    for (int k = 0; k < size; k++) {
      m[2 * k * (size + 1)] += 1;
    }
    System.arraycopy(m, 0, left, 0, m.length);
    return true;
  }

  double[] denseImpedance(int n) {
    return n == 0 ? source : transformers[layout.transformerOf[n]];
  }

  private void addFeederToParent(int n) {
    int size = layout.size(n);
    int p = layout.parent[n];
    int first = layout.first[n];
    stamp.on(blocks, plan.block[p], layout.size(p));
    int at = plan.block[n];
    for (int row = 0; row < size; row++) {
      int toRow = layout.joinedTo[first + row] - layout.first[p];
      for (int column = 0; column < size; column++) {
        int toColumn = layout.joinedTo[first + column] - layout.first[p];
        stamp.add(toRow, toColumn, blocks[at], blocks[at + 1]);
        at += 2;
      }
    }
  }

  /** Aᵀ·Q·A, A being real. */
  private void addTransformerToParent(int n) {
    int p = layout.parent[n];
    int size = layout.size(n);
    int parentSize = layout.size(p);
    double[] a = layout.turns[layout.transformerOf[n]];
    stamp.on(blocks, plan.block[p], parentSize);
    for (int row = 0; row < size; row++) {
      for (int column = 0; column < size; column++) {
        int at = plan.block[n] + 2 * (row * size + column);
        addTurned(a, row * parentSize, column * parentSize, parentSize, at);
      }
    }
  }

  private void addTurned(double[] a, int rowAt, int columnAt, int parentSize, int at) {
    for (int i = 0; i < parentSize; i++) {
      for (int j = 0; j < parentSize; j++) {
        double factor = a[rowAt + i] * a[columnAt + j];
        stamp.add(i, j, factor * blocks[at], factor * blocks[at + 1]);
      }
    }
  }
}
