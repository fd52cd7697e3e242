package fourthwire.store;

import fourthwire.metering.series.ColumnCodec;
import fourthwire.metering.series.Series;
import java.util.List;
import org.springframework.jdbc.core.simple.JdbcClient;

/** The rows of a stored log, a column of a chunk read when it is asked for. */
final class StoredSeries implements Series {
  private static final int TIMES = -1;

  private final JdbcClient jdbc;
  private final long readingId;
  private final List<String> quantities;
  private final int[] rows;

  StoredSeries(JdbcClient jdbc, long readingId, List<String> quantities) {
    this.jdbc = jdbc;
    this.readingId = readingId;
    this.quantities = List.copyOf(quantities);
    this.rows =
        jdbc
            .sql(
                """
                select row_count from series_chunks where reading_id = ? and quantity = ?
                order by chunk
                """)
            .params(readingId, TIMES)
            .query(Integer.class)
            .list()
            .stream()
            .mapToInt(n -> n)
            .toArray();
  }

  @Override
  public List<String> quantities() {
    return quantities;
  }

  @Override
  public long rows() {
    long all = 0;
    for (int n : rows) {
      all += n;
    }
    return all;
  }

  @Override
  public int chunks() {
    return rows.length;
  }

  @Override
  public int rows(int chunk) {
    return rows[chunk];
  }

  @Override
  public long[] startMillis(int chunk) {
    return ColumnCodec.decodeWhole(coded(chunk, TIMES), rows[chunk]);
  }

  @Override
  public double[] values(int chunk, int quantity) {
    return ColumnCodec.decode(coded(chunk, quantity), rows[chunk]);
  }

  private byte[] coded(int chunk, int quantity) {
    return jdbc.sql(
            "select bytes from series_chunks where reading_id = ? and quantity = ? and chunk = ?")
        .params(readingId, quantity, chunk)
        .query(byte[].class)
        .single();
  }
}
