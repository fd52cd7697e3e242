package fourthwire.intake.reading.log;

/**
 * A column's factor as a shift of the decimal point and what is left. A shift is exact: 3.99176 kW
 * become 3991.76 W to the last digit, which a product would miss.
 *
 * @param shift decimal places to the right
 * @param rest to multiply by; 1 where the factor is a power of ten
 */
record Factor(int shift, double rest) {
  private static final int FARTHEST = 9;

  static Factor of(double factor) {
    for (int shift = -FARTHEST; shift <= FARTHEST; shift++) {
      if (factor == Double.parseDouble("1e" + shift)) {
        return new Factor(shift, 1);
      }
    }
    return new Factor(0, factor);
  }
}
