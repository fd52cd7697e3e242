package fourthwire.audit.solve;

/** Newton's equations of one board alone, with what all above it answers, solved at once. */
final class BoardInverse {
  private final FeederOhms ohms;
  private final double[] side;
  private final int perConductor;
  private DenseLu factors = new DenseLu(new double[0][0]);

  BoardInverse(FeederOhms ohms, int perConductor) {
    this.ohms = ohms;
    this.perConductor = perConductor;
    this.side = new double[ohms.size() * perConductor];
  }

  /** Takes up the slopes of what hangs at the board. */
  void renew(Iterable<PlaceSlope> slopes) {
    double[][] drawn = new double[side.length][side.length];
    slopes.forEach(slope -> slope.addTo(drawn, ohms));
    double[][] matrix = new double[side.length][side.length];
    for (int k = 0; k < perConductor / 2; k++) {
      for (int a = 0; a < ohms.size(); a++) {
        for (int b = 0; b < ohms.size(); b++) {
          double r = ohms.re(k, a, b);
          double x = ohms.im(k, a, b);
          double[] re = drawn[b * perConductor + 2 * k];
          double[] im = drawn[b * perConductor + 2 * k + 1];
          double[] intoRe = matrix[a * perConductor + 2 * k];
          double[] intoIm = matrix[a * perConductor + 2 * k + 1];
          for (int column = 0; column < side.length; column++) {
            intoRe[column] += r * re[column] - x * im[column];
            intoIm[column] += r * im[column] + x * re[column];
          }
        }
      }
    }
    for (int k = 0; k < side.length; k++) {
      matrix[k][k] += 1;
    }
    factors = new DenseLu(matrix);
  }

  /** The board's potentials become those that follow from them. */
  void solve(double[] row) {
    for (int c = 0; c < ohms.size(); c++) {
      System.arraycopy(row, ohms.start(c), side, c * perConductor, perConductor);
    }
    factors.solve(side);
    for (int c = 0; c < ohms.size(); c++) {
      System.arraycopy(side, c * perConductor, row, ohms.start(c), perConductor);
    }
  }
}
