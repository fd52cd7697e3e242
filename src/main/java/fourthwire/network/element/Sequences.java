package fourthwire.network.element;

/**
 * Symmetrical components of three equal, symmetrically arranged phases (C. L. Fortescue, 1918): a
 * circulant matrix M with M[i][j] = c[(i - j) mod 3] multiplies the positive sequence (line k at
 * -k·120°) by Σ c[k]·a<sup>k</sup>, the negative by Σ c[k]·a<sup>-k</sup> and the zero sequence by
 * Σ c[k], where a = 1∠120°.
 */
public final class Sequences {
  private static final double SIN_120 = Math.sqrt(3) / 2;

  private Sequences() {}

  /**
   * Turns positive, negative and zero component (real, imaginary; six values) into c[0], c[1], c[2]
   * of the circulant, in place: c[k] = (zero + positive·a<sup>-k</sup> + negative·a<sup>k</sup>)/3.
   */
  public static void toCirculant(double[] c) {
    double sumRe = c[0] + c[2];
    double sumIm = c[1] + c[3];
    double differenceRe = c[0] - c[2];
    double differenceIm = c[1] - c[3];
    double zeroRe = c[4];
    double zeroIm = c[5];
    c[0] = (zeroRe + sumRe) / 3;
    c[1] = (zeroIm + sumIm) / 3;
    // a^-1 = -1/2 - j·sin 120°, a = -1/2 + j·sin 120°
    c[2] = (zeroRe - sumRe / 2 + SIN_120 * differenceIm) / 3;
    c[3] = (zeroIm - sumIm / 2 - SIN_120 * differenceRe) / 3;
    c[4] = (zeroRe - sumRe / 2 - SIN_120 * differenceIm) / 3;
    c[5] = (zeroIm - sumIm / 2 + SIN_120 * differenceRe) / 3;
  }

  /** Writes the circulant of c into lines 0 to 2 of a square complex matrix. */
  public static void writeCirculant(double[] c, double[] matrix, int size) {
    for (int row = 0; row < 3; row++) {
      for (int column = 0; column < 3; column++) {
        int k = 2 * ((row - column + 3) % 3);
        int at = 2 * (row * size + column);
        matrix[at] = c[k];
        matrix[at + 1] = c[k + 1];
      }
    }
  }
}
