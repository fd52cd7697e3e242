package fourthwire.web;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.ServiceTest;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/** Meters' files through the pages: taken in, shown in figures, refused with what is missing. */
class ReadingPagesTest extends ServiceTest {
  private static final String HTML = "text/html";
  private static final String FORM = "application/x-www-form-urlencoded";

  private String readings = "";

  @BeforeEach
  void makeSite() {
    Answer added =
        http().form("POST", "/sites", new Part("survey", "a.zip", SmallSite.zip("Mill")));
    readings = added.header("Location").replaceAll(".*(/sites/\\d+).*", "$1") + "/readings";
  }

  /** THD of 1 + 0.3 of the 3rd is 30 %, its rms 10·√1.09 (definitions of IEEE 519-2022). */
  @Test
  void aCaptureShowsEveryOrderInFigures() throws InterruptedException {
    String page = read("record.csv", capture(), "LP-1", "");
    assertThat(page)
        .contains("waveform capture", "Every order in figures", "50th")
        .contains("30.0", "10.4", "3.00", "Crest factor")
        .contains("L1 carried most: 10.4\u202fA, distorted by 30.0\u202f%")
        .contains("Voltages L1; currents L1. 12 whole cycles were analysed", "The file")
        .doesNotContain("??");
  }

  /** Two of twelve cycles come first; the whole record, where it is more, after the spectrum. */
  @Test
  void aCapturesFirstCyclesComeFirst() throws InterruptedException {
    String page = read("record.csv", capture(), "LP-1", "");
    int first = page.indexOf("The first two cycles");
    assertThat(first).isPositive().isLessThan(page.indexOf("Fundamentals"));
    assertThat(page.indexOf("Harmonic amps by order")).isLessThan(page.indexOf("The whole record"));
    assertThat(page.substring(first)).contains(">40\u202fms</text>", ">200\u202fms</text>");
  }

  @Test
  void aLogShowsItsQuantities() throws InterruptedException {
    String log =
        """
        Time,I1,IN
        2026-03-02 00:10:00,10,3
        2026-03-02 00:20:00,20,4
        2026-03-02 00:30:00,30,5
        """;
    String mapping =
        """
        {"kind":"log","time":{"columns":["Time"],"format":"yyyy-MM-dd HH:mm:ss","stamp":"end",
        "interval_s":600},"columns":{"I1":{"quantity":"L1.rms_a"},"IN":{"quantity":"N.rms_a"}}}
        """;
    assertThat(read("week.csv", log, "LP-1", mapping))
        .contains("interval log", "L1.rms_a", "N.rms_a", "20.0", "30.0")
        .doesNotContain("??");
  }

  @Test
  void aFileThatCantBeReadIsRefused() {
    Answer refused = add("odd.dat", "no configuration beside it", "LP-1", "");
    assertThat(refused.status()).isEqualTo(422);
    assertThat(text(refused))
        .contains("The file was not read", "configuration file")
        .doesNotContain("??", "Exception");
  }

  @Test
  void withoutAFileThePageAsksForOne() {
    for (Answer without :
        List.of(
            http().form("POST", readings, Part.field("at", "LP-1")),
            http().send("POST", readings, FORM, "at=LP-1"))) {
      assertThat(without.status()).isEqualTo(422);
      assertThat(text(without)).contains("No file was sent").doesNotContain("Exception");
    }
  }

  /** A layout nobody has confirmed is shown; what is open is asked for; then it is remembered. */
  @Test
  void aNewLayoutIsConfirmedOnceAndNeverAgain() throws InterruptedException {
    String file =
        """
        Date,Current A,IN [A],H5 L1
        03/02/2026 00:10:00,10,3,1.2
        03/02/2026 00:20:00,20,4,1.3
        03/02/2026 00:30:00,30,5,1.4
        """;
    Answer taken = add("week.csv", file, "LP-1", "");
    assertThat(taken.status()).isEqualTo(302);
    String upload = taken.header("Location").replaceAll(".*(/uploads/\\d+).*", "$1");
    String columns = upload + "/columns";
    assertThat(http().get(upload).header("Location")).endsWith(columns);
    assertThat(text(http().get(readings, "Accept", HTML))).contains("wait until their columns");
    String asked = text(http().get(columns, "Accept", HTML));
    assertThat(asked)
        .contains("What each column holds", "must be settled", "harmonic is of current or voltage")
        .contains("does not settle whether day or month comes first", "Europe/Vienna")
        .contains("20 A", "not settled by the file")
        .doesNotContain("??", "Monday 2 March", "Tuesday 3 February");

    Answer looked = http().send("POST", columns, FORM, fields("dd/MM/yyyy", "") + "&act=look");
    assertThat(looked.status()).isEqualTo(200);
    assertThat(text(looked)).contains("Tuesday 3 February 2026, 00:10:00 (Europe/Vienna)");
    Answer open = http().send("POST", columns, FORM, fields("", "voltage_h_v") + "&act=read");
    assertThat(open.status()).as("nobody said which of day and month comes first").isEqualTo(422);
    Answer read =
        http().send("POST", columns, FORM, fields("dd/MM/yyyy", "voltage_h_v") + "&act=read");
    assertThat(read.status()).as(text(read)).isEqualTo(302);
    assertThat(shown(upload))
        .contains("3 February 2026, 00:10", "L1.voltage_h5_v", "N.rms_a")
        .doesNotContain("??");

    Answer second = add("next.csv", file.replace("/2026", "/2027"), "LP-1", "");
    String next = second.header("Location").replaceAll(".*(/uploads/\\d+).*", "$1");
    assertThat(shown(next)).contains("3 February 2027, 00:10", "L1.voltage_h5_v");
  }

  private static String fields(String format, String third) {
    return "date=Date&clock=&format="
        + format
        + "&zone=Europe/Vienna&stamp=start&interval="
        + "&h0=Current+A&m0=rms_a&p0=L1&o0=&s0=mean&f0=1"
        + "&h1=IN+%5BA%5D&m1=rms_a&p1=N&o1=&s1=mean&f1=1"
        + "&h2=H5+L1&m2="
        + third
        + "&p2=L1&o2=5&s2=mean&f2=1";
  }

  /** Headings that leave the measure open tell place and order, to which one choice is added. */
  @Test
  void oneChoiceIsMadeForAllColumnsOfAKind() throws InterruptedException {
    String file =
        """
        Date,L1 H4,L1 H6,L2 H4
        2026-03-02 00:10:00,1.2,2.2,3.2
        2026-03-02 00:20:00,1.3,2.3,3.3
        2026-03-02 00:30:00,1.4,2.4,3.4
        """;
    Answer taken = add("week.csv", file, "LP-1", "");
    String upload = taken.header("Location").replaceAll(".*(/uploads/\\d+).*", "$1");
    String columns = upload + "/columns";
    assertThat(text(http().get(columns, "Accept", HTML)))
        .contains("Columns of a kind together", "Set for all 3", "value=\"all-open\"");
    String each = "date=Date&zone=Europe/Vienna&stamp=start";
    String[] headings = {"L1+H4", "L1+H6", "L2+H4"};
    for (int k = 0; k < headings.length; k++) {
      each +=
          "&h%d=%s&k%d=open&m%d=&p%d=&o%d=&s%d=mean&f%d=1"
              .formatted(k, headings[k], k, k, k, k, k, k);
    }
    String chosen = "&act=all-open&km-open=current_h_a&ko-open=1&ks-open=max&kf-open=0.001";
    Answer set = http().send("POST", columns, FORM, each + chosen);
    assertThat(set.status()).isEqualTo(200);
    assertThat(text(set))
        .contains("value=\"all-current_h_a\"", "name=\"o0\" value=\"5\"", "name=\"o1\" value=\"7\"")
        .contains("name=\"f2\" value=\"0.001\"", "<option value=\"max\" selected")
        .doesNotContain("??", "value=\"all-open\"");
  }

  @Test
  void aWaitingFileIsDiscarded() {
    Answer taken =
        add("week.csv", "Date,Foo\n2026-03-02 00:10,1\n2026-03-02 00:20,2\n", "LP-1", "");
    String upload = taken.header("Location").replaceAll(".*(/uploads/\\d+).*", "$1");
    assertThat(http().post(upload + "/cancel").status()).isEqualTo(302);
    assertThat(text(http().get(upload, "Accept", HTML))).contains("cancelled");
    assertThat(text(http().get(readings, "Accept", HTML))).doesNotContain("wait until");
  }

  private String read(String name, String file, String at, String mapping)
      throws InterruptedException {
    Answer taken = add(name, file, at, mapping);
    assertThat(taken.status()).as(text(taken)).isEqualTo(302);
    return shown(taken.header("Location").replaceAll(".*(/uploads/\\d+).*", "$1"));
  }

  private String shown(String upload) throws InterruptedException {
    Answer progress = http().get(upload, "Accept", HTML);
    for (int tries = 0; progress.status() != 302 && tries < 600; tries++) {
      assertThat(text(progress)).doesNotContain("failed");
      Thread.sleep(50);
      progress = http().get(upload, "Accept", HTML);
    }
    String reading = progress.header("Location").replaceAll(".*(/readings/\\d+).*", "$1");
    Answer shown = http().get(reading, "Accept", HTML);
    assertThat(shown.status()).isEqualTo(200);
    return text(shown);
  }

  private Answer add(String name, String file, String at, String mapping) {
    return http()
        .form(
            "POST",
            readings,
            new Part("file", name, file.getBytes(StandardCharsets.UTF_8)),
            Part.field("at", at),
            Part.field("mapping", mapping));
  }

  /** Twelve cycles at 50 Hz, 128 samples each. */
  private static String capture() {
    StringBuilder csv = new StringBuilder("Time [ms],U1 [V],I1 [A]\n");
    for (int k = 0; k < 12 * 128; k++) {
      double t = k / 6400.0;
      double wt = 2 * Math.PI * 50 * t;
      double i = Math.sqrt(2) * (10 * Math.sin(wt) + 3 * Math.sin(3 * wt + Math.PI));
      csv.append(
          String.format(
              Locale.ROOT, "%.6f,%.6f,%.6f%n", 1000 * t, 230 * Math.sqrt(2) * Math.sin(wt), i));
    }
    return csv.toString();
  }

  private static String text(Answer answer) {
    return new String(answer.response().body(), StandardCharsets.UTF_8);
  }
}
