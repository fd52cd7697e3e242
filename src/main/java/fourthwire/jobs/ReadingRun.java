package fourthwire.jobs;

import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingReader;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.metering.LogResult;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import java.util.List;
import java.util.OptionalLong;
import java.util.concurrent.CancellationException;
import java.util.function.BiPredicate;
import java.util.function.DoublePredicate;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** Reads one stored upload from queued to its end. */
public final class ReadingRun {
  /** Share of the work that is done once the file is read and analysed. */
  private static final double STORING = 0.9;

  private final ReadingUploads uploads;
  private final ReadingRepository readings;
  private final ReadingReader reader;
  private final ReadingSettings settings;
  private final Stop stop;

  /** With this reader, on what is stored here. */
  public ReadingRun(
      ReadingUploads uploads,
      ReadingRepository readings,
      ReadingReader reader,
      ReadingSettings settings,
      Stop stop) {
    this.uploads = uploads;
    this.readings = readings;
    this.reader = reader;
    this.settings = settings;
    this.stop = stop;
  }

  /** Reads it; its end, whatever it is, is stored. Does nothing where it has ended before. */
  public void run(long uploadId) {
    if (!uploads.start(uploadId)) {
      return;
    }
    try {
      uploads.find(uploadId).ifPresent(this::read);
    } catch (CancellationException e) {
      uploads.end(uploadId, ReadingUploads.State.CANCELLED, "cancelled");
    } catch (ReadingRefusedException e) {
      uploads.end(uploadId, ReadingUploads.State.FAILED, sentence(e));
    } catch (RefusedException e) {
      uploads.end(uploadId, ReadingUploads.State.FAILED, String.valueOf(e.getMessage()));
    } catch (Stop.StoppedException e) {
      // stays stored as running: the next start reads it again
    } catch (RuntimeException | Error e) {
      if (!stop.isAsked()) {
        uploads.end(
            uploadId, ReadingUploads.State.FAILED, Failure.sentence("Upload " + uploadId, e));
      }
    }
  }

  private void read(ReadingUploads.Entry upload) {
    List<RawFile> files = uploads.files(upload.id());
    ReadingSetting setting = settings.of(upload.siteId(), upload.meter(), upload.mapping());
    ReadingPlan plan = reader.plan(files, setting);
    OptionalLong before =
        settings.readBefore(upload.siteId(), upload.meter(), files, plan.mapping());
    if (before.isPresent()) {
      readings.remember(upload.siteId(), upload.meter(), plan.layout(), upload.mapping());
      uploads.finish(upload.id(), before.getAsLong());
      return;
    }
    Reading reading = reader.read(files, plan, setting, listener(upload.id()));
    try {
      BiPredicate<Double, String> listener = listener(upload.id());
      DoublePredicate storing =
          share -> listener.test(STORING + (1 - STORING) * share, "storing what was read");
      if (!storing.test(0)) {
        throw new CancellationException("stopped before it was stored");
      }
      uploads.finish(
          upload.id(),
          readings.add(
              new ReadingRepository.Addition(
                  upload.siteId(),
                  upload.meter(),
                  files,
                  plan.layout(),
                  plan.mapping(),
                  upload.mapping(),
                  reading),
              storing));
    } finally {
      reading.log().flatMap(LogResult::detail).ifPresent(d -> d.series().close());
    }
  }

  private BiPredicate<Double, String> listener(long uploadId) {
    Ticker ticker = new Ticker(System::nanoTime);
    return (share, message) -> {
      stop.check();
      return !ticker.isDue() || uploads.progress(uploadId, share, message);
    };
  }

  /** The refusal with its questions, for a place that has one sentence only. */
  static String sentence(ReadingRefusedException e) {
    return Stream.concat(
            Stream.of(String.valueOf(e.getMessage())),
            e.questions().stream().map(q -> q.part() + ": " + q.message()))
        .map(s -> s.endsWith(".") ? s : s + ".")
        .collect(Collectors.joining(" "));
  }
}
