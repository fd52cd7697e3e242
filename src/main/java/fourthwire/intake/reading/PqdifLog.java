package fourthwire.intake.reading;

import fourthwire.intake.reading.pqdif.Pqdif;
import fourthwire.intake.reading.pqdif.ValueSeries;
import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.Instant;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/**
 * The interval data of a PQDIF file as a table: a column a series, named by its quantity, a row a
 * moment. From there it is read like any other log.
 */
final class PqdifLog {
  private static final long MOST_CELLS = 20_000_000;

  private final Map<String, Integer> columns = new LinkedHashMap<>();
  private final TreeMap<Instant, double[]> rows = new TreeMap<>();

  private PqdifLog() {}

  /** The table of a file; empty where it holds no interval data. */
  static Optional<Part> of(Pqdif file, String name) {
    List<ValueSeries> logged =
        file.series().stream().filter(s -> !s.origin().isWaveform() && s.count() > 0).toList();
    if (logged.isEmpty()) {
      return Optional.empty();
    }
    PqdifLog log = new PqdifLog();
    logged.forEach(s -> log.columns.putIfAbsent(PqdifNames.column(s.origin()), log.columns.size()));
    logged.forEach(log::add);
    byte[] csv = log.csv();
    return Optional.of(new Part(name, () -> new ByteArrayInputStream(csv)));
  }

  private void add(ValueSeries s) {
    int column = columns.get(PqdifNames.column(s.origin()));
    for (int k = 0; k < s.count(); k++) {
      Instant at = s.origin().start().plus(Duration.ofMillis(Math.round(1000 * s.secondsAt(k))));
      rows.computeIfAbsent(at, t -> blank())[column] = s.at(k) * PqdifNames.factor(s.origin());
      if ((long) rows.size() * columns.size() > MOST_CELLS) {
        throw new ReadingRefusedException(
            "The PQDIF file holds more than " + MOST_CELLS + " values: cut it into shorter files.");
      }
    }
  }

  private double[] blank() {
    double[] row = new double[columns.size()];
    Arrays.fill(row, Double.NaN);
    return row;
  }

  private byte[] csv() {
    StringBuilder csv = new StringBuilder("time");
    columns.keySet().forEach(c -> csv.append(',').append('"').append(c).append('"'));
    rows.forEach(
        (at, row) -> {
          csv.append('\n').append(at);
          for (double value : row) {
            csv.append(',').append(Double.isNaN(value) ? "" : Double.toString(value));
          }
        });
    return csv.append('\n').toString().getBytes(StandardCharsets.UTF_8);
  }
}
