package fourthwire.config;

import fourthwire.intake.reading.ReadingReader;
import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.site.SurveyCodec;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** How surveys are kept, and how meters' files are read. */
@Configuration(proxyBeanMethods = false)
class IntakeConfiguration {
  @Bean
  SurveyCodec surveyCodec() {
    return new ZipSurveyCodec();
  }

  @Bean
  ReadingReader readingReader() {
    return new FormatReader();
  }
}
