package fourthwire.store;

import fourthwire.metering.LogResult;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.reduce.LogSpan;
import fourthwire.metering.series.ColumnCodec;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.QuantityStatistics;
import fourthwire.metering.series.Series;
import fourthwire.metering.series.SeriesStatistics;
import fourthwire.metering.series.WeekClock;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.CancellationException;
import java.util.function.DoublePredicate;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionTemplate;

/** The rows of logs as coded columns, written a chunk of all columns at a time. */
final class SeriesTables implements SeriesRepository {
  private static final int TIMES = -1;

  /** Columns of chunks stored or deleted at once: a megabyte at most, unless a chunk has more. */
  private static final int COLUMNS_AT_ONCE = 32;

  private final JdbcClient jdbc;
  private final JdbcTemplate template;
  private final TransactionTemplate transaction;

  SeriesTables(JdbcClient jdbc, JdbcTemplate template, TransactionTemplate transaction) {
    this.jdbc = jdbc;
    this.template = template;
    this.transaction = transaction;
  }

  /**
   * Stores a log's rows, a few chunks at a time, as a database keeps what it may have to undo. What
   * a failure leaves is the caller's to delete.
   *
   * @param goesOn is told the share stored; false lets go of the rest
   * @throws CancellationException where it was false
   */
  void add(long readingId, LogResult.Detail detail, DoublePredicate goesOn) {
    LogSeries series = detail.series();
    transaction.executeWithoutResult(
        status -> addQuantities(readingId, series.quantities(), detail.statistics()));
    int atOnce = Math.max(1, COLUMNS_AT_ONCE / (series.quantities().size() + 1));
    for (int chunk = 0; chunk < series.chunks(); chunk += atOnce) {
      if (!goesOn.test((double) chunk / series.chunks())) {
        throw new CancellationException("stopped while its rows were stored");
      }
      int first = chunk;
      int end = Math.min(series.chunks(), chunk + atOnce);
      transaction.executeWithoutResult(
          status -> IntStream.range(first, end).forEach(each -> addChunk(readingId, series, each)));
    }
  }

  private void addQuantities(long readingId, List<String> names, SeriesStatistics statistics) {
    List<Object[]> rows = new ArrayList<>();
    for (int q = 0; q < names.size(); q++) {
      rows.add(
          new Object[] {
            readingId,
            q,
            names.get(q),
            statistics.firstWeek(),
            statistics.weeks(),
            coded(statistics.quantities().get(q))
          });
    }
    template.batchUpdate(
        """
        insert into series_quantities (reading_id, quantity, name, first_week, weeks, statistics)
        values (?, ?, ?, ?, ?, ?)
        """,
        rows);
  }

  static byte[] coded(QuantityStatistics s) {
    DoubleStream counts = Arrays.stream(s.weekCount()).asDoubleStream();
    DoubleStream percentiles =
        DoubleStream.concat(Arrays.stream(s.weekP95()), Arrays.stream(s.weekP99()));
    return ColumnCodec.encode(
        DoubleStream.concat(
                DoubleStream.concat(counts, percentiles), Arrays.stream(s.hourOfWeekMean()))
            .toArray());
  }

  /** Columns are coded on all processors, for the database takes them one after the other. */
  private void addChunk(long readingId, LogSeries series, int chunk) {
    List<Object[]> rows =
        IntStream.range(TIMES, series.quantities().size())
            .parallel()
            .mapToObj(
                q -> new Object[] {readingId, q, chunk, series.rows(chunk), series.coded(chunk, q)})
            .toList();
    template.batchUpdate(
        """
        insert into series_chunks (reading_id, quantity, chunk, row_count, bytes)
        values (?, ?, ?, ?, ?)
        """,
        rows);
  }

  /**
   * Removes a log's rows, some chunks of a quantity at a time: outside a transaction no more than
   * that is then kept for an undo, however long the log.
   */
  void delete(long readingId) {
    int most =
        jdbc.sql("select coalesce(max(quantity), -2) from series_quantities where reading_id = ?")
            .param(readingId)
            .query(Integer.class)
            .single();
    for (int q = TIMES; q <= most; q++) {
      delete(readingId, q);
    }
  }

  /** Deletes readings whose rows are not all there: only while nothing is being stored. */
  void deleteHalfStored() {
    jdbc.sql("select id from readings where sha256 is null")
        .query(Long.class)
        .list()
        .forEach(this::deleteHalfStored);
  }

  /** Deletes a reading that was not stored whole. */
  void deleteHalfStored(long readingId) {
    delete(readingId);
    jdbc.sql("delete from readings where id = ? and sha256 is null").param(readingId).update();
  }

  private void delete(long readingId, int quantity) {
    String chunks =
        """
        delete from series_chunks
        where reading_id = ? and quantity = ? and chunk >= ? and chunk < ?
        """;
    int from = 0;
    while (jdbc.sql(chunks).params(readingId, quantity, from, from + COLUMNS_AT_ONCE).update()
        > 0) {
      from += COLUMNS_AT_ONCE;
    }
  }

  @Override
  public List<String> quantities(long readingId) {
    return jdbc.sql("select name from series_quantities where reading_id = ? order by quantity")
        .param(readingId)
        .query(String.class)
        .list();
  }

  private Optional<Integer> number(long readingId, String quantity) {
    return jdbc.sql("select quantity from series_quantities where reading_id = ? and name = ?")
        .params(readingId, quantity)
        .query(Integer.class)
        .optional();
  }

  @Override
  public Optional<Column> column(long readingId, String quantity) {
    return number(readingId, quantity).map(q -> new Column(times(readingId), values(readingId, q)));
  }

  private record Coded(int rows, byte[] bytes) {}

  private List<Coded> chunks(long readingId, int quantity) {
    return jdbc.sql(
            """
            select row_count, bytes from series_chunks where reading_id = ? and quantity = ?
            order by chunk
            """)
        .params(readingId, quantity)
        .query(
            (row, number) ->
                new Coded(row.getInt("row_count"), Objects.requireNonNull(row.getBytes("bytes"))))
        .list();
  }

  private long[] times(long readingId) {
    return chunks(readingId, TIMES).stream()
        .flatMapToLong(c -> Arrays.stream(ColumnCodec.decodeWhole(c.bytes(), c.rows())))
        .toArray();
  }

  private double[] values(long readingId, int quantity) {
    return chunks(readingId, quantity).stream()
        .flatMapToDouble(c -> Arrays.stream(ColumnCodec.decode(c.bytes(), c.rows())))
        .toArray();
  }

  @Override
  public LogSpan.Source chunks(long readingId) {
    return new StoredChunks(jdbc, readingId);
  }

  @Override
  public Optional<Series> series(long readingId) {
    List<String> names = quantities(readingId);
    return names.isEmpty()
        ? Optional.empty()
        : Optional.of(new StoredSeries(jdbc, readingId, names));
  }

  @Override
  public Optional<Weeks> weeks(long readingId, String quantity) {
    return jdbc.sql(
            """
            select first_week, weeks, statistics from series_quantities
            where reading_id = ? and name = ?
            """)
        .params(readingId, quantity)
        .query(SeriesTables::weeks)
        .optional();
  }

  private static Weeks weeks(ResultSet row, int number) throws SQLException {
    int n = row.getInt("weeks");
    double[] all =
        ColumnCodec.decode(
            Objects.requireNonNull(row.getBytes("statistics")), 3 * n + WeekClock.HOURS);
    return new Weeks(
        row.getLong("first_week"),
        Arrays.copyOfRange(all, 0, n),
        Arrays.copyOfRange(all, n, 2 * n),
        Arrays.copyOfRange(all, 2 * n, 3 * n),
        Arrays.copyOfRange(all, 3 * n, all.length));
  }
}
