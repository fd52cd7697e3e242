package fourthwire.limits.loading;

import fourthwire.limits.Check;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Words;
import fourthwire.quantity.Figure;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * One conductor's current against what it carries.
 *
 * @param rmsA its current, amps
 * @param ampacityA the smallest rating as installed, before any harmonic factor, amps
 * @param ampacityName what has that rating
 * @param adjustedAmpacityA the smallest rating after the harmonic factor, amps
 * @param adjustedName what has that rating
 * @param factor harmonic factor applied to cables
 * @param loadingPercent rms on {@code ampacityA}
 * @param adjustedLoadingPercent rms on {@code adjustedAmpacityA}
 */
public record ConductorLoading(
    double rmsA,
    Figure ampacityA,
    String ampacityName,
    Figure adjustedAmpacityA,
    String adjustedName,
    double factor,
    Figure loadingPercent,
    Figure adjustedLoadingPercent) {

  static ConductorLoading of(double rmsA, List<ConductorRating> ratings, double factor) {
    Optional<ConductorRating> plain =
        ratings.stream().min(Comparator.comparingDouble(ConductorRating::ampacityA));
    if (plain.isEmpty()) {
      Figure unknown = Figure.unknown("no ampacity or bus rating is known");
      return new ConductorLoading(rmsA, unknown, "", unknown, "", factor, unknown, unknown);
    }
    ConductorRating adjusted =
        ratings.stream().min(Comparator.comparingDouble(r -> r.adjustedA(factor))).orElseThrow();
    double adjustedA = adjusted.adjustedA(factor);
    return new ConductorLoading(
        rmsA,
        Figure.of(plain.get().ampacityA()),
        plain.get().name(),
        Figure.of(adjustedA),
        adjusted.name(),
        adjusted.cable() ? factor : 1,
        Figure.of(100 * rmsA / plain.get().ampacityA()),
        Figure.of(100 * rmsA / adjustedA));
  }

  /** The current against the adjusted rating; empty where no rating is known. */
  Optional<Check> check(FindingCode code, String conductor, AmpacityFactors factors) {
    if (adjustedAmpacityA.value().isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Check(
            code,
            "",
            Check.Rule.BINDING,
            rmsA,
            adjustedAmpacityA.value().getAsDouble(),
            "A",
            basis(factors),
            () -> sentence(conductor, factors)));
  }

  /** Whether it uses more of what it carries than the other does. */
  boolean isTighterThan(ConductorLoading other) {
    return adjustedLoadingPercent.value().orElse(0)
        > other.adjustedLoadingPercent.value().orElse(0) * (1 + 1e-9);
  }

  private String basis(AmpacityFactors factors) {
    return factor < 1 ? factors.basis() : "Rating: " + adjustedName;
  }

  private String sentence(String conductor, AmpacityFactors factors) {
    double limit = adjustedAmpacityA.value().orElseThrow();
    String why =
        factor < 1
            ? "%s: %s A × %s, as %s"
                .formatted(
                    adjustedName,
                    Words.number(limit / factor),
                    Words.number(factor),
                    factors.reason().get())
            : adjustedName;
    return "%s carries %s A, %s %% of the %s A that it is good for (%s)."
        .formatted(
            conductor,
            Words.number(rmsA),
            Words.number(100 * rmsA / limit),
            Words.number(limit),
            why);
  }
}
