package fourthwire.audit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.testsupport.SmallSite;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;

/** I_L (public contract, section 6): as surveyed, else as measured, else the design state's. */
class MeasuredDemandTest {
  private static final Figure NOT = Figure.unknown("not measured");

  private static MeasuredState state(Figure demandA) {
    return new MeasuredState(
        "M1",
        OptionalLong.of(7),
        Optional.empty(),
        "the interval with the highest line current, as read",
        Map.of(),
        new DesignState.NeutralCurrent(NOT, NOT, NOT, NOT, ""),
        Map.of(),
        new PowerFigures(NOT, NOT, NOT, NOT, NOT, NOT),
        Map.of(),
        new MeasuredState.Demand(demandA, "of twelve months, as read"));
  }

  private static DesignState design(Map<String, List<MeasuredState>> measured) {
    AuditResult result =
        new HarmonicAudit()
            .run(
                new AuditRequest(
                    SmallSite.survey("Works"),
                    Optional.empty(),
                    measured,
                    false,
                    0,
                    AuditRequest.SEED),
                (share, message) -> {});
    return result.nodes().stream()
        .filter(n -> n.node().equals("LP-1"))
        .findFirst()
        .orElseThrow()
        .design()
        .orElseThrow();
  }

  /** TDD after IEEE 519-2022, 3.1: the root of the sum of squares of orders 2 to 50, on I_L. */
  @Test
  void aMetersDemandTakesTheDesignStatesPlace() {
    DesignState computed = design(Map.of());
    assertThat(computed.demandBasis()).contains("design state");

    DesignState measured =
        design(Map.of("LP-1", List.of(state(Figure.unknown("too short")), state(Figure.of(17)))));
    assertThat(measured.demandA().value()).hasValue(17);
    assertThat(measured.demandBasis()).isEqualTo("As measured by M1: of twelve months, as read.");
    Spectrum line = measured.currentSpectrum().get(Conductor.L1);
    double sum = 0;
    for (int h = 2; h <= Spectrum.HIGHEST_ORDER; h++) {
      sum += line.magnitude(h) * line.magnitude(h);
    }
    assertThat(measured.lines().get(Conductor.L1).tddPercent().value().orElseThrow())
        .isCloseTo(100 * Math.sqrt(sum) / 17, within(1e-9));
  }
}
