package fourthwire.intake.survey;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The help page names every table of the survey and every column it may have. */
class HelpTest {
  private static final Path HELP = Path.of("src/main/resources/templates/help/help.html");
  private static final String FEEDER = "Feeder columns";

  static Stream<String> tables() {
    return Schemas.tables().stream();
  }

  @ParameterizedTest
  @MethodSource("tables")
  void everyColumnStandsUnderItsTable(String table) throws IOException {
    Set<String> columns = Schemas.columns(table);
    String own = part(table);
    String text = own.contains("feeder columns may follow") ? own + part(FEEDER) : own;
    assertThat(columns)
        .isNotEmpty()
        .allSatisfy(c -> assertThat(text).contains("<code>" + named(c) + "</code>"));
  }

  @Test
  void aColumnThatIsNotThereIsFoundMissing() throws IOException {
    assertThat(part("panels")).doesNotContain("<code>impedance_percent</code>");
  }

  /** The hours stand as one row, from the first to the last. */
  private static String named(String column) {
    return column.matches("h\\d\\d") ? "h00</code> … <code>h23" : column;
  }

  /** What the page says of one table. */
  private static String part(String table) throws IOException {
    String page = Files.readString(HELP);
    int from = page.indexOf("<summary><span>" + table + "</span>");
    assertThat(from).as("a part on " + table).isPositive();
    return page.substring(from, page.indexOf("</details>", from));
  }
}
