package fourthwire.store;

import fourthwire.audit.AuditRepository;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.site.SiteRepository;
import fourthwire.site.SurveyCodec;
import java.time.Clock;
import javax.sql.DataSource;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.jdbc.support.JdbcTransactionManager;
import org.springframework.transaction.PlatformTransactionManager;
import org.springframework.transaction.support.TransactionTemplate;

/** Makes the repositories of one database whose tables have been migrated. */
public final class Store {
  private final JdbcTemplate template;
  private final JdbcClient jdbc;
  private final TransactionTemplate transaction;
  private final Clock clock;

  /** On this database, with this clock for the times it notes. */
  public Store(DataSource database, PlatformTransactionManager transactions, Clock clock) {
    this.template = new JdbcTemplate(database);
    this.jdbc = JdbcClient.create(template);
    this.transaction = new TransactionTemplate(transactions);
    this.clock = clock;
  }

  /** On this database, with transactions of its own and the system's clock. */
  public Store(DataSource database) {
    this(database, new JdbcTransactionManager(database), Clock.systemUTC());
  }

  /** Sites and their surveys. */
  public SiteRepository sites(SurveyCodec codec) {
    return new JdbcSites(jdbc, transaction, files(), seriesTables(), codec, clock);
  }

  /** Audits and their results. */
  public AuditRepository audits() {
    return new JdbcAudits(jdbc, template, transaction, clock);
  }

  /** Readings and their files. */
  public ReadingRepository readings() {
    return new JdbcReadings(jdbc, transaction, files(), seriesTables(), clock);
  }

  /** Corrections of logs. */
  public CorrectionRepository corrections() {
    return new JdbcCorrections(jdbc, template, transaction, clock);
  }

  /** Rows of logs. */
  public SeriesRepository series() {
    return seriesTables();
  }

  /** Uploads that wait to be read. */
  public ReadingUploads uploads() {
    return new JdbcUploads(jdbc, transaction, files(), seriesTables(), clock);
  }

  /** Settings of this installation. */
  public Settings settings() {
    return new Settings(jdbc);
  }

  /**
   * Empties the scheduler's own table, in which a stop may have left tasks as picked up. What is to
   * be done stands in our tables.
   */
  public void forgetScheduledTasks() {
    jdbc.sql("delete from scheduled_tasks").update();
  }

  private SeriesTables seriesTables() {
    return new SeriesTables(jdbc, template, transaction);
  }

  private FileStore files() {
    return new FileStore(jdbc, transaction);
  }
}
