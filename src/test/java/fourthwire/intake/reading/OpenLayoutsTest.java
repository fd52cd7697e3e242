package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fourthwire.intake.reading.upload.FormatReader;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Layouts that leave something open: the reader asks, with the columns, and guesses nothing. */
class OpenLayoutsTest {
  private record Open(LayoutWriter layout, String part) {}

  private static final Map<String, Open> LAYOUTS = new LinkedHashMap<>();

  private static void layout(String name, String part, LayoutWriter layout) {
    LAYOUTS.put(name, new Open(layout, part));
  }

  private static LayoutWriter dated() {
    return LayoutWriter.of(",", '.').time("Time", "yyyy-MM-dd HH:mm");
  }

  static {
    layout(
        "day or month first",
        "time.format",
        LayoutWriter.of(",", '.')
            .time("Time", "dd/MM/yyyy HH:mm")
            .rows(18)
            .lines("V# (V)", "rms_v"));
    layout(
        "a year of two digits that may be a day",
        "time.format",
        LayoutWriter.of(",", '.').time("Time", "yy-MM-dd HH:mm").rows(18).lines("V# (V)", "rms_v"));
    layout(
        "powers without unit and without amps",
        "columns.P1",
        dated().lines("P#", "active_w", 3).lines("V#", "rms_v"));
    layout(
        "harmonics without unit and without anything to compare",
        "columns.I1 H3",
        dated().lines("I# H3", "current_h3_a").lines("V#", "rms_v"));
    layout("no conductor", "columns.Current (A)", dated().column("Current (A)", "L1.rms_a"));
    layout(
        "no date",
        "time.columns",
        LayoutWriter.of(",", '.').time("Time", "HH:mm").lines("V# (V)", "rms_v"));
    layout(
        "seconds from a start",
        "time.columns",
        LayoutWriter.of(",", '.')
            .time(
                "Time (s)",
                t ->
                    String.valueOf(
                        600 * (t.getDayOfMonth() * 144 + t.getHour() * 6 + t.getMinute() / 10)))
            .lines("V# (V)", "rms_v"));
    layout(
        "distortion of what",
        "columns.THD L1 (%)",
        dated().lines("THD L# (%)", "current_thd_percent").lines("V# (V)", "rms_v"));
    layout(
        "energy without unit",
        "columns.Energy",
        dated().column("Energy", "total.energy_wh", 3).lines("V# (V)", "rms_v"));
    layout(
        "the same quantity twice",
        "columns.V L1 (V)",
        dated().column("U1 (V)", "L1.rms_v").column("V L1 (V)", "L1.rms_v"));
    layout(
        "thousands or three decimals",
        "columns.P L1 (W)",
        LayoutWriter.of(";", ',')
            .time("Time", "yyyy-MM-dd HH:mm")
            .lines("P L# (W)", "active_w")
            .grouping("."));
    layout(
        "name and unit disagree",
        "columns.Voltage L1 (A)",
        dated().lines("Voltage L# (A)", "rms_v").column("I N (A)", "N.rms_a"));
    layout(
        "volts of alternating current, of no conductor",
        "columns.AC (V)",
        dated().column("AC (V)", "L1.rms_v"));
    layout(
        "power sent out",
        "columns.kW export",
        dated().column("kW export", "total.active_w", 3).lines("V# (V)", "rms_v"));
    layout(
        "two feeders in one file",
        "columns.Feeder 3 L1 A",
        dated().lines("Feeder 2 L# A", "rms_a").lines("Feeder 3 L# A", "rms_a"));
    layout(
        "two boards in one file",
        "columns.MDB-2 kW",
        dated().column("MDB-1 kW", "L1.active_w", 3).column("MDB-2 kW", "L2.active_w", 3));
    layout(
        "numbers of things that are no lines",
        "columns.Load 1 (A)",
        dated().column("Load 1 (A)", "L1.rms_a").column("Load 2 (A)", "L2.rms_a"));
    layout(
        "lines counted from 0, or components",
        "columns.I1 (A)",
        dated()
            .column("I0 (A)", "L1.rms_a")
            .column("I1 (A)", "L2.rms_a")
            .column("I2 (A)", "L3.rms_a"));
    layout(
        "amps behind the instrument transformer",
        "columns.I1 sec (A)",
        dated().lines("I# sec (A)", "rms_a"));
    layout(
        "a unit below the names that is none known",
        "columns.I1 [Ax]",
        dated().lines("I#|Ax", "rms_a"));
    layout(
        "an abbreviated zone",
        "time.zone",
        LayoutWriter.of(",", '.').time("Time (EST)", "yyyy-MM-dd HH:mm").lines("V# (V)", "rms_v"));
    layout(
        "an abbreviated zone above the table",
        "time.zone",
        dated().preamble("Time zone: CET").lines("V# (V)", "rms_v"));
    layout(
        "VAB as volts between lines or volt-amperes of a line",
        "columns.VAA",
        dated().lines("V@", "rms_v").lines("I@", "rms_a").lines("VA@", "apparent_va"));
    layout(
        "newest first, one day that may be a month",
        "time.format",
        LayoutWriter.of(",", '.')
            .time("Time", "dd/MM/yyyy HH:mm")
            .rows(18)
            .newestFirst()
            .lines("V# (V)", "rms_v"));
  }

  static Stream<String> layouts() {
    return LAYOUTS.keySet().stream();
  }

  @ParameterizedTest
  @MethodSource("layouts")
  void isAsked(String name) {
    Open open = LAYOUTS.get(name);
    ReadingRefusedException e =
        catchThrowableOfType(
            ReadingRefusedException.class,
            () ->
                new FormatReader()
                    .plan(List.of(Files.of("log.csv", open.layout().bytes())), Files.setting(50)));
    assertThat(e).as("refused").isNotNull();
    assertThat(e.columns()).isNotEmpty();
    assertThat(e.questions()).extracting("part").contains(open.part());
  }
}
