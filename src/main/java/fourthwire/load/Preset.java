package fourthwire.load;

import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.OptionalDouble;

/**
 * A named set of load parameters in plain words: what a person finds on site.
 *
 * @param name the words of the survey's {@code preset} column
 * @param kind the load kind it stands for
 * @param typicalW electrical input power of one unit where the survey has none, watts
 * @param lowW that power's fifth percentile
 * @param highW its ninety-fifth
 * @param displacementFactor lagging positive; empty: the kind's default
 * @param thdLowPercent least current distortion expected at rated load on a usual supply
 * @param thdHighPercent largest
 * @param source where the figures come from
 * @param sizes the model columns that do not depend on voltage and power
 * @param resistancePercent own source resistance in percent of V²/P, as V and P give it
 * @param filterNanofaradPerW input filter in nanofarads for each watt
 */
public record Preset(
    String name,
    LoadKind kind,
    double typicalW,
    double lowW,
    double highW,
    OptionalDouble displacementFactor,
    double thdLowPercent,
    double thdHighPercent,
    String source,
    ModelColumns sizes,
    OptionalDouble resistancePercent,
    OptionalDouble filterNanofaradPerW) {

  /**
   * The model columns of one unit of this preset.
   *
   * @param ratedW input power of one unit, watts
   * @param portV nominal port voltage (line to line on three lines)
   */
  public ModelColumns columns(double ratedW, double portV) {
    OptionalDouble ohm = scaled(resistancePercent, portV * portV / ratedW / 100);
    OptionalDouble filterUf = scaled(filterNanofaradPerW, ratedW * 1e-3);
    return new ModelColumns(
        sizes.efficiency(),
        sizes.capacitanceUfPerW(),
        ohm,
        sizes.sourceInductanceUh(),
        sizes.diodeSaturationA(),
        sizes.diodeEmission(),
        sizes.diodeResistanceOhm(),
        sizes.lineChokePercent(),
        sizes.dcChokePercent(),
        sizes.firingDegrees(),
        filterUf,
        sizes.deadAngleDegrees(),
        sizes.residualPercent(),
        sizes.lockedRotorReactancePercent());
  }

  private static OptionalDouble scaled(OptionalDouble value, double factor) {
    return value.isPresent()
        ? OptionalDouble.of(value.getAsDouble() * factor)
        : OptionalDouble.empty();
  }
}
