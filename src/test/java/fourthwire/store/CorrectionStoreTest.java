package fourthwire.store;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.jobs.CorrectionService;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.metering.log.InventedBoard;
import fourthwire.testsupport.Databases;
import fourthwire.testsupport.SmallSite;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import javax.sql.DataSource;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.springframework.jdbc.core.simple.JdbcClient;

/** Corrections are recorded and taken back, on both databases, and touch nothing that was read. */
class CorrectionStoreTest {
  private static final int D = 10 * InventedBoard.PER_DAY;

  private DataSource database;
  private ReadingRepository readings;
  private CorrectionRepository corrections;
  private CorrectionService service;
  private long reading;

  private void open(Databases kind) {
    database = kind.migrated();
    Store store = new Store(database);
    readings = store.readings();
    corrections = store.corrections();
    service = new CorrectionService(readings, store.series(), corrections);
    long site = store.sites(new ZipSurveyCodec()).create(SmallSite.survey("Works"), List.of());
    InventedBoard board = new InventedBoard(3, 2);
    board.scale("L2.active_w", D, D + 4 * InventedBoard.PER_DAY, -1);
    board.scale("L2.power_factor", D, D + 4 * InventedBoard.PER_DAY, -1);
    board.repeat(D);
    reading = readings.add(addition(site, board.reading()));
  }

  private static ReadingRepository.Addition addition(long site, Reading reading) {
    return new ReadingRepository.Addition(
        site,
        new ReadingRepository.MeterRef("M1", "LP-1"),
        List.of(),
        "layout",
        new ReadingMapping(
            Optional.of(ReadingKind.LOG),
            new ReadingMapping.Time(
                List.of(),
                Optional.empty(),
                Optional.of(InventedBoard.ZONE.getId()),
                Optional.empty(),
                OptionalDouble.empty()),
            OptionalDouble.empty(),
            Map.of()),
        Optional.empty(),
        reading);
  }

  @ParameterizedTest
  @EnumSource
  void correctionsMakeASecondSetAndGoWithoutATrace(Databases kind) {
    open(kind);
    List<String> read = table("series_quantities", "statistics");
    Map<String, QuantitySummary> before = summaries();
    int turned = finding("Active power");
    int repeated = finding("the time of the row before");

    long first = service.make(reading, turned, 0, share -> {});
    List<String> onlyFirst = table("cleaned_quantities", "statistics");
    long second = service.make(reading, repeated, 0, share -> {});
    CorrectionRepository.Cleaned cleaned = corrections.cleaned(reading).orElseThrow();
    assertThat(cleaned.rows()).isEqualTo(28L * InventedBoard.PER_DAY);
    assertThat(cleaned.log().quantities().get("L2.active_w").min()).isPositive();
    assertThat(cleaned.log().keyIntervals()).isNotEmpty();
    assertThat(corrections.ofReading(reading))
        .extracting(CorrectionRepository.Entry::finding)
        .containsExactly(turned, repeated);

    assertThat(service.undo(reading, second, share -> {})).isTrue();
    assertThat(service.undo(reading, second, share -> {})).as("it holds no more").isFalse();
    assertThat(table("cleaned_quantities", "statistics")).isEqualTo(onlyFirst);
    long again = service.make(reading, repeated, 0, share -> {});
    assertThat(service.undo(reading, first, share -> {})).as("in another order").isTrue();
    assertThat(service.undo(reading, again, share -> {})).isTrue();
    assertThat(corrections.cleaned(reading)).isEmpty();
    assertThat(corrections.ofReading(reading)).hasSize(3).noneMatch(c -> c.holds());
    assertThat(table("series_quantities", "statistics")).isEqualTo(read);
    assertThat(summaries()).isEqualTo(before);

    service.make(reading, turned, 0, share -> {});
    assertThat(readings.delete(reading)).isTrue();
    for (String table : List.of("reading_corrections", "cleaned_logs", "cleaned_quantities")) {
      assertThat(table(table, "reading_id")).as(table).isEmpty();
    }
  }

  /** Columns that a correction does not touch have the bytes they have as read. */
  @ParameterizedTest
  @EnumSource
  void whatIsNotTouchedIsAsRead(Databases kind) {
    open(kind);
    List<String> read = table("series_quantities", "statistics");
    service.make(reading, finding("Active power"), 0, share -> {});
    List<String> cleaned = table("cleaned_quantities", "statistics");
    List<String> names = table("cleaned_quantities", "name");
    for (int q = 0; q < names.size(); q++) {
      boolean touched = names.get(q).matches("L2\\.(active_w|power_factor)");
      assertThat(cleaned.get(q).equals(read.get(q))).as(names.get(q)).isEqualTo(!touched);
    }
  }

  private Map<String, QuantitySummary> summaries() {
    return readings.find(reading).orElseThrow().reading().log().orElseThrow().quantities();
  }

  private int finding(String part) {
    List<String> sentences = new ArrayList<>();
    readings
        .find(reading)
        .orElseThrow()
        .reading()
        .quality()
        .forEach(q -> sentences.add(q.sentence()));
    for (int k = 0; k < sentences.size(); k++) {
      if (sentences.get(k).contains(part)) {
        return k;
      }
    }
    throw new AssertionError(part + " in " + sentences);
  }

  private List<String> table(String table, String column) {
    String order = table.endsWith("quantities") ? " order by quantity" : "";
    return JdbcClient.create(database)
        .sql("select " + column + " from " + table + order)
        .query(
            (row, number) -> {
              Object value = row.getObject(1);
              return value instanceof byte[] bytes
                  ? HexFormat.of().formatHex(bytes)
                  : String.valueOf(value);
            })
        .list();
  }
}
