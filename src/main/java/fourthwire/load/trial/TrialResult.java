package fourthwire.load.trial;

import fourthwire.quantity.Figure;
import fourthwire.quantity.LinePower;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.SymmetricalComponents;
import fourthwire.quantity.ThreePhasePower;
import java.util.List;

/**
 * What all units together draw, and the voltage that this leaves at their terminals.
 *
 * <p>Angles are those of the public contract's spectrum tables: time starts at the upward zero
 * crossing of the terminal voltage's own fundamental (on three lines of its positive sequence).
 *
 * @param current of each line, rms amps
 * @param direct component of each line's current, amps; 0 where its half-waves mirror each other.
 *     It is in none of the orders, and in no figure taken from these
 * @param voltage of each port, rms volts; on three lines of each line to the common point
 * @param remarks what has to be known of the current besides, in sentences
 */
public record TrialResult(
    List<Spectrum> current, List<Double> direct, List<Spectrum> voltage, List<String> remarks) {
  /** Copies the lists. */
  public TrialResult {
    current = List.copyOf(current);
    direct = List.copyOf(direct);
    voltage = List.copyOf(voltage);
    remarks = List.copyOf(remarks);
  }

  /** Takes spectra of any time origin. */
  static TrialResult of(
      List<Spectrum> current, List<Double> direct, List<Spectrum> voltage, List<String> remarks) {
    Phasor reference =
        voltage.size() == 3
            ? SymmetricalComponents.of(voltage).positive().at(1)
            : voltage.get(0).at(1);
    double degrees = reference.degrees();
    return new TrialResult(turned(current, degrees), direct, turned(voltage, degrees), remarks);
  }

  private static List<Spectrum> turned(List<Spectrum> spectra, double degrees) {
    return spectra.stream().map(s -> Spectrum.of(h -> s.at(h).turned(-h * degrees))).toList();
  }

  /** So many times the current at the same voltage. */
  public TrialResult times(double factor) {
    return new TrialResult(
        current.stream().map(s -> s.times(factor)).toList(),
        direct.stream().map(amps -> amps * factor).toList(),
        voltage,
        remarks);
  }

  /** The current of the first line. */
  public Spectrum first() {
    return current.get(0);
  }

  /** Whether it stands on three lines. */
  public boolean threeLines() {
    return current.size() == 3;
  }

  /** Powers after IEEE 1459: of the port, or effective ones of three lines without a neutral. */
  public PowerFigures power() {
    return threeLines()
        ? ThreePhasePower.threeWire(SymmetricalComponents.differences(voltage), current).figures()
        : LinePower.of(voltage.get(0), first()).figures();
  }

  /** True power factor; unknown where nothing flows. */
  public Figure powerFactor() {
    return power().powerFactor();
  }
}
