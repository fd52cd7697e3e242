package fourthwire.limits.distortion;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.limits.Check;
import fourthwire.limits.Finding;
import fourthwire.limits.Severity;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** Judgements on currents and voltages; the figures are those of IEEE 519-2022, Tables 1 and 2. */
class DistortionLimitsTest {
  /** 400 V, 34 times the demand current of 100 A: Table 2 gives 7 % to order 10, TDD 8 %. */
  private static final CurrentDistortion519 TABLE_2 =
      CurrentDistortion519.of(Edition519.IEEE_519_2022, 400, 3400, 100);

  private static Spectrum with(double fundamental, int order, double amount) {
    return Spectrum.of(h -> new Phasor(h == 1 ? fundamental : h == order ? amount : 0, 0));
  }

  private static List<Finding> judge(double fifth, AssessmentPoint place) {
    return TABLE_2.judge(
        Map.of(Conductor.L1, with(90, 5, 1), Conductor.L2, with(90, 5, fifth)), 100, place);
  }

  @Test
  void overALimitAtCommonCouplingAsksForAction() {
    List<Finding> findings = judge(9.1, AssessmentPoint.COMMON_COUPLING);
    assertThat(findings).extracting(Finding::code).containsExactly("current-order", "current-tdd");
    Finding order = findings.get(0);
    assertThat(order.severity()).isEqualTo(Severity.ACT);
    assertThat(order.figure().value().orElseThrow()).isCloseTo(9.1, within(1e-9));
    assertThat(order.limit()).isEqualTo(Figure.of(7));
    assertThat(order.sentence())
        .isEqualTo(
            "The 5th harmonic of L2 is 9.1 % of the demand current; IEEE 519-2022 allows 7 % at"
                + " this short-circuit ratio (34).");
    assertThat(order.basis()).isEqualTo("IEEE 519-2022, clause 5.2, Table 2");
  }

  @Test
  void nearTheLimitIsWatchedAndUnderItIsNoFinding() {
    assertThat(judge(6.9, AssessmentPoint.COMMON_COUPLING))
        .extracting(Finding::severity)
        .containsExactly(Severity.WATCH, Severity.WATCH);
    assertThat(judge(5.5, AssessmentPoint.COMMON_COUPLING)).isEmpty();
  }

  @Test
  void insideTheSiteTheLimitIsAGuide() {
    assertThat(judge(9.1, AssessmentPoint.INSIDE))
        .allSatisfy(f -> assertThat(f.severity()).isEqualTo(Severity.WATCH))
        .allSatisfy(f -> assertThat(f.sentence()).contains("Guidance only"));
    assertThat(judge(6.9, AssessmentPoint.INSIDE)).isEmpty();
  }

  @Test
  void aGeneratorHasNoCommonCoupling() {
    assertThat(judge(50, AssessmentPoint.GENERATOR)).isEmpty();
  }

  /** The ratio's bands: a printed bound belongs to the upper row, 1000 itself to "100 to 1000". */
  @Test
  void boundsOfTheRatio() {
    assertThat(tdd(19.999)).isEqualTo(5);
    assertThat(tdd(20)).isEqualTo(8);
    assertThat(tdd(1000)).isEqualTo(15);
    assertThat(tdd(1000.1)).isEqualTo(20);
  }

  private static double tdd(double ratio) {
    return CurrentDistortion519.of(Edition519.IEEE_519_2022, 400, ratio, 1).tddLimitPercent();
  }

  @Test
  void voltageOverTableOne() {
    VoltageDistortion table = VoltageDistortion.ieee519(Edition519.IEEE_519_2022, 480);
    List<Finding> findings =
        table.judge(Map.of("L1", with(277, 5, 277 * 0.06)), AssessmentPoint.COMMON_COUPLING);
    assertThat(findings).extracting(Finding::code).containsExactly("voltage-order");
    assertThat(findings.get(0).severity()).isEqualTo(Severity.ACT);
    assertThat(findings.get(0).sentence()).contains("5th harmonic", "6 %", "5 %");
  }

  /** IEC 61000-2-4 holds at every point of a plant, EN 50160 at the supply's terminals. */
  @Test
  void plantLevelsBindInside() {
    Map<String, Spectrum> voltage = Map.of("L1", with(230, 5, 230 * 0.07));
    assertThat(VoltageDistortion.iec61000x2x4(2).judge(voltage, AssessmentPoint.INSIDE))
        .extracting(Finding::severity)
        .containsExactly(Severity.ACT, Severity.WATCH);
    assertThat(VoltageDistortion.en50160(400).judge(voltage, AssessmentPoint.INSIDE))
        .extracting(Finding::severity)
        .containsExactly(Severity.WATCH);
    assertThat(VoltageDistortion.en50160(400).orderLimitPercent(29)).isEmpty();
  }

  /** A bank's resonance at order 6.8: the 7th carries current, so it is named. */
  @Test
  void resonanceNamesItsBank() {
    List<ResonanceCheck.Peak> peaks = List.of(new ResonanceCheck.Peak(6.8, 1.9, "PFC-1"));
    List<Finding> findings = ResonanceCheck.judge(peaks, List.of(with(100, 7, 12)));
    assertThat(findings).hasSize(1);
    assertThat(findings.get(0).sentence()).contains("PFC-1", "6.8", "7th", "12 %");
    assertThat(ResonanceCheck.judge(peaks, List.of(with(100, 5, 20)))).isEmpty();
    assertThat(ResonanceCheck.judge(peaks, List.of(with(100, 7, 0.5)))).isEmpty();
  }

  /** NEMA MG 1: 0.03; EN 50160: 2 % of negative sequence. */
  @Test
  void motorsAndUnbalance() {
    assertThat(VoltageQuality.motorVoltage(List.of(with(100, 5, 7))).finding()).isPresent();
    assertThat(VoltageQuality.motorVoltage(List.of(with(100, 5, 2))).finding()).isEmpty();
    assertThat(VoltageQuality.unbalance(Figure.of(2.1)).flatMap(Check::finding))
        .map(Finding::severity)
        .hasValue(Severity.ACT);
    assertThat(VoltageQuality.unbalance(Figure.unknown("not supplied"))).isEmpty();
  }
}
