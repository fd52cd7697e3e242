package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.rectifier.CapacitorInput;
import fourthwire.load.rectifier.SixPulse;
import fourthwire.load.rectifier.TwelvePulse;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.OptionalDouble;
import java.util.function.DoubleFunction;
import java.util.function.Function;

/**
 * Rectifier models from survey rows: the defaults of the model columns that are empty, and the size
 * of the direct-current side.
 *
 * <p>Defaults (all common practice, no source, except as noted): smoothing capacitor 2 µF/W below
 * 160 V, 1 µF/W above (recalled from power supply handbooks); own source resistance 2 % of V²/P,
 * own inductance none; {@code capacitor-input-choke} a line choke of 3 % where neither choke is
 * given; diodes as in the public contract, section 3; drives 40 µF/kW at 400 V, more at lower
 * voltage for the same stored energy, and 0.2 % of V²/P in each line; of twelve-pulse rectifiers
 * that is the lead ahead of the windings, and no line choke is taken where none is given.
 */
final class Rectifiers {
  /** Below this nominal voltage a supply is taken to be built for 100 to 240 V. */
  private static final double LOW_VOLTAGE_V = 160;

  private static final double CAPACITANCE_LOW_VOLTAGE_UF_PER_W = 2;
  private static final double CAPACITANCE_UF_PER_W = 1;
  private static final double SOURCE_RESISTANCE_SHARE = 0.02;

  /** Line choke of a supply said to have one, percent of V²/P. */
  private static final double CHOKE_PERCENT = 3;

  private static final double DRIVE_UF_PER_W_AT_400_V = 0.04;
  private static final double DRIVE_RESISTANCE_SHARE = 0.002;

  private Rectifiers() {}

  static LoadModel capacitorInput(LoadRequest request, DesignPowers known) {
    DoubleFunction<BridgeLoad> unit = power -> singlePhaseUnit(request, power);
    BridgeLoad load =
        sized(request, known, unit, l -> new CapacitorInput(l, request.frequencyHz()));
    return new CapacitorInput(load, request.frequencyHz());
  }

  private static BridgeLoad singlePhaseUnit(LoadRequest request, double dcPowerW) {
    ModelColumns c = request.columns();
    double v = request.nominalPortV();
    double microfaradPerW =
        c.capacitanceUfPerW()
            .orElse(v < LOW_VOLTAGE_V ? CAPACITANCE_LOW_VOLTAGE_UF_PER_W : CAPACITANCE_UF_PER_W);
    double base = v * v / dcPowerW;
    double omega = 2 * Math.PI * request.frequencyHz();
    boolean unsaid =
        request.kind() == LoadKind.CAPACITOR_INPUT_CHOKE
            && c.lineChokePercent().isEmpty()
            && c.dcChokePercent().isEmpty();
    double choke = c.lineChokePercent().orElse(unsaid ? CHOKE_PERCENT : 0) / 100 * base;
    double direct = c.dcChokePercent().orElse(0) / 100 * base;
    return new BridgeLoad(
        dcPowerW,
        microfaradPerW * 1e-6 * dcPowerW,
        c.sourceResistanceOhm().orElse(SOURCE_RESISTANCE_SHARE * base) + choke / 15,
        c.sourceInductanceUh().orElse(0) * 1e-6 + choke / omega,
        direct / 10,
        direct / omega,
        diode(c));
  }

  static LoadModel sixPulse(LoadRequest request, DesignPowers known) {
    return threeLine(request, known, 1, load -> new SixPulse(load, request.frequencyHz()));
  }

  static LoadModel twelvePulse(LoadRequest request, DesignPowers known) {
    return threeLine(request, known, 2, load -> new TwelvePulse(load, request.frequencyHz()));
  }

  private static LoadModel threeLine(
      LoadRequest request, DesignPowers known, int bridges, Function<BridgeLoad, LoadModel> model) {
    return model.apply(
        sized(request, known, power -> threeLineUnit(request, bridges, power), model));
  }

  /** The lead is common to all bridges, each has a line choke for its share of the power. */
  private static BridgeLoad threeLineUnit(LoadRequest request, int bridges, double dcPowerW) {
    ModelColumns c = request.columns();
    double v = request.nominalPortV();
    double base = v * v / dcPowerW;
    double omega = 2 * Math.PI * request.frequencyHz();
    double line = c.lineChokePercent().orElse(0) / 100 * base * bridges;
    double direct = c.dcChokePercent().orElse(0) / 100 * base;
    double microfaradPerW =
        c.capacitanceUfPerW().orElse(DRIVE_UF_PER_W_AT_400_V * (400 / v) * (400 / v));
    return new BridgeLoad(
        dcPowerW,
        microfaradPerW * 1e-6 * dcPowerW,
        c.sourceResistanceOhm().orElse(DRIVE_RESISTANCE_SHARE * base),
        c.sourceInductanceUh().orElse(0) * 1e-6,
        line / 15,
        line / omega,
        direct / 10,
        direct / omega,
        diode(c));
  }

  static Diode diode(ModelColumns c) {
    return new Diode(
        c.diodeSaturationA().orElse(3e-11),
        c.diodeEmission().orElse(1.2),
        c.diodeResistanceOhm().orElse(1e-3));
  }

  /**
   * All units of the row together, in this state.
   *
   * @param unit one unit by its rated direct-current power
   */
  static BridgeLoad sized(
      LoadRequest request,
      DesignPowers known,
      DoubleFunction<BridgeLoad> unit,
      Function<BridgeLoad, LoadModel> model) {
    OptionalDouble efficiency = request.columns().efficiency();
    double rated;
    if (efficiency.isPresent() && request.rating() instanceof LoadRequest.Rating.Watts w) {
      rated = w.w() * efficiency.getAsDouble();
    } else {
      rated = known.of(request, p -> model.apply(unit.apply(p)));
    }
    BridgeLoad one = unit.apply(rated);
    return request.lowerPower()
        ? one.atPower(rated * request.demand()).parallel(request.units())
        : one.parallel(request.units() * request.demand());
  }
}
