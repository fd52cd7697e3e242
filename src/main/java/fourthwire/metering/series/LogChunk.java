package fourthwire.metering.series;

/**
 * A few thousand rows of a log, column by column: the block in which logs are read, stored and gone
 * through. It hands out its own arrays: they are not to be changed.
 *
 * @param startMillis when each row's interval begins, milliseconds of the epoch
 * @param values by quantity and row, in SI units; NaN for none
 */
public record LogChunk(long[] startMillis, double[][] values) {
  /** Most rows of a chunk. */
  public static final int ROWS = 4096;

  /** How many rows it has. */
  public int rows() {
    return startMillis.length;
  }
}
