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

  /** These columns, and where one is empty the other's. */
  public ModelColumns orElse(ModelColumns other) {
    return new ModelColumns(
        or(efficiency, other.efficiency),
        or(capacitanceUfPerW, other.capacitanceUfPerW),
        or(sourceResistanceOhm, other.sourceResistanceOhm),
        or(sourceInductanceUh, other.sourceInductanceUh),
        or(diodeSaturationA, other.diodeSaturationA),
        or(diodeEmission, other.diodeEmission),
        or(diodeResistanceOhm, other.diodeResistanceOhm),
        or(lineChokePercent, other.lineChokePercent),
        or(dcChokePercent, other.dcChokePercent),
        or(firingDegrees, other.firingDegrees),
        or(inputFilterUf, other.inputFilterUf),
        or(deadAngleDegrees, other.deadAngleDegrees),
        or(residualPercent, other.residualPercent),
        or(lockedRotorReactancePercent, other.lockedRotorReactancePercent));
  }

  private static OptionalDouble or(OptionalDouble own, OptionalDouble other) {
    return own.isPresent() ? own : other;
  }
}
