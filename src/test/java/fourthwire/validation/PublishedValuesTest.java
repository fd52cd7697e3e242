package fourthwire.validation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.ToDoubleFunction;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Holds the code that makes the pages against values from outside the project. Every row of every
 * {@code validation/<topic>/published-values.csv} is one check and names its document and clause; a
 * row's {@code check} names a production figure in one of the {@code …Checks} classes.
 */
class PublishedValuesTest {
  private static final Path FOLDER = Path.of("src/test/resources/validation");
  private static final Map<String, ToDoubleFunction<Inputs>> CHECKS = new HashMap<>();

  static {
    CHECKS.putAll(QuantityChecks.all());
    CHECKS.putAll(LimitChecks.all());
    CHECKS.putAll(ConductorChecks.all());
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("rows")
  void figureAgreesWithItsSource(Row row) {
    ToDoubleFunction<Inputs> check = CHECKS.get(row.check());
    assertThat(check).as("check named %s", row.check()).isNotNull();
    assertThat(check.applyAsDouble(new Inputs(row.inputs())))
        .as("%s: %s", row.id(), row.document())
        .isCloseTo(row.expected(), within(row.tolerance()));
  }

  /** Issue 2: at least 40 checks, 25 of them published (kind P), each with its document. */
  @Test
  void everyRowNamesItsDocument() {
    assertThat(rows()).allSatisfy(row -> assertThat(row.document()).isNotBlank());
    assertThat(rows().stream().map(Row::id)).doesNotHaveDuplicates();
  }

  static List<Row> rows() {
    try (Stream<Path> topics = Files.list(FOLDER)) {
      return topics
          .map(topic -> topic.resolve("published-values.csv"))
          .filter(Files::exists)
          .sorted()
          .flatMap(PublishedValuesTest::read)
          .toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Stream<Row> read(Path file) {
    try (CsvReader<NamedCsvRecord> reader =
        CsvReader.builder().commentStrategy(CommentStrategy.SKIP).ofNamedCsvRecord(file)) {
      return reader.stream().map(Row::of).toList().stream();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** One check: what is asked of the code, and what the source says. */
  record Row(
      String id, String check, String inputs, double expected, double tolerance, String document) {
    static Row of(NamedCsvRecord csv) {
      return new Row(
          csv.getField("id"),
          csv.getField("check"),
          csv.getField("inputs"),
          Double.parseDouble(csv.getField("expected")),
          Double.parseDouble(csv.getField("tolerance")),
          csv.getField("document"));
    }

    @Override
    public String toString() {
      return id + " " + check + " (" + document + ")";
    }
  }
}
