package fourthwire.web;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http.Answer;
import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;

/** The page of a node shows what its result holds. */
class NodePageTest extends PagesTest {
  @Test
  void aPanelShowsItsVerdictItsConductorsAndItsFindings() {
    String page = page(audit, "LP-2 East offices");
    assertThat(page)
        .contains("<h1>LP-2 East offices</h1>")
        .contains("Act", "neutral over its ampacity", "probability 94")
        .contains("What each conductor carries")
        .contains("× mean line")
        .contains("IEC 60364-5-52:2009, Annex E")
        .contains("must not be added or enlarged before the resonance check");
  }

  @Test
  void theNorthAmericanPracticeNamesTheLinesAbc() {
    String page = page(americanAudit, "LP-2 East offices");
    assertThat(page).contains("distortion of C stands above").doesNotContain(">L1<");
  }

  @Test
  void aNodeWithoutNeutralHasThreeRailsAndVoltagesBetweenLines() {
    String page = page(audit, "MP-1 Pumps & air");
    assertThat(page).contains("MP-1 Pumps &amp; air").contains("L1-L2").doesNotContain("rail n\"");
  }

  @Test
  void aFindingShowsItsWorkingWithTheNodesOwnFigures() {
    String page = page(audit, "LP-2 East offices");
    assertThat(page)
        .contains("I(N) = √(Σ I_h²) = √(", "² (3rd)", "As installed it carries 101")
        .contains("What makes the neutral current", "Adds to N, A");
  }

  @Test
  void whatAPanelFeedsStandsOnceRankedByWhatItAdds() {
    String page = page(audit, "LP-2 East offices");
    String table = page.substring(page.indexOf("id=\"branches\""));
    assertThat(table.split("LP-2%20East%20offices:1\"", -1)).hasSize(2);
  }

  @Test
  void nothingIsLeftUnsaidByAMissingKey() {
    assertThat(page(audit, "T1")).doesNotContain("??").contains("Factor K");
  }

  @Test
  void aPanelShowsItsWeekHowSureItIsAndItsImpedance() {
    String page = page(audit, "LP-2 East offices");
    assertThat(page)
        .contains("How sure", "200 sites drawn", "class=\"span\"")
        .contains("Power of every capacitor-input load on the site", "46\u202f%")
        .contains("The week", "over the limit in 38 of 168 hours", "EUR")
        .contains("plot hours n", "plot impedance", "PFC-1, 1 of 2 steps");
    assertThat(page(audit, "T1")).contains("No week: not computed.");
  }

  @Test
  void theSitesPageSaysWhereToClampNext() {
    Answer answer = http().get("/audits/" + audit);
    assertThat(new String(answer.response().body(), StandardCharsets.UTF_8))
        .contains("Where to clamp next", "64\u202f%");
  }

  private String page(long of, String node) {
    Answer answer =
        http()
            .get("/audits/" + of + "/node?name=" + URLEncoder.encode(node, StandardCharsets.UTF_8));
    assertThat(answer.status()).isEqualTo(200);
    return new String(answer.response().body(), StandardCharsets.UTF_8);
  }
}
