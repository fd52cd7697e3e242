package fourthwire.web;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.audit.AuditRepository;
import fourthwire.limits.FindingCode;
import fourthwire.limits.LimitEditions;
import fourthwire.load.Preset;
import fourthwire.load.Presets;
import fourthwire.site.LoadKind;
import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** The pages of sites, surveys and audits, as a browser without script sees them. */
class SitePagesTest extends PagesTest {
  private static final String HTML = "text/html";

  @Test
  void aSiteIsHeadedByItsVerdictAndShowsTheTree() {
    String page = text("/sites/" + site);
    assertThat(page)
        .contains("One neutral is over its ampacity")
        .contains("LP-2 East offices", "Watch", "Nothing found")
        .contains("depth-3", "630", "Dyn11")
        .contains("Mutual coupling between conductors is not modelled.");
    assertThat(page.indexOf("MSB")).isLessThan(page.indexOf("LP-1 Reception"));
  }

  @Test
  void aRefusedSurveyListsItsErrorsAndStoresNothing() {
    Map<String, String> tables = SmallSite.tables("Broken");
    tables.put("panels.csv", "panel,fed_from,bus_rating_a\nLP-1,<nowhere>,many\n");
    int before = sites.list().size();
    Answer answer =
        http().form("POST", "/sites", new Part("survey", "broken.zip", SmallSite.zip(tables)));
    assertThat(answer.status()).isEqualTo(422);
    assertThat(text(answer))
        .contains("The survey was refused", "Nothing was stored", "broken.zip")
        .contains("bus_rating_a", "<code>many</code>", "&lt;nowhere&gt;")
        .doesNotContain("<nowhere>");
    assertThat(sites.list()).hasSize(before);
  }

  @Test
  void aSurveyIsTakenInRevisedHandedOutAndDeleted() {
    Answer added =
        http().form("POST", "/sites", new Part("survey", "a.zip", SmallSite.zip("Lock House")));
    assertThat(added.status()).isEqualTo(302);
    String place = added.header("Location").replaceAll(".*(/sites/\\d+).*", "$1");
    assertThat(text(place)).contains("Not audited yet", "Lock House", "GRID", "SET");
    http()
        .form("POST", place + "/survey", new Part("survey", "a.zip", SmallSite.zip("Lock House")));
    assertThat(text(place + "/survey")).contains("revision 2", "LP-1");
    Answer zip = http().get(place + "/survey/download?format=zip");
    assertThat(zip.type()).isEqualTo("application/zip");
    assertThat(text(place + "/delete")).contains("Delete Lock House?", "2 survey revisions");
    assertThat(http().post(place + "/delete").status()).isEqualTo(302);
    assertThat(http().get(place, "Accept", HTML).status()).isEqualTo(404);
  }

  @Test
  void anAuditIsAskedForAndWatched() {
    Answer asked = http().post("/sites/" + site + "/audits");
    assertThat(asked.status()).isEqualTo(302);
    assertThat(asked.header("Location")).matches(".*/audits/\\d+/progress");
    assertThat(text("/sites/" + site + "/audits")).contains("Audit " + audit);
  }

  @Test
  void aFailedAuditSaysWhyAndAWaitingOneCanBeCancelled() {
    long failed = audits.create(site, 1, Optional.empty());
    audits.start(failed);
    audits.end(failed, AuditRepository.State.FAILED, "order 7 did not settle at LP-2");
    assertThat(text("/audits/" + failed + "/progress"))
        .contains("failed", "order 7 did not settle at LP-2")
        .doesNotContain("hx-get");
    long waiting = audits.create(site, 1, Optional.empty());
    assertThat(text("/audits/" + waiting + "/progress"))
        .contains("waiting", "every 1s", "http-equiv=\"refresh\"", "Cancel it");
    assertThat(http().post("/audits/" + waiting + "/cancel").status()).isEqualTo(302);
    assertThat(text("/audits/" + waiting + "/progress")).contains("cancelled");
  }

  @Test
  void whatIsNotThereIsSaidOnAPage() {
    for (String path :
        List.of("/sites/999", "/audits/999", "/sites/x", "/nowhere", "/readings/9")) {
      Answer answer = http().get(path, "Accept", HTML);
      assertThat(answer.status()).as(path).isEqualTo(404);
      assertThat(text(answer)).as(path).contains("This page is not there", "list of sites");
    }
  }

  @Test
  void everyPageForbidsScriptsAndStylesOfOthersAndCarriesTheCautions() {
    for (String path : List.of("/", "/help", "/sites/" + site, "/sites/" + site + "/readings")) {
      Answer answer = http().get(path, "Accept", HTML);
      assertThat(answer.status()).as(path).isEqualTo(200);
      assertThat(answer.header("Content-Security-Policy")).contains("default-src 'self'");
      assertThat(text(answer))
          .contains("before the resonance check")
          .doesNotContain("style=", "<style", "onclick", "??");
    }
  }

  @Test
  void theHelpNamesEveryCheckEveryPresetAndEveryEdition() {
    String help = text("/help");
    for (FindingCode code : FindingCode.values()) {
      assertThat(help).contains("<code>" + code.word() + "</code>");
    }
    for (Preset preset : Presets.all()) {
      assertThat(help).contains(preset.name(), preset.source());
    }
    assertThat(help).contains(LimitEditions.editions());
    for (LoadKind kind : LoadKind.values()) {
      assertThat(help).contains("<code>" + kind.word() + "</code>");
    }
  }

  private String text(String path) {
    Answer answer = http().get(path, "Accept", HTML);
    assertThat(answer.status()).as(path).isEqualTo(200);
    return text(answer);
  }

  private static String text(Answer answer) {
    return new String(answer.response().body(), StandardCharsets.UTF_8);
  }
}
