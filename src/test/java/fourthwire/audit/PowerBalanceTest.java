package fourthwire.audit;

import static fourthwire.audit.SurveyBuilder.ohms;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Laws that every audited site obeys: power balance, Kirchhoff's law, rotation of the lines. */
class PowerBalanceTest {
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {21, 22, 23, 24})
  void whatTheSupplyGivesIsWhatCircuitsTakeAndFeedersLose(long seed) {
    List<NodeResult> nodes = audit(site(seed, 0));
    double supplied = activeW(nodes, SiteTree.Kind.SUPPLY);
    double taken = activeW(nodes, SiteTree.Kind.CIRCUIT);
    double lost =
        nodes.stream()
            .mapToDouble(n -> n.design().orElseThrow().lossesW().value().orElseThrow())
            .sum();
    assertThat(taken + lost).as("seed %d", seed).isCloseTo(supplied, within(1e-7 * supplied));
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {31, 32})
  void theNeutralIsTheSumOfTheLinesAndTheAddersSumToIt(long seed) {
    for (NodeResult node : audit(site(seed, 0))) {
      DesignState state = node.design().orElseThrow();
      if (node.kind() != SiteTree.Kind.PANEL) {
        continue;
      }
      Spectrum sum =
          state.currentSpectrum().entrySet().stream()
              .filter(e -> e.getKey().isLine())
              .map(Map.Entry::getValue)
              .reduce(Spectrum.ZERO, Spectrum::plus);
      Spectrum neutral = state.currentSpectrum().get(Conductor.N);
      assertThat(sum.minus(neutral).rms()).isLessThan(1e-9 * (1 + sum.rms()));
      assertThat(state.neutralAdders().stream().mapToDouble(DesignState.NeutralAdder::amps).sum())
          .isCloseTo(neutral.rms(), within(1e-9 * (1 + neutral.rms())));
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {41, 42})
  void turningAllLinesTurnsTheFiguresAndNothingElse(long seed) {
    List<NodeResult> plain = audit(site(seed, 0));
    List<NodeResult> turned = audit(site(seed, 1));
    for (int n = 0; n < plain.size(); n++) {
      DesignState a = plain.get(n).design().orElseThrow();
      DesignState b = turned.get(n).design().orElseThrow();
      if (plain.get(n).kind() == SiteTree.Kind.PANEL) {
        assertThat(b.neutral().rmsA().value().orElseThrow())
            .isCloseTo(
                a.neutral().rmsA().value().orElseThrow(),
                within(2e-4 * a.lines().get(Conductor.L1).rmsA().value().orElseThrow()));
        assertThat(b.lines().get(Conductor.L2).rmsA().value().orElseThrow())
            .isCloseTo(
                a.lines().get(Conductor.L1).rmsA().value().orElseThrow(),
                within(2e-4 * a.lines().get(Conductor.L1).rmsA().value().orElseThrow()));
      }
    }
  }

  private static List<NodeResult> audit(Survey survey) {
    return new HarmonicAudit()
        .run(new AuditRequest(survey, Optional.empty(), Map.of()), Progress.SILENT)
        .nodes();
  }

  private static double activeW(List<NodeResult> nodes, SiteTree.Kind kind) {
    return nodes.stream()
        .filter(n -> n.kind() == kind)
        .mapToDouble(n -> n.design().orElseThrow().power().activeW().value().orElseThrow())
        .sum();
  }

  /** A random site; {@code turn} moves every load to the next line. */
  private static Survey site(long seed, int turn) {
    Random random = new Random(seed);
    SurveyBuilder b =
        new SurveyBuilder(50)
            .supply("GRID", 11000, 150, 8)
            .transformer("T1", "GRID", 250, 11000, 400, "Dyn11", 4, 3250)
            .panel("MSB", "T1", ohms(0.01, 0.006, 0.01, 0.006))
            .panel("A", "MSB", ohms(0.06, 0.01, 0.09, 0.01))
            .panel("B", "MSB", ohms(0.05, 0.01, 0.05, 0.01));
    LoadKind[] kinds = {LoadKind.CAPACITOR_INPUT, LoadKind.PFC_CONTINUOUS, LoadKind.RESISTIVE};
    for (int k = 0; k < 10; k++) {
      String panel = k % 2 == 0 ? "A" : "B";
      String line = "L" + ((k + turn) % 3 + 1);
      boolean shared = k < 4 && k % 2 == 0;
      b.circuit(
              "c" + k,
              panel,
              line,
              shared ? Optional.of("s") : Optional.empty(),
              ohms(0.1 + random.nextDouble(), 0.02, 0.3, 0.02))
          .load(panel, "c" + k, kinds[random.nextInt(3)], 100 + 200 * random.nextDouble(), 6);
    }
    b.circuit("drive", "B", "L1-L2-L3", ohms(0.1, 0.03, 0, 0))
        .load("B", "drive", LoadKind.SIX_PULSE, 6000, 1);
    return b.build();
  }
}
