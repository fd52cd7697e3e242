package fourthwire.load;

import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Everything a load model is made from: one load row's share on one port (or on three lines).
 *
 * @param kind the load kind
 * @param ports 1 or 3, as the kind and its circuit ask
 * @param frequencyHz system frequency
 * @param nominalPortV nominal rms voltage of a port: line to neutral or line to line for one port,
 *     line to LINE for three ports
 * @param rating what is known of one unit
 * @param units how many equal units stand here; a fraction where a row is split over lines
 * @param demand share of rated power in this state, 0 to 1 and above 0
 * @param lowerPower true: each unit runs at {@code demand} of its power; false: {@code demand} of
 *     the units run at full power
 * @param displacementFactor of {@code linear}, {@code motor} and {@code measured}: lagging positive
 *     (0, 1], leading negative; empty: the kind's default
 * @param columns the model columns of the row
 * @param spectrum of {@code measured}: relative to a fundamental of 1∠φ1, as the contract's
 *     spectrum tables have it; empty otherwise
 */
public record LoadRequest(
    LoadKind kind,
    int ports,
    double frequencyHz,
    double nominalPortV,
    Rating rating,
    double units,
    double demand,
    boolean lowerPower,
    OptionalDouble displacementFactor,
    ModelColumns columns,
    Optional<Spectrum> spectrum) {

  /** The same equipment in another state. */
  public LoadRequest inState(double newUnits, double newDemand) {
    return new LoadRequest(
        kind,
        ports,
        frequencyHz,
        nominalPortV,
        rating,
        newUnits,
        newDemand,
        lowerPower,
        displacementFactor,
        columns,
        spectrum);
  }

  /** The same with these columns; where one is empty, its own. */
  public LoadRequest withColumns(ModelColumns others) {
    return new LoadRequest(
        kind,
        ports,
        frequencyHz,
        nominalPortV,
        rating,
        units,
        demand,
        lowerPower,
        displacementFactor,
        others.orElse(columns),
        spectrum);
  }

  /** What one unit is rated: electrical input watts, volt-amperes or amps at nominal voltage. */
  public sealed interface Rating {
    /** Active input power, watts. */
    record Watts(double w) implements Rating {}

    /** Apparent input power, volt-amperes. */
    record VoltAmperes(double va) implements Rating {}

    /** Rms input current (of each line), amps. */
    record Amps(double a) implements Rating {}
  }
}
