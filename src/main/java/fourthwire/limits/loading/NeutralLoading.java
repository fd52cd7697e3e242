package fourthwire.limits.loading;

import fourthwire.limits.Check;
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
import java.util.OptionalDouble;

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
 * @param checks the neutral's and the most loaded line's. A circuit of one line says the same of
 *     line and neutral, so the neutral is left out there unless it is the tighter of the two
 * @param otherTriplensPercent orders 6, 9, 12 … on the fundamental, where a rule asks for it
 */
public record NeutralLoading(
    Optional<ConductorLoading> neutral,
    ConductorLoading line,
    String lineName,
    AmpacityFactors factors,
    Figure thirdHarmonicPercent,
    double requiredAmpacityA,
    List<Check> checks,
    OptionalDouble otherTriplensPercent) {

  /** Judges a feeder. */
  public static NeutralLoading of(NeutralCase c) {
    AmpacityFactors factors = c.rule().factors(c);
    Spectrum worst = c.mostLoadedLine().getValue();
    String lineName = c.mostLoadedLine().getKey().name();
    ConductorLoading line = ConductorLoading.of(worst.rms(), c.lineRatings(), factors.line());
    Optional<ConductorLoading> neutral =
        c.neutral().map(n -> ConductorLoading.of(n.rms(), c.neutralRatings(), factors.neutral()));
    List<Check> checks = new ArrayList<>();
    neutral
        .filter(n -> c.lines().size() > 1 || n.isTighterThan(line))
        .flatMap(n -> n.check(FindingCode.NEUTRAL_AMPACITY, "The neutral", factors))
        .ifPresent(checks::add);
    line.check(FindingCode.LINE_AMPACITY, lineName, factors).ifPresent(checks::add);
    return new NeutralLoading(
        neutral,
        line,
        lineName,
        factors,
        thirdPercent(worst),
        Math.max(
            line.rmsA() / factors.line(),
            neutral.map(n -> n.rmsA() / factors.neutral()).orElse(0.0)),
        List.copyOf(checks),
        otherTriplens(c, worst));
  }

  /** Act over the limit, watch over 80 %, a note on other triplens; worst first. */
  public List<Finding> findings() {
    List<Finding> findings = new ArrayList<>(Judgement.findings(checks));
    notes().forEach(findings::add);
    findings.sort(Comparator.comparing(Finding::severity));
    return findings;
  }

  /** What is said besides the checks: triplens that the cable factors do not cover. */
  public List<Finding> notes() {
    return otherTriplensPercent.stream().mapToObj(this::otherTriplens).toList();
  }

  private static Figure thirdPercent(Spectrum line) {
    return line.magnitude(1) > 0
        ? Figure.of(ThirdHarmonicContent.percent(line))
        : Figure.unknown("no fundamental");
  }

  private static OptionalDouble otherTriplens(NeutralCase c, Spectrum worst) {
    double percent = ThirdHarmonicContent.otherTriplensPercent(worst);
    boolean told =
        c.rule() == AmpacityRule.THIRD_HARMONIC_CONTENT
            && c.isFourWire()
            && percent > ThirdHarmonicContent.OTHER_TRIPLENS_PERCENT;
    return told ? OptionalDouble.of(percent) : OptionalDouble.empty();
  }

  private Finding otherTriplens(double percent) {
    return Judgement.note(
        FindingCode.OTHER_TRIPLENS,
        percent,
        "%",
        ThirdHarmonicContent.basis(),
        "On %s the triplen harmonics beyond the third come to %s %% of the fundamental; above %s %% Annex E asks for a lower factor than its table gives."
            .formatted(
                lineName,
                Words.number(percent),
                Words.number(ThirdHarmonicContent.OTHER_TRIPLENS_PERCENT)));
  }
}
