package fourthwire.metering.series;

import java.util.List;

/**
 * Rows of a log in chunks, column by column, gone through as often as needed. It may hand out its
 * own arrays: they are not to be changed. Read by several threads at once.
 */
public interface Series {
  /** Names of the columns. */
  List<String> quantities();

  /** Rows, repeated ones included. */
  long rows();

  /** How many chunks there are. */
  int chunks();

  /** Rows of a chunk. */
  int rows(int chunk);

  /** When the rows of a chunk begin, milliseconds of the epoch. */
  long[] startMillis(int chunk);

  /** A quantity's values in a chunk, in SI units; NaN for none. */
  double[] values(int chunk, int quantity);

  /** Position of a quantity; -1 where it is not logged. */
  default int indexOf(String quantity) {
    return quantities().indexOf(quantity);
  }
}
