package fourthwire.site;

import java.util.OptionalDouble;

/**
 * The optional model columns of a load row, per unit of equipment; empty means the kind's default.
 * Units are in the names, as in the survey table.
 */
public record ModelColumns(
    OptionalDouble efficiency,
    OptionalDouble capacitanceUfPerW,
    OptionalDouble sourceResistanceOhm,
    OptionalDouble sourceInductanceUh,
    OptionalDouble diodeSaturationA,
    OptionalDouble diodeEmission,
    OptionalDouble diodeResistanceOhm,
    OptionalDouble lineChokePercent,
    OptionalDouble dcChokePercent,
    OptionalDouble firingDegrees,
    OptionalDouble inputFilterUf,
    OptionalDouble deadAngleDegrees,
    OptionalDouble residualPercent,
    OptionalDouble lockedRotorReactancePercent) {
  /** Every column empty. */
  public static final ModelColumns NONE =
      new ModelColumns(
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty());
}
