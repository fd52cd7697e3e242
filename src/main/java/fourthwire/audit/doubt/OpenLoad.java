package fourthwire.audit.doubt;

import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.LoadPlacement;
import fourthwire.load.DesignPowers;
import fourthwire.load.KindDefaults;
import fourthwire.load.LoadRequest;
import fourthwire.load.LoadRequest.Rating;
import fourthwire.load.Preset;
import fourthwire.load.PresetParameter;
import fourthwire.load.Presets;
import fourthwire.load.Spread;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Load;
import fourthwire.site.Load.Confidence;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.ToDoubleFunction;

/**
 * One placed load with what the survey leaves open of it.
 *
 * <p>Its amount: {@code low_w} and {@code high_w} where they are given, else by its confidence
 * (methods, section 5: measured ±3 %, nameplate -40/+0 %, counted ±15 %, guess ±40 %). The doubt is
 * taken as one of how much of the equipment there is: impedances and capacitors go with it. Its
 * parameters: the preset's spreads, else the kind's.
 */
final class OpenLoad {
  private static final Map<Confidence, Spread> BY_CONFIDENCE =
      new EnumMap<>(
          Map.of(
              Confidence.MEASURED, new Spread(0.97, 1, 1.03),
              Confidence.NAMEPLATE, new Spread(0.6, 1, 1),
              Confidence.COUNTED, new Spread(0.85, 1, 1.15),
              Confidence.GUESS, new Spread(0.6, 1, 1.4)));
  private static final double LEAST_DISPLACEMENT = 0.05;

  private final Device device;
  private final Spread amount;
  private final Map<PresetParameter, Spread> parameters;
  private final ModelColumns columns;

  OpenLoad(Device device) {
    LoadRequest request = device.placement().request();
    this.device = device;
    this.amount = amount(device.placement().load());
    Preset defaults = KindDefaults.of(request.kind(), request.nominalPortV());
    this.parameters = new EnumMap<>(PresetParameter.class);
    parameters.putAll(defaults.parameters());
    preset(device.placement().load()).ifPresent(p -> parameters.putAll(p.parameters()));
    parameters.values().removeIf(Spread::isExact);
    if (request.kind() == LoadKind.CAPACITOR_INPUT_CHOKE
        && request.columns().dcChokePercent().isPresent()
        && request.columns().lineChokePercent().isEmpty()) {
      parameters.remove(PresetParameter.LINE_CHOKE_PERCENT);
    }
    this.columns = request.columns().orElse(filled(defaults, request));
  }

  /** The kind's usual figures, of the parameters that have a spread here. */
  private ModelColumns filled(Preset defaults, LoadRequest request) {
    Map<PresetParameter, Spread> open = new HashMap<>(defaults.parameters());
    open.keySet().retainAll(parameters.keySet());
    if (request.kind() == LoadKind.MEASURED) {
      open.clear();
    }
    return new Preset(
            defaults.name(),
            defaults.kind(),
            defaults.watts(),
            defaults.sizedForV(),
            open,
            0,
            0,
            0,
            0,
            defaults.source())
        .columns(roughW(request), request.nominalPortV());
  }

  private static Optional<Preset> preset(Load load) {
    return load.preset().flatMap(Presets::find);
  }

  private static Spread amount(Load load) {
    Spread spread =
        Optional.ofNullable(BY_CONFIDENCE.get(load.confidence().orElse(Confidence.GUESS)))
            .orElseThrow();
    if (load.ratedW().isEmpty()) {
      return spread;
    }
    double rated = load.ratedW().getAsDouble();
    double low = load.lowW().isPresent() ? load.lowW().getAsDouble() / rated : spread.low();
    double high = load.highW().isPresent() ? load.highW().getAsDouble() / rated : spread.high();
    return new Spread(Math.min(low, 1), 1, Math.max(high, 1));
  }

  private static double roughW(LoadRequest request) {
    if (request.rating() instanceof Rating.Watts watts) {
      return watts.w();
    }
    if (request.rating() instanceof Rating.VoltAmperes va) {
      return va.va();
    }
    double lines = request.ports() == 3 ? Math.sqrt(3) : 1;
    return ((Rating.Amps) request.rating()).a() * request.nominalPortV() * lines;
  }

  LoadPlacement placement() {
    return device.placement();
  }

  LoadKind kind() {
    return device.placement().request().kind();
  }

  Spread amount() {
    return amount;
  }

  /** The parameters that are not exact. */
  Map<PresetParameter, Spread> parameters() {
    return Map.copyOf(parameters);
  }

  /** About how many watts of doubt there are in its amount, to weigh loads against each other. */
  double roughSpreadW() {
    double volts = device.placement().request().nominalPortV();
    return device.roughA() * volts * Math.max(amount.high() - amount.low(), 0) / 2;
  }

  /**
   * The load as drawn.
   *
   * @param amountDeviate of its amount
   * @param deviate of each of its parameters
   * @param known powers found for loads of the same draw
   */
  Device drawn(
      double amountDeviate, ToDoubleFunction<PresetParameter> deviate, DesignPowers known) {
    Map<PresetParameter, Double> factors = new EnumMap<>(PresetParameter.class);
    parameters.forEach(
        (p, spread) -> factors.put(p, TwoPieces.factor(spread, deviate.applyAsDouble(p))));
    LoadRequest r = device.placement().request();
    LoadRequest drawn =
        new LoadRequest(
            r.kind(),
            r.ports(),
            r.frequencyHz(),
            r.nominalPortV(),
            r.rating(),
            r.units() * TwoPieces.factor(amount, amountDeviate),
            r.demand(),
            r.lowerPower(),
            displacement(r, factors),
            columns(factors),
            r.spectrum().map(s -> spectrum(s, factors)));
    return Device.of(device.placement().with(drawn), known);
  }

  private OptionalDouble displacement(LoadRequest r, Map<PresetParameter, Double> factors) {
    Double factor = factors.get(PresetParameter.DISPLACEMENT_FACTOR);
    Spread spread = parameters.get(PresetParameter.DISPLACEMENT_FACTOR);
    if (factor == null || spread == null) {
      return r.displacementFactor();
    }
    double usual = r.displacementFactor().orElse(spread.typical());
    double size = Math.min(1, Math.max(LEAST_DISPLACEMENT, Math.abs(usual) * factor));
    return OptionalDouble.of(Math.copySign(size, usual));
  }

  private static Spectrum spectrum(Spectrum given, Map<PresetParameter, Double> factors) {
    double factor = factors.getOrDefault(PresetParameter.RESIDUAL_PERCENT, 1.0);
    return Spectrum.of(
        h -> h == 1 ? given.at(h) : new Phasor(factor * given.re(h), factor * given.im(h)));
  }

  private ModelColumns columns(Map<PresetParameter, Double> factors) {
    return new ModelColumns(
        columns.efficiency(),
        times(columns.capacitanceUfPerW(), factors, PresetParameter.CAPACITANCE_UF_PER_W),
        times(columns.sourceResistanceOhm(), factors, PresetParameter.SOURCE_RESISTANCE_PERCENT),
        columns.sourceInductanceUh(),
        columns.diodeSaturationA(),
        columns.diodeEmission(),
        columns.diodeResistanceOhm(),
        times(columns.lineChokePercent(), factors, PresetParameter.LINE_CHOKE_PERCENT),
        times(columns.dcChokePercent(), factors, PresetParameter.DC_CHOKE_PERCENT),
        times(columns.firingDegrees(), factors, PresetParameter.FIRING_DEGREES),
        times(columns.inputFilterUf(), factors, PresetParameter.INPUT_FILTER_NF_PER_W),
        times(columns.deadAngleDegrees(), factors, PresetParameter.DEAD_ANGLE_DEGREES),
        times(columns.residualPercent(), factors, PresetParameter.RESIDUAL_PERCENT),
        times(
            columns.lockedRotorReactancePercent(),
            factors,
            PresetParameter.LOCKED_ROTOR_REACTANCE_PERCENT));
  }

  private static OptionalDouble times(
      OptionalDouble value, Map<PresetParameter, Double> factors, PresetParameter parameter) {
    if (value.isEmpty()) {
      return value;
    }
    double drawn = value.getAsDouble() * factors.getOrDefault(parameter, 1.0);
    return OptionalDouble.of(Math.min(drawn, Math.max(most(parameter), value.getAsDouble())));
  }

  /** What equipment can be at most, so that the tail of a spread is no impossible unit. */
  private static double most(PresetParameter parameter) {
    return switch (parameter) {
      case FIRING_DEGREES -> 175;
      case DEAD_ANGLE_DEGREES -> 75;
      case LINE_CHOKE_PERCENT, RESIDUAL_PERCENT, LOCKED_ROTOR_REACTANCE_PERCENT -> 99;
      default -> Double.POSITIVE_INFINITY;
    };
  }
}
