package fourthwire.network.element;

import fourthwire.quantity.Phasor;

/** An admittance between two terminals as a function of the harmonic order. */
@FunctionalInterface
public interface OrderAdmittance {
  /** Open at every order. */
  OrderAdmittance OPEN =
      (order, siemens) -> {
        siemens[0] = 0;
        siemens[1] = 0;
      };

  /**
   * The admittance at an order.
   *
   * @param order above 0, also between whole orders
   * @param siemens receives the real and the imaginary part; it may be longer than two
   */
  void at(double order, double[] siemens);

  /**
   * The reciprocal of a series impedance; at an order where that is 0 the network can't be solved.
   */
  static OrderAdmittance ofSeries(SeriesImpedance impedance) {
    return (order, siemens) -> reciprocal(impedance.at(order), siemens);
  }

  /**
   * Resistance, inductance and capacitance in series, y(h) = 1/(R + j(h·X_L - X_C/h)).
   *
   * @param resistanceOhm the same at every order
   * @param inductiveOhm X_L at the fundamental
   * @param capacitiveOhm X_C at the fundamental, a positive number
   */
  static OrderAdmittance ofSeriesCapacitor(
      double resistanceOhm, double inductiveOhm, double capacitiveOhm) {
    return (order, siemens) ->
        reciprocal(
            new Phasor(resistanceOhm, order * inductiveOhm - capacitiveOhm / order), siemens);
  }

  private static void reciprocal(Phasor ohm, double[] siemens) {
    double square = ohm.re() * ohm.re() + ohm.im() * ohm.im();
    siemens[0] = ohm.re() / square;
    siemens[1] = -ohm.im() / square;
  }
}
