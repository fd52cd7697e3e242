package fourthwire.metering.log;

import java.time.Instant;
import java.util.List;
import java.util.Optional;

/**
 * The rows of one local day, or of a part of it where they are very many, in the file's order. It
 * hands out its own arrays: they are not to be changed.
 */
final class LogDay {
  private final List<String> quantities;
  private final long[] startMillis;
  private final double[][] values;
  private final long firstRow;
  private final long intervalMillis;

  LogDay(
      List<String> quantities,
      long[] startMillis,
      double[][] values,
      long firstRow,
      long intervalMillis) {
    this.quantities = quantities;
    this.startMillis = startMillis;
    this.values = values;
    this.firstRow = firstRow;
    this.intervalMillis = intervalMillis;
  }

  int rows() {
    return startMillis.length;
  }

  /** Number of its first row in the log, from 0. */
  long firstRow() {
    return firstRow;
  }

  long startMillis(int row) {
    return startMillis[row];
  }

  long intervalMillis() {
    return intervalMillis;
  }

  /** When it begins. */
  Instant from() {
    return Instant.ofEpochMilli(startMillis[0]);
  }

  /** When its last interval ends. */
  Instant to() {
    return Instant.ofEpochMilli(startMillis[rows() - 1] + intervalMillis);
  }

  List<String> quantities() {
    return quantities;
  }

  double[] of(int quantity) {
    return values[quantity];
  }

  /** A quantity's values; empty where it is not logged. */
  Optional<double[]> find(String quantity) {
    int q = quantities.indexOf(quantity);
    return q < 0 ? Optional.empty() : Optional.of(values[q]);
  }
}
