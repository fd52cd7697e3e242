package fourthwire.jobs;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingUploads;
import fourthwire.testsupport.Databases;
import fourthwire.testsupport.RawFiles;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/** Meters' files from the upload to the reading, with what is kept of the mapping. */
class ReadingRunTest {
  private static final String DAY_13 =
      "Time,I1 (A)\n01/13/2026 00:00,10\n01/13/2026 00:10,20\n01/13/2026 00:20,30\n";
  private static final String DAY_2 = DAY_13.replace("/13/", "/02/");

  private ReadingDesk desk;

  @BeforeEach
  void open() {
    desk = new ReadingDesk(Databases.H2.migrated());
  }

  private static Optional<ReadingMapping> mapping(double factor, Optional<String> format) {
    return Optional.of(
        new ReadingMapping(
            Optional.empty(),
            new ReadingMapping.Time(
                List.of(), format, Optional.empty(), Optional.empty(), OptionalDouble.empty()),
            OptionalDouble.empty(),
            Map.of(
                "I1 (A)",
                new ReadingMapping.Column("L1.rms_a", ReadingMapping.Statistic.MEAN, factor))));
  }

  private long queue(String text, Optional<ReadingMapping> mapping) {
    return desk.take(RawFiles.of("log.csv", text), mapping);
  }

  private ReadingUploads.Entry read(String text, Optional<ReadingMapping> mapping) {
    return desk.read(queue(text, mapping));
  }

  @Test
  void theSameFileByTheSameMappingAnswersTheReadingThatIsThere() {
    long first = read(DAY_13, mapping(1, Optional.empty())).reading().orElseThrow();
    assertThat(read(DAY_13, mapping(1, Optional.empty())).reading()).hasValue(first);
    assertThat(read(DAY_13, mapping(1, Optional.of("MM/dd/yyyy HH:mm"))).reading())
        .as("the same as resolved")
        .hasValue(first);
    assertThat(desk.readings().ofSite(desk.site())).hasSize(1);
  }

  @Test
  void theSameFileIsNeitherStoredNorReadAgain() {
    long first = read(DAY_13, Optional.empty()).reading().orElseThrow();
    long again = queue(DAY_13, Optional.empty());
    assertThat(desk.uploads().find(again).orElseThrow())
        .returns(ReadingUploads.State.DONE, ReadingUploads.Entry::state)
        .returns(OptionalLong.of(first), ReadingUploads.Entry::reading);
    assertThat(desk.uploads().files(again)).isEmpty();
  }

  /** Both were stored before either was read. */
  @Test
  void theSameFileQueuedTwiceIsReadOnce() {
    long one = queue(DAY_13, Optional.empty());
    long other = queue(DAY_13, Optional.empty());
    long first = desk.read(one).reading().orElseThrow();
    assertThat(desk.read(other).reading()).hasValue(first);
    assertThat(desk.uploads().files(other)).isEmpty();
    assertThat(desk.readings().ofSite(desk.site())).hasSize(1);
  }

  @Test
  void theSameFileByAnotherMappingIsRefusedUntilItsReadingIsDeleted() {
    long first = read(DAY_13, mapping(1, Optional.empty())).reading().orElseThrow();
    assertThatThrownBy(() -> queue(DAY_13, mapping(10, Optional.empty())))
        .isInstanceOf(RefusedException.class)
        .hasMessageContaining("reading " + first)
        .hasMessageContaining("delete");
    desk.readings().delete(first);
    long again = read(DAY_13, mapping(10, Optional.empty())).reading().orElseThrow();
    assertThat(desk.readings().find(again).orElseThrow().reading().log().orElseThrow().quantities())
        .hasEntrySatisfying("L1.rms_a", s -> assertThat(s.mean()).isEqualTo(200));
  }

  @Test
  void twoMappingsQueuedAtOnceDoNotAnswerForEachOther() {
    long one = queue(DAY_13, mapping(1, Optional.empty()));
    long other = queue(DAY_13, mapping(10, Optional.empty()));
    desk.read(one);
    desk.read(other);
    assertThat(desk.uploads().find(other).orElseThrow().state())
        .isEqualTo(ReadingUploads.State.FAILED);
    assertThat(desk.uploads().find(other).orElseThrow().message()).contains("another mapping");
  }

  /** On day 13 the file itself says month first; on the 2nd it does not. */
  @Test
  void aProposalIsNotRememberedAsIfItWereConfirmed() {
    read(DAY_13, Optional.empty()).reading().orElseThrow();
    assertThatThrownBy(() -> queue(DAY_2, Optional.empty()))
        .isInstanceOf(ReadingRefusedException.class)
        .satisfies(
            e ->
                assertThat(((ReadingRefusedException) e).questions())
                    .extracting("part")
                    .containsExactly("time.format"));
    long given = read(DAY_2, mapping(1, Optional.of("dd/MM/yyyy"))).reading().orElseThrow();
    assertThat(desk.readings().find(given).orElseThrow().reading().notes())
        .contains("Times are taken as the starts of the intervals.");
    // The format was given and is remembered; the note on the assumption comes again.
    String next = DAY_2.replace("00:20,30", "00:20,40");
    long remembered = read(next, Optional.empty()).reading().orElseThrow();
    assertThat(desk.readings().find(remembered).orElseThrow().reading().notes())
        .contains("Times are taken as the starts of the intervals.");
    assertThatThrownBy(() -> queue(DAY_13.replace("10\n", "11\n"), Optional.empty()))
        .isInstanceOf(ReadingRefusedException.class);
  }

  @Test
  void aFailureIsWholeSentences() {
    ReadingRefusedException e =
        new ReadingRefusedException(
            "The interval can't be told.",
            List.of(),
            List.of(new ReadingRefusedException.Question("time.interval_s", "give the length")));
    assertThat(ReadingRun.sentence(e))
        .isEqualTo("The interval can't be told. time.interval_s: give the length.");
  }
}
