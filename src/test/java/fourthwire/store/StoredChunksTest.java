package fourthwire.store;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.metering.LogResult;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingRepository.MeterRef;
import fourthwire.metering.reduce.LogSpan;
import fourthwire.metering.series.LogSeries;
import fourthwire.testsupport.Databases;
import fourthwire.testsupport.SmallLog;
import fourthwire.testsupport.SmallSite;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** The rows of a stored log come back, chunk by chunk, on both databases. */
class StoredChunksTest {
  @ParameterizedTest
  @EnumSource
  void theRowsComeBackQuantityByQuantity(Databases kind) {
    Store store = new Store(kind.migrated());
    long site = store.sites(new ZipSurveyCodec()).create(SmallSite.survey("Works"), List.of());
    Reading log = SmallLog.reading();
    LogSeries series =
        log.log().flatMap(LogResult::detail).map(LogResult.Detail::series).orElseThrow();
    long reading =
        store
            .readings()
            .add(
                new ReadingRepository.Addition(
                    site,
                    new MeterRef("M1", "LP-1"),
                    List.of(),
                    "made",
                    new ReadingMapping(
                        Optional.empty(),
                        ReadingMapping.Time.FROM_FILE,
                        OptionalDouble.empty(),
                        Map.of()),
                    Optional.empty(),
                    log));

    LogSpan.Source stored = store.series().chunks(reading);

    assertThat(stored.times()).hasSize(series.chunks());
    assertThat(stored.times().get(0)).isEqualTo(series.startMillis(0));
    List<double[]> neutral = new ArrayList<>();
    stored.values("N.rms_a", 0, series.chunks() - 1, (chunk, values) -> neutral.add(values));
    assertThat(neutral).hasSize(series.chunks());
    assertThat(neutral.get(0)).isEqualTo(series.values(0, series.indexOf("N.rms_a")));
    stored.values(
        "L2.rms_v", 0, 9, (chunk, values) -> assertThat(values).as("not logged").isNull());
    stored.values("N.rms_a", 1, 9, (chunk, values) -> assertThat(chunk).isPositive());
  }
}
