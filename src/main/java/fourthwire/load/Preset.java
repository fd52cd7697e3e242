package fourthwire.load;

import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.ToDoubleBiFunction;

/**
 * A named set of load parameters in plain words: what a person finds on site.
 *
 * <p>Distortion and power factor are what its source leads one to expect of one unit at its usual
 * power on a sinusoidal supply of nominal voltage, from a stiff one to the reference impedance of
 * IEC 60725; the tests hold the model to both bands.
 *
 * @param name the words of the survey's {@code preset} column
 * @param kind the load kind it stands for
 * @param watts electrical input power of one unit while it runs
 * @param sizedForV nominal port voltage its capacitor per watt is stated for: at another voltage it
 *     is taken to store the same energy; empty: built for 100 to 240 V, the same everywhere
 * @param parameters what is known of it; the rest is the kind's default
 * @param thdLowPercent least current distortion expected
 * @param thdHighPercent largest
 * @param powerFactorLow least true power factor expected
 * @param powerFactorHigh largest
 * @param source where the figures come from
 */
public record Preset(
    String name,
    LoadKind kind,
    Spread watts,
    OptionalDouble sizedForV,
    Map<PresetParameter, Spread> parameters,
    double thdLowPercent,
    double thdHighPercent,
    double powerFactorLow,
    double powerFactorHigh,
    String source) {

  /** Keeps its own copy of the parameters. */
  public Preset {
    parameters = Map.copyOf(parameters);
  }

  /** Power of one unit where the survey has none, watts. */
  public double typicalW() {
    return watts.typical();
  }

  /** That power's fifth percentile. */
  public double lowW() {
    return watts.low();
  }

  /** Its ninety-fifth. */
  public double highW() {
    return watts.high();
  }

  /** What is known of one parameter; empty: the kind's default holds. */
  public Optional<Spread> find(PresetParameter parameter) {
    return Optional.ofNullable(parameters.get(parameter));
  }

  /** Lagging positive; empty: the kind's default. */
  public OptionalDouble displacementFactor() {
    return find(PresetParameter.DISPLACEMENT_FACTOR).stream()
        .mapToDouble(Spread::typical)
        .findFirst();
  }

  /**
   * The model columns of one unit of this preset, every parameter at its usual figure.
   *
   * @param ratedW input power of one unit, watts
   * @param portV nominal port voltage (line to line on three lines)
   */
  public ModelColumns columns(double ratedW, double portV) {
    return columns(ratedW, portV, (parameter, spread) -> spread.typical());
  }

  /**
   * The same with each parameter where the caller wants it inside its spread.
   *
   * @param choice the figure to take
   */
  public ModelColumns columns(
      double ratedW, double portV, ToDoubleBiFunction<PresetParameter, Spread> choice) {
    double storage = sizedForV.isPresent() ? square(sizedForV.getAsDouble() / portV) : 1;
    OptionalDouble none = OptionalDouble.empty();
    return new ModelColumns(
        none,
        scaled(choice, PresetParameter.CAPACITANCE_UF_PER_W, storage),
        scaled(choice, PresetParameter.SOURCE_RESISTANCE_PERCENT, portV * portV / ratedW / 100),
        none,
        none,
        none,
        none,
        scaled(choice, PresetParameter.LINE_CHOKE_PERCENT, 1),
        scaled(choice, PresetParameter.DC_CHOKE_PERCENT, 1),
        scaled(choice, PresetParameter.FIRING_DEGREES, 1),
        scaled(choice, PresetParameter.INPUT_FILTER_NF_PER_W, ratedW * 1e-3),
        scaled(choice, PresetParameter.DEAD_ANGLE_DEGREES, 1),
        scaled(choice, PresetParameter.RESIDUAL_PERCENT, 1),
        scaled(choice, PresetParameter.LOCKED_ROTOR_REACTANCE_PERCENT, 1));
  }

  private OptionalDouble scaled(
      ToDoubleBiFunction<PresetParameter, Spread> choice,
      PresetParameter parameter,
      double factor) {
    return find(parameter).stream()
        .mapToDouble(spread -> choice.applyAsDouble(parameter, spread) * factor)
        .findFirst();
  }

  private static double square(double x) {
    return x * x;
  }
}
