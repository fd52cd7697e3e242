package fourthwire.network;

import fourthwire.quantity.Phasor;
import java.util.ArrayList;
import java.util.List;
import org.ejml.data.Complex_F64;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_ZDRM;

/**
 * The same circuit written as one dense system of equations and solved by a general linear-algebra
 * library (EJML): every potential and every link current is an unknown, Kirchhoff's current law
 * stands at every conductor and the voltage equation V = A·V_parent - Z·I at every link. It shares
 * no line with the elimination.
 */
final class DenseNetwork {
  private final List<Integer> first = new ArrayList<>(List.of(0));
  private final List<int[]> equations = new ArrayList<>();
  private final List<Phasor> values = new ArrayList<>();
  private final List<Phasor> rightSide = new ArrayList<>();
  private Phasor[] solution = {};

  int size(int node) {
    return first.get(node + 1) - first.get(node);
  }

  private int conductors() {
    return first.get(first.size() - 1);
  }

  private void put(int row, int column, Phasor value) {
    equations.add(new int[] {row, column});
    values.add(value);
  }

  /*
   * Of conductor c, the potential is unknown 2c and the current fed into it unknown 2c + 1; row 2c
   * is the voltage equation, row 2c + 1 the current law.
   */
  int source(Phasor[][] z, Phasor[] emf) {
    first.add(z.length);
    for (int i = 0; i < z.length; i++) {
      link(i, 0, z[i]);
      rightSide.add(emf[i]);
      rightSide.add(Phasor.ZERO);
    }
    return 0;
  }

  private void link(int conductor, int nodeFirst, Phasor[] impedanceRow) {
    put(2 * conductor, 2 * conductor, new Phasor(1, 0));
    for (int k = 0; k < impedanceRow.length; k++) {
      put(2 * conductor, 2 * (nodeFirst + k) + 1, impedanceRow[k]);
    }
    put(2 * conductor + 1, 2 * conductor + 1, new Phasor(1, 0));
  }

  int node(int parent, double[][] a, Phasor[][] z) {
    int at = conductors();
    first.add(at + a.length);
    for (int i = 0; i < a.length; i++) {
      link(at + i, at, z[i]);
      for (int k = 0; k < a[i].length; k++) {
        int p = first.get(parent) + k;
        put(2 * (at + i), 2 * p, new Phasor(-a[i][k], 0));
        put(2 * p + 1, 2 * (at + i) + 1, new Phasor(-a[i][k], 0));
      }
      rightSide.add(Phasor.ZERO);
      rightSide.add(Phasor.ZERO);
    }
    return first.size() - 2;
  }

  /** An admittance matrix between chosen conductors of a node and earth. */
  void shunt(int node, int[] conductors, Phasor[][] y) {
    for (int i = 0; i < conductors.length; i++) {
      for (int k = 0; k < conductors.length; k++) {
        int row = first.get(node) + conductors[i];
        int column = first.get(node) + conductors[k];
        put(2 * row + 1, 2 * column, y[i][k].times(-1));
      }
    }
  }

  void inject(int node, int conductor, Phasor amps) {
    int row = 2 * (first.get(node) + conductor) + 1;
    rightSide.set(row, rightSide.get(row).minus(amps));
  }

  void solve() {
    int n = 2 * conductors();
    ZMatrixRMaj m = new ZMatrixRMaj(n, n);
    Complex_F64 old = new Complex_F64();
    for (int k = 0; k < values.size(); k++) {
      int[] at = equations.get(k);
      m.get(at[0], at[1], old);
      Phasor v = values.get(k);
      m.set(at[0], at[1], old.real + v.re(), old.imaginary + v.im());
    }
    ZMatrixRMaj b = new ZMatrixRMaj(n, 1);
    for (int k = 0; k < n; k++) {
      b.set(k, 0, rightSide.get(k).re(), rightSide.get(k).im());
    }
    ZMatrixRMaj x = new ZMatrixRMaj(n, 1);
    if (!CommonOps_ZDRM.solve(m, b, x)) {
      throw new AssertionError("the dense system is singular");
    }
    solution = new Phasor[n];
    for (int k = 0; k < n; k++) {
      x.get(k, 0, old);
      solution[k] = new Phasor(old.real, old.imaginary);
    }
  }

  Phasor potential(int node, int conductor) {
    return solution[2 * (first.get(node) + conductor)];
  }

  Phasor current(int node, int conductor) {
    return solution[2 * (first.get(node) + conductor) + 1];
  }

  /** The largest potential, or current, of all. */
  double largest(boolean current) {
    double largest = 0;
    for (int k = current ? 1 : 0; k < solution.length; k += 2) {
      largest = Math.max(largest, solution[k].magnitude());
    }
    return largest;
  }
}
