package fourthwire.network;

import java.util.Arrays;

/**
 * Driving-point impedances from the source outwards. With G of the feeding node, what a current
 * injected at a node meets is
 *
 * <pre>  G_node = ((1 - Z·Q)·A·G·Aᵀ + Z)·(1 - Q·Z)</pre>
 *
 * which follows from the elimination (see {@link Elimination}): 1 - Z·Q = (1 + Z·Y)⁻¹ and 1 - Q·Z =
 * (1 + Y·Z)⁻¹. An ideal source has G = 0 behind its own impedance.
 */
final class ImpedanceWalk {
  private final Layout layout;
  private final Plan plan;
  private final Elimination factors;

  ImpedanceWalk(Layout layout, Plan plan, Elimination factors) {
    this.layout = layout;
    this.plan = plan;
    this.factors = factors;
  }

  /** The impedance at a node, walking to it from the source. */
  DrivingPoint at(int node) {
    return new DrivingPoint(walk(node), layout.size(node));
  }

  private double[] walk(int n) {
    return n == 0 ? source() : step(n, walk(layout.parent[n]));
  }

  /** G at the source's terminals. */
  double[] source() {
    int size = layout.size(0);
    return behindImpedance(0, new double[2 * size * size]);
  }

  /** G at a node from that of the node that feeds it. */
  double[] step(int n, double[] feeding) {
    return behindImpedance(n, transferred(n, feeding));
  }

  /** A·G·Aᵀ. */
  private double[] transferred(int n, double[] g) {
    int size = layout.size(n);
    int parentSize = layout.size(layout.parent[n]);
    double[] result = new double[2 * size * size];
    if (layout.isFeeder(n)) {
      int first = layout.first[n];
      int parentFirst = layout.first[layout.parent[n]];
      for (int k = 0; k < size * size; k++) {
        int row = layout.joinedTo[first + k / size] - parentFirst;
        int column = layout.joinedTo[first + k % size] - parentFirst;
        result[2 * k] = g[2 * (row * parentSize + column)];
        result[2 * k + 1] = g[2 * (row * parentSize + column) + 1];
      }
      return result;
    }
    double[] a = layout.turns[layout.transformerOf[n]];
    for (int k = 0; k < size * size; k++) {
      int rowAt = k / size * parentSize;
      int columnAt = k % size * parentSize;
      for (int m = 0; m < parentSize * parentSize; m++) {
        double factor = a[rowAt + m / parentSize] * a[columnAt + m % parentSize];
        result[2 * k] += factor * g[2 * m];
        result[2 * k + 1] += factor * g[2 * m + 1];
      }
    }
    return result;
  }

  private double[] behindImpedance(int n, double[] behind) {
    int size = layout.size(n);
    double[] z = impedance(n);
    if (plan.role[n] == Plan.PASSIVE) {
      add(z, behind);
      return behind;
    }
    double[] q = factor(n);
    double[] left = Blocks.product(z, 0, q, 0, size);
    Blocks.subtractFromIdentity(left, size);
    double[] right = Blocks.product(q, 0, z, 0, size);
    Blocks.subtractFromIdentity(right, size);
    double[] sum = Blocks.product(left, 0, behind, 0, size);
    add(z, sum);
    return Blocks.product(sum, 0, right, 0, size);
  }

  private static void add(double[] from, double[] to) {
    for (int k = 0; k < to.length; k++) {
      to[k] += from[k];
    }
  }

  private double[] impedance(int n) {
    if (!layout.isFeeder(n)) {
      return factors.denseImpedance(n);
    }
    int size = layout.size(n);
    double[] z = new double[2 * size * size];
    for (int k = 0; k < size; k++) {
      z[2 * k * (size + 1)] = factors.resistance(layout.first[n] + k);
      z[2 * k * (size + 1) + 1] = factors.reactance(layout.first[n] + k);
    }
    return z;
  }

  private double[] factor(int n) {
    int size = layout.size(n);
    int at = plan.block[n];
    if (plan.role[n] == Plan.FULL) {
      return Arrays.copyOfRange(factors.blocks, at, at + 2 * size * size);
    }
    double[] q = new double[2 * size * size];
    new Stamp()
        .on(q, 0, size)
        .addPair(
            plan.pairFrom[n] - layout.first[n],
            plan.pairTo[n] - layout.first[n],
            factors.blocks[at],
            factors.blocks[at + 1]);
    return q;
  }
}
