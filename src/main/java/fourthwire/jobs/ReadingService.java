package fourthwire.jobs;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingReader;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository.MeterRef;
import fourthwire.metering.ReadingUploads;
import fourthwire.site.Meter;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;

/** Takes in meters' files. */
public final class ReadingService {
  private final ReadingUploads uploads;
  private final ReadingReader reader;
  private final ReadingSettings settings;
  private final JobQueue queue;

  /** With this reader, on what is stored here. */
  public ReadingService(
      ReadingUploads uploads, ReadingReader reader, ReadingSettings settings, JobQueue queue) {
    this.uploads = uploads;
    this.reader = reader;
    this.settings = settings;
    this.queue = queue;
  }

  /**
   * Where files come from: a meter of the survey, or a node, at which a meter is made.
   *
   * @param files one file, a capture's two, or a zip of them
   * @param mapping of their columns, where the user gave one
   */
  public record Upload(
      long siteId,
      Optional<String> meter,
      Optional<String> at,
      List<? extends RawFile> files,
      Optional<ReadingMapping> mapping) {}

  /**
   * Checks that the files can be read and queues the reading; the site must be there.
   *
   * @return the job's id
   * @throws RefusedException where the meter or node is not known, or the same files were read by
   *     another mapping before
   * @throws fourthwire.intake.reading.ReadingRefusedException with the columns found and what must
   *     be mapped
   */
  public long take(Upload upload) {
    long id = store(upload);
    queue.addReading(id);
    return id;
  }

  /**
   * Checks and stores the files as a queued upload, which the caller reads himself; files that were
   * read before are not stored again.
   */
  public long store(Upload upload) {
    MeterRef meter = meter(upload);
    List<RawFile> files = List.copyOf(upload.files());
    ReadingPlan plan = reader.plan(files, settings.of(upload.siteId(), meter, upload.mapping()));
    OptionalLong before = settings.readBefore(upload.siteId(), meter, files, plan.mapping());
    if (before.isPresent()) {
      settings.remember(upload.siteId(), meter, plan.layout(), upload.mapping());
      return uploads.createDone(upload.siteId(), meter, before.getAsLong());
    }
    return uploads.create(upload.siteId(), meter, files, upload.mapping());
  }

  /**
   * Takes files as {@link #take} does, but a log of a layout that nobody has confirmed at its meter
   * waits until somebody has.
   *
   * @return the upload's id
   */
  public long takeOrAsk(Upload upload) {
    if (upload.mapping().isPresent()) {
      return take(upload);
    }
    MeterRef meter = meter(upload);
    List<RawFile> files = List.copyOf(upload.files());
    boolean ask =
        reader
            .propose(files, settings.of(upload.siteId(), meter, upload.mapping()))
            .filter(p -> !p.isSettled())
            .isPresent();
    return ask ? uploads.createWaiting(upload.siteId(), meter, files) : take(upload);
  }

  /**
   * How a waiting log would be read.
   *
   * @param edited what a person made of the proposal so far
   */
  public LogProposal proposal(ReadingUploads.Entry waiting, Optional<ReadingMapping> edited) {
    return reader
        .propose(
            uploads.files(waiting.id()), settings.of(waiting.siteId(), waiting.meter(), edited))
        .orElseThrow();
  }

  /**
   * Queues a waiting log to be read by this mapping, which its meter's next files of the layout are
   * then read by too. Nothing happens where it waits no more.
   *
   * @throws RefusedException where the same file was read by another mapping before
   * @throws fourthwire.intake.reading.ReadingRefusedException where the mapping leaves something
   *     open
   */
  public void confirm(ReadingUploads.Entry waiting, ReadingMapping mapping) {
    List<RawFile> files = uploads.files(waiting.id());
    ReadingPlan plan =
        reader.plan(files, settings.of(waiting.siteId(), waiting.meter(), Optional.of(mapping)));
    settings.readBefore(waiting.siteId(), waiting.meter(), files, plan.mapping());
    if (uploads.confirm(waiting.id(), mapping)) {
      queue.addReading(waiting.id());
    }
  }

  private MeterRef meter(Upload upload) {
    Survey survey = settings.survey(upload.siteId());
    if (upload.meter().isPresent()) {
      return surveyed(survey, upload.meter().get());
    }
    return made(
        survey,
        upload
            .at()
            .orElseThrow(
                () ->
                    new RefusedException(
                        "name the meter, or with \"at\" the node the readings were taken at")));
  }

  private static MeterRef surveyed(Survey survey, String name) {
    return survey.meters().stream()
        .filter(m -> m.name().equals(name))
        .findFirst()
        .map(m -> new MeterRef(m.name(), m.at()))
        .orElseThrow(
            () ->
                new RefusedException("the survey has no meter \"" + name + "\"" + meters(survey)));
  }

  private static String meters(Survey survey) {
    return survey.meters().isEmpty()
        ? "; it has none at all: name a node with \"at\" and a meter is made there"
        : "; it has "
            + String.join(", ", survey.meters().stream().map(Meter::name).toList())
            + "; with \"at\" a meter is made at a node";
  }

  /** The survey's only meter at the node, or one that is called as the node. */
  private static MeterRef made(Survey survey, String node) {
    if (survey.supplies().stream().noneMatch(s -> s.name().equals(node))
        && SiteTree.of(survey).find(node).isEmpty()) {
      throw new RefusedException(
          "the survey has no supply, transformer, panel or circuit \""
              + node
              + "\"; a circuit is named panel:circuit");
    }
    List<Meter> there = survey.meters().stream().filter(m -> m.at().equals(node)).toList();
    return new MeterRef(there.size() == 1 ? there.get(0).name() : node, node);
  }

  /** Asks a queued or running reading to stop; false if it had ended or is not there. */
  public boolean cancel(long uploadId) {
    return uploads.cancel(uploadId);
  }
}
