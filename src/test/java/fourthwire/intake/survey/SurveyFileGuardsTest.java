package fourthwire.intake.survey;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.site.check.SurveyError;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Files that could do harm, or are no survey at all, give one clear error of the whole file. */
class SurveyFileGuardsTest {
  private static final byte[] NO_BYTES = {};

  @ParameterizedTest
  @ValueSource(
      strings = {
        "/etc/panels.csv",
        "../panels.csv",
        "a/../../panels.csv",
        "a\\panels.csv",
        "C:panels.csv"
      })
  void pathsThatLeadElsewhereAreRefused(String path) {
    assertRefused(new SurveyKit().file(path, "panel,fed_from\n").zip(), "path");
  }

  @Test
  void aBombIsRefusedBeforeItIsUnpacked() {
    byte[] zeros = new byte[60_000_000];
    assertRefused(new SurveyKit().file("readme.txt", zeros).zip(), "100 times", "200 MB");
  }

  @Test
  void moreThanTwoHundredMegabytesAreRefused() {
    byte[] noise = new byte[51_000_000];
    for (int i = 0; i < noise.length; i++) {
      noise[i] = (byte) ('a' + (i * 31 + i / 7 * 17 + i / 1009) % 26);
    }
    SurveyKit kit = new SurveyKit();
    for (int i = 0; i < 4; i++) {
      kit.file("notes" + i + ".txt", noise);
    }
    assertRefused(kit.zip(), "200 MB", "1,000,000 rows");
  }

  @Test
  void moreThanAMillionRowsAreRefused() {
    StringBuilder rows = new StringBuilder("circuit,panel,lines\n");
    for (int i = 0; i < 1_000_000; i++) {
      rows.append(i).append(",LP-1,L1\n");
    }
    SurveyImport.Outcome outcome =
        SurveyImport.read(new SurveyKit().file("circuits.csv", rows.toString()).zip());
    assertThat(((SurveyImport.Refused) outcome).errors())
        .singleElement()
        .satisfies(e -> assertThat(e.table()).isEqualTo("circuits"))
        .satisfies(e -> assertThat(e.row()).isZero())
        .satisfies(e -> assertThat(e.message()).contains("1,000,000 rows", "200 MB"));
  }

  @Test
  void manyFilesAreRefused() {
    Map<String, byte[]> files = new LinkedHashMap<>();
    for (int i = 0; i < 1001; i++) {
      files.put("f" + i, NO_BYTES);
    }
    assertRefused(SurveyKit.zip(files), "1000 files");
  }

  @Test
  void aTruncatedZipIsDamaged() {
    byte[] zip = new SurveyKit().zip();
    for (int length : new int[] {5, zip.length / 3, zip.length - 30, zip.length - 1}) {
      assertRefused(Arrays.copyOf(zip, length), "damaged");
    }
  }

  @Test
  void aZipWithAChangedByteIsDamaged() {
    byte[] zip = new SurveyKit().zip();
    // Within the packed data of the first file, whose local header takes 38 bytes.
    zip[60] ^= 0x55;
    assertRefused(zip, "damaged");
  }

  @Test
  void anEncryptedZipIsNamedSo() {
    byte[] zip = new SurveyKit().zip();
    // Bit 0 of the general purpose flag of each central entry, APPNOTE 4.4.4.
    for (int i = 0; i < zip.length - 9; i++) {
      if (zip[i] == 'P' && zip[i + 1] == 'K' && zip[i + 2] == 1 && zip[i + 3] == 2) {
        zip[i + 8] |= 1;
      }
      if (zip[i] == 'P' && zip[i + 1] == 'K' && zip[i + 2] == 3 && zip[i + 3] == 4) {
        zip[i + 6] |= 1;
      }
    }
    assertRefused(zip, "encrypted");
  }

  @Test
  void whatIsNoZipIsRefused() {
    assertRefused("panel,fed_from\nMSB,T1\n".getBytes(StandardCharsets.UTF_8), "neither");
    assertRefused(NO_BYTES, "neither");
    assertRefused(new byte[] {(byte) 0xD0, (byte) 0xCF, 0x11, (byte) 0xE0}, "password");
  }

  @Test
  void aZipWithoutTablesIsRefused() {
    assertRefused(SurveyKit.zip(Map.of("readme.txt", NO_BYTES)), "no table");
    assertRefused(SurveyKit.zip(Map.of()), "no table");
  }

  @Test
  void aWorkbookWithMacrosIsRefused() {
    assertRefused(workbook("xl/vbaProject.bin", "x"), "macros");
    assertRefused(
        workbook(
            "[Content_Types].xml",
            "<Types><Override ContentType=\"application/vnd.ms-excel.sheet.macroEnabled.main+xml\""
                + "/></Types>"),
        "macros");
  }

  @Test
  void aWorkbookThatDeclaresADocumentTypeIsRefused() {
    assertRefused(
        workbook(
            "xl/sharedStrings.xml",
            "<?xml version=\"1.0\"?><!DOCTYPE x [<!ENTITY e SYSTEM \"file:///etc/passwd\">]><x>&e;</x>"),
        "document type");
  }

  @Test
  void aWorkbookWithAnImpossibleColumnIsRefused() {
    assertRefused(
        workbook(
            "xl/worksheets/sheet1.xml",
            "<worksheet><sheetData><row r=\"1\"><c r=\"ZZZZZZ1\"><v>1</v></c></row></sheetData>"
                + "</worksheet>"),
        "column");
  }

  @Test
  void aWorkbookThatIsNoXmlIsDamaged() {
    assertRefused(workbook("xl/workbook.xml", "<workbook><sheets>"), "damaged");
    assertRefused(workbook("xl/worksheets/sheet1.xml", "<worksheet><sheetData><row"), "damaged");
  }

  /** A good workbook with one part put in place of its own or beside them. */
  private static byte[] workbook(String path, String text) {
    Map<String, byte[]> parts = new LinkedHashMap<>();
    try {
      Archive.unpack(new SurveyKit().xlsx(), Guards.none())
          .forEach(p -> parts.put(p.path(), p.bytes()));
    } catch (RefusedException e) {
      throw new AssertionError(e);
    }
    parts.put(path, text.getBytes(StandardCharsets.UTF_8));
    return SurveyKit.zip(parts);
  }

  private static void assertRefused(byte[] file, String... says) {
    SurveyImport.Outcome outcome = SurveyImport.read(file);
    assertThat(outcome).isInstanceOf(SurveyImport.Refused.class);
    List<SurveyError> errors = ((SurveyImport.Refused) outcome).errors();
    assertThat(errors).hasSize(1);
    assertThat(errors.get(0).table()).isEmpty();
    assertThat(errors.get(0).row()).isZero();
    assertThat(errors.get(0).message()).contains(says).doesNotContain("Exception", "Channel");
  }
}
