package fourthwire.jobs;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.audit.Audit;
import fourthwire.audit.AuditFailedException;
import fourthwire.audit.AuditRepository;
import fourthwire.audit.AuditRepository.State;
import fourthwire.audit.AuditRequest;
import fourthwire.audit.Progress;
import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.jobs.measured.MeasuredStates;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.site.SiteRepository;
import fourthwire.store.Store;
import fourthwire.testsupport.Databases;
import fourthwire.testsupport.SlowAudit;
import fourthwire.testsupport.SmallSite;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

/** Every way an audit can end is stored as what it is. */
class AuditRunTest {
  private final Store store = new Store(Databases.H2.migrated());
  private final SiteRepository sites = store.sites(new ZipSurveyCodec());
  private final AuditRepository audits = store.audits();
  private final Stop stop = new Stop();
  private final long site = sites.create(SmallSite.survey("Works"), List.of());

  @Test
  void aFinishedAuditIsDoneWithItsNodes() {
    long id = run(new SlowAudit().letGo());

    assertThat(state(id)).isEqualTo(State.DONE);
    assertThat(audits.nodes(id)).hasSize(4);
  }

  @Test
  void anAuditWithoutAFigureFailsWithItsSentence() {
    long id =
        run(
            (request, progress) -> {
              throw new AuditFailedException("LP-1 does not converge at order 5");
            });

    assertThat(state(id)).isEqualTo(State.FAILED);
    assertThat(message(id)).isEqualTo("LP-1 does not converge at order 5");
    assertThat(audits.nodes(id)).isEmpty();
  }

  @Test
  void equipmentWithoutASteadyStateFailsWithItsOwnSentence() {
    long id =
        run(
            (request, progress) -> {
              throw new NoSteadyStateException("the source cannot give what the load takes");
            });

    assertThat(state(id)).isEqualTo(State.FAILED);
    assertThat(message(id)).isEqualTo("the source cannot give what the load takes");
  }

  @Test
  void theAuditIsAskedForItsWeekAndItsDraws() {
    long id = audits.create(site, 1, Optional.empty(), 7);
    List<AuditRequest> asked = new ArrayList<>();
    Audit audit = new SlowAudit().letGo();
    auditRun(
            (request, progress) -> {
              asked.add(request);
              return audit.run(request, progress);
            })
        .run(id);

    assertThat(asked).extracting(AuditRequest::week).containsExactly(true);
    assertThat(asked).extracting(AuditRequest::draws).containsExactly(7);
  }

  @Test
  void anUnforeseenErrorIsToldByReferenceOnly() {
    long id =
        run(
            (request, progress) -> {
              throw new IllegalStateException("inner workings");
            });

    assertThat(state(id)).isEqualTo(State.FAILED);
    assertThat(message(id)).containsPattern("reference [0-9a-f]{8}").doesNotContain("inner");
  }

  @Test
  void aCancelledAuditStopsAtItsNextStep() {
    long id = audits.create(site, 1, Optional.empty());

    auditRun(
            (request, progress) -> {
              progress.at(0.1, "begun");
              audits.cancel(id);
              return untilStopped(progress);
            })
        .run(id);

    assertThat(state(id)).isEqualTo(State.CANCELLED);
  }

  @Test
  void aStopLeavesTheAuditToTheNextStart() {
    long id = audits.create(site, 1, Optional.empty());

    auditRun(
            (request, progress) -> {
              stop.ask();
              return untilStopped(progress);
            })
        .run(id);

    assertThat(state(id)).isEqualTo(State.RUNNING);
    List<Long> again = new ArrayList<>();
    new JobRecovery(audits, store.uploads(), queue(again)).run();
    assertThat(again).containsExactly(id);
  }

  @Test
  void anAuditThatHasEndedIsNotRunAgain() {
    SlowAudit audit = new SlowAudit().letGo();
    long id = run(audit);
    auditRun(audit).run(id);
    assertThat(audit.runs).hasValue(1);
  }

  @Test
  void aDeletedSiteEndsItsAudit() {
    long id =
        run(
            (request, progress) -> {
              sites.delete(site);
              return untilStopped(progress);
            });
    assertThat(audits.find(id)).isEmpty();
  }

  @Test
  void progressIsWrittenEvery400Milliseconds() {
    AtomicLong nanos = new AtomicLong();
    Ticker ticker = new Ticker(nanos::get);
    assertThat(ticker.isDue()).isTrue();
    assertThat(ticker.isDue()).isFalse();
    nanos.set(399_000_000);
    assertThat(ticker.isDue()).isFalse();
    nanos.set(400_000_000);
    assertThat(ticker.isDue()).isTrue();
  }

  private static fourthwire.audit.AuditResult untilStopped(Progress progress) {
    for (int step = 0; step < 1_000_000_000; step++) {
      progress.at(0.5, "solving");
    }
    throw new AssertionError("was not stopped");
  }

  private long run(Audit audit) {
    long id = audits.create(site, 1, Optional.empty());
    auditRun(audit).run(id);
    return id;
  }

  private AuditRun auditRun(Audit audit) {
    return new AuditRun(
        audits,
        sites,
        new MeasuredStates(store.readings(), store.series(), store.corrections()),
        audit,
        stop);
  }

  private static JobQueue queue(List<Long> into) {
    return new JobQueue() {
      @Override
      public void addAudit(long auditId) {
        into.add(auditId);
      }

      @Override
      public void addReading(long uploadId) {
        throw new AssertionError("no upload waits");
      }
    };
  }

  private State state(long id) {
    return audits.find(id).orElseThrow().state();
  }

  private String message(long id) {
    return audits.find(id).orElseThrow().message();
  }
}
