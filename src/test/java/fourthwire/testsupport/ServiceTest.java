package fourthwire.testsupport;

import fourthwire.Application;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.test.context.filter.annotation.TypeExcludeFilters;
import org.springframework.boot.test.web.server.LocalServerPort;
import org.springframework.test.context.DynamicPropertyRegistry;
import org.springframework.test.context.DynamicPropertySource;

/**
 * The whole service on a free port, its store empty in a folder of its own; shared by the tests.
 */
@SpringBootTest(
    classes = Application.class,
    webEnvironment = SpringBootTest.WebEnvironment.RANDOM_PORT,
    properties = {
      "fourthwire.demo=false",
      "fourthwire.allowed-hosts=audit.example.org",
      "spring.servlet.multipart.max-file-size=2MB"
    })
@TypeExcludeFilters(OtherApplications.class)
public abstract class ServiceTest {
  @LocalServerPort private int port;

  @DynamicPropertySource
  static void folder(DynamicPropertyRegistry registry) {
    registry.add("fourthwire.data-dir", ServiceTest::temporaryFolder);
  }

  private static String temporaryFolder() {
    try {
      return Files.createTempDirectory("fourthwire-test").toString();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** How a script reaches it. */
  protected Http http() {
    return new Http(port);
  }
}
