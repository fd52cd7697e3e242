package fourthwire.sample;

import fourthwire.audit.AuditRequest;
import fourthwire.audit.AuditResult;
import fourthwire.audit.NodeResult;
import fourthwire.audit.Progress;
import fourthwire.audit.run.HarmonicAudit;
import fourthwire.intake.survey.SurveyImport;
import fourthwire.site.Survey;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;

/** The demo site's survey as it stands in {@code sample-data}, and its audit. */
public final class DemoSurvey {
  /** The folder of everything that belongs to the demo site. */
  static final Path FOLDER = Path.of("sample-data");

  private DemoSurvey() {}

  /** The survey; it must be read without an error or a warning. */
  public static Survey read() {
    SurveyImport.Outcome outcome = SurveyImport.read(zip());
    if (outcome instanceof SurveyImport.Read read && read.warnings().isEmpty()) {
      return read.survey();
    }
    throw new IllegalStateException("the demo's survey is not accepted: " + outcome);
  }

  static AuditResult audit(Survey survey) {
    return new HarmonicAudit()
        .run(new AuditRequest(survey, Optional.empty(), Map.of()), Progress.SILENT);
  }

  static NodeResult node(AuditResult audit, String name) {
    return audit.nodes().stream().filter(n -> n.node().equals(name)).findFirst().orElseThrow();
  }

  private static byte[] zip() {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (ZipOutputStream zip = new ZipOutputStream(bytes)) {
      for (Path table : tables()) {
        zip.putNextEntry(new ZipEntry(table.getFileName().toString()));
        zip.write(Files.readAllBytes(table));
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return bytes.toByteArray();
  }

  private static List<Path> tables() throws IOException {
    try (Stream<Path> files = Files.list(FOLDER.resolve("survey"))) {
      return files.filter(f -> f.toString().endsWith(".csv")).sorted().toList();
    }
  }
}
