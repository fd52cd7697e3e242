package fourthwire.config;

import fourthwire.audit.AuditRepository;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.site.SiteRepository;
import fourthwire.site.SurveyCodec;
import fourthwire.store.Settings;
import fourthwire.store.Store;
import java.time.Clock;
import javax.sql.DataSource;
import org.springframework.boot.context.properties.EnableConfigurationProperties;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.transaction.PlatformTransactionManager;

/** The repositories. */
@Configuration(proxyBeanMethods = false)
@EnableConfigurationProperties(InstallationProperties.class)
class StoreConfiguration {
  @Bean
  Clock clock() {
    return Clock.systemUTC();
  }

  @Bean
  Store store(DataSource database, PlatformTransactionManager transactions, Clock clock) {
    return new Store(database, transactions, clock);
  }

  @Bean
  SiteRepository siteRepository(Store store, SurveyCodec codec) {
    return store.sites(codec);
  }

  @Bean
  AuditRepository auditRepository(Store store) {
    return store.audits();
  }

  @Bean
  ReadingRepository readingRepository(Store store) {
    return store.readings();
  }

  @Bean
  SeriesRepository seriesRepository(Store store) {
    return store.series();
  }

  @Bean
  CorrectionRepository correctionRepository(Store store) {
    return store.corrections();
  }

  @Bean
  ReadingUploads readingUploads(Store store) {
    return store.uploads();
  }

  @Bean
  Settings settings(Store store) {
    return store.settings();
  }
}
