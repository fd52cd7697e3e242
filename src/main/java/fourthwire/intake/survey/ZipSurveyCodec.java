package fourthwire.intake.survey;

import fourthwire.site.Survey;
import fourthwire.site.SurveyCodec;

/** Keeps a survey as the zip that export gives, so that what is stored can be read by anyone. */
public final class ZipSurveyCodec implements SurveyCodec {
  @Override
  public byte[] encode(Survey survey) {
    return SurveyExport.zip(survey);
  }

  @Override
  public Survey decode(byte[] zip) {
    SurveyImport.Outcome outcome = SurveyImport.read(zip);
    if (outcome instanceof SurveyImport.Read read) {
      return read.survey();
    }
    throw new IllegalArgumentException("a stored survey does not read: " + outcome);
  }
}
