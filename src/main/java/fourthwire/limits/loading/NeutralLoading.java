package fourthwire.limits.loading;

import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Judgement;
import fourthwire.limits.Words;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * A feeder's neutral and its most loaded line against their ampacities, with the harmonic factor
 * that the site's practice asks for.
 *
 * @param neutral the neutral's loading; empty where there is no neutral
 * @param line the most loaded line's loading
 * @param lineName which line that is
 * @param factors the factors applied and why
 * @param thirdHarmonicPercent I3/I1 of the most loaded line
 * @param requiredAmpacityA tabulated ampacity that a cable would need for these currents with these
 *     factors, amps
 * @param findings act over the limit, watch over 80 %, a note on other triplens; worst first. A
 *     circuit of one line says the same of line and neutral, so the neutral is left out there
 *     unless it is the tighter of the two
 */
public record NeutralLoading(
    Optional<ConductorLoading> neutral,
    ConductorLoading line,
    String lineName,
    AmpacityFactors factors,
    Figure thirdHarmonicPercent,
    double requiredAmpacityA,
    List<Finding> findings) {

  /** Judges a feeder. */
  public static NeutralLoading of(NeutralCase c) {
    AmpacityFactors factors = c.rule().factors(c);
    Spectrum worst = c.mostLoadedLine().getValue();
    String lineName = c.mostLoadedLine().getKey().name();
    ConductorLoading line = ConductorLoading.of(worst.rms(), c.lineRatings(), factors.line());
    Optional<ConductorLoading> neutral =
        c.neutral().map(n -> ConductorLoading.of(n.rms(), c.neutralRatings(), factors.neutral()));
    List<Finding> findings = new ArrayList<>();
    neutral
        .filter(n -> c.lines().size() > 1 || n.isTighterThan(line))
        .flatMap(n -> n.finding(FindingCode.NEUTRAL_AMPACITY, "The neutral", factors))
        .ifPresent(findings::add);
    line.finding(FindingCode.LINE_AMPACITY, lineName, factors).ifPresent(findings::add);
    otherTriplens(c, worst, lineName).ifPresent(findings::add);
    findings.sort(Comparator.comparing(Finding::severity));
    return new NeutralLoading(
        neutral,
        line,
        lineName,
        factors,
        thirdPercent(worst),
        Math.max(
            line.rmsA() / factors.line(),
            neutral.map(n -> n.rmsA() / factors.neutral()).orElse(0.0)),
        List.copyOf(findings));
  }

  private static Figure thirdPercent(Spectrum line) {
    return line.magnitude(1) > 0
        ? Figure.of(ThirdHarmonicContent.percent(line))
        : Figure.unknown("no fundamental");
  }

  private static Optional<Finding> otherTriplens(NeutralCase c, Spectrum worst, String lineName) {
    double percent = ThirdHarmonicContent.otherTriplensPercent(worst);
    if (c.rule() != AmpacityRule.THIRD_HARMONIC_CONTENT
        || !c.isFourWire()
        || percent <= ThirdHarmonicContent.OTHER_TRIPLENS_PERCENT) {
      return Optional.empty();
    }
    return Optional.of(
        Judgement.note(
            FindingCode.OTHER_TRIPLENS,
            percent,
            "%",
            ThirdHarmonicContent.basis(),
            "On %s the triplen harmonics beyond the third come to %s %% of the fundamental; above %s %% Annex E asks for a lower factor than its table gives."
                .formatted(
                    lineName,
                    Words.number(percent),
                    Words.number(ThirdHarmonicContent.OTHER_TRIPLENS_PERCENT))));
  }
}
