package fourthwire.intake.survey;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.site.Survey;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Every dialect of the public contract, section 2, gives the same survey. */
class CsvDialectTest {
  private static final List<String> TABLES =
      List.of(
          "site",
          "supplies",
          "background",
          "transformers",
          "panels",
          "circuits",
          "loads",
          "spectra",
          "schedules",
          "capacitors",
          "filters",
          "meters",
          "spot_readings");

  static Stream<Arguments> dialects() {
    List<Arguments> all = new ArrayList<>();
    for (char separator : new char[] {',', ';', '\t'}) {
      for (char decimal : new char[] {'.', ','}) {
        for (String lineEnd : List.of("\n", "\r\n", "\r")) {
          for (boolean mark : new boolean[] {false, true}) {
            if (separator != ',' || decimal == '.') {
              all.add(Arguments.of(separator, decimal, lineEnd, mark));
            }
          }
        }
      }
    }
    return all.stream();
  }

  @ParameterizedTest
  @MethodSource("dialects")
  void everyDialectIsTheSameSurvey(char separator, char decimal, String lineEnd, boolean mark) {
    SurveyKit kit = new SurveyKit();
    Map<String, byte[]> files = new LinkedHashMap<>();
    for (String table : TABLES) {
      List<List<String>> rows = kit.rows(table);
      for (List<String> row : rows) {
        row.replaceAll(c -> c.matches("-?\\d+\\.\\d+") ? c.replace('.', decimal) : c);
      }
      String text = (mark ? "\ufeff" : "") + kit.csv(table, separator, lineEnd);
      files.put(table + ".csv", text.getBytes(StandardCharsets.UTF_8));
    }
    assertThat(SurveyRoundTripTest.read(SurveyKit.zip(files))).isEqualTo(good());
  }

  @Test
  void eachTableMayHaveItsOwnSeparator() {
    SurveyKit kit = new SurveyKit();
    kit.file("loads.csv", kit.csv("loads", ';', "\n"));
    kit.file("panels.csv", kit.csv("panels", '\t', "\r\n"));
    assertThat(SurveyRoundTripTest.read(kit.zip())).isEqualTo(good());
  }

  @Test
  void trailingEmptyColumnsAndRowsAreTolerated() {
    SurveyKit kit = new SurveyKit();
    String trailing = kit.csv("panels", ',', ",,,\n") + ",,,,,,,,,,,,,\n\n\n";
    assertThat(SurveyRoundTripTest.read(kit.file("panels.csv", trailing).zip())).isEqualTo(good());
  }

  @Test
  void oneFolderIsTolerated() {
    Map<String, byte[]> files = new LinkedHashMap<>();
    new SurveyKit().csvFiles().forEach((name, bytes) -> files.put("house/" + name, bytes));
    assertThat(SurveyRoundTripTest.read(SurveyKit.zip(files))).isEqualTo(good());
  }

  @Test
  void blankLinesCountAndQuotedLinesAreOneRow() {
    SurveyKit kit = new SurveyKit();
    String text = "meter,at,note\n\nmain,MSB,\"two\nlines\"\n\nsecond,NOWHERE,x\n";
    SurveyImport.Outcome outcome = SurveyImport.read(kit.file("meters.csv", text).zip());
    assertThat(((SurveyImport.Refused) outcome).errors())
        .extracting(e -> e.table() + " " + e.row() + " " + e.column() + " " + e.value())
        .containsExactly("meters 5 at NOWHERE");
  }

  @Test
  void whatIsNotKnownIsAWarning() {
    SurveyKit kit =
        new SurveyKit()
            .set("panels", 2, "colour", "grey")
            .append("site", "altitude_m,300")
            .file("README.txt", "hello")
            .file("__MACOSX/._panels.csv", "x")
            .file(".DS_Store", "x")
            .file("furniture.csv", "chair,table\n");
    SurveyImport.Outcome outcome = SurveyImport.read(kit.zip());
    assertThat(outcome).isInstanceOf(SurveyImport.Read.class);
    assertThat(String.join("\n", ((SurveyImport.Read) outcome).warnings()))
        .contains("colour", "altitude_m", "README.txt", "furniture");
    assertThat(((SurveyImport.Read) outcome).survey()).isEqualTo(good());
  }

  @Test
  void theParentsNamesOfLinesAreReadAsThePanelsOwn() {
    SurveyImport.Outcome outcome =
        SurveyImport.read(new SurveyKit().set("circuits", 6, "lines", "L3").zip());
    assertThat(outcome).isInstanceOf(SurveyImport.Read.class);
    assertThat(((SurveyImport.Read) outcome).survey()).isEqualTo(good());
    assertThat(((SurveyImport.Read) outcome).warnings()).hasSize(1);
  }

  @Test
  void wordsAndLinesAreReadInEitherCaseAndByTheirOtherNames() {
    SurveyKit kit =
        new SurveyKit()
            .set("site", 4, "value", "IEC")
            .set("panels", 4, "parent_lines", "c")
            .set("circuits", 3, "lines", "B")
            .set("circuits", 8, "lines", "a-b-c")
            .set("loads", 2, "kind", "Capacitor-Input");
    assertThat(SurveyRoundTripTest.read(kit.zip())).isEqualTo(good());
  }

  private static Survey good() {
    return SurveyRoundTripTest.read(new SurveyKit().zip());
  }
}
