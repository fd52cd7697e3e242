package fourthwire.sample;

import fourthwire.audit.AuditResult;
import fourthwire.audit.DesignState;
import fourthwire.intake.survey.SurveyExport;
import fourthwire.site.Meter;
import fourthwire.site.SpotReading;
import fourthwire.site.Survey;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;

/**
 * Makes the demo site's files anew: its tables in their canonical form, with the clamp readings,
 * and its meters' files. The survey's other tables are the source and stay as they are.
 *
 * <p>The command stands in {@code sample-data/README.md}.
 */
public final class SampleDataGenerator {
  private static final long SEED = 20260302;

  /** Nodes visited with the clamp, in this order. */
  private static final List<String> VISITED =
      List.of(
          "MSB",
          "ESB",
          "SRV",
          "LIFT",
          "LS",
          "SH-1",
          "SH-2",
          "CAFE",
          "WORK",
          "PLANT",
          "PUMP",
          "EV",
          "PARK",
          "FLAT",
          "OF-1E",
          "OF-1W",
          "OF-2E",
          "OF-2W",
          "OF-3E",
          "OF-3W",
          "OF-4E",
          "OF-4W",
          "OF-3W:desks 1",
          "SRV:rack 1");

  private final Survey survey;
  private final AuditResult audit;
  private final Occupancy occupancy;

  private SampleDataGenerator(Survey survey) {
    this.survey = survey;
    this.audit = DemoSurvey.audit(survey);
    this.occupancy = new Occupancy(survey);
  }

  /** Writes every file. */
  public static void main(String[] arguments) throws IOException {
    for (Map.Entry<String, byte[]> file : files(DemoSurvey.read()).entrySet()) {
      Path path = DemoSurvey.FOLDER.resolve(file.getKey());
      Files.createDirectories(path.getParent());
      Files.write(path, file.getValue());
    }
  }

  /** Every file by its name within the folder. */
  static Map<String, byte[]> files(Survey survey) throws IOException {
    SampleDataGenerator generator = new SampleDataGenerator(survey);
    Map<String, byte[]> files = new TreeMap<>(generator.tables());
    generator.readings().forEach((k, text) -> files.put(k, text.getBytes(StandardCharsets.UTF_8)));
    return files;
  }

  private Map<String, byte[]> tables() throws IOException {
    Map<String, byte[]> tables = new TreeMap<>();
    byte[] zip = SurveyExport.zip(withSpotReadings(clamped()));
    try (ZipInputStream in = new ZipInputStream(new ByteArrayInputStream(zip))) {
      for (ZipEntry e = in.getNextEntry(); e != null; e = in.getNextEntry()) {
        tables.put("survey/" + e.getName(), in.readAllBytes());
      }
    }
    return tables;
  }

  private List<SpotReading> clamped() {
    return new ClampReadings(audit, occupancy, SEED).at(VISITED, "OF-3W");
  }

  /** The main meter runs the whole week; the office's stood still for an evening. */
  private Map<String, String> readings() {
    WeekLog.Deviation main = new WeekLog.Deviation(1.02, 0.96, 0, 0);
    WeekLog.Deviation office = new WeekLog.Deviation(0.97, 0.94, 546, 23);
    WaveformRecord record =
        new WaveformRecord(design("M2"), survey.settings().frequencyHz(), office.lines());
    return Map.of(
        "readings/M1__week.csv", week("M1", main, SEED + 1),
        "readings/M2__week.csv", week("M2", office, SEED + 2),
        "readings/M2__record.cfg", record.configuration(),
        "readings/M2__record.dat", record.data());
  }

  private String week(String meter, WeekLog.Deviation deviation, long seed) {
    return new WeekLog(at(meter), design(meter), occupancy, deviation, seed).csv();
  }

  private String at(String meter) {
    return survey.meters().stream()
        .filter(m -> m.name().equals(meter))
        .map(Meter::at)
        .findFirst()
        .orElseThrow();
  }

  private DesignState design(String meter) {
    return DemoSurvey.node(audit, at(meter)).design().orElseThrow();
  }

  private Survey withSpotReadings(List<SpotReading> readings) {
    return new Survey(
        survey.settings(),
        survey.supplies(),
        survey.background(),
        survey.transformers(),
        survey.panels(),
        survey.circuits(),
        survey.loads(),
        survey.spectra(),
        survey.schedules(),
        survey.capacitors(),
        survey.filters(),
        survey.meters(),
        readings);
  }
}
