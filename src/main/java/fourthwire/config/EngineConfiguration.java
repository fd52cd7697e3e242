package fourthwire.config;

import fourthwire.audit.Audit;
import fourthwire.audit.run.HarmonicAudit;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** The audit. */
@Configuration(proxyBeanMethods = false)
class EngineConfiguration {
  @Bean
  Audit audit() {
    return new HarmonicAudit();
  }
}
