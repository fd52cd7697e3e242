package fourthwire.metering.reduce;

/** Takes rows of one quantity, a chunk at a time. */
@FunctionalInterface
public interface RowTaker {
  /**
   * The next rows; neither array may be changed or kept.
   *
   * @param startMillis when each begins, milliseconds of the epoch
   * @param values NaN for none
   */
  void take(long[] startMillis, double[] values);
}
