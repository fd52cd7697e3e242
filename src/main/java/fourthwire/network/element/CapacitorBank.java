package fourthwire.network.element;

import fourthwire.quantity.Phasor;
import java.util.OptionalDouble;

/**
 * A three-phase capacitor bank with or without a series reactor, its star point not earthed; a
 * tuned filter is such a bank too. Per leg of the equivalent star, at the fundamental:
 *
 * <ul>
 *   <li>X<sub>C</sub> = rated voltage² / rated power of the capacitor alone,
 *   <li>X<sub>L</sub> = detuning · X<sub>C</sub>, or X<sub>C</sub>/n² for a filter tuned to order
 *       n,
 *   <li>y(h) = 1/(R + j(h·X<sub>L</sub> - X<sub>C</sub>/h)).
 * </ul>
 *
 * <p>Sources: IEEE 1531-2003 (filters; from memory); detuned banks as in manufacturers' worked
 * examples (check values C3 to C9).
 *
 * @param capacitiveOhm X_C
 * @param inductiveOhm X_L, 0 without a reactor
 * @param resistanceOhm R of the reactor, the same at every order
 */
public record CapacitorBank(double capacitiveOhm, double inductiveOhm, double resistanceOhm) {
  /**
   * Quality factor that stands for a reactor without resistance: at its tuning order a bank would
   * otherwise be a short circuit, which no finite admittance is.
   */
  private static final double LOSSLESS = 1e6;

  /** Refuses a bank without capacitance, and one whose reactor outweighs it. */
  public CapacitorBank {
    if (!(capacitiveOhm > 0) || Double.isInfinite(capacitiveOhm)) {
      throw new IllegalArgumentException(
          "a bank's capacitive reactance of " + capacitiveOhm + " ohm: it must be above 0");
    }
    if (!(inductiveOhm >= 0 && inductiveOhm < capacitiveOhm)) {
      throw new IllegalArgumentException(
          "a bank's reactor of %s ohm: 0 or more, and less than the capacitor's %s ohm"
              .formatted(inductiveOhm, capacitiveOhm));
    }
    if (!(resistanceOhm >= 0) || Double.isInfinite(resistanceOhm)) {
      throw new IllegalArgumentException(
          "a bank's resistance of " + resistanceOhm + " ohm: it must be 0 or more");
    }
  }

  /**
   * A plain or detuned bank.
   *
   * @param kvar of the capacitor alone at its rated voltage
   * @param ratedV rated voltage of the capacitor, line to line
   * @param detuningPercent X_L over X_C, 0 without a reactor
   * @param qualityFactor X_L over R at the fundamental; empty: next to no resistance
   */
  public static CapacitorBank detuned(
      double kvar, double ratedV, double detuningPercent, OptionalDouble qualityFactor) {
    double capacitive = ratedV * ratedV / (1000 * kvar);
    double inductive = detuningPercent / 100 * capacitive;
    double resistance = inductive / qualityFactor.orElse(LOSSLESS);
    return new CapacitorBank(capacitive, inductive, resistance);
  }

  /**
   * A single-tuned filter.
   *
   * @param kvar of the capacitor alone at its rated voltage
   * @param ratedV rated voltage of the capacitor, line to line
   * @param tunedOrder n, the order at which X_L and X_C are equal
   * @param qualityFactor n·X_L over R
   */
  public static CapacitorBank tuned(
      double kvar, double ratedV, double tunedOrder, double qualityFactor) {
    double capacitive = ratedV * ratedV / (1000 * kvar);
    double inductive = capacitive / (tunedOrder * tunedOrder);
    return new CapacitorBank(capacitive, inductive, tunedOrder * inductive / qualityFactor);
  }

  /** This many of such banks side by side, or this share of one's steps. */
  public CapacitorBank times(double banks) {
    return new CapacitorBank(capacitiveOhm / banks, inductiveOhm / banks, resistanceOhm / banks);
  }

  /** The order at which reactor and capacitor are in series resonance; empty without a reactor. */
  public OptionalDouble tuningOrder() {
    return inductiveOhm == 0
        ? OptionalDouble.empty()
        : OptionalDouble.of(Math.sqrt(capacitiveOhm / inductiveOhm));
  }

  /** Reactive power at the fundamental with the reactor in series, resistance neglected, kvar. */
  public double kvarAt(double lineVoltageV) {
    return lineVoltageV * lineVoltageV / (capacitiveOhm - inductiveOhm) / 1000;
  }

  /** Voltage on the capacitor at the fundamental, per unit of the line's, resistance neglected. */
  public double voltageRise() {
    return capacitiveOhm / (capacitiveOhm - inductiveOhm);
  }

  /** Capacitance of a leg of the equivalent star, farads. */
  public double capacitanceF(double frequencyHz) {
    return 1 / (2 * Math.PI * frequencyHz * capacitiveOhm);
  }

  /** Inductance of a leg's reactor, henries. */
  public double inductanceH(double frequencyHz) {
    return inductiveOhm / (2 * Math.PI * frequencyHz);
  }

  /** Impedance of a leg at an order, ohms. */
  public Phasor ohm(double order) {
    return new Phasor(resistanceOhm, order * inductiveOhm - capacitiveOhm / order);
  }

  /** The bank as a linear element on lines 0, 1 and 2 of a node. */
  public Shunt shunt() {
    return Shunt.threeLines(
        Shunt.EARTH,
        SequenceAdmittance.isolatedStar(
            OrderAdmittance.ofSeriesCapacitor(resistanceOhm, inductiveOhm, capacitiveOhm)));
  }
}
