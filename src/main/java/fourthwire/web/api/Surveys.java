package fourthwire.web.api;

import fourthwire.intake.survey.SurveyImport;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import org.springframework.web.multipart.MultipartFile;

/** Reads uploaded surveys. */
final class Surveys {
  private Surveys() {}

  static SurveyImport.Read read(MultipartFile file) {
    try (InputStream in = file.getInputStream()) {
      SurveyImport.Outcome outcome = SurveyImport.read(in);
      if (outcome instanceof SurveyImport.Refused refused) {
        throw new SurveyRefusedException(refused.errors());
      }
      return (SurveyImport.Read) outcome;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
