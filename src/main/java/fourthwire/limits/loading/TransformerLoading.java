package fourthwire.limits.loading;

import fourthwire.limits.Check;
import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Judgement;
import fourthwire.limits.Words;
import fourthwire.quantity.Figure;
import fourthwire.quantity.HarmonicLoss;
import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.Supplier;

/**
 * What a transformer carries of a distorted current.
 *
 * <p>Derating after IEEE C57.110-2018: the current of this shape that heats the windings no more
 * than the rated sine does is √((1 + P)/(1 + F_HL·P)) of the rated current, P the winding eddy loss
 * on the I²R loss; other stray loss counts as I²R. The method is good to about order 25 and errs to
 * the safe side on large conductors and foil. Factor K (EN 50464-3, HD 538.3) stands beside it with
 * its customary e = 0.1 and q = 1.7.
 *
 * @param loadingPercent rms of the most loaded line on the rated current
 * @param kFactor Σ(I_h/I_rated)²·h², largest line
 * @param harmonicLossFactor F_HL of the most loaded line
 * @param deratedA what a line may carry of this shape, amps
 * @param deratedKva the same as a rating, kVA
 * @param deratedLoadingPercent rms of the most loaded line on {@code deratedA}
 * @param factorK divisor of the rating by the European method
 * @param factorKKva rating on factor K, kVA
 * @param checks the load against the derated rating, or against rating and K rating
 */
public record TransformerLoading(
    Figure loadingPercent,
    Figure kFactor,
    Figure harmonicLossFactor,
    Figure deratedA,
    Figure deratedKva,
    Figure deratedLoadingPercent,
    Figure factorK,
    Figure factorKKva,
    List<Check> checks) {
  private static final String C57_110 = "IEEE C57.110-2018, clause 5 (from memory)";
  private static final String UL_1561 = "UL 1561, K-factor (from memory)";
  private static final PublishedTable K_RATINGS =
      PublishedTable.beside(TransformerLoading.class, "k-ratings.csv");
  private static final double EDDY_RATIO = 0.1;
  private static final double EXPONENT = 1.7;

  /** Judges a transformer by its most loaded line. */
  public static TransformerLoading of(TransformerCase t) {
    Spectrum worst =
        t.lines().stream()
            .max(Comparator.comparingDouble(Spectrum::rms))
            .orElseThrow(() -> new IllegalArgumentException("a transformer has a line"));
    double rmsA = worst.rms();
    double k =
        t.lines().stream().mapToDouble(i -> HarmonicLoss.kFactor(i, t.ratedA())).max().orElse(0);
    Figure lossFactor = HarmonicLoss.harmonicLossFactor(worst);
    Figure factorK = HarmonicLoss.factorK(worst, EDDY_RATIO, EXPONENT);
    Figure perUnit = lossFactor.map(f -> deratedPerUnit(t.eddyFraction(), f));
    Figure deratedA = perUnit.map(pu -> pu * t.ratedA());
    Figure deratedKva = perUnit.map(pu -> pu * t.ratedKva());
    return new TransformerLoading(
        Figure.of(100 * rmsA / t.ratedA()),
        Figure.of(k),
        lossFactor,
        deratedA,
        deratedKva,
        deratedA.map(a -> 100 * rmsA / a),
        factorK,
        factorK.map(f -> t.ratedKva() / f),
        checks(t, rmsA, k, deratedKva));
  }

  /** Act over the limit, watch over 80 %. */
  public List<Finding> findings() {
    return Judgement.findings(checks);
  }

  /** Largest permissible current of this shape on the rated current (IEEE C57.110-2018). */
  static double deratedPerUnit(double eddyFraction, double harmonicLossFactor) {
    return Math.sqrt((1 + eddyFraction) / (1 + harmonicLossFactor * eddyFraction));
  }

  /** The smallest standard K rating that bears a K-factor; empty above the largest. */
  public static OptionalDouble standardRatingFor(double kFactor) {
    return K_RATINGS.rows().stream()
        .mapToDouble(row -> row.number("k"))
        .filter(k -> k >= kFactor)
        .min();
  }

  private static List<Check> checks(TransformerCase t, double rmsA, double k, Figure deratedKva) {
    List<Check> checks = new ArrayList<>();
    double loadKva = t.ratedKva() * rmsA / t.ratedA();
    if (t.kRating().isPresent()) {
      checks.add(ratedLoading(t, loadKva));
      checks.add(kRating(t.kRating().getAsDouble(), k));
    } else {
      deratedKva.value().ifPresent(limit -> checks.add(deratedLoading(t, loadKva, limit)));
    }
    return List.copyOf(checks);
  }

  private static Check deratedLoading(TransformerCase t, double loadKva, double limit) {
    return loading(
        loadKva,
        limit,
        C57_110,
        () ->
            "The most loaded line puts %s kVA on the transformer; with this current's harmonics its rating of %s kVA is good for %s kVA."
                .formatted(Words.number(loadKva), Words.number(t.ratedKva()), Words.number(limit)));
  }

  private static Check loading(
      double loadKva, double limitKva, String basis, Supplier<String> sentence) {
    return new Check(
        FindingCode.TRANSFORMER_LOADING,
        "",
        Check.Rule.BINDING,
        loadKva,
        limitKva,
        "kVA",
        basis,
        sentence);
  }

  /** A K-rated transformer bears its rated current as long as the K-factor is within its rating. */
  private static Check ratedLoading(TransformerCase t, double loadKva) {
    return loading(
        loadKva,
        t.ratedKva(),
        "rating as surveyed",
        () ->
            "The most loaded line puts %s kVA on the transformer, which is rated %s kVA."
                .formatted(Words.number(loadKva), Words.number(t.ratedKva())));
  }

  private static Check kRating(double rating, double k) {
    return new Check(
        FindingCode.TRANSFORMER_K_RATING,
        "",
        Check.Rule.BINDING,
        k,
        rating,
        "",
        UL_1561,
        () ->
            "The load's K-factor is %s; the transformer is rated K-%s."
                    .formatted(Words.number(k), Words.number(rating))
                + adequate(k, rating));
  }

  private static String adequate(double k, double rating) {
    OptionalDouble standard = standardRatingFor(k);
    return k > rating && standard.isPresent()
        ? " The next standard rating that bears it is K-"
            + Words.number(standard.getAsDouble())
            + "."
        : "";
  }
}
