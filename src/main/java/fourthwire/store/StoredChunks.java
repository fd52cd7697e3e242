package fourthwire.store;

import fourthwire.metering.reduce.LogSpan;
import fourthwire.metering.series.ColumnCodec;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.List;
import java.util.Objects;
import org.springframework.jdbc.core.simple.JdbcClient;

/** Reads the chunks of one log, only those that are asked for; the times once. Not thread-safe. */
final class StoredChunks implements LogSpan.Source {
  private static final int TIMES = -1;

  private final JdbcClient jdbc;
  private final long readingId;
  private List<long[]> times = List.of();

  StoredChunks(JdbcClient jdbc, long readingId) {
    this.jdbc = jdbc;
    this.readingId = readingId;
  }

  @Override
  public List<long[]> times() {
    if (times.isEmpty()) {
      times = readTimes();
    }
    return times;
  }

  private List<long[]> readTimes() {
    return jdbc.sql(
            """
            select row_count, bytes from series_chunks where reading_id = ? and quantity = ?
            order by chunk
            """)
        .params(readingId, TIMES)
        .query((row, n) -> ColumnCodec.decodeWhole(bytes(row), row.getInt("row_count")))
        .list();
  }

  @Override
  public void values(String quantity, int first, int last, LogSpan.ChunkTaker taker) {
    jdbc.sql(
            """
            select c.chunk, c.row_count, c.bytes
            from series_chunks c join series_quantities q
              on q.reading_id = c.reading_id and q.quantity = c.quantity
            where q.reading_id = ? and q.name = ? and c.chunk between ? and ?
            order by c.chunk
            """)
        .params(readingId, quantity, first, last)
        .query(
            row -> {
              taker.take(
                  row.getInt("chunk"), ColumnCodec.decode(bytes(row), row.getInt("row_count")));
            });
  }

  private static byte[] bytes(ResultSet row) throws SQLException {
    return Objects.requireNonNull(row.getBytes("bytes"));
  }
}
