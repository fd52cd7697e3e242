package fourthwire.metering.log;

import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The rows of one local day, or of a part of it where they are very many, in the file's order. It
 * hands out its own arrays: they are not to be changed.
 */
final class LogDay {
  private final List<String> quantities;
  private final Map<String, Integer> numbers;
  private final long[] startMillis;
  private final double[][] values;
  private final long firstRow;
  private final long intervalMillis;

  /**
   * Rows in the file's order.
   *
   * @param quantities names of the columns
   * @param numbers positions of the quantities by name
   * @param firstRow number of the first row in the log, from 0
   */
  LogDay(
      List<String> quantities,
      Map<String, Integer> numbers,
      long[] startMillis,
      double[][] values,
      long firstRow,
      long intervalMillis) {
    this.quantities = quantities;
    this.numbers = numbers;
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
    return Optional.ofNullable(numbers.get(quantity)).map(q -> values[q]);
  }
}
