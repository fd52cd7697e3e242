package fourthwire.intake.reading.pqdif;

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
public final class IntervalTable {
  private static final long MOST_CELLS = 20_000_000;

  private final Map<String, Integer> columns = new LinkedHashMap<>();
  private final TreeMap<Instant, double[]> rows = new TreeMap<>();

  private IntervalTable() {}

  /** The table of a file as CSV in UTF-8; empty where it holds no interval data. */
  public static Optional<byte[]> of(Pqdif file) {
    List<ValueSeries> logged =
        file.series().stream().filter(s -> !s.origin().isWaveform() && s.count() > 0).toList();
    if (logged.isEmpty()) {
      return Optional.empty();
    }
    IntervalTable log = new IntervalTable();
    logged.forEach(s -> log.columns.putIfAbsent(ColumnName.of(s.origin()), log.columns.size()));
    logged.forEach(log::add);
    return Optional.of(log.csv());
  }

  private void add(ValueSeries s) {
    int column = columns.computeIfAbsent(ColumnName.of(s.origin()), n -> columns.size());
    for (int k = 0; k < s.count(); k++) {
      Instant at = s.origin().start().plus(Duration.ofMillis(Math.round(1000 * s.secondsAt(k))));
      rows.computeIfAbsent(at, t -> blank())[column] = s.at(k) * ColumnName.factor(s.origin());
      if ((long) rows.size() * columns.size() > MOST_CELLS) {
        throw new PqdifException(
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
