package fourthwire.network;

import fourthwire.network.element.Sequences;
import fourthwire.network.element.Shunt;

/**
 * Where elements add themselves up: one node's admittance matrix at one order, a square block
 * inside a flat array (see {@link Blocks}).
 */
final class Stamp {
  private final double[] siemens = new double[6];
  private double[] matrix = new double[0];
  private int offset;
  private int size;

  /** Turns to the block of this size that starts at the offset. */
  Stamp on(double[] matrix, int offset, int size) {
    this.matrix = matrix;
    this.offset = offset;
    this.size = size;
    return this;
  }

  void add(int row, int column, double re, double im) {
    int at = offset + 2 * (row * size + column);
    matrix[at] += re;
    matrix[at + 1] += im;
  }

  /** An admittance between two conductors. */
  void addPair(int conductor, int other, double re, double im) {
    add(conductor, conductor, re, im);
    add(other, other, re, im);
    add(conductor, other, -re, -im);
    add(other, conductor, -re, -im);
  }

  void add(Shunt shunt, double order) {
    if (shunt instanceof Shunt.TwoTerminal two) {
      addTwoTerminal(two, order);
    } else if (shunt instanceof Shunt.ThreeTerminal three) {
      addThreeTerminal(three, order);
    }
  }

  private void addTwoTerminal(Shunt.TwoTerminal shunt, double order) {
    shunt.admittance().at(order, siemens);
    if (shunt.other() == Shunt.EARTH) {
      add(shunt.conductor(), shunt.conductor(), siemens[0], siemens[1]);
    } else {
      addPair(shunt.conductor(), shunt.other(), siemens[0], siemens[1]);
    }
  }

  private void addThreeTerminal(Shunt.ThreeTerminal shunt, double order) {
    shunt.admittance().at(order, siemens);
    double zeroRe = siemens[4];
    double zeroIm = siemens[5];
    Sequences.toCirculant(siemens);
    for (int row = 0; row < 3; row++) {
      for (int column = 0; column < 3; column++) {
        int k = 2 * ((row - column + 3) % 3);
        add(shunt.line(row), shunt.line(column), siemens[k], siemens[k + 1]);
      }
    }
    if (shunt.common() != Shunt.EARTH && (zeroRe != 0 || zeroIm != 0)) {
      addCommonPoint(shunt, zeroRe, zeroIm);
    }
  }

  /** What flows in by the lines leaves by the common point; each line's row sums to Y0. */
  private void addCommonPoint(Shunt.ThreeTerminal shunt, double zeroRe, double zeroIm) {
    for (int leg = 0; leg < 3; leg++) {
      add(shunt.line(leg), shunt.common(), -zeroRe, -zeroIm);
      add(shunt.common(), shunt.line(leg), -zeroRe, -zeroIm);
    }
    add(shunt.common(), shunt.common(), 3 * zeroRe, 3 * zeroIm);
  }
}
