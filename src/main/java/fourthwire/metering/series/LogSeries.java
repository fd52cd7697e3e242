package fourthwire.metering.series;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.Executor;

/**
 * The rows of a log as read, in chunks: to be gone through as often as needed, in memory that does
 * not grow with the log. Chunks are held as numbers as long as they are few; once they are many
 * each column is coded and filed.
 */
public final class LogSeries implements Series, AutoCloseable {
  private static final int CODED_AHEAD = 3;

  private final List<String> quantities;
  private final Parts parts;
  private final long mostHeldValues;
  private final List<Integer> lengths = new ArrayList<>();
  private final List<LogChunk> held = new ArrayList<>();

  /** Of each chunk that is filed the numbers of its coded columns, the first that of the times. */
  private final List<CompletableFuture<int[]>> filed = new ArrayList<>();

  private long rows;

  /**
   * An empty series.
   *
   * @param quantities names of its columns
   * @param parts takes the coded columns
   * @param mostHeldValues how many values may be held as numbers
   */
  public LogSeries(List<String> quantities, Parts parts, long mostHeldValues) {
    this.quantities = List.copyOf(quantities);
    this.parts = parts;
    this.mostHeldValues = mostHeldValues;
  }

  /**
   * Adds rows behind those that are there.
   *
   * @param worker codes columns that are filed
   */
  public void add(LogChunk chunk, Executor worker) {
    lengths.add(chunk.rows());
    rows += chunk.rows();
    held.add(chunk);
    if (!filed.isEmpty() || rows * quantities.size() > mostHeldValues) {
      held.forEach(c -> file(c, worker));
      held.clear();
    }
  }

  private void file(LogChunk chunk, Executor worker) {
    if (filed.size() > CODED_AHEAD) {
      filed.get(filed.size() - CODED_AHEAD).join();
    }
    filed.add(CompletableFuture.supplyAsync(() -> encoded(chunk), worker));
  }

  private int[] encoded(LogChunk chunk) {
    int[] numbers = new int[quantities.size() + 1];
    numbers[0] = parts.add(ColumnCodec.encode(chunk.startMillis()));
    for (int q = 0; q < quantities.size(); q++) {
      numbers[q + 1] = parts.add(ColumnCodec.encode(chunk.values()[q]));
    }
    return numbers;
  }

  private boolean holding() {
    return filed.isEmpty();
  }

  /** Names of the columns. */
  @Override
  public List<String> quantities() {
    return quantities;
  }

  /** Rows, repeated ones included. */
  @Override
  public long rows() {
    return rows;
  }

  /** Chunks so far. */
  @Override
  public int chunks() {
    return lengths.size();
  }

  /** Rows of a chunk. */
  @Override
  public int rows(int chunk) {
    return lengths.get(chunk);
  }

  /** When the rows of a chunk begin, milliseconds of the epoch; not to be changed. */
  @Override
  public long[] startMillis(int chunk) {
    return holding()
        ? held.get(chunk).startMillis()
        : ColumnCodec.decodeWhole(coded(chunk, -1), rows(chunk));
  }

  /** A quantity's values in a chunk; not to be changed. */
  @Override
  public double[] values(int chunk, int quantity) {
    return holding()
        ? held.get(chunk).values()[quantity]
        : ColumnCodec.decode(coded(chunk, quantity), rows(chunk));
  }

  /** A column of a chunk as it is stored; the times are quantity -1. */
  public byte[] coded(int chunk, int quantity) {
    if (!holding()) {
      return parts.get(filed.get(chunk).join()[quantity + 1]);
    }
    LogChunk there = held.get(chunk);
    return quantity < 0
        ? ColumnCodec.encode(there.startMillis())
        : ColumnCodec.encode(there.values()[quantity]);
  }

  /** All values of a quantity in one array; for logs whose rows an array holds. */
  public double[] all(int quantity) {
    double[] all = new double[Math.toIntExact(rows)];
    int at = 0;
    for (int k = 0; k < chunks(); k++) {
      System.arraycopy(values(k, quantity), 0, all, at, rows(k));
      at += rows(k);
    }
    return all;
  }

  /** Lets go of what it holds. */
  @Override
  public void close() {
    filed.forEach(f -> f.exceptionally(e -> new int[0]).join());
    held.clear();
    parts.close();
  }
}
