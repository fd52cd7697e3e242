package fourthwire.intake.survey;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.site.Survey;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

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

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void randomSurveysComeBackEqualAndByteForByte(long seed) {
    SurveyImport.Outcome outcome = SurveyImport.read(SurveyGenerator.tables(seed));
    assertThat(outcome).isInstanceOf(SurveyImport.Read.class);
    assertRoundTrip(((SurveyImport.Read) outcome).survey());
  }

  static LongStream seeds() {
    return LongStream.rangeClosed(1, 100);
  }

  @Test
  void theSameWorkbookIsWrittenAtAnyTime() throws InterruptedException {
    Survey survey = read(new SurveyKit().zip());
    byte[] first = SurveyExport.xlsx(survey);
    // A zip's own time stamps count in steps of two seconds.
    Thread.sleep(2100);
    assertThat(SurveyExport.xlsx(survey)).isEqualTo(first);
  }

  @Test
  void theCodecKeepsASurvey() {
    Survey survey = read(new SurveyKit().zip());
    ZipSurveyCodec codec = new ZipSurveyCodec();
    assertThat(codec.decode(codec.encode(survey))).isEqualTo(survey);
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
