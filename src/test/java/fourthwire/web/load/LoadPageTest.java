package fourthwire.web.load;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.load.LoadRequest;
import fourthwire.load.Presets;
import fourthwire.load.trial.LoadTrial;
import fourthwire.load.trial.TrialResult;
import fourthwire.load.trial.TrialSource;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.ServiceTest;
import fourthwire.web.support.Numbers;
import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/** The load model page over HTTP: every kind and preset, wrong fields, figures of the engine. */
class LoadPageTest extends ServiceTest {
  static Stream<String> presets() {
    return Presets.names().stream();
  }

  @ParameterizedTest
  @EnumSource(LoadKind.class)
  void everyKindHasItsPage(LoadKind kind) {
    String more = kind == LoadKind.MEASURED ? "&spectrum=1+100+-20;3+60+170" : "";
    complete(page("/loads?load=" + kind.word() + "&r_ohm=0.05&x_ohm=0.03&background=flat" + more));
  }

  @ParameterizedTest
  @MethodSource("presets")
  void everyPresetHasItsPage(String preset) {
    String page = page("/loads?load=" + URLEncoder.encode(preset, StandardCharsets.UTF_8));
    complete(page);
    assertThat(page).contains("Preset “" + preset);
  }

  /** With no question the first preset stands there, so that there is something to read. */
  @Test
  void theBarePageAnswersTheFirstPreset() {
    complete(page("/loads"));
  }

  @Test
  void everythingWrongIsSaidAtOnceBesideItsField() {
    Answer answer =
        http()
            .get(
                "/loads?load=warp+core&watts=many&level=0&units=2.5&volts=-3&hz=55&fault_mva=1"
                    + "&r_ohm=1&orders=3+x&use=fun&capacitance_uf_per_w=0");
    assertThat(answer.status()).isEqualTo(400);
    String page = text(answer);
    assertThat(page)
        .contains("warp core is neither a preset nor a load kind")
        .contains("many is no number; accepted is 0.1 to")
        .contains("0 is outside; accepted is 1 to 100")
        .contains("2.5 is no whole number")
        .contains("-3 is outside")
        .contains("55 is not among the choices")
        .contains("give the fault level, or R and X, not both")
        .contains("“3 x” can’t be read")
        .contains("fun is not among the choices")
        .contains("nothing was computed")
        .doesNotContain("<svg class=\"plot", "??");
    assertThat(page.split("aria-invalid=\"true\"", -1)).hasSize(11);
  }

  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          measured, '',                                 needs its orders
          measured, '&spectrum=1+100;1+90',             can’t be read
          measured, '&spectrum=51+3',                   can’t be read
          measured, '&lines=three&spectrum=3+5',        order 3 needs a neutral
          linear,   '&displacement_factor=0',           negative for leading
          """)
  void whatOneKindAsksIsSaid(String kind, String fields, String said) {
    Answer answer = http().get("/loads?load=" + kind + fields);
    assertThat(answer.status()).isEqualTo(400);
    assertThat(text(answer)).contains(said);
  }

  /** Parameters that no equipment can have are the engine's sentence, not a failure. */
  /**
   * Digits as the page itself writes them are read; a comma that may part thousands is asked for.
   */
  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {"1%20200|1200 W", "1%E2%80%AF200|1200 W", "120,5|121 W", "0,125|0.125 W"})
  void digitsInGroupsAndDecimalCommas(String watts, String shown) {
    assertThat(page("/loads?watts=" + watts).replace('\u202f', ' ')).contains(shown);
  }

  @Test
  void aCommaThatMayPartThousandsIsAskedFor() {
    Answer answer = http().get("/loads?watts=1,200");
    assertThat(answer.status()).isEqualTo(400);
    assertThat(text(answer)).contains("1,200 may mean 1200 or 1.200");
  }

  /** The survey's background table takes no more than the fundamental itself either. */
  @Test
  void noOrderOfAVoltageIsOverItsFundamental() {
    Answer answer = http().get("/loads?orders=3+101+0");
    assertThat(answer.status()).isEqualTo(400);
    assertThat(text(answer)).contains("“3 101 0” can’t be read").contains("at most 100,");
  }

  @Test
  void impossibleEquipmentIsSaidSo() {
    Answer answer = http().get("/loads?load=capacitor-input&watts=2000&source_resistance_ohm=500");
    assertThat(answer.status()).isEqualTo(400);
    assertThat(text(answer)).contains("check the rating").doesNotContain("reference");
  }

  /** A typed efficiency is not sought, so that the state itself is the first to be missing. */
  @Test
  void aTestWithoutASteadyStateIsNotJudged() {
    assertThat(
            page("/loads?load=capacitor-input&watts=2000&efficiency=0.9&source_resistance_ohm=500"))
        .contains("no steady state", "class A: not judged", "nothing is judged")
        .doesNotContain("every order keeps", "??");
  }

  @Test
  void noSteadyStateIsAPlainSentenceWithoutFigures() {
    String page = page("/loads?load=capacitor-input&watts=1500&units=20&r_ohm=5&x_ohm=5");
    assertThat(page)
        .contains("no steady state", "the source cannot give what the load asks for")
        .contains("Try a stiffer source, fewer units or a lower load level. No figure is shown")
        .containsPattern("of 28\u202f\\d{3}\u202fW finds")
        .containsPattern("behind 5\\.\\d+\u202fΩ")
        .doesNotContain("<svg class=\"plot");
  }

  /**
   * Where the current of 20 units does not repeat and 50 are fed, and 100 are not: each has its
   * reason, and what stands between gaps is drawn, a stroke by itself.
   */
  @Test
  void everyPointWithoutAStateHasItsReason() {
    String soft = "/loads?load=capacitor-input&watts=150&r_ohm=0.05&x_ohm=2";
    String page = page(soft + "&capacitance_uf_per_w=0.2&units=50");
    assertThat(page)
        .contains("For 1 unit THD is", "; for 50,")
        .contains("At 20 there is no steady state: the current doesn’t repeat")
        .contains("At 100 there is no steady state: the source can’t give")
        .containsPattern("class=\"curve solid\" d=\"[^\"]*M841[.\\d]* ([.\\d]+)L857[.\\d]* \\1\"");
    assertThat(page(soft + "&capacitance_uf_per_w=0.2&units=20"))
        .contains("the current does not repeat from cycle to cycle. Try a stiffer source, a larger")
        .doesNotContain("the source cannot give");
  }

  /** What is direct of a current belongs to its rms: √(Σ I_h² + I_0²). */
  @Test
  void aDirectComponentIsSaidAndCounted() {
    String asked =
        "/loads?load=capacitor-input&watts=150&units=50&r_ohm=0.05&x_ohm=2&capacitance_uf_per_w=0.2";
    assertThat(page(asked)).contains("is direct current", "Direct component, A");
    assertThat(page("/loads?load=capacitor-input&watts=150"))
        .doesNotContain("of it is direct current", "Direct component");
    ModelColumns small = ModelColumns.NONE.with(ModelColumns.Column.CAPACITANCE_UF_PER_W, 0.2);
    TrialResult result =
        LoadTrial.solve(
            new LoadRequest(
                LoadKind.CAPACITOR_INPUT,
                1,
                50,
                230,
                new LoadRequest.Rating.Watts(150),
                50,
                1,
                true,
                OptionalDouble.empty(),
                small,
                Optional.empty()),
            new TrialSource(230, 0.05, 2 / (100 * Math.PI), Spectrum.ZERO));
    assertThat(page(asked))
        .contains(
            "draw " + Numbers.of(Math.hypot(result.first().rms(), result.direct().get(0)), "A"));
  }

  /**
   * One order high up is over its limit at a light load, while the test at rated load is passed.
   */
  @Test
  void theChartReachesTheLastOrderOverItsLimit() {
    String page =
        page(
            "/loads?load=server+supply&watts=800&units=10&level=5&r_ohm=0.05&x_ohm=0.1"
                + "&orders=3+1.5+0;5+3+180;2+1+0");
    assertThat(page)
        .contains("class A, as tested at rated load; over it as shown here")
        .contains("the 31st is 0.09", "every order keeps within its limit")
        .contains(">31<tspan class=\"letters\">st</tspan>")
        .contains("At 5\u202f% of its power THD is", ">5\u202f%</text>");
  }

  @Test
  void emptyFieldsLeaveTheAddress() {
    Answer answer = http().get("/loads?load=motor&watts=&level=&r_ohm=0.1&background=flat");
    assertThat(answer.status()).isEqualTo(302);
    assertThat(answer.header("Location")).endsWith("/loads?load=motor&r_ohm=0.1&background=flat");
    assertThat(http().get("/loads?load=desktop+computer,+no+PFC&watts=").header("Location"))
        .contains("load=desktop%20computer");
  }

  static LongStream seeds() {
    return LongStream.rangeClosed(1, 12);
  }

  /** The THD in the heading is the engine's for the same question. */
  @ParameterizedTest
  @MethodSource("seeds")
  void theHeadingHoldsTheEnginesFigures(long seed) {
    Random random = new Random(seed * 0x9E3779B97F4A7C15L);
    List<LoadKind> kinds =
        List.of(
            LoadKind.CAPACITOR_INPUT,
            LoadKind.PFC_CONTINUOUS,
            LoadKind.SIX_PULSE,
            LoadKind.PHASE_DIMMER);
    LoadKind kind = kinds.get(random.nextInt(kinds.size()));
    boolean three = kind == LoadKind.SIX_PULSE;
    int watts = 50 + random.nextInt(three ? 8000 : 400);
    int units = 1 + random.nextInt(4);
    int level = kind.runsAtLowerPower() ? 20 + random.nextInt(81) : 100;
    int fifth = random.nextInt(4);
    TrialResult result =
        LoadTrial.solve(
            new LoadRequest(
                kind,
                three ? 3 : 1,
                50,
                three ? 400 : 230,
                new LoadRequest.Rating.Watts(watts),
                units,
                level / 100.0,
                kind.runsAtLowerPower(),
                OptionalDouble.empty(),
                ModelColumns.NONE,
                Optional.empty()),
            new TrialSource(
                three ? 400 : 230,
                0.1,
                0.05 / (100 * Math.PI),
                Spectrum.of(h -> h == 5 ? new Phasor(fifth / 100.0, 0) : Phasor.ZERO)));
    String asked =
        "/loads?load=%s&watts=%d&units=%d&level=%d&r_ohm=0.1&x_ohm=0.05&orders=5+%d"
            .formatted(kind.word(), watts, units, level, fifth);
    String thd = Numbers.of(Distortion.thdPercent(result.first()).value().orElseThrow(), "%");
    String factor = Numbers.of(result.powerFactor().value().orElseThrow());
    assertThat(page(asked))
        .contains("THD\u00a0" + thd + ", power\u00a0factor\u00a0" + factor)
        .contains(Numbers.of(result.first().rms() / units));
  }

  /** Three equal parts: N carries three times the triplens, √(Σ (3·I_h)²) over h = 3, 9, 15 … */
  @Test
  void threeEqualPartsReturnThroughTheNeutral() {
    TrialResult part =
        LoadTrial.solve(
            new LoadRequest(
                LoadKind.CAPACITOR_INPUT,
                1,
                50,
                230,
                new LoadRequest.Rating.Watts(100),
                1,
                1,
                true,
                OptionalDouble.empty(),
                ModelColumns.NONE,
                Optional.empty()),
            TrialSource.ideal(230));
    double square = 0;
    for (int h = 3; h <= Spectrum.HIGHEST_ORDER; h += 3) {
      square += 9 * Math.pow(part.first().magnitude(h), 2);
    }
    assertThat(page("/loads?load=capacitor-input&watts=300&lines=three"))
        .contains("three equal parts", "trace n", Numbers.of(Math.sqrt(square)));
    assertThat(page("/loads?load=EV+charger,+three-phase")).contains("three equal parts");
  }

  /** The spectrum can be put into a survey as it is: order 1 at 100, degrees of the contract. */
  @Test
  void theSpectrumComesAsRowsOfTheSurvey() {
    Answer answer = http().get("/loads/spectra.csv?load=six-pulse&watts=7500");
    assertThat(answer.status()).isEqualTo(200);
    assertThat(answer.type()).startsWith("text/csv");
    List<String> lines = text(answer).lines().toList();
    assertThat(lines.get(0)).isEqualTo("spectrum,order,percent,degrees");
    assertThat(lines.get(1)).startsWith("six-pulse,1,100.0000,");
    assertThat(lines).anyMatch(l -> l.startsWith("six-pulse,5,"));
    String named = text(http().get("/loads/spectra.csv?load=desktop+computer,+no+PFC"));
    assertThat(named).contains("\"desktop computer, no PFC\",3,");
    assertThat(http().get("/loads/spectra.csv?watts=none").status()).isEqualTo(400);
  }

  /** Fed back as a measured spectrum it gives the same current again. */
  @Test
  void theSpectrumReadBackGivesTheSameDistortion() {
    String csv = text(http().get("/loads/spectra.csv?load=capacitor-input&watts=100"));
    String typed =
        csv.lines()
            .skip(1)
            .map(l -> l.split(","))
            .map(c -> c[1] + "+" + c[2] + "+" + c[3])
            .reduce((a, b) -> a + ";" + b)
            .orElseThrow();
    String original = heading(page("/loads?load=capacitor-input&watts=100"));
    String again = heading(page("/loads?load=measured&watts=100&spectrum=" + typed));
    assertThat(again.replaceAll(".*: ", "")).isEqualTo(original.replaceAll(".*: ", ""));
  }

  /** IEC 61000-3-2:2018, class D at 120 W: 3.4 mA/W is 0.408 A. */
  @Test
  void theLimitsStandBesideTheOrders() {
    String page = page("/loads?load=desktop+computer,+no+PFC&watts=120");
    assertThat(page)
        .contains("Over IEC 61000-3-2, class D", "0.408", "clause 7.5, Table 3")
        .contains("orders are over their limits");
    assertThat(page("/loads?load=desktop+computer,+no+PFC&watts=120&volts=120"))
        .contains("it sets none below 220 V");
    assertThat(page("/loads?load=desktop+computer,+no+PFC&watts=120&use=other"))
        .contains("IEC 61000-3-2, class A");
    assertThat(page("/loads?load=six-pulse&watts=20000&fault_mva=2"))
        .contains("IEC 61000-3-12, Table", "short-circuit ratio", "PWHC");
  }

  private static void complete(String page) {
    assertThat(page)
        .contains("<svg class=\"plot cycle\"", "<svg class=\"plot spectrum\"", "THD\u00a0")
        .contains("Power factor", "The model", "Every order in figures")
        .doesNotContain("??", "NaN", "Infinity");
  }

  private static String heading(String page) {
    return page.replaceAll("(?s).*<h1>(.*?)</h1>.*", "$1");
  }

  private String page(String path) {
    Answer answer = http().get(path, "Accept", "text/html");
    assertThat(answer.status()).as(path).isEqualTo(200);
    return text(answer);
  }

  private static String text(Answer answer) {
    return new String(answer.response().body(), StandardCharsets.UTF_8);
  }
}
