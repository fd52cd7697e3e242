package fourthwire.sample;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.audit.AuditResult;
import fourthwire.audit.DesignState;
import fourthwire.audit.NodeResult;
import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Severity;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** What the demo site is there to show, and that each verdict goes when one input is changed. */
class DemoVerdictsTest {
  /** The bank's peak then stands by the 15th, of which the main board carries little. */
  private static final double ANOTHER_SIZE_KVAR = 40;

  private static Survey survey;
  private static AuditResult audit;

  @BeforeAll
  static void asItStands() {
    survey = DemoSurvey.read();
    audit = DemoSurvey.audit(survey);
  }

  @Test
  void isOfTheSizeItWasAskedFor() {
    assertThat(survey.panels()).hasSizeGreaterThan(12);
    assertThat(survey.circuits()).hasSizeGreaterThan(150);
    assertThat(survey.loads()).hasSizeGreaterThan(170);
    assertThat(survey.spotReadings()).hasSizeGreaterThan(20);
  }

  @Test
  void oldOfficeOverloadsItsNeutralUntilTheNeutralIsLarger() {
    assertThat(find(audit, "OF-3W", FindingCode.NEUTRAL_AMPACITY))
        .map(Finding::severity)
        .hasValue(Severity.ACT);
    AuditResult mended = DemoSurvey.audit(Changed.neutral(survey, "OF-3W", "50 mm2"));
    assertThat(find(mended, "OF-3W", FindingCode.NEUTRAL_AMPACITY)).isEmpty();
  }

  @Test
  void transformerIsDeratedAndNearItsLimitUntilItsWindingsHaveLittleEddyLoss() {
    assertThat(deratedKva(audit)).isLessThan(0.97 * 630);
    assertThat(find(audit, "T1", FindingCode.TRANSFORMER_LOADING))
        .map(Finding::severity)
        .hasValue(Severity.WATCH);
    AuditResult mended = DemoSurvey.audit(Changed.eddyLoss(survey, "T1", 1));
    assertThat(deratedKva(mended)).isGreaterThan(0.99 * 630);
    assertThat(find(mended, "T1", FindingCode.TRANSFORMER_LOADING)).isEmpty();
  }

  @Test
  void bankResonatesNearTheThirteenthUntilItIsOfAnotherSize() {
    Finding resonance = find(audit, "MSB", FindingCode.RESONANCE).orElseThrow();
    assertThat(resonance.limit().value()).hasValue(13);
    AuditResult mended = DemoSurvey.audit(Changed.bank(survey, "PFC-1", ANOTHER_SIZE_KVAR));
    assertThat(find(mended, "MSB", FindingCode.RESONANCE)).isEmpty();
  }

  @Test
  void kitchenIsFineUntilItsFeederIsTooSmall() {
    assertThat(DemoSurvey.node(audit, "CAFE").findings()).isEmpty();
    AuditResult spoilt = DemoSurvey.audit(Changed.size(survey, "CAFE", "6 mm2"));
    assertThat(find(spoilt, "CAFE", FindingCode.LINE_AMPACITY)).isPresent();
  }

  /** A page that is all red, or all the same, teaches nothing. */
  @Test
  void verdictsAreMixed() {
    List<NodeResult> boards =
        audit.nodes().stream().filter(n -> n.kind() == SiteTree.Kind.PANEL).toList();
    assertThat(boards).filteredOn(n -> n.findings().isEmpty()).hasSizeBetween(3, 10);
    assertThat(boards)
        .filteredOn(n -> n.findings().stream().anyMatch(f -> f.severity() == Severity.ACT))
        .hasSizeBetween(1, 3);
  }

  /** Common practice, no source: what an engineer expects of a sound low-voltage installation. */
  @Test
  void figuresAreThoseOfABuilding() {
    assertThat(transformer().transformer().orElseThrow().loadingPercent().value().orElseThrow())
        .isBetween(50.0, 85.0);
    for (NodeResult n : audit.nodes()) {
      DesignState design = n.design().orElseThrow();
      if (n.kind() == SiteTree.Kind.PANEL) {
        design
            .voltage()
            .forEach(
                (line, v) -> {
                  assertThat(v.dropPercent().value().orElseThrow())
                      .as(n.node())
                      .isBetween(0.0, 4.0);
                  assertThat(v.thdPercent().value().orElseThrow()).as(n.node()).isBetween(2.0, 8.0);
                });
      }
    }
  }

  private static DesignState transformer() {
    return DemoSurvey.node(audit, "T1").design().orElseThrow();
  }

  private static double deratedKva(AuditResult of) {
    DesignState design = DemoSurvey.node(of, "T1").design().orElseThrow();
    return design.transformer().orElseThrow().deratedKva().value().orElseThrow();
  }

  private static Optional<Finding> find(AuditResult of, String node, FindingCode code) {
    return DemoSurvey.node(of, node).findings().stream()
        .filter(f -> f.code().equals(code.word()))
        .findFirst();
  }
}
