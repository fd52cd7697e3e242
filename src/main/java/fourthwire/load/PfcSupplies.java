package fourthwire.load;

import fourthwire.load.control.PowerFactorCorrected;
import fourthwire.load.model.LoadModel;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;

/** Power-factor-corrected models from survey rows, with the defaults of the empty columns. */
final class PfcSupplies {
  /** Dead angle at rated power, degrees, and its exponent; see {@link PowerFactorCorrected}. */
  private static final double CONTINUOUS_DEGREES = 11;

  private static final double CRITICAL_DEGREES = 9;
  private static final double EXPONENT = 0.5;
  private static final double CRITICAL_RESIDUAL_PERCENT = 3;

  /** Input filter capacitance by rated power (common practice, no source). */
  private static final double FILTER_UF_PER_W = 1e-3;

  private PfcSupplies() {}

  static LoadModel of(LoadRequest request, DesignPowers known) {
    double rated =
        request.rating() instanceof LoadRequest.Rating.Watts w
            ? w.w()
            : known.of(request, p -> model(request, p, 1, 1));
    double share = request.lowerPower() ? request.demand() : 1;
    double units = request.lowerPower() ? request.units() : request.units() * request.demand();
    return model(request, rated, share, units);
  }

  private static LoadModel model(LoadRequest request, double ratedW, double share, double units) {
    boolean critical = request.kind() == LoadKind.PFC_CRITICAL;
    ModelColumns c = request.columns();
    double degrees = c.deadAngleDegrees().orElse(critical ? CRITICAL_DEGREES : CONTINUOUS_DEGREES);
    double residual = c.residualPercent().orElse(critical ? CRITICAL_RESIDUAL_PERCENT : 0);
    double filterUf = c.inputFilterUf().orElse(FILTER_UF_PER_W * ratedW);
    return new PowerFactorCorrected(
        ratedW * share * units,
        request.frequencyHz(),
        filterUf * 1e-6 * units,
        degrees * Math.pow(share, -EXPONENT),
        residual / 100);
  }
}
