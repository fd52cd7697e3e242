package fourthwire.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.webmvc.test.autoconfigure.AutoConfigureMockMvc;
import org.springframework.test.web.servlet.MockMvc;

/** The page of a node shows what its result holds. */
@SpringBootTest(classes = PagesApplication.class)
@AutoConfigureMockMvc
class NodePageTest {
  @Autowired MockMvc mvc;

  @Test
  void aPanelShowsItsVerdictItsConductorsAndItsFindings() throws Exception {
    String page = page("/audits/1/node", "LP-2 East offices");
    assertThat(page)
        .contains("<h1>LP-2 East offices</h1>")
        .contains("Act", "neutral over its ampacity", "probability 94")
        .contains("What each conductor carries")
        .contains("× mean line")
        .contains("IEC 60364-5-52:2009, Annex E")
        .contains("must not be added or enlarged before the resonance check");
  }

  @Test
  void theNorthAmericanPracticeNamesTheLinesAbc() throws Exception {
    String page = page("/audits/2/node", "LP-2 East offices");
    assertThat(page).contains("distortion of C stands above").doesNotContain(">L1<");
  }

  @Test
  void aNodeWithoutNeutralHasThreeRailsAndVoltagesBetweenLines() throws Exception {
    String page = page("/audits/1/node", "MP-1 Pumps & air");
    assertThat(page).contains("MP-1 Pumps &amp; air").contains("L1-L2").doesNotContain("rail n\"");
  }

  @Test
  void nothingIsLeftUnsaidByAMissingKey() throws Exception {
    assertThat(page("/audits/1/node", "T1")).doesNotContain("??").contains("Factor K");
  }

  private String page(String path, String node) throws Exception {
    return mvc.perform(get(path).param("name", node))
        .andExpect(status().isOk())
        .andReturn()
        .getResponse()
        .getContentAsString();
  }
}
