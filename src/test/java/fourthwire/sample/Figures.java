package fourthwire.sample;

import fourthwire.audit.DesignState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import java.math.BigDecimal;
import java.math.MathContext;

/**
 * A node's design figures as the generator builds on them: to three figures, so that a better digit
 * of the engine does not change every file.
 */
final class Figures {
  private static final MathContext THREE = new MathContext(3);

  private final DesignState design;

  Figures(DesignState design) {
    this.design = design;
  }

  private static double rounded(double value) {
    return new BigDecimal(value).round(THREE).doubleValue();
  }

  private static double rounded(Figure figure) {
    return rounded(figure.value().orElseThrow());
  }

  double rmsA(Conductor conductor) {
    return conductor == Conductor.N
        ? rounded(design.neutral().rmsA())
        : rounded(design.lines().get(conductor).rmsA());
  }

  boolean hasNeutral() {
    return design.neutral().rmsA().value().isPresent();
  }

  boolean has(Conductor line) {
    return design.lines().containsKey(line);
  }

  double currentThdPercent(Conductor line) {
    return rounded(design.lines().get(line).thdPercent());
  }

  double rmsV(Conductor line) {
    return rounded(design.voltage().get(line.name()).rmsV());
  }

  double voltageThdPercent(Conductor line) {
    return rounded(design.voltage().get(line.name()).thdPercent());
  }

  double orderA(Conductor conductor, int order) {
    return rounded(design.currentSpectrum().get(conductor).magnitude(order));
  }

  /** An order of the neutral's current on its rms. */
  double shareOfNeutral(int order) {
    return orderA(Conductor.N, order) / rmsA(Conductor.N);
  }

  double activeW() {
    return rounded(design.power().activeW());
  }
}
