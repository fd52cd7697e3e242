package fourthwire.config.demo;

import fourthwire.config.InstallationProperties;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.survey.SurveyImport;
import fourthwire.jobs.AuditService;
import fourthwire.jobs.ReadingRun;
import fourthwire.jobs.ReadingService;
import fourthwire.jobs.RefusedException;
import fourthwire.json.MappingJson;
import fourthwire.site.SiteRepository;
import fourthwire.store.Settings;
import java.io.IOException;
import java.util.Optional;
import java.util.OptionalInt;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.boot.ApplicationArguments;
import org.springframework.boot.ApplicationRunner;
import org.springframework.stereotype.Component;

/**
 * Stores the demo site at the first start with an empty store, reads its meters' files and asks for
 * its audit. A demo site that was deleted does not come back.
 */
@Component
class DemoSite implements ApplicationRunner {
  private static final Logger LOG = LoggerFactory.getLogger(DemoSite.class);
  private static final String LOADED = "demo-loaded";

  /** Enough for the pages to show how sure they are, few enough for a start. */
  private static final int DRAWS = 40;

  private final InstallationProperties installation;
  private final Settings settings;
  private final SiteRepository sites;
  private final ReadingService readings;
  private final ReadingRun reading;
  private final AuditService audits;
  private final DemoFiles files = new DemoFiles();

  DemoSite(
      InstallationProperties installation,
      Settings settings,
      SiteRepository sites,
      ReadingService readings,
      ReadingRun reading,
      AuditService audits) {
    this.installation = installation;
    this.settings = settings;
    this.sites = sites;
    this.readings = readings;
    this.reading = reading;
    this.audits = audits;
  }

  @Override
  public void run(ApplicationArguments arguments) throws IOException {
    if (!installation.demo() || settings.find(LOADED).isPresent() || !sites.list().isEmpty()) {
      return;
    }
    Optional<byte[]> survey = files.survey();
    if (survey.isPresent()) {
      load(survey.get());
    }
  }

  private void load(byte[] survey) throws IOException {
    if (SurveyImport.read(survey) instanceof SurveyImport.Read read) {
      long site = sites.create(read.survey(), read.warnings());
      settings.put(LOADED, Long.toString(site));
      for (DemoFiles.Readings r : files.readings()) {
        read(site, r);
      }
      audits.ask(site, Optional.empty(), OptionalInt.of(DRAWS));
      LOG.info(
          "the demo site \"{}\" is stored; its audit is queued", read.survey().settings().name());
    } else {
      LOG.error("the demo site is not loaded: {}", SurveyImport.read(survey));
    }
  }

  /** At once rather than as a job: the audit is to show it. */
  private void read(long site, DemoFiles.Readings r) {
    try {
      reading.run(
          readings.store(
              new ReadingService.Upload(
                  site,
                  Optional.of(r.meter()),
                  Optional.empty(),
                  r.files(),
                  r.mapping().map(MappingJson::read))));
    } catch (ReadingRefusedException | RefusedException | MappingJson.RefusedException e) {
      LOG.error("the demo site's readings of {} are not loaded: {}", r.meter(), e.getMessage());
    }
  }
}
