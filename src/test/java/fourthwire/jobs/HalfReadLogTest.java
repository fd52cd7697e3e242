package fourthwire.jobs;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingReader;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingRepository.MeterRef;
import fourthwire.metering.ReadingUploads;
import fourthwire.testsupport.Databases;
import fourthwire.testsupport.RawFiles;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.CancellationException;
import java.util.function.BiPredicate;
import java.util.function.DoublePredicate;
import javax.sql.DataSource;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.springframework.jdbc.core.simple.JdbcClient;

/** What is left of a log whose reading does not come to its end: nothing. */
class HalfReadLogTest {
  private static final List<String> OF_A_LOG =
      List.of("readings", "reading_files", "series_quantities", "series_chunks");
  private static final List<String> OF_A_FILE =
      List.of("reading_upload_files", "stored_files", "stored_file_parts");

  private final Stop stop = new Stop();
  private Runnable atRow = () -> {};
  private Runnable atStatistics = () -> {};
  private boolean loseSeries;

  /** Reads as ever, but lets something happen on the way. */
  private final class Interrupted implements ReadingReader {
    private final ReadingReader reader = new FormatReader();

    @Override
    public ReadingPlan plan(List<RawFile> files, ReadingSetting setting) {
      return reader.plan(files, setting);
    }

    @Override
    public Optional<LogProposal> propose(List<RawFile> files, ReadingSetting setting) {
      return reader.propose(files, setting);
    }

    @Override
    public Reading read(
        List<RawFile> files,
        ReadingPlan plan,
        ReadingSetting setting,
        BiPredicate<Double, String> progress) {
      Reading reading =
          reader.read(
              files,
              plan,
              setting,
              (share, message) -> {
                (message.contains("rows") ? atRow : atStatistics).run();
                return progress.test(share, message);
              });
      if (loseSeries) {
        reading.log().orElseThrow().detail().orElseThrow().series().close();
      }
      return reading;
    }
  }

  private static RawFile log() {
    StringBuilder text = new StringBuilder("Time,I1 (A),I2 (A),I3 (A)\n");
    for (int k = 0; k < 40_000; k++) {
      text.append(java.time.LocalDateTime.of(2025, 1, 1, 0, 0).plusMinutes(k))
          .append(",%d.5,%d.25,%d\n".formatted(k % 97, k % 89, k % 83));
    }
    return RawFiles.of("log.csv", text.toString());
  }

  private static long count(DataSource database, List<String> tables) {
    return tables.stream()
        .mapToLong(
            table ->
                JdbcClient.create(database)
                    .sql("select count(*) from " + table)
                    .query(Long.class)
                    .single())
        .sum();
  }

  /** The site's survey is a file too. */
  private static void assertNothingLeft(DataSource database, long filesBefore) {
    assertThat(count(database, OF_A_LOG)).isZero();
    assertThat(count(database, OF_A_FILE)).isEqualTo(filesBefore);
  }

  @ParameterizedTest
  @EnumSource(Databases.class)
  void aCancelledReadingLeavesNothing(Databases kind) {
    DataSource database = kind.migrated();
    ReadingDesk desk = new ReadingDesk(database, new Interrupted(), stop);
    long files = count(database, OF_A_FILE);
    long early = desk.take(log(), Optional.empty());
    atRow = () -> desk.uploads().cancel(early);
    assertThat(desk.read(early).state()).isEqualTo(ReadingUploads.State.CANCELLED);
    assertNothingLeft(database, files);
    atRow = () -> {};
    long late = desk.take(log(), Optional.empty());
    atStatistics = () -> desk.uploads().cancel(late);
    assertThat(desk.read(late).state()).isEqualTo(ReadingUploads.State.CANCELLED);
    assertNothingLeft(database, files);
  }

  /** The process ends in the middle: the next start reads it again, once. */
  @ParameterizedTest
  @EnumSource(Databases.class)
  void aBrokenOffReadingIsReadAgain(Databases kind) {
    DataSource database = kind.migrated();
    ReadingDesk desk = new ReadingDesk(database, new Interrupted(), stop);
    long upload = desk.take(log(), Optional.empty());
    atStatistics = stop::ask;
    assertThat(desk.read(upload).state()).isEqualTo(ReadingUploads.State.RUNNING);
    assertThat(count(database, OF_A_LOG)).isZero();
    ReadingDesk next = new ReadingDesk(database);
    assertThat(next.uploads().recover()).containsExactly(upload);
    long reading = next.read(upload).reading().orElseThrow();
    assertThat(next.readings().find(reading).orElseThrow().reading().count()).isEqualTo(40_000);
    assertThat(next.uploads().recover()).isEmpty();
  }

  /** The rows of a log are stored in pieces: what a start finds of one half stored goes. */
  @ParameterizedTest
  @EnumSource(Databases.class)
  void aStartDeletesHalfStoredRows(Databases kind) {
    DataSource database = kind.migrated();
    ReadingDesk desk = new ReadingDesk(database, new Interrupted(), stop);
    long files = count(database, OF_A_FILE);
    long upload = desk.take(log(), Optional.empty());
    long reading = desk.read(upload).reading().orElseThrow();
    long whole = count(database, OF_A_LOG);
    JdbcClient jdbc = JdbcClient.create(database);
    // As a process leaves it that ended while the rows were being stored.
    jdbc.sql("delete from reading_files").update();
    jdbc.sql("update readings set sha256 = null").update();
    assertThat(desk.readings().ofSite(desk.site())).as("is not listed").isEmpty();
    assertThat(desk.readings().find(reading)).isEmpty();
    assertThat(count(database, OF_A_LOG)).isEqualTo(whole - 1);
    desk.uploads().recover();
    assertNothingLeft(database, files);
  }

  /** A cancel is heard while rows are being stored, and takes back those that are. */
  @ParameterizedTest
  @EnumSource(Databases.class)
  void aCancelWhileRowsAreStoredLeavesNothing(Databases kind) {
    DataSource database = kind.migrated();
    ReadingDesk desk = new ReadingDesk(database, new Interrupted(), stop);
    long files = count(database, OF_A_FILE);
    List<RawFile> file = List.of(log());
    MeterRef meter = new MeterRef("LP-1", "LP-1");
    ReadingReader reader = new FormatReader();
    ReadingSetting setting =
        new ReadingSetting(
            Optional.of(ZoneOffset.UTC),
            50,
            Optional.empty(),
            layout -> Optional.empty(),
            List.of(),
            OptionalDouble.empty());
    ReadingPlan plan = reader.plan(file, setting);
    Reading reading = reader.read(file, plan, setting, (share, message) -> true);
    ReadingRepository.Addition addition =
        new ReadingRepository.Addition(
            desk.site(), meter, file, plan.layout(), plan.mapping(), Optional.empty(), reading);
    List<Double> told = new ArrayList<>();
    DoublePredicate untilSomeAreThere =
        share -> {
          told.add(share);
          return count(database, List.of("series_chunks")) == 0;
        };
    assertThatThrownBy(() -> desk.readings().add(addition, untilSomeAreThere))
        .isInstanceOf(CancellationException.class);
    assertThat(told).as("some rows were stored").hasSizeGreaterThan(1);
    assertNothingLeft(database, files);
  }

  @ParameterizedTest
  @EnumSource(Databases.class)
  void whatFailsWhileItIsStoredIsTakenBack(Databases kind) {
    DataSource database = kind.migrated();
    ReadingDesk desk = new ReadingDesk(database, new Interrupted(), stop);
    long files = count(database, OF_A_FILE);
    long upload = desk.take(log(), Optional.empty());
    loseSeries = true;
    assertThat(desk.read(upload).state()).isEqualTo(ReadingUploads.State.FAILED);
    assertNothingLeft(database, files);
  }
}
