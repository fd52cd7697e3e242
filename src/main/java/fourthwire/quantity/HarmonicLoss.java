package fourthwire.quantity;

import java.util.function.IntToDoubleFunction;

/**
 * What a current's orders do to a transformer, in four published numbers. They look alike and are
 * not: the K-factor is on the rated current and grows with the load, the harmonic loss factor is on
 * the actual rms current and does not; factor K of the European standards is a divisor of the
 * rating.
 */
public final class HarmonicLoss {
  private HarmonicLoss() {}

  /**
   * K-factor Σ(I_h/I_rated)²·h², orders 1 to 50 (UL 1561 and UL 1562, from memory).
   *
   * @param ratedA the transformer's rated current on the same side, amps, above 0
   */
  public static double kFactor(Spectrum current, double ratedA) {
    return weighted(current, h -> (double) h * h) / (ratedA * ratedA);
  }

  /**
   * Harmonic loss factor for winding eddy loss, F_HL = ΣI_h²·h²/ΣI_h², orders 1 to 50 (IEEE
   * C57.110-2018).
   */
  public static Figure harmonicLossFactor(Spectrum current) {
    return perRmsSquare(current, h -> (double) h * h);
  }

  /**
   * Harmonic loss factor for other stray loss, F_HL-STR = ΣI_h²·h^0.8/ΣI_h² (IEEE C57.110-2018).
   */
  public static Figure strayLossFactor(Spectrum current) {
    return perRmsSquare(current, h -> Math.pow(h, 0.8));
  }

  /**
   * Factor K = √(1 + e/(1+e)·(I1/I)²·Σ n^q·(I_n/I1)²), n from 2 (EN 50464-3, HD 538.3); the rating
   * is divided by it. One published example counts n = 1 in the sum, which counts the fundamental's
   * eddy loss twice; the standard's formula does not.
   *
   * @param eddyRatio e, eddy loss at the fundamental on the direct-current loss
   * @param exponent q, 1.7 for round or rectangular conductors, 1.5 for foil
   */
  public static Figure factorK(Spectrum current, double eddyRatio, double exponent) {
    double weight = eddyRatio / (1 + eddyRatio);
    return perRmsSquare(current, n -> n == 1 ? 0 : Math.pow(n, exponent))
        .map(sum -> Math.sqrt(1 + weight * sum));
  }

  private static Figure perRmsSquare(Spectrum current, IntToDoubleFunction weight) {
    double square = current.rms() * current.rms();
    return square > 0
        ? Figure.of(weighted(current, weight) / square)
        : Figure.unknown("no current flows");
  }

  private static double weighted(Spectrum current, IntToDoubleFunction weight) {
    double sum = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      double a = current.magnitude(h);
      sum += a * a * weight.applyAsDouble(h);
    }
    return sum;
  }
}
