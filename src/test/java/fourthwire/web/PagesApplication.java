package fourthwire.web;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.AuditResult;
import fourthwire.site.Practice;
import fourthwire.site.SiteRepository;
import java.util.List;
import java.util.Optional;
import org.springframework.boot.SpringBootConfiguration;
import org.springframework.boot.autoconfigure.EnableAutoConfiguration;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.ComponentScan;
import org.springframework.context.annotation.FilterType;
import org.springframework.security.config.annotation.web.builders.HttpSecurity;
import org.springframework.security.web.SecurityFilterChain;

/** The pages alone, over a store in memory that holds one audited site. */
@SpringBootConfiguration
@EnableAutoConfiguration(
    excludeName = {
      "org.springframework.boot.jdbc.autoconfigure.DataSourceAutoConfiguration",
      "org.springframework.boot.flyway.autoconfigure.FlywayAutoConfiguration",
      "com.github.kagkarlsson.scheduler.boot.autoconfigure.DbSchedulerAutoConfiguration"
    })
@ComponentScan(
    basePackages = "fourthwire.web",
    excludeFilters =
        @ComponentScan.Filter(
            type = FilterType.REGEX,
            pattern = "fourthwire\\.web\\.(api\\..*|.*Application|.*Test.*)"))
public class PagesApplication {
  /** Serves the pages by themselves, to look at them. */
  public static void main(String[] args) {
    org.springframework.boot.SpringApplication.run(PagesApplication.class, args);
  }

  @Bean
  MemoryStore store() {
    return new MemoryStore();
  }

  @Bean
  SiteRepository sites(MemoryStore store) {
    SiteRepository sites = store.sites();
    sites.create(SampleSite.survey(Practice.IEC), List.of());
    sites.create(SampleSite.survey(Practice.NORTH_AMERICA), List.of());
    return sites;
  }

  @Bean
  AuditRepository audits(MemoryStore store, SiteRepository sites) {
    AuditRepository audits = store.audits();
    sites.list().forEach(s -> audited(audits, s.id()));
    return audits;
  }

  private static void audited(AuditRepository audits, long site) {
    long id = audits.create(site, 1, Optional.empty());
    audits.finish(
        id,
        new AuditResult(
            "GRID",
            "0.1.0",
            List.of("IEEE 519-2022", "IEC 60364-5-52:2009"),
            SampleSite.results(),
            List.of("Mutual coupling between conductors is not modelled.")));
  }

  @Bean
  SecurityFilterChain open(HttpSecurity http) throws Exception {
    http.authorizeHttpRequests(a -> a.anyRequest().permitAll())
        .headers(
            h ->
                h.contentSecurityPolicy(
                    c -> c.policyDirectives("default-src 'self'; object-src 'none'")));
    return http.build();
  }
}
