package fourthwire.web.figure;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.Waveform;
import java.io.StringReader;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

/** The pictures: well-formed, in proportion, with no style and no script in them. */
class FigureTest {
  private static final Rail.Scale SCALE = new Rail.Scale(1.3, true);

  @Test
  void aBarIsAsLongAsTheCurrentIsOfTheAmpacity() throws Exception {
    Document svg = parsed(rail(Conductor.L1, 0.65, List.of(), List.of(1.3)));
    assertThat(widths(svg, "fill")).containsExactly(50.0);
    assertThat(svg.getDocumentElement().getAttribute("aria-label")).isEqualTo("L1 <&> \"N\"");
    // the mark at 100 % of ampacity on a scale that ends at 130 %
    assertThat(element(svg, "line", "full-mark").getAttribute("x1")).isEqualTo("76.92%");
    assertThat(((Element) svg.getElementsByTagName("svg").item(1)).getAttribute("x"))
        .isEqualTo("100%");
  }

  @Test
  void thePartsOfTheNeutralFillItsBar() throws Exception {
    List<Rail.Part> parts =
        List.of(
            new Rail.Part("unbalance", 0.1, "unbalance"),
            new Rail.Part("3", 0.8, "3rd"),
            new Rail.Part("9", 0.1, "9th"));
    Document svg = parsed(rail(Conductor.N, 1.3, parts, List.of()));
    assertThat(widths(svg, "fill part-unbalance", "fill part-3", "fill part-9"))
        .containsExactly(10.0, 80.0, 10.0);
    assertThat(svg.getElementsByTagName("text").item(0).getTextContent()).isEqualTo("3rd");
  }

  @Test
  void aScaleGrowsWithWhatItHolds() {
    assertThat(Rail.Scale.holding(List.of(0.5, 1.1), true).end()).isEqualTo(1.3);
    assertThat(Rail.Scale.holding(List.of(2.0), true).end()).isGreaterThan(2);
  }

  @Test
  void axesHaveRoundSteps() {
    assertThat(Ticks.upTo(110, 5)).isEqualTo(new Ticks(25, 125));
    assertThat(Ticks.upTo(0.19, 5).text(0.05)).isEqualTo("0.05");
    assertThat(Ticks.upTo(11, 5).text(2.5)).isEqualTo("2.5");
    assertThat(Ticks.upTo(230, 3).values()).containsExactly(0.0, 100.0, 200.0, 300.0);
    assertThat(Ticks.upTo(0, 5).end()).isEqualTo(1);
  }

  @Test
  void aSineOfOneAmpPeaksAtItsRootTwo() throws Exception {
    Spectrum sine = Spectrum.of(h -> h == 1 ? new Phasor(1, 0) : Phasor.ZERO);
    Document svg = parsed(CyclePlot.draw(Map.of(Conductor.L1, sine), "A", "one cycle"));
    Matcher point =
        Pattern.compile("L250 ([0-9.]+)L")
            .matcher(element(svg, "path", "trace l1").getAttribute("d"));
    assertThat(point.find()).isTrue();
    double end = Ticks.upTo(Math.sqrt(2), 3).end();
    assertThat(Double.parseDouble(point.group(1)))
        .isBetween(104 * (1 - Math.sqrt(2) / end) - 0.1, 104 * (1 - Math.sqrt(2) / end) + 0.1);
  }

  @Test
  void aSpectrumHasABarASeriesAndAMarkWhereALimitStands() throws Exception {
    List<SpectrumPlot.Group> groups =
        List.of(
            new SpectrumPlot.Group(3, List.of(5.0, 10.0), OptionalDouble.of(2.5)),
            new SpectrumPlot.Group(5, List.of(2.0, 0.0), OptionalDouble.empty()));
    Document svg =
        parsed(
            SpectrumPlot.draw(
                List.of(Conductor.L3, Conductor.N), groups, h -> h + "th", "A", "spectrum"));
    NodeList bars = svg.getElementsByTagName("rect");
    assertThat(bars.getLength()).isEqualTo(4);
    assertThat(((Element) bars.item(1)).getAttribute("height")).isEqualTo("208");
    assertThat(((Element) bars.item(0)).getAttribute("height")).isEqualTo("104");
    assertThat(element(svg, "line", "limit").getAttribute("y1")).isEqualTo("156");
  }

  @Test
  void aLimitWithinReachMakesThePictureTaller() throws Exception {
    List<SpectrumPlot.Group> groups =
        List.of(
            new SpectrumPlot.Group(3, List.of(10.0), OptionalDouble.of(20)),
            new SpectrumPlot.Group(5, List.of(1.0), OptionalDouble.of(500)));
    Document svg =
        parsed(SpectrumPlot.draw(List.of(Conductor.L1), groups, 2.5, h -> h + "th", "A", "limits"));
    assertThat(element(svg, "line", "limit").getAttribute("y1")).isEqualTo("0");
    assertThat(((Element) svg.getElementsByTagName("rect").item(0)).getAttribute("height"))
        .isEqualTo("104");
  }

  /** A value between two gaps has no neighbour to be joined to, and is a short stroke. */
  @Test
  void aCurveBreaksWhereThereIsNoValue() throws Exception {
    List<CurvePlot.Place> places =
        List.of(
            new CurvePlot.Place(0, "1"),
            new CurvePlot.Place(0.5, ""),
            new CurvePlot.Place(1, "100"));
    Document svg =
        parsed(
            CurvePlot.draw(
                places,
                List.of(
                    new CurvePlot.Curve(
                        CurvePlot.Style.SOLID,
                        List.of(
                            OptionalDouble.of(100),
                            OptionalDouble.empty(),
                            OptionalDouble.of(50)))),
                OptionalDouble.of(0.5),
                "curves"));
    assertThat(element(svg, "path", "curve solid").getAttribute("d"))
        .isEqualTo("M0 0L8 0M992 84L1000 84");
    assertThat(element(svg, "line", "here").getAttribute("x1")).isEqualTo("50%");
  }

  /** Whatever its values, so that two charts of it are alike. */
  @Test
  void aFactorIsDrawnFromZeroToOne() throws Exception {
    List<CurvePlot.Place> places =
        List.of(new CurvePlot.Place(0, "10"), new CurvePlot.Place(1, "100"));
    CurvePlot.Curve curve =
        new CurvePlot.Curve(
            CurvePlot.Style.SOLID, List.of(OptionalDouble.of(0.5), OptionalDouble.of(0.6)));
    Document svg = parsed(CurvePlot.drawFactor(places, curve, OptionalDouble.empty(), "factor"));
    assertThat(element(svg, "path", "curve solid").getAttribute("d")).isEqualTo("M0 35L1000 28");
    assertThat(svg.getDocumentElement().getTextContent()).startsWith("00.51");
  }

  /** The curve behind others fills the height whatever its unit. */
  @Test
  void aVoltageBehindTheCurrentHasItsOwnScale() throws Exception {
    Spectrum amps = Spectrum.of(h -> h == 1 ? new Phasor(0.2, 0) : Phasor.ZERO);
    Spectrum volts = Spectrum.of(h -> h == 1 ? new Phasor(230, 0) : Phasor.ZERO);
    Document svg =
        parsed(
            CyclePlot.drawOver(
                volts, Map.of(Conductor.L1, Waveform.of(amps, 240)), "A", "voltage and current"));
    assertThat(element(svg, "path", "backdrop").getAttribute("d")).contains("L250 8.3L");
  }

  @Test
  void theSmallRailsLeaveOutWhatIsNotThere() throws Exception {
    Document svg =
        parsed(
            SmallRails.draw(
                Map.of(Conductor.L1, OptionalDouble.of(0.65), Conductor.N, OptionalDouble.empty()),
                "small"));
    assertThat(widths(svg, "fill l1")).containsExactly(50.0);
    assertThat(svg.getElementsByTagName("rect").getLength()).isEqualTo(3);
  }

  /** One cell an hour, the darkest at the end of the scale, those over the limit crossed. */
  @Test
  void aWeekHasACellAnHourAndACrossOverTheLimit() throws Exception {
    List<String> days = List.of("a", "b", "c", "d", "e", "f", "g");
    Document svg =
        parsed(
            HourPicture.draw("n", h -> h == 0 ? Double.NaN : h % 24, 23, 21.5, days, "the week"));
    NodeList cells = svg.getElementsByTagName("rect");
    assertThat(cells.getLength()).isEqualTo(167);
    assertThat(((Element) cells.item(22)).getAttribute("fill-opacity")).isEqualTo("1");
    assertThat(count(svg, "line", "over")).isEqualTo(14);
  }

  @Test
  void aRangeStandsBetweenItsPercentiles() throws Exception {
    Document svg = parsed(RangeBar.draw(10, 20, 50, 25, 92.6, "range"));
    assertThat(element(svg, "line", "span").getAttribute("x1")).isEqualTo("10%");
    assertThat(element(svg, "line", "span").getAttribute("x2")).isEqualTo("50%");
    assertThat(element(svg, "line", "half").getAttribute("x1")).isEqualTo("20%");
    assertThat(element(svg, "circle", "computed").getAttribute("cx")).isEqualTo("25%");
    assertThat(element(svg, "line", "full-mark").getAttribute("x1")).isEqualTo("92.59%");
  }

  @Test
  void impedanceStandsOnALogarithmicScaleOverTheCurrents() throws Exception {
    Document svg =
        parsed(
            ImpedancePlot.draw(
                new ImpedancePlot.Curve(
                    491,
                    k -> 1 + k / 10.0,
                    k -> k == 0 ? 10 : 100,
                    List.of(3.0, 6.0),
                    List.of(25.5)),
                h -> h + "th",
                "impedance"));
    assertThat(element(svg, "path", "curve").getAttribute("d")).startsWith("M0 150L");
    assertThat(element(svg, "line", "full-mark").getAttribute("x1")).isEqualTo("50%");
    assertThat(count(svg, "line", "order-bar")).isEqualTo(2);
  }

  private static long count(Document svg, String name, String classes) {
    NodeList all = svg.getElementsByTagName(name);
    return java.util.stream.IntStream.range(0, all.getLength())
        .filter(k -> ((Element) all.item(k)).getAttribute("class").equals(classes))
        .count();
  }

  private static String rail(
      Conductor c, double share, List<Rail.Part> parts, List<Double> measured) {
    return new Rail(c, share, false, parts, measured).draw(SCALE, "L1 <&> \"N\"");
  }

  private static Document parsed(String svg) throws Exception {
    assertThat(svg).doesNotContain("style=").doesNotContain("<script").doesNotContain("NaN");
    return DocumentBuilderFactory.newInstance()
        .newDocumentBuilder()
        .parse(new InputSource(new StringReader(svg)));
  }

  private static List<Double> widths(Document svg, String... classes) {
    return java.util.Arrays.stream(classes)
        .map(c -> element(svg, "rect", c).getAttribute("width").replace("%", ""))
        .map(Double::valueOf)
        .toList();
  }

  private static Element element(Document svg, String name, String classes) {
    NodeList all = svg.getElementsByTagName(name);
    for (int i = 0; i < all.getLength(); i++) {
      Element e = (Element) all.item(i);
      if (e.getAttribute("class").equals(classes)) {
        return e;
      }
    }
    throw new AssertionError("no " + name + " of class " + classes);
  }
}
