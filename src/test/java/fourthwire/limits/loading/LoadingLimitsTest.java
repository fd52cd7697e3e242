package fourthwire.limits.loading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;
import static org.assertj.core.api.Assertions.within;

import fourthwire.limits.Finding;
import fourthwire.limits.Severity;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/** Conductors, transformers and banks against what they carry; sources stand beside each rule. */
class LoadingLimitsTest {
  private static Spectrum amps(double first, double third, double ninth) {
    return Spectrum.of(h -> new Phasor(h == 1 ? first : h == 3 ? third : h == 9 ? ninth : 0, 0));
  }

  private static NeutralCase balanced(
      AmpacityRule rule, Spectrum line, double nonlinearShare, ConductorRating... neutral) {
    Spectrum sum = Spectrum.of(h -> h % 3 == 0 ? line.at(h).times(3) : Phasor.ZERO);
    return new NeutralCase(
        rule,
        Map.of(Conductor.L1, line, Conductor.L2, line, Conductor.L3, line),
        Optional.of(sum),
        List.of(new ConductorRating("feeder", 150, true)),
        List.of(neutral),
        nonlinearShare,
        true);
  }

  private static final ConductorRating FEEDER = new ConductorRating("feeder", 150, true);

  /** IEC 60364-5-52, Annex E: 40 % of third harmonic puts 0.86 on the neutral. */
  @Test
  void annexEWorksOnTheNeutralFrom33Percent() {
    NeutralLoading loading =
        NeutralLoading.of(
            balanced(AmpacityRule.THIRD_HARMONIC_CONTENT, amps(110, 44, 0), 1, FEEDER));
    ConductorLoading neutral = loading.neutral().orElseThrow();
    assertThat(neutral.rmsA()).isCloseTo(132, within(1e-9));
    assertThat(neutral.loadingPercent().value().orElseThrow()).isCloseTo(88, within(1e-9));
    assertThat(neutral.adjustedAmpacityA().value().orElseThrow()).isCloseTo(129, within(1e-9));
    assertThat(loading.factors().line()).isEqualTo(1);
    Finding finding = loading.findings().get(0);
    assertThat(finding.code()).isEqualTo("neutral-ampacity");
    assertThat(finding.severity()).isEqualTo(Severity.ACT);
    assertThat(finding.limit().value().orElseThrow()).isCloseTo(129, within(1e-9));
    assertThat(finding.basis()).contains("IEC 60364-5-52", "E.52.1");
    assertThat(finding.sentence()).contains("132 A", "129 A", "feeder: 150 A × 0.86", "40 %");
  }

  /** The same annex: 15 to 33 % puts 0.86 on the lines; over 45 % the neutral takes 1.0. */
  @Test
  void annexEBands() {
    assertThat(factors(14.9)).containsExactly(1.0, 1.0);
    assertThat(factors(15.1)).containsExactly(0.86, 1.0);
    assertThat(factors(32.9)).containsExactly(0.86, 1.0);
    assertThat(factors(33.1)).containsExactly(1.0, 0.86);
    assertThat(factors(45.1)).containsExactly(1.0, 1.0);
  }

  private static List<Double> factors(double thirdPercent) {
    AmpacityFactors factors =
        NeutralLoading.of(
                balanced(AmpacityRule.THIRD_HARMONIC_CONTENT, amps(100, thirdPercent, 0), 1))
            .factors();
    return List.of(factors.line(), factors.neutral());
  }

  /** A bus is no cable: the factor leaves it alone, and the smaller of the two is named. */
  @Test
  void theSmallerOfFeederAndBusGoverns() {
    NeutralLoading loading =
        NeutralLoading.of(
            balanced(
                AmpacityRule.THIRD_HARMONIC_CONTENT,
                amps(110, 44, 0),
                1,
                FEEDER,
                new ConductorRating("neutral bus", 125, false)));
    ConductorLoading neutral = loading.neutral().orElseThrow();
    assertThat(neutral.adjustedName()).isEqualTo("neutral bus");
    assertThat(neutral.adjustedAmpacityA().value().orElseThrow()).isEqualTo(125);
    assertThat(neutral.factor()).isEqualTo(1);
  }

  /** Ninth harmonic of 12 %: a note that Annex E's table does not cover it. */
  @Test
  void otherTriplensAreNoted() {
    assertThat(triplenCodes(12)).contains("other-triplens");
    assertThat(triplenCodes(9)).doesNotContain("other-triplens");
  }

  private static List<String> triplenCodes(double ninth) {
    return NeutralLoading.of(balanced(AmpacityRule.THIRD_HARMONIC_CONTENT, amps(100, 10, ninth), 1))
        .findings()
        .stream()
        .map(Finding::code)
        .toList();
  }

  /** NFPA 70, 310.15(E): a wye's neutral counts over half nonlinear; two lines' always; (C)(1). */
  @Test
  void northAmericanCount() {
    Spectrum line = amps(100, 30, 0);
    assertThat(northAmerican(balanced(AmpacityRule.CURRENT_CARRYING_COUNT, line, 0.51)))
        .isEqualTo(0.8);
    assertThat(northAmerican(balanced(AmpacityRule.CURRENT_CARRYING_COUNT, line, 0.5)))
        .isEqualTo(1.0);
    assertThat(northAmerican(twoLines(line, true))).isEqualTo(1.0);
    assertThat(NeutralLoading.of(twoLines(line, true)).factors().reason().get())
        .contains("3 current-carrying");
    assertThat(NeutralLoading.of(twoLines(line, false)).factors().reason().get())
        .contains("2 current-carrying");
  }

  private static NeutralCase twoLines(Spectrum line, boolean wye) {
    return new NeutralCase(
        AmpacityRule.CURRENT_CARRYING_COUNT,
        Map.of(Conductor.L1, line, Conductor.L2, line),
        Optional.of(line),
        List.of(FEEDER),
        List.of(FEEDER),
        1,
        wye);
  }

  private static double northAmerican(NeutralCase c) {
    return NeutralLoading.of(c).factors().neutral();
  }

  /** One line and its neutral carry the same: said once, of the tighter one. */
  @Test
  void aSingleLineCircuitIsJudgedOnce() {
    assertThat(singleLine(FEEDER)).containsExactly("line-ampacity");
    assertThat(singleLine(new ConductorRating("feeder", 120, true)))
        .containsExactlyInAnyOrder("neutral-ampacity", "line-ampacity");
  }

  private static List<String> singleLine(ConductorRating neutral) {
    Spectrum line = amps(140, 0, 0);
    NeutralCase c =
        new NeutralCase(
            AmpacityRule.THIRD_HARMONIC_CONTENT,
            Map.of(Conductor.L1, line),
            Optional.of(line),
            List.of(FEEDER),
            List.of(neutral),
            1,
            true);
    return NeutralLoading.of(c).findings().stream().map(Finding::code).toList();
  }

  /** No rating known: no loading and no verdict, and the reason is there. */
  @Test
  void unknownAmpacityGivesNoVerdict() {
    NeutralLoading loading =
        NeutralLoading.of(balanced(AmpacityRule.THIRD_HARMONIC_CONTENT, amps(100, 40, 0), 1));
    assertThat(loading.neutral().orElseThrow().loadingPercent().value()).isEmpty();
    assertThat(loading.neutral().orElseThrow().loadingPercent().reason()).isNotBlank();
    assertThat(loading.findings()).noneMatch(f -> f.code().equals("neutral-ampacity"));
  }

  /** IEEE C57.110: a sine takes nothing off, more distortion takes more; act over the derating. */
  @Test
  void transformerDeratesWithDistortion() {
    assertThat(derated(amps(90, 0, 0))).isCloseTo(100, within(1e-9));
    assertThat(derated(amps(90, 20, 0))).isGreaterThan(derated(amps(90, 40, 0))).isLessThan(100);
    TransformerLoading over = transformer(amps(96, 30, 10), OptionalDouble.empty());
    assertThat(over.findings())
        .extracting(Finding::code, Finding::severity)
        .containsExactly(tuple("transformer-loading", Severity.ACT));
  }

  /** A K rating is held against the K-factor (UL 1561); the next one that bears it is named. */
  @Test
  void kRating() {
    TransformerLoading loading = transformer(amps(70, 60, 30), OptionalDouble.of(4));
    Finding finding =
        loading.findings().stream()
            .filter(f -> f.code().equals("transformer-k-rating"))
            .findFirst()
            .orElseThrow();
    assertThat(finding.severity()).isEqualTo(Severity.ACT);
    assertThat(loading.kFactor().value().orElseThrow())
        .isCloseTo(0.49 + 9 * 0.36 + 81 * 0.09, within(1e-9));
    assertThat(finding.sentence()).contains("K-13");
  }

  private static double derated(Spectrum current) {
    return transformer(current, OptionalDouble.empty()).deratedKva().value().orElseThrow();
  }

  private static TransformerLoading transformer(Spectrum current, OptionalDouble kRating) {
    return TransformerLoading.of(
        new TransformerCase(100, 100, List.of(current, current, current), 0.08, kRating));
  }

  /** IEEE 18: 135 % of rated current; IEC 60831: 130 %. */
  @Test
  void capacitorOverload() {
    CapacitorLoading.Phase phase =
        new CapacitorLoading.Phase("PFC-1", amps(100, 0, 88), amps(231, 0, 23), 231, 23_100);
    assertThat(CapacitorLoading.judge(phase, CapacitorLoading.Standard.IEC_60831))
        .extracting(Finding::code, Finding::severity)
        .containsExactly(tuple("capacitor-current", Severity.ACT));
    assertThat(CapacitorLoading.judge(phase, CapacitorLoading.Standard.IEEE_18))
        .extracting(Finding::code, Finding::severity)
        .contains(tuple("capacitor-current", Severity.WATCH));
  }
}
