package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.dhatim.fastexcel.Workbook;
import org.dhatim.fastexcel.Worksheet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Interval logs as CSV: layouts, times, refusals. The expected figures are those typed in. */
class LogReadingTest {
  private static Reading read(String text) {
    return read(text.getBytes(StandardCharsets.UTF_8), Files.setting(50));
  }

  private static Reading read(byte[] bytes, ReadingSetting setting) {
    List<fourthwire.metering.RawFile> files = List.of(Files.of("log.csv", bytes));
    ReadingReader reader = new FormatReader();
    return reader.read(files, reader.plan(files, setting), setting, (share, message) -> true);
  }

  private static ReadingRefusedException refusal(String text, ReadingSetting setting) {
    try {
      read(text.getBytes(StandardCharsets.UTF_8), setting);
    } catch (ReadingRefusedException e) {
      return e;
    }
    throw new AssertionError("was not refused");
  }

  private static double mean(Reading reading, String quantity) {
    return reading.log().orElseThrow().quantities().get(quantity).mean();
  }

  @Test
  void tradeWordsWithUnitsAreMappedWithoutBeingTold() {
    Reading r =
        read(
            """
            Time,I1 rms [A],Current L2 (A),U L1-N avg V,P total kW,Neutral current [A],PF L1,THD I L1 %,Frequency Hz
            2025-03-01 00:00:00,10,20,230,4.5,7,0.9,33,50.01
            2025-03-01 00:10:00,12,22,232,5.5,9,0.8,35,49.99
            """);
    assertThat(r.kind()).isEqualTo(ReadingKind.LOG);
    assertThat(r.count()).isEqualTo(2);
    assertThat(r.sampleRateHz().orElseThrow()).isEqualTo(1 / 600.0, within(1e-12));
    assertThat(r.log().orElseThrow().interval()).isEqualTo(Duration.ofMinutes(10));
    assertThat(mean(r, "L1.rms_a")).isEqualTo(11);
    assertThat(mean(r, "L2.rms_a")).isEqualTo(21);
    assertThat(mean(r, "L1.rms_v")).isEqualTo(231);
    assertThat(mean(r, "total.active_w")).isEqualTo(5000);
    assertThat(mean(r, "N.rms_a")).isEqualTo(8);
    assertThat(mean(r, "L1.power_factor")).isEqualTo(0.85, within(1e-12));
    assertThat(mean(r, "L1.current_thd_percent")).isEqualTo(34);
    assertThat(mean(r, "frequency_hz")).isEqualTo(50);
  }

  @Test
  void ordersBelowTheNameOfTheirGroupAreRead() {
    Reading r =
        read(
            "Time;Harmonics I L1 (%);;;Current L1 (A)\n;3;5;7;\n"
                + "2025-03-01 00:00;31;22;13;10\n2025-03-01 00:10;33;24;15;12\n");
    assertThat(mean(r, "L1.current_h3_percent")).isEqualTo(32);
    assertThat(mean(r, "L1.current_h7_percent")).isEqualTo(14);
    assertThat(mean(r, "L1.rms_a")).isEqualTo(11);
  }

  @Test
  void valuesWithoutATimeAreRefusedBeforeTheFileIsTaken() {
    List<fourthwire.metering.RawFile> files =
        List.of(
            Files.of(
                "log.csv", "Time;I1 (A);I2 (A);I3 (A)\n;31.5;22;13\n2025-03-01 00:10;33;24;15\n"));
    assertThatThrownBy(() -> new FormatReader().plan(files, Files.setting(50)))
        .isInstanceOfSatisfying(
            ReadingRefusedException.class, e -> assertThat(e.columns()).contains("I1 (A)"));
  }

  @Test
  void aRegisterThatNeverFallsIsSaidToBeOne() {
    StringBuilder log = new StringBuilder("Time;Energy register (kWh);I1 (A);P (kW)\n");
    for (int k = 0; k < 40; k++) {
      String sign = k % 3 == 0 ? "(%d.5)" : "%d.5";
      log.append("2025-03-01 %02d:%02d;%d.25;7;".formatted(k / 6, k % 6 * 10, 182311 + 3 * k));
      log.append(sign.formatted(k)).append('\n');
    }
    Reading r = read(log.toString());
    assertThat(r.log().orElseThrow().quantities().get("total.energy_wh").min())
        .isEqualTo(182311.25e3);
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("Energy register", "differences"));
    // Every third is written in brackets, as accounts write what is below nothing.
    assertThat(r.log().orElseThrow().quantities().get("total.active_w").min()).isEqualTo(-39500);
    assertThat(r.quality()).noneMatch(q -> q.code().equals(QualityFinding.IMPOSSIBLE_VALUE));
  }

  @Test
  void aUnitRowWithAMultipleIsApplied() {
    Reading r = read("Time;I1;I2\n;x10 A;0.1 A\n2025-03-01 00:00;2;30\n2025-03-01 00:10;4;50\n");
    assertThat(mean(r, "L1.rms_a")).isEqualTo(30);
    assertThat(mean(r, "L2.rms_a")).isEqualTo(4);
  }

  @Test
  void exactQuantityNamesAreRead() {
    Reading r =
        read(
            "time;L1.rms_a;N.current_h9_a;L1.current_h3_percent\n"
                + "2025-03-01T00:00:00Z;1,5;0,25;61,2\n"
                + "2025-03-01T00:01:00Z;2,5;0,75;63,2\n");
    assertThat(mean(r, "L1.rms_a")).isEqualTo(2);
    assertThat(mean(r, "N.current_h9_a")).isEqualTo(0.5);
    assertThat(mean(r, "L1.current_h3_percent")).isEqualTo(62.2, within(1e-12));
    assertThat(r.period().orElseThrow().from()).isEqualTo(Instant.parse("2025-03-01T00:00:00Z"));
    assertThat(r.period().orElseThrow().to()).isEqualTo(Instant.parse("2025-03-01T00:02:00Z"));
  }

  @Test
  void preambleUnitsRowDateAndTimeColumnsDayFirstAndUtf16AreRead() {
    String text =
        """
        Meter;MSB main
        Serial;4711

        Date;Time;L1;L1 voltage
        ;;A;V
        13.02.2025;00:00;1.234,5;230,1
        13.02.2025;00:15;1.236,5;230,3
        """
            .replace("Date;Time;L1;", "Date;Time;Current L1;");
    byte[] utf16 = ("\uFEFF" + text).getBytes(StandardCharsets.UTF_16LE);
    Reading r = read(utf16, Files.setting(50));
    assertThat(mean(r, "L1.rms_a")).isEqualTo(1235.5);
    assertThat(mean(r, "L1.rms_v")).isEqualTo(230.2, within(1e-9));
    // Amsterdam stands at UTC+1 in February.
    assertThat(r.period().orElseThrow().from()).isEqualTo(Instant.parse("2025-02-12T23:00:00Z"));
  }

  @Test
  void theStepsSettleTheOrderOfDates() {
    Reading r =
        read(
            """
            Date Time,I L1 (A)
            01/02/2025 23:50,1
            02/02/2025 00:00,2
            02/02/2025 00:10,3
            """);
    assertThat(r.period().orElseThrow().from()).isEqualTo(Instant.parse("2025-02-01T22:50:00Z"));
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("day first"));
  }

  @Test
  void aDateOrderThatTheFileDoesNotSettleIsAsked() {
    ReadingRefusedException e =
        refusal("Date Time,I L1 (A)\n01/02/2025 10:00,1\n01/02/2025 10:10,2\n", Files.setting(50));
    assertThat(e.columns()).containsExactly("Date Time", "I L1 (A)");
    assertThat(e.questions()).extracting("part").containsExactly("time.format");
  }

  @Test
  void unitsAndConductorsThatAreOpenAreAskedAllAtOnce() {
    ReadingSetting noZone =
        new ReadingSetting(
            Optional.empty(),
            50,
            Optional.empty(),
            l -> Optional.empty(),
            List.of(),
            OptionalDouble.empty());
    ReadingRefusedException e =
        refusal("time,Power L1,THD L2\n2025-01-01 00:00,1,2\n2025-01-01 00:10,1,2\n", noZone);
    assertThat(e.questions())
        .extracting("part")
        .containsExactlyInAnyOrder("columns.Power L1", "columns.THD L2", "time.zone");
  }

  @Test
  void theRepeatedHourOfAutumnIsTwoHours() {
    StringBuilder text = new StringBuilder("time,L1.rms_a\n");
    for (String t : List.of("01:30", "02:00", "02:30", "02:00", "02:30", "03:00", "03:30")) {
      text.append("2025-10-26 ").append(t).append(",").append(text.length()).append("\n");
    }
    Reading r = read(text.toString());
    assertThat(r.quality()).isEmpty();
    assertThat(r.period().orElseThrow().length()).isEqualTo(Duration.ofMinutes(210));
  }

  @Test
  void theRepeatedHourOfAutumnIsTwoHoursWhenTheNewestRowStandsFirst() {
    StringBuilder text = new StringBuilder("time,L1.rms_a\n");
    java.time.ZonedDateTime last =
        LocalDateTime.of(2025, 10, 27, 12, 0).atZone(ZoneId.of("Europe/Amsterdam"));
    for (int k = 0; k < 96; k++) {
      text.append(last.minusMinutes(30L * k).toLocalDateTime()).append(",").append(k).append("\n");
    }
    Reading r = read(text.toString());
    assertThat(r.quality()).isEmpty();
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("newest row stands first"));
    assertThat(r.period().orElseThrow().length()).isEqualTo(Duration.ofHours(48));
    assertThat(r.period().orElseThrow().to()).isEqualTo(last.plusMinutes(30).toInstant());
  }

  @Test
  void gapsRepeatsBlanksAndOverflowsAreFound() {
    StringBuilder text = new StringBuilder("time,L1.rms_a,L1.power_factor\n");
    for (int k = 0; k < 200; k++) {
      if (k >= 50 && k < 60) {
        continue;
      }
      String t = String.format("2025-01-%02d %02d:%02d", 1 + k / 144, k / 6 % 24, k % 6 * 10);
      String i = k == 80 ? "-" : k == 90 ? "99999" : k == 91 ? "1O.5" : String.valueOf(10 + k % 7);
      String row = t + "," + i + "," + (k == 100 ? "1.4" : "0.9") + "\n";
      text.append(row).append(k == 120 ? row : "");
    }
    Reading r = read(text.toString());
    assertThat(r.quality())
        .extracting(QualityFinding::code)
        .containsExactlyInAnyOrder(
            QualityFinding.GAP,
            QualityFinding.REPEATED_ROWS,
            QualityFinding.MISSING_VALUES,
            QualityFinding.IMPOSSIBLE_VALUE,
            QualityFinding.IMPOSSIBLE_VALUE,
            QualityFinding.IMPOSSIBLE_VALUE);
    assertThat(r.quality())
        .filteredOn(f -> f.code().equals(QualityFinding.GAP))
        .singleElement()
        .satisfies(
            f -> assertThat(f.period().orElseThrow().length()).isEqualTo(Duration.ofMinutes(100)));
  }

  @Test
  void aReversedClampAndAWrongRatioAreFound() {
    StringBuilder text = new StringBuilder("time,L1.active_w,L2.active_w,L2.rms_v,L2.rms_a\n");
    for (int k = 0; k < 60; k++) {
      text.append(
          String.format("2025-01-01 00:%02d,%d,%d,230,%d%n", k, -2000 - k, 46000 + k, 20 + k % 3));
    }
    assertThat(read(text.toString()).quality())
        .extracting(QualityFinding::code)
        .contains(QualityFinding.REVERSED_CLAMP, QualityFinding.WRONG_RATIO);
  }

  @Test
  void aValueThatStandsStillIsFound() {
    StringBuilder text = new StringBuilder("time,L1.rms_a\n");
    for (int k = 0; k < 144; k++) {
      double i = k > 60 && k < 90 ? 12.34 : 10 + Math.sin(k);
      text.append(String.format("2025-01-01 %02d:%02d,%.4f%n", k / 6, k % 6 * 10, i));
    }
    assertThat(read(text.toString()).quality())
        .extracting(QualityFinding::code)
        .containsExactly(QualityFinding.FLAT_LINE);
  }

  @Test
  void noTableIsRefusedInWords() {
    assertThatThrownBy(() -> read("nothing here"))
        .isInstanceOf(ReadingRefusedException.class)
        .hasMessageContaining("No table was found");
  }

  private static ReadingSetting told(ReadingMapping mapping) {
    return new ReadingSetting(
        Optional.of(ZoneId.of("Europe/Amsterdam")),
        50,
        Optional.of(mapping),
        l -> Optional.empty(),
        List.of(),
        OptionalDouble.empty());
  }

  private static ReadingMapping mapping(String column, double factor, Optional<String> format) {
    return new ReadingMapping(
        Optional.empty(),
        new ReadingMapping.Time(
            List.of(), format, Optional.empty(), Optional.empty(), OptionalDouble.empty()),
        OptionalDouble.empty(),
        Map.of(
            column, new ReadingMapping.Column("L1.rms_a", ReadingMapping.Statistic.MEAN, factor)));
  }

  @ParameterizedTest
  @ValueSource(strings = {"I L1", "I L1 [A]"})
  void aColumnWithAUnitBelowIsNamedWithOrWithoutIt(String name) {
    String text = "Time,I L1,U L1\n,A,V\n2025-01-01 00:00,10,230\n2025-01-01 00:10,20,231\n";
    ReadingMapping mapping = mapping(name, 1, Optional.empty());
    Reading r = read(text.getBytes(StandardCharsets.UTF_8), told(mapping));
    assertThat(mean(r, "L1.rms_a")).isEqualTo(15);
    assertThat(r.log().orElseThrow().quantities()).containsOnlyKeys("L1.rms_a");
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, -1, Double.NaN, Double.POSITIVE_INFINITY})
  void aFactorThatIsNotAboveZeroIsRefused(double factor) {
    ReadingRefusedException e =
        refusal(
            "Time,I L1 (A)\n2025-01-01 00:00,10\n2025-01-01 00:10,20\n",
            told(mapping("I L1 (A)", factor, Optional.empty())));
    assertThat(e.questions())
        .singleElement()
        .satisfies(q -> assertThat(q.part()).isEqualTo("columns.I L1 (A).factor"))
        .satisfies(q -> assertThat(q.message()).contains("ct_reversed"));
  }

  @ParameterizedTest
  @CsvSource({
    "2025-01-13 00:00, 2025-01-13 00:10, dd/MM/yyyy HH:mm",
    "01/13/2025 00:00, 01/13/2025 00:10, dd/MM/yyyy",
    "13.01.2025 00:00, 13.01.2025 00:10, MM/dd/yyyy",
    "13.01.2025 00:00, 13.01.2025 00:10, yyyy-MM-dd"
  })
  void aFormatThatContradictsTheFileIsAsked(String first, String second, String format) {
    String text = "Time,I L1 (A)\n" + first + ",10\n" + second + ",20\n";
    ReadingMapping mapping = mapping("I L1 (A)", 1, Optional.of(format));
    ReadingRefusedException e = refusal(text, told(mapping));
    assertThat(e.columns()).containsExactly("Time", "I L1 (A)");
    assertThat(e.questions()).extracting("part").containsExactly("time.format");
    ReadingSetting remembered =
        new ReadingSetting(
            Optional.of(ZoneId.of("Europe/Amsterdam")),
            50,
            Optional.empty(),
            l -> Optional.of(mapping),
            List.of(),
            OptionalDouble.empty());
    assertThat(refusal(text, remembered).questions()).hasSize(1);
  }

  @Test
  void theSheetOfAWorkbookIsReadAsATable() throws IOException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (Workbook workbook = new Workbook(bytes, "test", null)) {
      Worksheet sheet = workbook.newWorksheet("log");
      sheet.value(0, 0, "Meter, main");
      sheet.value(2, 0, "Time");
      sheet.value(2, 1, "I L1 (A)");
      for (int k = 0; k < 3; k++) {
        sheet.value(3 + k, 0, LocalDateTime.of(2025, 2, 1, 0, 10 * k));
        sheet.style(3 + k, 0).format("dd/mm/yyyy hh:mm").set();
        sheet.value(3 + k, 1, 10.5 + k);
      }
    }
    Reading r = read(bytes.toByteArray(), Files.setting(50));
    assertThat(mean(r, "L1.rms_a")).isEqualTo(11.5);
    assertThat(r.log().orElseThrow().interval()).isEqualTo(Duration.ofMinutes(10));
    assertThat(r.period().orElseThrow().from()).isEqualTo(Instant.parse("2025-01-31T23:00:00Z"));
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("row 4"));
  }

  @Test
  void coverAndEventsOfAWorkbookAreNotTakenForItsRows() throws IOException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (Workbook workbook = new Workbook(bytes, "test", null)) {
      Worksheet cover = workbook.newWorksheet("cover");
      cover.value(0, 0, "Survey of a board");
      cover.value(1, 0, "From");
      cover.value(1, 1, "2025-02-01 00:00");
      Worksheet events = workbook.newWorksheet("events");
      Worksheet rows = workbook.newWorksheet("trend");
      rows.value(0, 0, "Time");
      rows.value(0, 1, "I L1 (A)");
      List.of("Time", "Kind", "Lasted (s)")
          .forEach(h -> events.value(0, "TKL".indexOf(h.charAt(0)), h));
      for (int k = 0; k < 4; k++) {
        String time = "2025-02-01 00:" + k + "0";
        events.value(1 + k, 0, time);
        events.value(1 + k, 1, "dip");
        events.value(1 + k, 2, 0.2 * k);
        rows.value(1 + k, 0, time);
        rows.value(1 + k, 1, 10 + k);
      }
    }
    Reading r = read(bytes.toByteArray(), Files.setting(50));
    assertThat(r.count()).isEqualTo(4);
    assertThat(mean(r, "L1.rms_a")).isEqualTo(11.5);
  }

  /** Amsterdam's clocks went on at 2:00 on 30 March 2025 and back at 3:00 on 26 October. */
  @ParameterizedTest
  @CsvSource({"2025-03-30T00:00", "2025-10-26T00:00"})
  void aClockThatNeverChangesKeepsStandardTime(LocalDateTime from) {
    StringBuilder text = new StringBuilder("Time,I L1 (A)\n");
    for (int k = 0; k < 60; k++) {
      text.append(from.plusMinutes(10L * k)).append(',').append(k).append('\n');
    }
    Reading r = read(text.toString());
    assertThat(r.period().orElseThrow().from()).isEqualTo(from.toInstant(ZoneOffset.ofHours(1)));
    assertThat(r.quality()).isEmpty();
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("standard time all year"));
  }

  /** Energy suppliers count hours from 1 to 24; kilowatts that look like 12.34 are no clock. */
  @Test
  void hoursThatEndAreCountedFromOne() {
    StringBuilder text = new StringBuilder("Date,HE,kW\n");
    for (int k = 0; k < 48; k++) {
      text.append("02/1" + (3 + k / 24) + "/2025," + (1 + k % 24) + ",12." + (10 + k) + "\n");
    }
    Reading r = read(text.toString());
    assertThat(r.log().orElseThrow().interval()).isEqualTo(Duration.ofHours(1));
    assertThat(r.period().orElseThrow().from()).isEqualTo(Instant.parse("2025-02-12T23:00:00Z"));
    assertThat(r.period().orElseThrow().to()).isEqualTo(Instant.parse("2025-02-14T23:00:00Z"));
  }

  /** Day 45,700 of a spreadsheet is 12 February 2025. */
  @Test
  void daysOfASpreadsheetHaveTheirFractionBesideThem() {
    Reading r = read("Date,Time,I L1 (A)\n45700,0.25,1\n45700,0.5,2\n45700,0.75,3\n45701,0,4\n");
    assertThat(r.log().orElseThrow().interval()).isEqualTo(Duration.ofHours(6));
    assertThat(r.period().orElseThrow().from()).isEqualTo(Instant.parse("2025-02-12T05:00:00Z"));
  }

  @Test
  void theRepeatedHourOfAutumnIsTwoRowsOfAnHour() {
    String text = "Time,I L1 (A)\n";
    for (String hour : List.of("00", "01", "02", "02", "03", "04")) {
      text += "2025-10-26 " + hour + ":00," + (10 + text.length()) + "\n";
    }
    Reading r = read(text);
    assertThat(r.quality()).isEmpty();
    assertThat(r.period().orElseThrow().to()).isEqualTo(Instant.parse("2025-10-26T04:00:00Z"));
  }

  @Test
  void aWorkbookThatCouldDoHarmIsRefused() throws IOException {
    String cell = "<worksheet><sheetData><row r='1'><c r='ZZZZZZ1'><v>1</v></c></row></sheetData>";
    for (String part : List.of(cell + "</worksheet>", "<!DOCTYPE x [<!ENTITY e 'e'>]><x>&e;</x>")) {
      ByteArrayOutputStream bytes = new ByteArrayOutputStream();
      try (ZipOutputStream zip = new ZipOutputStream(bytes)) {
        for (String name : List.of("[Content_Types].xml", "xl/worksheets/sheet1.xml")) {
          zip.putNextEntry(new ZipEntry(name));
          zip.write(part.getBytes(StandardCharsets.UTF_8));
        }
      }
      assertThatThrownBy(() -> read(bytes.toByteArray(), Files.setting(50)))
          .isInstanceOf(ReadingRefusedException.class)
          .hasMessageContaining("CSV");
    }
  }
}
