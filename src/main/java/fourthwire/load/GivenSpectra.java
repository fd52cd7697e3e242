package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;

/**
 * Loads whose spectrum is given, not computed: {@code measured} from the survey, {@code
 * magnetic-ballast} and {@code active-front-end} from published rows.
 *
 * <p>The row is scaled to the rating at nominal voltage and turned by the displacement factor, then
 * injected as {@link MeasuredSpectrum} says; {@code residual_percent} scales its distortion as a
 * whole. Harmonic angles are those of a pulse at the crest, since none are published. Valid at
 * rated load; single orders of real equipment lie within half to twice the row (common practice, no
 * source).
 */
final class GivenSpectra {
  /** Percent of the fundamental at orders 3, 5, 7, 9 (common practice, no source). */
  private static final int[] BALLAST_ORDERS = {3, 5, 7, 9};

  private static final double[] BALLAST_PERCENT = {15, 3, 2, 1};

  /** Uncompensated fluorescent lamp with a magnetic ballast (common practice, no source). */
  private static final double BALLAST_DISPLACEMENT_FACTOR = 0.5;

  /** Drive with a regulated front end at rated load (recalled from makers' literature, low). */
  private static final int[] FRONT_END_ORDERS = {5, 7, 11, 13};

  private static final double[] FRONT_END_PERCENT = {2.5, 2, 1, 0.8};

  private GivenSpectra() {}

  static LoadModel measured(LoadRequest request) {
    return injected(request, request.spectrum().orElseThrow());
  }

  static LoadModel published(LoadRequest request) {
    boolean ballast = request.kind() == LoadKind.MAGNETIC_BALLAST;
    double factor = ballast ? BALLAST_DISPLACEMENT_FACTOR : 1;
    Spectrum shape =
        ballast
            ? row(BALLAST_ORDERS, BALLAST_PERCENT, 1)
            : row(FRONT_END_ORDERS, FRONT_END_PERCENT, 1);
    if (request.columns().residualPercent().isPresent()) {
      double scale =
          request.columns().residualPercent().getAsDouble() / 100 / shape.distortionRms();
      shape =
          ballast
              ? row(BALLAST_ORDERS, BALLAST_PERCENT, scale)
              : row(FRONT_END_ORDERS, FRONT_END_PERCENT, scale);
    }
    double degrees =
        LoadModels.fundamentalDegrees(
            java.util.OptionalDouble.empty(),
            java.util.OptionalDouble.of(request.displacementFactor().orElse(factor)));
    Spectrum turned = shape;
    return injected(request, Spectrum.of(h -> h == 1 ? Phasor.polar(1, degrees) : turned.at(h)));
  }

  private static Spectrum row(int[] orders, double[] percent, double scale) {
    double[] byOrder = new double[Spectrum.HIGHEST_ORDER + 1];
    byOrder[1] = 1;
    for (int k = 0; k < orders.length; k++) {
      byOrder[orders[k]] = scale * percent[k] / 100;
    }
    return Spectrum.of(
        h -> Phasor.polar(byOrder[h], h == 1 ? 0 : LoadModels.assumedHarmonicDegrees(h)));
  }

  /** A relative spectrum at the size the rating asks for, public contract, section 3. */
  private static LoadModel injected(LoadRequest request, Spectrum shape) {
    double cos = shape.re(1) / shape.magnitude(1);
    double rms = shape.rms() / shape.magnitude(1);
    double unitVa =
        request.rating() instanceof LoadRequest.Rating.Watts w
            ? w.w() / cos
            : Ratings.voltAmperes(request, request.rating(), 1) / rms;
    double amps = unitVa / Ratings.voltAmperes(request, 1) * request.units() * request.demand();
    return new MeasuredSpectrum(
        request.ports(), request.frequencyHz(), shape.times(amps / shape.magnitude(1)));
  }
}
