package fourthwire.load;

import fourthwire.quantity.Spectrum;
import java.util.Locale;
import java.util.OptionalDouble;

/** Makes the load model of a survey row. */
public final class LoadModels {
  private LoadModels() {}

  /**
   * The model of one load row's share on its port or lines.
   *
   * @throws IllegalArgumentException where the parameters are impossible, with a sentence for the
   *     user
   */
  public static LoadModel of(LoadRequest request) {
    RequestCheck.check(request);
    return switch (request.kind()) {
      case RESISTIVE -> constantImpedance(request, 1);
      case LINEAR -> constantImpedance(request, request.displacementFactor().orElse(1));
      case MEASURED -> measured(request);
      case CAPACITOR_INPUT -> Rectifiers.capacitorInput(request);
      case SIX_PULSE -> Rectifiers.sixPulse(request);
      case PFC_CONTINUOUS, PFC_CRITICAL -> PfcSupplies.of(request);
      default ->
          throw new IllegalArgumentException(
              String.format(
                  Locale.ROOT,
                  "the load kind %s can not be computed yet; enter the equipment as measured with"
                      + " its spectrum",
                  request.kind().word()));
    };
  }

  private static LoadModel constantImpedance(LoadRequest request, double displacementFactor) {
    double unitVa = Ratings.voltAmperes(request, request.rating(), Math.abs(displacementFactor));
    return new ConstantImpedance(
        request.ports(),
        request.nominalPortV(),
        unitVa * request.units() * request.demand(),
        displacementFactor);
  }

  private static LoadModel measured(LoadRequest request) {
    Spectrum shape = request.spectrum().orElseThrow();
    double cos = shape.re(1) / shape.magnitude(1);
    double rms = shape.rms() / shape.magnitude(1);
    double perPhaseRoot = request.ports() == 3 ? Math.sqrt(3) : 1;
    LoadRequest.Rating rating = request.rating();
    double unitAmps;
    if (rating instanceof LoadRequest.Rating.Watts w) {
      unitAmps = w.w() / (perPhaseRoot * request.nominalPortV() * cos);
    } else {
      unitAmps =
          Ratings.voltAmperes(request, rating, 1) / (perPhaseRoot * request.nominalPortV() * rms);
    }
    double scale = unitAmps * request.units() * request.demand() / shape.magnitude(1);
    return new MeasuredSpectrum(request.ports(), request.frequencyHz(), shape.times(scale));
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
