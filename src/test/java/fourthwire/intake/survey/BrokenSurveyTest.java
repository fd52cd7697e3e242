package fourthwire.intake.survey;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.site.Lines;
import fourthwire.site.check.SurveyError;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.time.LocalDateTime;
import java.util.List;
import java.util.function.Consumer;
import java.util.stream.Stream;
import org.dhatim.fastexcel.Workbook;
import org.dhatim.fastexcel.Worksheet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * One thing at a time is damaged in a good survey: exactly one error comes back, at the right
 * table, row and column, with the value as it was written. Source of what is an error: the public
 * contract, section 2.
 */
class BrokenSurveyTest {
  /** A damage and the one error it must give; the message must hold the last text. */
  record Case(Consumer<SurveyKit> damage, SurveyError expected) {
    @Override
    public String toString() {
      return expected.table()
          + " "
          + expected.row()
          + " "
          + expected.column()
          + " \""
          + expected.value()
          + "\": "
          + expected.message();
    }
  }

  private static Case of(
      String table, int row, String column, String value, String says, Consumer<SurveyKit> damage) {
    return new Case(damage, new SurveyError(table, row, column, value, says));
  }

  /** A cell is overwritten and is itself what is wrong. */
  private static Case cell(String table, int row, String column, String value, String says) {
    return of(table, row, column, value, says, k -> k.set(table, row, column, value));
  }

  static Stream<Case> cells() {
    return Stream.of(
        cell("site", 3, "value", "55", "50, 60"),
        cell("site", 3, "value", "fifty", "not a number"),
        cell("site", 4, "value", "metric", "iec, north-america"),
        cell("site", 5, "value", "Europe/Atlantis", "time zone"),
        cell("site", 7, "value", "-1", "at least 0"),
        cell("site", 8, "value", "T9", "called"),
        cell("site", 2, "value", "", "required"),
        cell("supplies", 2, "line_voltage_v", "11 kV", "not a number"),
        cell("supplies", 2, "line_voltage_v", "0", "above 0"),
        cell("supplies", 2, "fault_level_mva", "", "generator_kva"),
        cell("supplies", 2, "fault_level_mva", "-150", "above 0"),
        cell("supplies", 2, "role", "main", "normal, standby"),
        cell("supplies", 2, "system", "3-wire", "three-phase-3-wire"),
        cell("supplies", 3, "generator_kva", "", "generator_kva"),
        cell("supplies", 3, "subtransient_reactance_percent", "", "subtransient"),
        cell("supplies", 3, "role", "", "Exactly one"),
        cell("supplies", 3, "connects_at", "XX", "XX"),
        cell("supplies", 3, "connects_at", "GRID", "is a supply"),
        cell("background", 2, "order", "1", "2 to 50"),
        cell("background", 2, "order", "5.5", "whole number"),
        cell("background", 3, "order", "5", "already"),
        cell("background", 2, "supply", "GRUD", "GRUD"),
        cell("background", 2, "percent", "120", "0 to 100"),
        cell("transformers", 2, "connection", "Dyn", "clock number"),
        cell("transformers", 2, "connection", "Dyn6", "odd"),
        cell("transformers", 2, "connection", "open delta", "supported"),
        cell("transformers", 2, "primary_v", "10000", "within 5 %"),
        cell("transformers", 2, "load_loss_w", "30000", "more than the impedance"),
        cell("transformers", 2, "impedance_percent", "4,5", "decimal"),
        cell("transformers", 2, "rated_kva", "NaN", "not a number"),
        cell("transformers", 2, "rated_kva", "0x10", "not a number"),
        cell("transformers", 2, "rated_kva", "1e999", "too large"),
        cell("transformers", 2, "rated_kva", "Infinity", "not a number"),
        cell("transformers", 3, "primary_lines", "", "single-phase"),
        cell("transformers", 3, "primary_lines", "L1-L1", "twice"),
        cell("transformers", 3, "primary_lines", "R-S", "Accepted"),
        cell("transformers", 3, "primary_v", "230", "within 5 %"),
        cell("panels", 2, "panel", "M/SB", "/ and :"),
        cell("panels", 3, "panel", "LP:1", "/ and :"),
        cell("panels", 3, "panel", ".", "folders"),
        cell("panels", 3, "panel", "..", "folders"),
        cell("panels", 3, "panel", "", "required"),
        cell("panels", 4, "panel", "LP-1", "already"),
        cell("panels", 3, "panel", "T1", "already"),
        cell("panels", 3, "fed_from", "MSX", "MSB"),
        cell("panels", 3, "fed_from", "LP-1", "loop"),
        cell("panels", 2, "fed_from", "LP-1", "loop"),
        cell("panels", 3, "fed_from", "GEN", "standby"),
        cell("panels", 4, "parent_lines", "", "fewer lines"),
        cell("panels", 4, "parent_lines", "L1-L2", "names 2"),
        cell("panels", 4, "parent_lines", "L4", "Accepted"),
        cell("panels", 5, "system", "three-phase-4-wire", "3 lines"),
        cell("panels", 3, "system", "four wires", "three-phase-4-wire"),
        cell("panels", 3, "length_m", "", "conductor_size"),
        cell("panels", 3, "conductor_size", "50 sqmm", "25 mm2"),
        cell("panels", 3, "conductor_material", "silver", "copper, aluminium"),
        cell("panels", 3, "bus_rating_a", "160 A", "not a number"),
        cell("circuits", 3, "circuit", "1", "already"),
        cell("circuits", 4, "panel", "LP-X", "LP-X"),
        cell("circuits", 4, "panel", "T1", "is a transformer"),
        cell("circuits", 2, "lines", "L1-N", "L1-L2-L3-N"),
        cell("circuits", 2, "lines", "", "required"),
        cell("circuits", 6, "lines", "L2-L3", "other lines"),
        cell("circuits", 8, "lines", "L1-L2-L3-N", "no neutral upstream"),
        cell("circuits", 3, "neutral_size", "4 mm2", "share"),
        cell("circuits", 8, "shared_neutral", "B", "no neutral to share"),
        cell("loads", 3, "circuit", "9", "no circuit"),
        cell("loads", 2, "circuit", "1", "LP-1:1"),
        cell("loads", 3, "panel", "LP-9", "LP-9"),
        cell("loads", 2, "kind", "computer", "capacitor-input"),
        cell("loads", 2, "kind", "", "One of kind"),
        cell("loads", 2, "spectrum", "led", "Only one"),
        cell("loads", 4, "spectrum", "let", "led"),
        cell("loads", 2, "kind", "six-pulse", "three-phase"),
        cell("loads", 8, "kind", "pfc-continuous", "single-phase"),
        cell("loads", 2, "quantity", "-3", "above 0"),
        cell("loads", 2, "quantity", "", "required"),
        cell("loads", 2, "rated_w", "", "One of rated_w"),
        cell("loads", 2, "rated_w", "-90", "generation"),
        cell("loads", 2, "rated_w", "1.234,5", "not a number"),
        cell("loads", 2, "rated_w", "1 234", "not a number"),
        cell("loads", 2, "rated_w", "=45*2", "formula"),
        cell("loads", 2, "rated_va", "100", "Only one"),
        cell("loads", 2, "demand_factor", "1.2", "0 to 1"),
        cell("loads", 2, "schedule", "nights", "nights"),
        cell("loads", 6, "displacement_factor", "98", "-1 to 1"),
        cell("loads", 6, "displacement_factor", "0", "0 is no"),
        cell("loads", 2, "high_w", "50", "at least low_w"),
        cell("loads", 2, "confidence", "sure", "nameplate"),
        cell("loads", 2, "part_load", "half", "lower-power"),
        cell("loads", 2, "preset", "computer", "Only one"),
        cell("spectra", 2, "percent", "95", "100"),
        cell("spectra", 3, "order", "51", "1 to 50"),
        cell("spectra", 4, "order", "3", "already"),
        cell("spectra", 3, "percent", "-1", "0 to"),
        cell("schedules", 3, "days", "friday", "weekday"),
        cell("schedules", 4, "days", "saturday", "already"),
        cell("schedules", 2, "h05", "1.5", "0 to 1"),
        cell("schedules", 2, "h05", "", "required"),
        cell("capacitors", 2, "panel", "LP-2", "three-phase"),
        cell("capacitors", 2, "panel", "GRID", "is a supply"),
        cell("capacitors", 2, "kvar", "0", "above 0"),
        cell("capacitors", 2, "steps", "1.5", "whole number"),
        cell("filters", 2, "tuned_order", "", "tuned_order"),
        cell("filters", 3, "rated_a", "", "rated_a"),
        cell("filters", 4, "impedance_percent", "", "impedance_percent"),
        cell("filters", 4, "panel", "PP-1", "neutral"),
        cell("filters", 2, "type", "passive", "tuned"),
        cell("filters", 3, "filter", "F1", "already"),
        cell("meters", 2, "at", "LP-7", "LP-7"),
        cell("meters", 3, "at", "1", "LP-1:1"),
        cell("meters", 2, "ct_reversed", "L2-X", "Accepted"),
        cell("meters", 2, "instrument", "analog", "class-a"),
        cell("meters", 3, "meter", "main", "already"),
        cell("spot_readings", 2, "time", "10.3.2026 10:15", "2026-03-14T09:30"),
        cell("spot_readings", 2, "power_factor", "91", "-1 to 1"),
        cell("spot_readings", 3, "at", "M9", "M9"));
  }

  static Stream<Case> structures() {
    return Stream.of(
        of(
            "transformers",
            3,
            "primary_v",
            "400",
            "supplies row 3",
            k -> k.set("transformers", 2, "secondary_v", "208")),
        of(
            "panels",
            4,
            "system",
            "single-phase",
            "no neutral upstream",
            k -> k.set("panels", 2, "system", "three-phase-3-wire")),
        of(
            "circuits",
            8,
            "lines",
            "L1-L2-L3",
            "filters row 2",
            k ->
                k.set("panels", 6, "system", "single-phase")
                    .set("panels", 6, "parent_lines", "L1")),
        of(
            "transformers",
            3,
            "fed_from",
            "MSB",
            "supplies row 3",
            k -> k.set("panels", 2, "panel", "MAIN")),
        of(
            "transformers",
            2,
            "fed_from",
            "GRID",
            "background row 2",
            k -> k.set("supplies", 2, "supply", "MAINS")),
        of(
            "loads",
            2,
            "circuit",
            "LP-1:1",
            "meters row 3",
            k -> k.set("circuits", 2, "circuit", "11")),
        of(
            "panels",
            2,
            "system",
            "three-phase-4-wire",
            "no neutral upstream",
            k -> k.set("transformers", 2, "connection", "Dd0")),
        of("site", 0, "", "", "missing", k -> k.removeTable("site")),
        of("supplies", 0, "", "", "missing", k -> k.removeTable("supplies")),
        of("panels", 0, "", "", "missing", k -> k.removeTable("panels")),
        of("circuits", 0, "", "", "loads row 2 (\"LP-1:1\")", k -> k.removeTable("circuits")),
        of("spectra", 0, "", "", "loads row 4", k -> k.removeTable("spectra")),
        of("schedules", 0, "", "", "loads row 3", k -> k.removeTable("schedules")),
        of("transformers", 0, "", "", "panels row 2", k -> k.removeTable("transformers")),
        of(
            "loads",
            2,
            "circuit",
            "LP-1:1",
            "loads row 9",
            k ->
                k.removeTable("circuits")
                    .removeTable("meters")
                    .removeTable("spot_readings")
                    .file("circuits.csv", "circuit,panel,lines\n")),
        of("panels", 0, "", "", "file is empty", k -> k.file("panels.csv", "\n\n")),
        of(
            "capacitors",
            0,
            "",
            "",
            "1001 columns",
            k -> k.file("capacitors.csv", "capacitor,panel,kvar" + ",x".repeat(998) + "\n")),
        of(
            "circuits",
            10,
            "lines",
            "L3",
            "one naming",
            k ->
                k.append("panels", "LP-4,MSB,single-phase,L2-L3,,,,,,,")
                    .set("panels", 7, "system", "split-phase")
                    .append("circuits", "1,LP-4,L3,16,,,,")
                    .append("circuits", "2,LP-4,L2,16,,,,")
                    .append("circuits", "3,LP-4,L3,16,,,,")),
        of("site", 0, "key", "", "frequency_hz", k -> k.removeRow("site", 3)),
        of("site", 9, "key", "name", "row 2", k -> k.append("site", "name,Other house")),
        of("site", 1, "value", "", "missing", k -> k.removeColumn("site", "value")),
        of("supplies", 0, "role", "", "exactly one", k -> k.set("supplies", 2, "role", "standby")),
        of(
            "supplies",
            0,
            "",
            "",
            "no rows",
            k -> k.removeRow("supplies", 3).removeRow("supplies", 2)),
        of(
            "supplies",
            4,
            "role",
            "normal",
            "Exactly one",
            k -> k.append("supplies", "GRID-2,11000,100,,normal,three-phase-3-wire,,,")),
        of(
            "supplies",
            2,
            "generator_kva",
            "500",
            "not both",
            k ->
                k.set("supplies", 2, "generator_kva", "500")
                    .set("supplies", 2, "subtransient_reactance_percent", "12")),
        of(
            "panels",
            2,
            "system",
            "three-phase-4-wire",
            "no neutral upstream",
            k -> k.set("panels", 2, "fed_from", "GRID")),
        of("panels", 1, "fed_from", "", "missing", k -> k.removeColumn("panels", "fed_from")),
        of("circuits", 1, "lines", "", "missing", k -> k.rename("circuits", "lines", "line")),
        of("loads", 1, "load", "", "missing", k -> k.removeColumn("loads", "load")),
        of(
            "spectra",
            1,
            "percent",
            "percent",
            "twice",
            k -> k.rename("spectra", "degrees", "percent")),
        of("schedules", 1, "h23", "", "missing", k -> k.removeColumn("schedules", "h23")),
        of("circuits", 2, "panel", "LP-1", "circuits row 3", k -> k.removeRow("panels", 3)),
        of("spectra", 2, "order", "3", "no order 1", k -> k.removeRow("spectra", 2)),
        of("schedules", 2, "days", "weekday", "sunday", k -> k.removeRow("schedules", 4)),
        of("circuits", 2, "", "extra", "more cells", k -> k.rows("circuits").get(1).add("extra")),
        of(
            "transformers",
            2,
            "rated_kva",
            "",
            "impedance_percent",
            k -> k.rows("transformers").set(1, List.of("T1", "GRID"))),
        of(
            "loads",
            2,
            "preset",
            "no such thing",
            "preset",
            k -> k.set("loads", 2, "kind", "").set("loads", 2, "preset", "no such thing")),
        of(
            "loads",
            4,
            "spectrum",
            "",
            "needs the name",
            k -> k.set("loads", 4, "kind", "measured").set("loads", 4, "spectrum", "")),
        of(
            "loads",
            8,
            "spectrum",
            "led",
            "order 3",
            k -> k.set("loads", 8, "kind", "").set("loads", 8, "spectrum", "led")),
        of(
            "panels",
            3,
            "length_m",
            "",
            "resistance_ohm_per_km",
            k ->
                k.set("panels", 2, "resistance_ohm_per_km", "")
                    .set("panels", 3, "resistance_ohm_per_km", "0.5")
                    .set("panels", 3, "conductor_size", "")
                    .set("panels", 3, "neutral_size", "")
                    .set("panels", 3, "length_m", "")),
        of("panels", 3, "panel", "LP\t1", "Control", k -> k.set("panels", 3, "panel", "LP\t1")),
        of(
            "panels",
            3,
            "",
            "",
            "UTF-8",
            k ->
                k.file(
                    "panels.csv",
                    "panel,fed_from\nMSB,T1\nK\u00fcche,MSB\n"
                        .getBytes(StandardCharsets.ISO_8859_1))),
        of(
            "panels",
            3,
            "",
            "",
            "not closed",
            k -> k.file("panels.csv", "panel,fed_from\nMSB,T1\n\"LP-1,MSB\nLP-2,MSB\n")),
        of(
            "panels",
            1,
            "",
            "",
            "Row 1 is empty",
            k -> k.file("panels.csv", "\npanel,fed_from\nMSB,T1\n")),
        of("panels", 0, "", "", "twice", k -> k.file("PANELS.csv", "panel,fed_from\nMSB,T1\n")));
  }

  @ParameterizedTest
  @MethodSource({"cells", "structures"})
  void oneDamageGivesOneError(Case broken) {
    SurveyKit kit = new SurveyKit();
    broken.damage.accept(kit);
    assertOneError(SurveyImport.read(kit.zip()), broken.expected);
  }

  @ParameterizedTest
  @MethodSource("cells")
  void aWorkbookGivesTheSameError(Case broken) {
    SurveyKit kit = new SurveyKit();
    broken.damage.accept(kit);
    // A workbook has no separator that a decimal comma could be mistaken for.
    if (!broken.expected.value().equals("4,5")) {
      assertOneError(SurveyImport.read(kit.xlsx()), broken.expected);
    }
  }

  @Test
  void allErrorsComeAtOnceAndInOrder() {
    SurveyKit kit =
        new SurveyKit()
            .set("loads", 2, "rated_w", "x")
            .set("supplies", 2, "x_over_r", "x")
            .set("panels", 2, "bus_rating_a", "x")
            .set("circuits", 6, "lines", "L2")
            .set("loads", 3, "demand_factor", "7")
            .set("filters", 3, "rated_a", "");
    SurveyImport.Outcome outcome = SurveyImport.read(kit.zip());
    assertThat(outcome).isInstanceOf(SurveyImport.Refused.class);
    assertThat(((SurveyImport.Refused) outcome).errors())
        .extracting(e -> e.table() + " " + e.row() + " " + e.column())
        .containsExactly(
            "supplies 2 x_over_r",
            "panels 2 bus_rating_a",
            "circuits 6 lines",
            "loads 2 rated_w",
            "loads 3 demand_factor",
            "filters 3 rated_a");
  }

  private static void assertOneError(SurveyImport.Outcome outcome, SurveyError expected) {
    assertThat(outcome).isInstanceOf(SurveyImport.Refused.class);
    List<SurveyError> errors = ((SurveyImport.Refused) outcome).errors();
    assertThat(errors).hasSize(1);
    SurveyError error = errors.get(0);
    assertThat(List.of(error.table(), error.row(), error.column(), error.value()))
        .as(error.message())
        .isEqualTo(List.of(expected.table(), expected.row(), expected.column(), expected.value()));
    assertThat(error.message()).containsIgnoringCase(expected.message());
  }

  private static SurveyImport.Read accepted(byte[] file) {
    SurveyImport.Outcome outcome = SurveyImport.read(file);
    assertThat(outcome).isInstanceOf(SurveyImport.Read.class);
    return (SurveyImport.Read) outcome;
  }

  /** LP-2 is fed by L3 alone and calls it L1; what its neighbours say changes nothing. */
  @Test
  void aLineOfTheParentIsReadAsTheOwnLineItFeedsAndSaidSo() {
    SurveyKit kit = new SurveyKit().set("circuits", 6, "lines", "L3");
    SurveyImport.Read read = accepted(kit.zip());
    assertThat(read.survey().circuits().get(4).lines()).isEqualTo(Lines.L1);
    assertThat(read.warnings())
        .anySatisfy(w -> assertThat(w).contains("circuits row 6", "LP-2", "L3", "own L1"));
  }

  /** Fed by L1 and L3 with own names L1 and L2: L1 is L1 in both, L3 is the parent's only. */
  @Test
  void namesThatMeanTheSameInBothReadingsDoNotContradict() {
    SurveyKit kit =
        new SurveyKit()
            .append("panels", "LP-4,MSB,split-phase,L1-L3,,,,,,,")
            .append("circuits", "1,LP-4,L1,16,,,,")
            .append("circuits", "2,LP-4,L3,16,,,,");
    SurveyImport.Read read = accepted(kit.zip());
    assertThat(read.survey().circuits().get(8).lines()).isEqualTo(Lines.L1);
    assertThat(read.survey().circuits().get(9).lines()).isEqualTo(Lines.L2);
    assertThat(accepted(kit.set("circuits", 11, "lines", "L2").zip()).warnings())
        .noneSatisfy(w -> assertThat(w).contains("LP-4"));
  }

  @Test
  void aSurveyWithoutLoadsIsAcceptedWithAWarning() {
    assertThat(accepted(new SurveyKit().removeTable("loads").zip()).warnings())
        .contains("no loads: nothing will flow.");
  }

  @Test
  void unknownColumnsAreNamedUpToTwenty() {
    SurveyKit kit = new SurveyKit();
    for (int k = 0; k < 100; k++) {
      kit.set("capacitors", 2, "odd" + k, "1");
    }
    assertThat(accepted(kit.zip()).warnings())
        .hasSize(21)
        .last()
        .asString()
        .contains("capacitors: and 80 more");
  }

  /** Vienna stands at UTC+1 on 10 March. */
  @ParameterizedTest
  @ValueSource(
      strings = {
        "2026-03-10T10:15",
        "2026-03-10 09:15Z",
        "2026-03-10T04:15-05:00",
        "2026-03-10 10:15:00 +01:00"
      })
  void aTimeWithItsOffsetIsPutIntoLocalTime(String time) {
    SurveyImport.Read read = accepted(new SurveyKit().set("spot_readings", 2, "time", time).zip());
    assertThat(read.survey().spotReadings().get(0).time())
        .contains(LocalDateTime.of(2026, 3, 10, 10, 15));
  }

  @Test
  void aBooleanInAWorkbookIsNoNumber() throws IOException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (Workbook workbook = new Workbook(bytes, "test", null)) {
      Worksheet sheet = workbook.newWorksheet("supplies");
      sheet.value(0, 0, "supply");
      sheet.value(0, 1, "line_voltage_v");
      sheet.value(1, 0, "GRID");
      sheet.value(1, 1, true);
    }
    SurveyImport.Outcome outcome = SurveyImport.read(bytes.toByteArray());
    assertThat(((SurveyImport.Refused) outcome).errors())
        .anySatisfy(
            e -> {
              assertThat(e.column()).isEqualTo("line_voltage_v");
              assertThat(e.value()).isEqualTo("TRUE");
              assertThat(e.message()).contains("not a number");
            });
  }
}
