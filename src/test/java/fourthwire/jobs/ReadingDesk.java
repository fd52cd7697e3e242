package fourthwire.jobs;

import fourthwire.intake.reading.ReadingReader;
import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import fourthwire.site.SiteRepository;
import fourthwire.store.Store;
import fourthwire.testsupport.SmallSite;
import java.util.List;
import java.util.Optional;
import javax.sql.DataSource;

/** A site whose meters' files are taken in as the service does it, but read when told to. */
final class ReadingDesk {
  private final ReadingUploads uploads;
  private final ReadingRepository readings;
  private final ReadingService service;
  private final ReadingRun run;
  private final long site;

  /**
   * @param database with its tables
   */
  ReadingDesk(DataSource database) {
    this(database, new FormatReader(), new Stop());
  }

  /**
   * With a reader that may fail in its own ways.
   *
   * @param database with its tables
   */
  ReadingDesk(DataSource database, ReadingReader reader, Stop stop) {
    Store store = new Store(database);
    SiteRepository sites = store.sites(new ZipSurveyCodec());
    site = sites.create(SmallSite.survey("Works"), List.of());
    uploads = store.uploads();
    readings = store.readings();
    ReadingSettings settings = new ReadingSettings(sites, readings);
    service = new ReadingService(uploads, reader, settings, new NoQueue());
    run = new ReadingRun(uploads, readings, reader, settings, stop);
  }

  /** The reading is started by hand. */
  private static final class NoQueue implements JobQueue {
    @Override
    public void addAudit(long auditId) {}

    @Override
    public void addReading(long uploadId) {}
  }

  private ReadingService.Upload upload(RawFile file, Optional<ReadingMapping> mapping) {
    return new ReadingService.Upload(
        site, Optional.empty(), Optional.of("LP-1"), List.of(file), mapping);
  }

  /** Stores a file without looking into it. */
  long store(RawFile file) {
    return service.store(upload(file, Optional.empty()));
  }

  /** Takes a file as an upload over the interface is taken. */
  long take(RawFile file, Optional<ReadingMapping> mapping) {
    return service.take(upload(file, mapping));
  }

  /** Reads an upload. */
  ReadingUploads.Entry read(long upload) {
    run.run(upload);
    return uploads.find(upload).orElseThrow();
  }

  long site() {
    return site;
  }

  ReadingRepository readings() {
    return readings;
  }

  ReadingUploads uploads() {
    return uploads;
  }
}
