package fourthwire.web;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.AuditResult;
import fourthwire.audit.Progress;
import fourthwire.site.Practice;
import fourthwire.site.SiteRepository;
import fourthwire.testsupport.ServiceTest;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.TestInstance;
import org.springframework.beans.factory.annotation.Autowired;

/** The whole service with the sample site in it, audited, once under each practice. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
abstract class PagesTest extends ServiceTest {
  @Autowired SiteRepository sites;
  @Autowired AuditRepository audits;

  long site;
  long audit;
  long americanAudit;

  @BeforeAll
  void store() {
    site = sites.create(SampleSite.survey(Practice.IEC), List.of("Column colour is not known."));
    audit = audited(site);
    americanAudit = audited(sites.create(SampleSite.survey(Practice.NORTH_AMERICA), List.of()));
  }

  private long audited(long of) {
    long id = audits.create(of, 1, Optional.empty());
    audits.start(id);
    audits.finish(
        id,
        new AuditResult(
            "GRID",
            "0.1.0",
            List.of("IEEE 519-2022", "IEC 60364-5-52:2009"),
            SampleSite.results(),
            List.of("Mutual coupling between conductors is not modelled.")),
        Progress.SILENT);
    return id;
  }
}
