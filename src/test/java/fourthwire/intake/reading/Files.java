package fourthwire.intake.reading;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

import fourthwire.metering.RawFile;
import fourthwire.testsupport.RawFiles;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Uploads for tests. */
final class Files {
  /** Open measured records beside the project; see SOURCE.txt there. */
  private static final Path OPEN_DATA = Path.of("..", "shared", "data", "comtrade");

  private Files() {}

  static RawFile of(String name, byte[] bytes) {
    return RawFiles.of(name, bytes);
  }

  static RawFile of(String name, String text) {
    return of(name, text.getBytes(StandardCharsets.UTF_8));
  }

  static RawFile open(String path) {
    Path file = OPEN_DATA.resolve(path);
    assumeTrue(
        java.nio.file.Files.exists(file),
        () -> "the open data " + OPEN_DATA + " is not beside the project");
    try {
      return of(file.getFileName().toString(), java.nio.file.Files.readAllBytes(file));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static ReadingSetting setting(double nominalHz) {
    return new ReadingSetting(
        Optional.of(ZoneId.of("Europe/Amsterdam")),
        nominalHz,
        Optional.empty(),
        layout -> Optional.empty(),
        List.of(),
        OptionalDouble.empty());
  }
}
