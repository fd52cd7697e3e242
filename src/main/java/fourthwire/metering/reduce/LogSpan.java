package fourthwire.metering.reduce;

import java.util.ArrayList;
import java.util.List;

/**
 * The part of a stored log that lies in a span of time, gone through quantity by quantity in memory
 * that does not grow with the log's columns.
 */
public final class LogSpan {
  private final Source source;
  private final int firstChunk;
  private final List<long[]> times;

  /** Where the chunks of a log come from. */
  public interface Source {
    /** When the rows of every chunk begin. */
    List<long[]> times();

    /** A quantity's values in chunks {@code first} to {@code last}, in order. */
    void values(String quantity, int first, int last, ChunkTaker taker);
  }

  /** Takes the values of a chunk. */
  @FunctionalInterface
  public interface ChunkTaker {
    /** The next chunk's values; not to be changed or kept. */
    void take(int chunk, double[] values);
  }

  private LogSpan(Source source, int firstChunk, List<long[]> times) {
    this.source = source;
    this.firstChunk = firstChunk;
    this.times = times;
  }

  /** The whole log. */
  public static LogSpan whole(Source source) {
    return new LogSpan(source, 0, source.times());
  }

  /**
   * The chunks that have rows in a span; rows around it may be among them.
   *
   * @param fromMillis first instant, milliseconds of the epoch
   * @param toMillis the instant after the last
   */
  public static LogSpan of(Source source, long fromMillis, long toMillis) {
    List<long[]> all = source.times();
    int first = all.size();
    int last = -1;
    for (int k = 0; k < all.size(); k++) {
      if (overlaps(all.get(k), fromMillis, toMillis)) {
        first = Math.min(first, k);
        last = k;
      }
    }
    return last < 0
        ? new LogSpan(source, 0, List.of())
        : new LogSpan(source, first, new ArrayList<>(all.subList(first, last + 1)));
  }

  private static boolean overlaps(long[] times, long from, long to) {
    for (long t : times) {
      if (t >= from && t < to) {
        return true;
      }
    }
    return false;
  }

  /** Goes through the rows' times alone. */
  public void times(java.util.function.Consumer<long[]> taker) {
    times.forEach(taker);
  }

  /** Goes through a quantity's rows. */
  public void rows(String quantity, RowTaker taker) {
    if (!times.isEmpty()) {
      source.values(
          quantity,
          firstChunk,
          firstChunk + times.size() - 1,
          (chunk, values) -> taker.take(times.get(chunk - firstChunk), values));
    }
  }
}
