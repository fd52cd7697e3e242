package fourthwire.config;

import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.site.SurveyCodec;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** How surveys are kept. */
@Configuration(proxyBeanMethods = false)
class IntakeConfiguration {
  @Bean
  SurveyCodec surveyCodec() {
    return new ZipSurveyCodec();
  }
}
