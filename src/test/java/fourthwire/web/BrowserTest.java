package fourthwire.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.microsoft.playwright.Page;
import com.microsoft.playwright.options.BoundingBox;
import com.microsoft.playwright.options.ColorScheme;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import fourthwire.metering.log.InventedBoard;
import fourthwire.testsupport.RawFiles;
import fourthwire.testsupport.SmallCapture;
import fourthwire.testsupport.SmallLog;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.web.server.LocalServerPort;

/**
 * Every page in a real browser, at the widths of a phone, a tablet and a desk: no violation of the
 * accessibility rules (axe-core: WCAG 2.2 A and AA and its best practices), no scrolling sideways,
 * no script or style refused by the content policy.
 */
@Tag("browser")
class BrowserTest extends PagesTest {
  private static final int[] WIDTHS = {390, 820, 1440};
  private static final int MOST_STOPS = 80;
  private static final Predicate<String> FAINT = stop -> stop.endsWith(" without outline");

  /** A log with a column that must be asked for. */
  private static final String OPEN =
      """
      Date,Current A,IN [A],H5 L1
      2026-03-02 00:10:00,10,3,1.2
      2026-03-02 00:20:00,20,4,1.3
      2026-03-02 00:30:00,30,5,1.4
      """;

  @LocalServerPort int port;
  @Autowired ReadingRepository readings;
  @Autowired ReadingUploads uploads;
  private Browser browser;
  private long reading;
  private long log;
  private long faulty;
  private long upload;

  @BeforeAll
  void open() {
    assumeTrue(
        Browser.installed().isPresent(),
        "no Chromium is installed; set FOURTHWIRE_BROWSER to its path");
    browser = new Browser();
    reading = readings.add(SeriesPagesTest.addition("M9", SmallCapture.reading(), site));
    log = readings.add(SeriesPagesTest.addition("M8", SmallLog.reading(), site));
    InventedBoard board = new InventedBoard(4, 2);
    board.scale("L2.active_w", 1440, 2016, -1);
    board.repeat(1440);
    faulty = readings.add(SeriesPagesTest.addition("M6", board.reading(), site));
    upload =
        uploads.createWaiting(
            site, new ReadingRepository.MeterRef("M7", "MSB"), List.of(RawFiles.of("a.csv", OPEN)));
  }

  @AfterAll
  void close() {
    if (browser != null) {
      browser.close();
    }
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource({
    "sites, /",
    "site, /sites/{site}",
    "survey, /sites/{site}/survey",
    "audits, /sites/{site}/audits",
    "delete, /sites/{site}/delete",
    "help, /help",
    "loads,"
        + " /loads?load=desktop%20computer%2C%20no%20PFC&units=20&r_ohm=0.4&x_ohm=0.25&background=flat",
    "loads-three, /loads?load=six-pulse&watts=20000&fault_mva=2",
    "loads-wrong, /loads?load=capacitor-input&watts=many&units=0&capacitance_uf_per_w=0",
    "readings, /sites/{site}/readings",
    "capture, /readings/{reading}",
    "log, /readings/{log}",
    "log-over-time, /readings/{log}/series?also=rms_v",
    "log-part, /readings/{log}/series?together=true&from=2025-03-26&to=2025-03-29",
    "log-spread, /readings/{log}/spread",
    "log-orders, /readings/{log}/orders?of=N.current_a",
    "log-limits, /readings/{log}/orders?of=L1.voltage_percent&scale=common",
    "faults, /readings/{faulty}",
    "columns, /uploads/{upload}/columns",
    "missing, /sites/999",
    "panel, /audits/{audit}/node?name=LP-2%20East%20offices",
    "transformer, /audits/{audit}/node?name=T1",
    "three-wire, /audits/{audit}/node?name=MP-1%20Pumps%20%26%20air",
    "circuit, /audits/{audit}/node?name=LP-2%20East%20offices:1",
  })
  void aPageFitsEveryScreenAndBreaksNoRule(String name, String path) {
    for (int width : WIDTHS) {
      check(name, path, width, ColorScheme.LIGHT);
    }
    check(name, path, WIDTHS[1], ColorScheme.DARK);
  }

  /** What a person does here can be done with the tabulator alone, in the order it is read. */
  @ParameterizedTest(name = "{0}")
  @CsvSource({
    "sites, /, '#page|input[type=file]|Upload the survey'",
    "site, /sites/{site}, '#page|name=LP-2|select#supply|Run it'",
    "panel, /audits/{audit}/node?name=LP-2%20East%20offices, '#page|summary|name=LP-2'",
    "loads, /loads, '#page|id=\"load\"|id=\"watts\"|Compute|spectra.csv'",
    "readings, /sites/{site}/readings, '#page|input[type=file]|Read it'",
    "log, /readings/{log}/series?from=2025-03-26&to=2025-03-29,"
        + " '#page|id=\"show\"|id=\"from\"|> Show|Closer|The whole log'",
    "faults, /readings/{faulty}, '#page|Turn the sign|Count each|Delete this reading'",
    "columns, /uploads/{upload}/columns, '#page|id=\"date\"|id=\"zone\"|name=\"m2\"|Read the file"
        + " so'",
    "delete, /sites/{site}/delete, '#page|Delete it|Keep it'",
  })
  void everythingIsReachedByTheKeyboardInOrder(String name, String path, String stops) {
    try (Page page = browser.page(WIDTHS[2], ColorScheme.LIGHT)) {
      page.navigate(address(path));
      List<String> reached = new ArrayList<>();
      for (int i = 0; i < MOST_STOPS; i++) {
        page.keyboard().press("Tab");
        String stop =
            String.valueOf(
                page.evaluate(
                    "(() => { const e = document.activeElement;"
                        + " if (e === document.body) return '';"
                        + " const o = getComputedStyle(e).outlineStyle;"
                        + " return e.outerHTML.split('>')[0] + '> ' + e.innerText"
                        + " + (o === 'none' ? ' without outline' : ''); })()"));
        if (stop.isEmpty()) {
          break;
        }
        reached.add(stop);
      }
      assertThat(reached).as("each shows where the focus is").noneMatch(FAINT);
      int from = 0;
      for (String wanted : stops.split("\\|")) {
        int at = indexOf(reached, wanted, from);
        assertThat(at).as("%s after stop %d of %s", wanted, from, reached).isNotNegative();
        from = at;
      }
    }
  }

  private static int indexOf(List<String> reached, String wanted, int from) {
    String id = wanted.replaceAll(".*#", "");
    for (int i = from; i < reached.size(); i++) {
      String stop = reached.get(i);
      boolean found =
          switch (wanted) {
            case "#page" -> stop.contains("href=\"#page\"");
            case "summary" -> stop.startsWith("<summary");
            case "input[type=file]" -> stop.contains("type=\"file\"");
            case "select#supply" -> stop.contains("id=\"" + id + "\"");
            default -> stop.contains(wanted);
          };
      if (found) {
        return i;
      }
    }
    return -1;
  }

  /** A drag along the picture shows that part; the readout follows the pointer. */
  @Test
  void aDragAlongThePictureLooksCloser() {
    try (Page page = browser.page(WIDTHS[2], ColorScheme.LIGHT)) {
      page.navigate(address("/readings/{log}/series"));
      BoundingBox box = page.locator("svg.series").first().boundingBox();
      page.mouse().move(box.x + box.width * 0.4, box.y + 60);
      page.mouse().down();
      page.mouse().move(box.x + box.width * 0.5, box.y + 60);
      assertThat(page.locator(".brush:visible").count()).isEqualTo(1);
      page.mouse().move(box.x + box.width * 0.6, box.y + 60);
      page.mouse().up();
      page.waitForURL("**from=2025-03-**to=2025-04-**");
      assertThat(page.locator("svg.overview .window").count()).isEqualTo(1);
    }
  }

  private String address(String path) {
    return "http://localhost:"
        + port
        + path.replace("{audit}", "" + audit)
            .replace("{site}", "" + site)
            .replace("{reading}", "" + reading)
            .replace("{log}", "" + log)
            .replace("{upload}", "" + upload)
            .replace("{faulty}", "" + faulty);
  }

  private void check(String name, String path, int width, ColorScheme scheme) {
    try (Page page = browser.page(width, scheme)) {
      StringBuilder console = new StringBuilder();
      page.onConsoleMessage(m -> console.append(m.type()).append(": ").append(m.text()));
      page.navigate(address(path));
      shoot(page, name + "-" + width + "-" + scheme.name().toLowerCase(java.util.Locale.ROOT));
      Object overflow =
          page.evaluate(
              "document.documentElement.scrollWidth - document.documentElement.clientWidth");
      assertThat(overflow).as("pixels too wide at %d", width).isEqualTo(0);
      page.evaluate("document.querySelectorAll('details').forEach(d => d.open = true)");
      assertThat(Browser.violations(page)).as("%s at %d, %s", name, width, scheme).isEmpty();
      assertThat(console.toString())
          .doesNotContain("Refused", "Content Security Policy", "Uncaught");
    }
  }

  /** With {@code -Dshots=folder} every page is also kept as a picture. */
  private static void shoot(Page page, String name) {
    String folder = System.getProperty("shots", "");
    if (!folder.isEmpty()) {
      page.screenshot(
          new Page.ScreenshotOptions().setPath(Path.of(folder, name + ".png")).setFullPage(true));
    }
  }
}
