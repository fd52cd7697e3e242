package fourthwire.load;

import fourthwire.load.control.PhaseDimmer;
import fourthwire.load.model.LoadModel;
import fourthwire.quantity.Phasor;
import fourthwire.site.ModelColumns;
import java.util.OptionalDouble;

/** Makes the load model of a survey row. */
public final class LoadModels {
  /** Common practice, no source. */
  private static final double MOTOR_DISPLACEMENT_FACTOR = 0.85;

  private static final double LOCKED_ROTOR_PERCENT = 17;
  private static final double FIRING_DEGREES = 90;
  private static final double LEAST_EFFICIENCY = 0.01;

  private LoadModels() {}

  /**
   * The model of one load row's share on its port or lines.
   *
   * @throws IllegalArgumentException where the parameters are impossible, with a sentence for the
   *     user
   */
  public static LoadModel of(LoadRequest request) {
    return of(request, new DesignPowers());
  }

  /**
   * Likewise, for many rows.
   *
   * @param known the powers found for rows before
   */
  public static LoadModel of(LoadRequest request, DesignPowers known) {
    RequestCheck.check(request);
    return switch (request.kind()) {
      case RESISTIVE -> constantImpedance(request, 1);
      case LINEAR -> constantImpedance(request, request.displacementFactor().orElse(1));
      case MEASURED -> GivenSpectra.measured(request);
      case CAPACITOR_INPUT, CAPACITOR_INPUT_CHOKE -> Rectifiers.capacitorInput(request, known);
      case SIX_PULSE -> Rectifiers.sixPulse(request, known);
      case PFC_CONTINUOUS, PFC_CRITICAL -> PfcSupplies.of(request, known);
      case MOTOR -> motor(request);
      case PHASE_DIMMER -> dimmer(request);
      case MAGNETIC_BALLAST, ACTIVE_FRONT_END -> GivenSpectra.published(request);
      case TWELVE_PULSE -> Rectifiers.twelvePulse(request, known);
    };
  }

  /**
   * The same request with the efficiency filled in that a rectifier's rated watts come to, so that
   * models of many states of it need not find it each time; any other request as it is.
   *
   * @throws IllegalArgumentException where the parameters are impossible, as for a model
   */
  public static LoadRequest sized(LoadRequest request) {
    boolean rectifier =
        switch (request.kind()) {
          case CAPACITOR_INPUT, CAPACITOR_INPUT_CHOKE, SIX_PULSE, TWELVE_PULSE -> true;
          default -> false;
        };
    if (!rectifier
        || request.columns().efficiency().isPresent()
        || !(request.rating() instanceof LoadRequest.Rating.Watts watts)) {
      return request;
    }
    RequestCheck.check(request);
    LoadRequest one = request.inState(1, 1);
    double directW =
        new DesignPower(request)
            .find(p -> of(one.withColumns(efficient(Math.max(LEAST_EFFICIENCY, p / watts.w())))));
    return request.withColumns(efficient(directW / watts.w()));
  }

  private static ModelColumns efficient(double efficiency) {
    return ModelColumns.NONE.with(ModelColumns.Column.EFFICIENCY, efficiency);
  }

  private static LoadModel constantImpedance(LoadRequest request, double displacementFactor) {
    double unitVa = Ratings.voltAmperes(request, request.rating(), Math.abs(displacementFactor));
    return new ConstantImpedance(
        request.ports(),
        request.nominalPortV(),
        unitVa * request.units() * request.demand(),
        displacementFactor);
  }

  private static LoadModel motor(LoadRequest request) {
    double cos = Math.abs(request.displacementFactor().orElse(MOTOR_DISPLACEMENT_FACTOR));
    double unitVa = Ratings.voltAmperes(request, request.rating(), cos);
    double ratedVa = unitVa * request.units() * (request.lowerPower() ? 1 : request.demand());
    double va = unitVa * request.units() * request.demand();
    double sign = Math.signum(request.displacementFactor().orElse(1));
    double x = request.columns().lockedRotorReactancePercent().orElse(LOCKED_ROTOR_PERCENT) / 100;
    double v = request.nominalPortV();
    return new Motor(
        request.frequencyHz(),
        new Phasor(va * cos, sign * va * Math.sqrt(1 - cos * cos)),
        x * v * v / ratedVa);
  }

  private static LoadModel dimmer(LoadRequest request) {
    double cos = Math.abs(request.displacementFactor().orElse(1));
    double va =
        Ratings.voltAmperes(request, request.rating(), cos) * request.units() * request.demand();
    double z = request.nominalPortV() * request.nominalPortV() / va;
    return new PhaseDimmer(
        z * cos,
        z * Math.sqrt(1 - cos * cos) / (2 * Math.PI * request.frequencyHz()),
        request.frequencyHz(),
        Math.toRadians(request.columns().firingDegrees().orElse(FIRING_DEGREES)));
  }

  /**
   * The angle a spectrum table takes where it gives none: a pulse at the crest, 180° for orders 3,
   * 7, 11 …, 0° for 5, 9, 13 … and for even orders (public contract, section 3).
   */
  public static double assumedHarmonicDegrees(int order) {
    return order % 4 == 3 ? 180 : 0;
  }

  /**
   * The fundamental's angle against the terminal voltage: the table's degrees where given, else by
   * the displacement factor (lagging positive), else 0.
   */
  public static double fundamentalDegrees(
      OptionalDouble tableDegrees, OptionalDouble displacementFactor) {
    if (tableDegrees.isPresent()) {
      return tableDegrees.getAsDouble();
    }
    if (displacementFactor.isEmpty()) {
      return 0;
    }
    double factor = displacementFactor.getAsDouble();
    return -Math.copySign(Math.toDegrees(Math.acos(Math.min(1, Math.abs(factor)))), factor);
  }
}
