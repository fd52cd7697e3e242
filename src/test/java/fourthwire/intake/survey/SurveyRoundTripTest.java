package fourthwire.intake.survey;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.site.Survey;
import org.junit.jupiter.api.Test;

/** What goes out comes in again, equal and byte for byte. */
class SurveyRoundTripTest {
  @Test
  void aHandWrittenSurveyIsReadWithoutWarning() {
    SurveyImport.Outcome outcome = SurveyImport.read(new SurveyKit().zip());
    assertThat(outcome).isInstanceOf(SurveyImport.Read.class);
    assertThat(((SurveyImport.Read) outcome).warnings()).isEmpty();
  }

  @Test
  void zipAndWorkbookOfTheSameTablesAreTheSameSurvey() {
    assertThat(read(new SurveyKit().xlsx())).isEqualTo(read(new SurveyKit().zip()));
  }

  @Test
  void exportImportExportIsByteIdentical() {
    assertRoundTrip(read(new SurveyKit().zip()));
  }

  static void assertRoundTrip(Survey survey) {
    byte[] zip = SurveyExport.zip(survey);
    byte[] xlsx = SurveyExport.xlsx(survey);
    assertThat(SurveyExport.zip(read(zip))).isEqualTo(zip);
    assertThat(SurveyExport.xlsx(read(xlsx))).isEqualTo(xlsx);
    assertThat(SurveyExport.zip(read(xlsx))).isEqualTo(zip);
    assertThat(read(zip)).isEqualTo(survey);
  }

  static Survey read(byte[] file) {
    SurveyImport.Outcome outcome = SurveyImport.read(file);
    assertThat(outcome).isInstanceOf(SurveyImport.Read.class);
    return ((SurveyImport.Read) outcome).survey();
  }
}
