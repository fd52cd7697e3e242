package fourthwire.web.support;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.audit.NodeResult;
import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Severity;
import fourthwire.quantity.Figure;
import fourthwire.site.Circuit;
import fourthwire.site.Feeder;
import fourthwire.site.Lines;
import fourthwire.site.Practice;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.web.SampleSite;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.springframework.context.support.ResourceBundleMessageSource;

/** The verdict in words is true of all nodes, circuits included, and counts things, not rows. */
class HeadlineTest {
  @Test
  void circuitsThatShareOneNeutralAreOneNeutral() {
    List<NodeResult> nodes =
        List.of(
            node("LP-9:1", SiteTree.Kind.CIRCUIT, over(FindingCode.NEUTRAL_AMPACITY)),
            node("LP-9:2", SiteTree.Kind.CIRCUIT, over(FindingCode.NEUTRAL_AMPACITY)),
            node("LP-9:3", SiteTree.Kind.CIRCUIT, over(FindingCode.NEUTRAL_AMPACITY)),
            node("LP-9", SiteTree.Kind.PANEL, guidance(FindingCode.CURRENT_TDD)));
    Headline.Text text = of(nodes);
    assertThat(text.sentence()).isEqualTo("One neutral is over its ampacity");
    assertThat(text.also())
        .isEqualTo("Also: the current is distorted beyond the guidance figure at one node.");
  }

  @Test
  void aResonanceIsNamedByItsOrderAndOnceForAllNodes() {
    List<NodeResult> nodes =
        List.of(
            node("MSB", SiteTree.Kind.PANEL, resonance(), over(FindingCode.NEUTRAL_AMPACITY)),
            node("LP-1", SiteTree.Kind.PANEL, resonance(), over(FindingCode.NEUTRAL_AMPACITY)));
    assertThat(of(nodes).sentence())
        .isEqualTo("Two neutrals are over their ampacity and a resonance waits near the 7th");
    assertThat(of(nodes).also()).isEmpty();
  }

  @Test
  void guidancePassedInsideTheSiteIsNotNear() {
    List<NodeResult> nodes =
        List.of(node("MSB", SiteTree.Kind.PANEL, guidance(FindingCode.VOLTAGE_THD)));
    assertThat(of(nodes).sentence())
        .isEqualTo("The voltage is distorted beyond the guidance figure at one node")
        .doesNotContain("near");
  }

  @Test
  void aFigureNearItsLimitIsSaidToBeNear() {
    Finding near = finding(FindingCode.LINE_AMPACITY, Severity.WATCH, 90, 100);
    assertThat(of(List.of(node("LP-1:4", SiteTree.Kind.CIRCUIT, near))).sentence())
        .isEqualTo("One circuit is near its ampacity");
    assertThat(of(List.of(node("LP-1", SiteTree.Kind.PANEL, near))).sentence())
        .isEqualTo("One feeder’s lines are near their ampacity");
  }

  @Test
  void notesMakeNoHeadline() {
    Finding note = finding(FindingCode.OTHER_TRIPLENS, Severity.NOTE, 12, 10);
    assertThat(of(List.of(node("LP-1", SiteTree.Kind.PANEL, note))).sentence())
        .isEqualTo("Nothing found over or near its limits");
  }

  private static Headline.Text of(List<NodeResult> nodes) {
    ResourceBundleMessageSource messages = new ResourceBundleMessageSource();
    messages.setBasename("messages");
    messages.setDefaultEncoding("UTF-8");
    return new Headline(new Words(messages)).of(nodes, withSharedNeutral());
  }

  private static Survey withSharedNeutral() {
    Survey s = SampleSite.survey(Practice.IEC);
    List<Circuit> circuits = new ArrayList<>(s.circuits());
    for (String line : List.of("L1", "L2", "L3")) {
      circuits.add(
          new Circuit(
              line.substring(1),
              "LP-9",
              Lines.find(line).orElseThrow(),
              OptionalDouble.empty(),
              Optional.of("N1"),
              Feeder.UNKNOWN));
    }
    return new Survey(
        s.settings(),
        s.supplies(),
        s.background(),
        s.transformers(),
        s.panels(),
        circuits,
        s.loads(),
        s.spectra(),
        s.schedules(),
        s.capacitors(),
        s.filters(),
        s.meters(),
        s.spotReadings());
  }

  private static NodeResult node(String name, SiteTree.Kind kind, Finding... findings) {
    return new NodeResult(
        name,
        kind,
        Optional.empty(),
        "GRID",
        Optional.empty(),
        "",
        List.of(),
        List.of(findings),
        List.of());
  }

  private static Finding over(FindingCode code) {
    return finding(code, Severity.ACT, 130, 100);
  }

  private static Finding guidance(FindingCode code) {
    return finding(code, Severity.WATCH, 26, 15);
  }

  private static Finding resonance() {
    return finding(FindingCode.RESONANCE, Severity.WATCH, 7.2, 7);
  }

  private static Finding finding(FindingCode code, Severity severity, double figure, double limit) {
    return new Finding(
        code.word(),
        severity,
        Figure.of(figure),
        Figure.of(limit),
        "",
        Figure.unknown("no spread was computed"),
        "invented for this test",
        "Invented.");
  }
}
