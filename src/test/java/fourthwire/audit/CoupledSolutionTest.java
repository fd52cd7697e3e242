package fourthwire.audit;

import static fourthwire.audit.SurveyBuilder.ohms;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.quantity.Conductor;
import fourthwire.site.LoadKind;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.testsupport.MixedSite;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Network and loads together where that is hard: soft sources, hundreds of units on one riser, a
 * bank in resonance. That they settled is checked from outside: what all circuits take and all
 * feeders lose is what the supply gives, and √3 bounds the neutral of pulses that never overlap
 * (reference: neutral_closed_forms).
 */
class CoupledSolutionTest {
  private static final double SQRT3_PERCENT = 173.3;

  @Test
  @DisplayName("600 computers on one riser: pulses flattened by their own voltage drop")
  void sixHundredOnOneRiser() {
    List<NodeResult> nodes = audit(computers(true), Optional.empty(), 2);
    balances(nodes);
    DesignState riser = state(nodes, "LP");
    assertThat(value(riser.neutral().percentOfMeanLine())).isBetween(120.0, SQRT3_PERCENT);
    assertThat(value(riser.voltage().get("L1").thdPercent())).isBetween(4.0, 15.0);
    DesignState one = state(audit(computers(false), Optional.empty(), 1), "LP");
    assertThat(value(riser.lines().get(Conductor.L1).thdPercent()))
        .as("attenuation: many units distort less than one")
        .isLessThan(0.8 * value(one.lines().get(Conductor.L1).thdPercent()));
  }

  @Test
  @DisplayName("The same computers on a generating set of little more than their rating")
  void softGenerator() {
    List<NodeResult> nodes = audit(computers(true), Optional.of("SET"), 2);
    balances(nodes);
    assertThat(value(state(nodes, "LP").voltage().get("L1").thdPercent())).isGreaterThan(10);
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2})
  @DisplayName("A mixed site is the same to the last bit on one thread and on three")
  void threads(long seed) {
    Survey survey = MixedSite.survey(8, 120, seed);
    List<NodeResult> alone = audit(survey, Optional.empty(), 1);
    balances(alone);
    assertThat(audit(survey, Optional.empty(), 3)).isEqualTo(alone);
  }

  @Test
  @DisplayName("A cancel is heard within a pass, on every thread")
  void cancel() {
    AtomicInteger heard = new AtomicInteger();
    Progress impatient =
        (share, message) -> {
          if (message.contains("pass 2") && heard.incrementAndGet() == 3) {
            throw new Progress.CancelledException();
          }
        };
    AuditRequest request =
        new AuditRequest(MixedSite.survey(8, 120, 1), Optional.empty(), Map.of());
    assertThatThrownBy(() -> new HarmonicAudit(2).run(request, impatient))
        .isInstanceOf(Progress.CancelledException.class);
    assertThat(heard).hasValue(3);
  }

  /** Thirty circuits of twenty computers behind one riser, with a set that can take over. */
  private static Survey computers(boolean all) {
    SurveyBuilder b =
        new SurveyBuilder(50)
            .supply("GRID", 400, 12, 5)
            .generator("SET", 400, 100, 14, "MSB")
            .panel("MSB", "GRID", ohms(0.002, 0.002, 0.002, 0.002))
            .panel("LP", "MSB", ohms(0.012, 0.008, 0.012, 0.008));
    int units = all ? 20 : 1;
    for (int k = 0; k < (all ? 30 : 3); k++) {
      b.circuit("c" + k, "LP", "L" + (k % 3 + 1), ohms(0.05, 0.005, 0.05, 0.005))
          .load("LP", "c" + k, LoadKind.CAPACITOR_INPUT, 120, units);
    }
    return b.build();
  }

  private static List<NodeResult> audit(Survey survey, Optional<String> supply, int threads) {
    return new HarmonicAudit(threads)
        .run(new AuditRequest(survey, supply, Map.of()), Progress.SILENT)
        .nodes();
  }

  private static DesignState state(List<NodeResult> nodes, String name) {
    return nodes.stream()
        .filter(n -> n.node().equals(name))
        .findFirst()
        .flatMap(NodeResult::design)
        .orElseThrow();
  }

  private static double value(fourthwire.quantity.Figure figure) {
    return figure.value().orElseThrow();
  }

  private static void balances(List<NodeResult> nodes) {
    double supplied = activeW(nodes, SiteTree.Kind.SUPPLY);
    double taken = activeW(nodes, SiteTree.Kind.CIRCUIT);
    double lost =
        nodes.stream().flatMap(n -> n.design().stream()).mapToDouble(d -> value(d.lossesW())).sum();
    assertThat(taken + lost).isCloseTo(supplied, within(1e-7 * supplied));
  }

  private static double activeW(List<NodeResult> nodes, SiteTree.Kind kind) {
    return nodes.stream()
        .filter(n -> n.kind() == kind)
        .flatMap(n -> n.design().stream())
        .mapToDouble(d -> value(d.power().activeW()))
        .sum();
  }
}
