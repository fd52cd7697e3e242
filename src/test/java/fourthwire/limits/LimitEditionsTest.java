package fourthwire.limits;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every table that judges is named among the editions. */
class LimitEditionsTest {
  private static final Path TABLES = Path.of("src/main/resources/fourthwire/limits");

  static List<Path> tables() throws IOException {
    try (Stream<Path> files = Files.walk(TABLES)) {
      return files.filter(f -> f.toString().endsWith(".csv")).sorted().toList();
    }
  }

  @ParameterizedTest
  @MethodSource("tables")
  void everyTableNamesItsSourceAndIsListed(Path table) throws IOException {
    List<String> lines = Files.readAllLines(table);
    assertThat(lines).anyMatch(l -> l.startsWith("# clause: "));
    assertThat(lines).anyMatch(l -> l.startsWith("# provenance: "));
    String documents =
        lines.stream()
            .filter(l -> l.startsWith("# document: "))
            .findFirst()
            .orElseThrow()
            .substring("# document: ".length());
    for (String document : documents.split("; ")) {
      assertThat(
              Stream.of(LimitEditions.editions(), LimitEditions.equipment()).flatMap(List::stream))
          .anyMatch(edition -> edition.startsWith(document));
    }
  }

  @Test
  void codesAreShortLowerCaseWordsAndDiffer() {
    assertThat(Stream.of(FindingCode.values()).map(FindingCode::word))
        .doesNotHaveDuplicates()
        .allMatch(word -> word.matches("[a-z-]{3,30}"));
  }

  @Test
  void numbersInSentencesReadAsPeopleWriteThem() {
    assertThat(Stream.of(0.03, 9.06, 34.0, 128.4, 1_234.6, 0.0, 99.97).map(Words::number))
        .containsExactly("0.03", "9.06", "34", "128", "1235", "0", "100");
    assertThat(Stream.of(2, 3, 5, 11, 12, 13, 21, 22, 23, 31, 50).map(Words::ordinal))
        .containsExactly(
            "2nd", "3rd", "5th", "11th", "12th", "13th", "21st", "22nd", "23rd", "31st", "50th");
  }
}
