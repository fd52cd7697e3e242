package fourthwire.web.figure;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.metering.reduce.StepValues;
import fourthwire.metering.reduce.TimeSteps;
import fourthwire.metering.reduce.ValuesBySize;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/** Pictures of logs: where each value, gap, limit and note stands. */
class SeriesFigureTest {
  private static final ZoneId UTC = ZoneId.of("UTC");
  private static final ZoneId VIENNA = ZoneId.of("Europe/Vienna");
  private static final long HOUR = 3_600_000;

  /** Half-hourly values over four hours; the third hour has none. */
  private static StepValues values() {
    StepValues values = new StepValues(TimeSteps.of(0, 4 * HOUR, HOUR / 2, 5, UTC), HOUR / 2);
    values.take(
        new long[] {0, HOUR / 2, HOUR, 3 * HOUR / 2, 3 * HOUR, 7 * HOUR / 2},
        new double[] {0, 2, 8, 10, 5, 5});
    return values;
  }

  private static String plot(List<SeriesPlot.Bound> bounds, List<SeriesPlot.Note> notes) {
    SeriesPlot.Strip strip =
        new SeriesPlot.Strip(
            "N", "0 to 10 A", "0 to 10 A", "n", values(), Optional.empty(), bounds);
    return SeriesPlot.draw(
        List.of(strip), notes, new SeriesPlot.Manner(UTC, 1, "A", false), "currents");
  }

  /** Strips are 84 px high, four units a pixel: 10 A is at 0, 0 A at 336. */
  @Test
  void aStripIsThePathOfItsStepsWithGaps() {
    String svg = plot(List.of(), List.of());
    assertThat(path(svg, "trace")).isEqualTo("M0 302h1v-268h1M3 168h1");
    assertThat(path(svg, "spread")).isEqualTo("M0 269h1v-269h1v67h-1v269h-1zM3 168h1h-1z");
    assertThat(svg)
        .contains("viewBox=\"0 0 4 336\"", "data-from=\"0\"", "data-to=\"" + 4 * HOUR + "\"")
        .doesNotContain("style=", "NaN", "passed");
  }

  @Test
  void stepsPastALimitAreMarkedAndTheLimitIsNamed() {
    String svg = plot(List.of(new SeriesPlot.Bound(9, true, "9 A")), List.of());
    assertThat(path(svg, "passed")).isEqualTo("M1 0h1v14h-1z");
    assertThat(svg).contains(">9 A</text>");
    String under = plot(List.of(new SeriesPlot.Bound(1, false, "1 A")), List.of());
    assertThat(path(under, "passed")).isEqualTo("M0 0h1v14h-1z");
    String far = plot(List.of(new SeriesPlot.Bound(900, true, "900 A")), List.of());
    assertThat(far).as("far off the values").doesNotContain("900", "passed");
  }

  @Test
  void notesStandUnderTheirTime() {
    String svg =
        plot(
            List.of(),
            List.of(
                new SeriesPlot.Note("1 3", HOUR, 2 * HOUR),
                new SeriesPlot.Note("2", 9 * HOUR, 10 * HOUR)));
    assertThat(svg).contains("class=\"note-bar\" x=\"25%\"", "width=\"25%\"", ">1 3</text>");
    assertThat(svg.split("note-bar", -1)).as("what lies outside is not drawn").hasSize(2);
  }

  @Test
  void theOverviewFramesThePartShown() {
    String svg = SeriesPlot.overview(values(), "n", HOUR, 3 * HOUR, UTC, "whole");
    assertThat(svg).contains("class=\"window\" x=\"25%\" y=\"-3\" width=\"50%\"");
  }

  @Test
  void timeIsMarkedByTheLocalClock() {
    long from = Instant.parse("2025-03-29T23:00:00Z").toEpochMilli();
    List<TimeAxis.Mark> marks = new TimeAxis(from, from + 23 * HOUR, VIENNA).marks(14);
    assertThat(marks.stream().map(TimeAxis.Mark::text).filter(t -> !t.isEmpty()).limit(3))
        .containsExactly("30 Mar", "04:00", "06:00");
    assertThat(marks.get(3).at()).as("06:00 is the fifth hour").isEqualTo(5 / 23.0);
  }

  @Test
  void aDayIsFilledAsHighAsItIsCovered() {
    CoveragePicture.Month month =
        new CoveragePicture.Month("May 2025", List.of(1.0, 0.5, 0.0, Double.NaN), List.of(2));
    String svg = CoveragePicture.draw(List.of(month), "May");
    assertThat(path(svg, "bed")).isEqualTo("M0 0h16v48h-16zM20 0h16v48h-16zM40 0h16v48h-16z");
    assertThat(path(svg, "measured")).isEqualTo("M0 0h16v48h-16zM20 24h16v24h-16zM40 48h16v0h-16z");
    assertThat(svg).contains("<svg x=\"4.84%\" y=\"6\"><path class=\"diamond\"");
  }

  @Test
  void theCurveFallsFromTheLargestToTheLeast() {
    ValuesBySize values = new ValuesBySize(0, 100, 1);
    values.take(
        IntStream.range(0, 101).mapToLong(k -> Math.min(99, k)).toArray(),
        IntStream.range(0, 101).mapToDouble(k -> k).toArray());
    String svg =
        DurationPlot.draw(
            List.of(new DurationPlot.Curve("l1", values)),
            List.of(new SeriesPlot.Bound(80, true, "80 A")),
            1,
            "A",
            "curve");
    assertThat(path(svg, "trace l1"))
        .startsWith("M0 0L")
        .contains("L1000 440L")
        .endsWith("2000 880");
    assertThat(svg).contains("x1=\"5%\"", ">P95</text>", ">80 A</text>");
  }

  @Test
  void hoursCarryTheirFigures() {
    String table =
        HourTable.draw(
            "n",
            h -> h == 0 ? 10 : h == 1 ? Double.NaN : 5,
            0,
            10,
            v -> "%.0f".formatted(v),
            List.of("Mon", "Tue", "Wed", "Thu", "Fri", "Sat", "Sun"),
            "week");
    assertThat(table).contains("<td class=\"t11\">10</td><td></td><td class=\"t6\">5</td>");
    assertThat(table.split("<td class", -1)).hasSize(168);
    assertThat(table).doesNotContain("NaN");
  }

  @Test
  void anAxisLeavesZeroWhereItsValuesAreFarFromIt() {
    assertThat(Scale.holding(229, 233, 3).orElseThrow().low()).isEqualTo(228);
    assertThat(Scale.holding(10, 100, 3).orElseThrow().low()).isZero();
    assertThat(Scale.holding(-3, 3, 3).orElseThrow().low()).isEqualTo(-4);
    assertThat(Scale.holding(7, 7, 3).orElseThrow().high()).isGreaterThanOrEqualTo(7);
    assertThat(Scale.holding(-7, -7, 3).orElseThrow().high()).isGreaterThanOrEqualTo(-7);
    assertThat(Scale.holding(Double.NaN, 1, 3)).isEmpty();
  }

  private static String path(String svg, String classes) {
    Matcher path = Pattern.compile("<path class=\"" + classes + "\" d=\"([^\"]*)\"").matcher(svg);
    assertThat(path.find()).as(classes + " in " + svg).isTrue();
    return path.group(1);
  }
}
