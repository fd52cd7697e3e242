package fourthwire.config;

import com.github.kagkarlsson.scheduler.SchedulerClient;
import com.github.kagkarlsson.scheduler.task.Task;
import fourthwire.audit.Audit;
import fourthwire.audit.AuditRepository;
import fourthwire.intake.reading.ReadingReader;
import fourthwire.jobs.AuditRun;
import fourthwire.jobs.AuditService;
import fourthwire.jobs.CorrectionRuns;
import fourthwire.jobs.CorrectionService;
import fourthwire.jobs.JobQueue;
import fourthwire.jobs.JobRecovery;
import fourthwire.jobs.ReadingRun;
import fourthwire.jobs.ReadingService;
import fourthwire.jobs.ReadingSettings;
import fourthwire.jobs.ScheduledJobs;
import fourthwire.jobs.Stop;
import fourthwire.jobs.measured.LogAssessments;
import fourthwire.jobs.measured.MeasuredStates;
import fourthwire.jobs.series.StoredLogs;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.site.SiteRepository;
import fourthwire.store.Store;
import java.time.Clock;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.beans.factory.SmartInitializingSingleton;
import org.springframework.context.ApplicationListener;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.context.event.ContextClosedEvent;

/** Work in the background: its queue, what does it, and what a start and a stop do about it. */
@Configuration(proxyBeanMethods = false)
class JobConfiguration {
  @Bean
  JobQueue jobQueue(ObjectProvider<SchedulerClient> scheduler, Clock clock) {
    return new ScheduledJobs(scheduler::getObject, clock);
  }

  @Bean
  Stop stop() {
    return new Stop();
  }

  /** The first thing a stop does: running work lets go before the database closes. */
  @Bean
  ApplicationListener<ContextClosedEvent> letGo(Stop stop) {
    return event -> stop.ask();
  }

  @Bean
  AuditService auditService(AuditRepository audits, SiteRepository sites, JobQueue queue) {
    return new AuditService(audits, sites, queue);
  }

  @Bean
  AuditRun auditRun(
      AuditRepository audits,
      SiteRepository sites,
      ReadingRepository readings,
      SeriesRepository series,
      CorrectionRepository corrections,
      Audit audit,
      Stop stop) {
    return new AuditRun(
        audits, sites, new MeasuredStates(readings, series, corrections), audit, stop);
  }

  @Bean
  Task<Void> auditTask(AuditRun run) {
    return ScheduledJobs.auditTask(run::run);
  }

  @Bean
  StoredLogs storedLogs(
      ReadingRepository readings, SeriesRepository series, CorrectionRepository corrections) {
    return new StoredLogs(readings, series, corrections);
  }

  @Bean
  ReadingSettings readingSettings(SiteRepository sites, ReadingRepository readings) {
    return new ReadingSettings(sites, readings);
  }

  @Bean
  ReadingService readingService(
      ReadingUploads uploads, ReadingReader reader, ReadingSettings settings, JobQueue queue) {
    return new ReadingService(uploads, reader, settings, queue);
  }

  @Bean
  CorrectionService correctionService(
      ReadingRepository readings, SeriesRepository series, CorrectionRepository corrections) {
    return new CorrectionService(readings, series, corrections);
  }

  @Bean
  CorrectionRuns correctionRuns(CorrectionService service, Stop stop) {
    return new CorrectionRuns(service, stop);
  }

  @Bean
  LogAssessments logAssessments(
      SeriesRepository series, CorrectionRepository corrections, AuditRepository audits) {
    return new LogAssessments(series, corrections, audits);
  }

  @Bean
  ReadingRun readingRun(
      ReadingUploads uploads,
      ReadingRepository readings,
      ReadingReader reader,
      ReadingSettings settings,
      Stop stop) {
    return new ReadingRun(uploads, readings, reader, settings, stop);
  }

  @Bean
  Task<Void> readingTask(ReadingRun run) {
    return ScheduledJobs.readingTask(run::run);
  }

  /** Before the scheduler starts: what it had picked up is forgotten and handed in afresh. */
  @Bean
  SmartInitializingSingleton recovery(
      Store store, AuditRepository audits, ReadingUploads uploads, JobQueue queue) {
    return () -> {
      store.forgetScheduledTasks();
      new JobRecovery(audits, uploads, queue).run();
    };
  }
}
