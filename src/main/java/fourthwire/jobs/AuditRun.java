package fourthwire.jobs;

import fourthwire.audit.Audit;
import fourthwire.audit.AuditFailedException;
import fourthwire.audit.AuditRepository;
import fourthwire.audit.AuditRequest;
import fourthwire.audit.Progress;
import fourthwire.jobs.measured.MeasuredStates;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;

/** Runs one stored audit from queued to its end. */
public final class AuditRun {
  private final AuditRepository audits;
  private final SiteRepository sites;
  private final MeasuredStates measured;
  private final Audit audit;
  private final Stop stop;

  /** With this audit, on what is stored here. */
  public AuditRun(
      AuditRepository audits,
      SiteRepository sites,
      MeasuredStates measured,
      Audit audit,
      Stop stop) {
    this.audits = audits;
    this.sites = sites;
    this.measured = measured;
    this.audit = audit;
    this.stop = stop;
  }

  /** Runs it; its end, whatever it is, is stored. Does nothing where it has ended before. */
  public void run(long auditId) {
    if (!audits.start(auditId)) {
      return;
    }
    try {
      audits
          .find(auditId)
          .ifPresent(
              entry -> {
                Progress listener = listener(auditId);
                audits.finish(auditId, audit.run(request(entry), listener), listener);
              });
    } catch (Progress.CancelledException e) {
      audits.end(auditId, AuditRepository.State.CANCELLED, "cancelled");
    } catch (AuditFailedException | NoSteadyStateException e) {
      audits.end(auditId, AuditRepository.State.FAILED, String.valueOf(e.getMessage()));
    } catch (Stop.StoppedException e) {
      // stays stored as running: the next start runs it again
    } catch (RuntimeException | Error e) {
      if (!stop.isAsked()) {
        audits.end(auditId, AuditRepository.State.FAILED, Failure.sentence("Audit " + auditId, e));
      }
    }
  }

  private AuditRequest request(AuditRepository.Entry entry) {
    Survey survey = sites.survey(entry.siteId(), entry.surveyRevision());
    return new AuditRequest(
        survey,
        entry.supply(),
        measured.of(entry.siteId(), survey),
        true,
        entry.draws(),
        AuditRequest.SEED);
  }

  private Progress listener(long auditId) {
    Ticker ticker = new Ticker(System::nanoTime);
    return (share, message) -> {
      stop.check();
      if (ticker.isDue() && !audits.progress(auditId, share, message)) {
        throw new Progress.CancelledException();
      }
    };
  }
}
