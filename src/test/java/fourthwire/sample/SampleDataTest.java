package fourthwire.sample;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The committed files are those that the generator makes of the survey. */
class SampleDataTest {
  private static final long MOST_BYTES = 3_000_000;

  @Test
  void generatorMakesTheCommittedFilesToTheByte() throws IOException {
    Map<String, byte[]> made = SampleDataGenerator.files(DemoSurvey.read());
    assertThat(committed()).isEqualTo(new TreeSet<>(made.keySet()));
    for (Map.Entry<String, byte[]> file : made.entrySet()) {
      assertThat(Files.readString(DemoSurvey.FOLDER.resolve(file.getKey())))
          .as(file.getKey() + " (see sample-data/README.md on making it anew)")
          .isEqualTo(new String(file.getValue(), StandardCharsets.UTF_8));
    }
  }

  @Test
  void isSmall() throws IOException {
    long bytes = 0;
    for (String file : committed()) {
      bytes += Files.size(DemoSurvey.FOLDER.resolve(file));
    }
    assertThat(bytes).isLessThan(MOST_BYTES);
  }

  private static TreeSet<String> committed() throws IOException {
    try (Stream<Path> files = Files.walk(DemoSurvey.FOLDER)) {
      List<String> names =
          files
              .filter(Files::isRegularFile)
              .map(f -> DemoSurvey.FOLDER.relativize(f).toString().replace('\\', '/'))
              .filter(name -> !name.equals("README.md"))
              .toList();
      return new TreeSet<>(names);
    }
  }
}
