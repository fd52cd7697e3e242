package fourthwire.store;

import fourthwire.json.CorrectionJson;
import fourthwire.metering.Correction;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.metering.log.CleanedLog;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionTemplate;

/** Corrections of logs and the second set of statistics; the reading's row is their lock. */
final class JdbcCorrections implements CorrectionRepository {
  private final JdbcClient jdbc;
  private final JdbcTemplate template;
  private final TransactionTemplate transaction;
  private final Clock clock;

  JdbcCorrections(
      JdbcClient jdbc, JdbcTemplate template, TransactionTemplate transaction, Clock clock) {
    this.jdbc = jdbc;
    this.template = template;
    this.transaction = transaction;
    this.clock = clock;
  }

  @Override
  public OptionalLong add(
      long readingId,
      int finding,
      Correction correction,
      Function<List<Correction>, CleanedLog> make) {
    return Objects.requireNonNull(
        transaction.execute(
            status -> {
              lock(readingId);
              if (ofReading(readingId).stream()
                  .anyMatch(e -> e.holds() && e.finding() == finding)) {
                return OptionalLong.empty();
              }
              long id = insert(readingId, finding, correction);
              clean(readingId, make);
              return OptionalLong.of(id);
            }));
  }

  private void lock(long readingId) {
    jdbc.sql("select id from readings where id = ? for update")
        .param(readingId)
        .query(Long.class)
        .optional();
  }

  private long insert(long readingId, int finding, Correction correction) {
    return Rows.insert(
        jdbc.sql(
                """
                insert into reading_corrections (reading_id, finding, correction, made)
                values (?, ?, ?, ?)
                """)
            .params(
                readingId, finding, CorrectionJson.write(correction).toString(), Rows.now(clock)));
  }

  @Override
  public boolean undo(long readingId, long id, Function<List<Correction>, CleanedLog> make) {
    return Boolean.TRUE.equals(
        transaction.execute(
            status -> {
              lock(readingId);
              int undone =
                  jdbc.sql(
                          """
                          update reading_corrections set undone = ?
                          where id = ? and reading_id = ? and undone is null
                          """)
                      .params(Rows.now(clock), id, readingId)
                      .update();
              if (undone == 1) {
                clean(readingId, make);
              }
              return undone == 1;
            }));
  }

  /** Forms the second set anew; without corrections there is none. */
  private void clean(long readingId, Function<List<Correction>, CleanedLog> make) {
    jdbc.sql("delete from cleaned_logs where reading_id = ?").param(readingId).update();
    List<Correction> holding =
        ofReading(readingId).stream().filter(Entry::holds).map(Entry::correction).toList();
    if (!holding.isEmpty()) {
      store(readingId, make.apply(holding));
    }
  }

  private void store(long readingId, CleanedLog made) {
    jdbc.sql("insert into cleaned_logs (reading_id, row_count, result) values (?, ?, ?)")
        .params(readingId, made.rows(), CorrectionJson.write(made.log()).toString())
        .update();
    List<Object[]> rows = new ArrayList<>();
    for (int q = 0; q < made.names().size(); q++) {
      rows.add(
          new Object[] {
            readingId,
            q,
            made.names().get(q),
            made.statistics().firstWeek(),
            made.statistics().weeks(),
            SeriesTables.coded(made.statistics().quantities().get(q))
          });
    }
    template.batchUpdate(
        """
        insert into cleaned_quantities (reading_id, quantity, name, first_week, weeks, statistics)
        values (?, ?, ?, ?, ?, ?)
        """,
        rows);
  }

  @Override
  public List<Entry> ofReading(long readingId) {
    return jdbc.sql(
            """
            select id, reading_id, finding, correction, made, undone from reading_corrections
            where reading_id = ? order by id
            """)
        .param(readingId)
        .query(JdbcCorrections::entry)
        .list();
  }

  private static Entry entry(ResultSet row, int number) throws SQLException {
    @Nullable OffsetDateTime undone = row.getObject("undone", OffsetDateTime.class);
    return new Entry(
        row.getLong("id"),
        row.getLong("reading_id"),
        row.getInt("finding"),
        CorrectionJson.read(Rows.text(row, "correction")),
        Rows.instant(row, "made"),
        undone == null ? Optional.<Instant>empty() : Optional.of(undone.toInstant()));
  }

  @Override
  public Optional<Cleaned> cleaned(long readingId) {
    return jdbc.sql("select row_count, result from cleaned_logs where reading_id = ?")
        .param(readingId)
        .query(
            (row, number) ->
                new Cleaned(row.getLong("row_count"), CorrectionJson.log(Rows.text(row, "result"))))
        .optional();
  }
}
