package fourthwire.store;

import fourthwire.json.MappingJson;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository.MeterRef;
import fourthwire.metering.ReadingUploads;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionTemplate;

/** Uploads of readings, their files kept until they have been read. */
final class JdbcUploads implements ReadingUploads {
  private static final String COLUMNS =
      """
      select id, site_id, meter, node, mapping, state, progress, message, asked, reading_id
      from reading_uploads
      """;

  private final JdbcClient jdbc;
  private final TransactionTemplate transaction;
  private final FileStore files;
  private final SeriesTables series;
  private final Clock clock;
  private final JobRows rows;

  JdbcUploads(
      JdbcClient jdbc,
      TransactionTemplate transaction,
      FileStore files,
      SeriesTables series,
      Clock clock) {
    this.jdbc = jdbc;
    this.transaction = transaction;
    this.files = files;
    this.series = series;
    this.clock = clock;
    this.rows = new JobRows(jdbc, "reading_uploads");
  }

  @Override
  public long create(
      long siteId,
      MeterRef meter,
      List<? extends RawFile> uploaded,
      Optional<ReadingMapping> mapping) {
    return create(siteId, meter, uploaded, mapping, State.QUEUED);
  }

  @Override
  public long createWaiting(long siteId, MeterRef meter, List<? extends RawFile> uploaded) {
    return create(siteId, meter, uploaded, Optional.empty(), State.WAITING);
  }

  /** The files come first, in pieces: they may be larger than what a transaction should hold. */
  private long create(
      long siteId,
      MeterRef meter,
      List<? extends RawFile> uploaded,
      Optional<ReadingMapping> mapping,
      State state) {
    List<Long> saved = new ArrayList<>();
    try {
      for (RawFile file : uploaded) {
        saved.add(save(file));
      }
      return Objects.requireNonNull(
          transaction.execute(
              status -> {
                long id = insert(siteId, meter, mapping, state);
                for (int i = 0; i < uploaded.size(); i++) {
                  addFile(id, i, uploaded.get(i).name(), saved.get(i));
                }
                return id;
              }));
    } catch (RuntimeException | Error e) {
      files.delete(saved);
      throw e;
    }
  }

  private long save(RawFile file) {
    try (InputStream in = file.open()) {
      return files.save(in).id();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public long createDone(long siteId, MeterRef meter, long readingId) {
    return Objects.requireNonNull(
        transaction.execute(
            status -> {
              long id = insert(siteId, meter, Optional.empty(), State.RUNNING);
              finish(id, readingId);
              return id;
            }));
  }

  @Override
  public boolean confirm(long uploadId, ReadingMapping mapping) {
    return jdbc.sql(
                """
                update reading_uploads set state = 'queued', mapping = ?
                where id = ? and state = 'waiting'
                """)
            .params(MappingJson.write(mapping).toString(), uploadId)
            .update()
        == 1;
  }

  @Override
  public List<Entry> waiting(long siteId) {
    return jdbc.sql(COLUMNS + " where site_id = ? and state = 'waiting' order by id")
        .param(siteId)
        .query(JdbcUploads::entry)
        .list();
  }

  private long insert(long siteId, MeterRef meter, Optional<ReadingMapping> mapping, State state) {
    return Rows.insert(
        jdbc.sql(
                """
                insert into reading_uploads (site_id, meter, node, mapping, state, progress,
                  message, cancel_asked, asked)
                values (?, ?, ?, ?, ?, 0, 'waiting', false, ?)
                """)
            .params(siteId, meter.name(), meter.node())
            .param(mapping.map(m -> MappingJson.write(m).toString()).orElse(null))
            .param(state.word())
            .param(Rows.now(clock)));
  }

  private void addFile(long uploadId, int position, String name, long fileId) {
    jdbc.sql(
            """
            insert into reading_upload_files (upload_id, position, name, file_id)
            values (?, ?, ?, ?)
            """)
        .params(uploadId, position, name, fileId)
        .update();
  }

  @Override
  public Optional<Entry> find(long uploadId) {
    return jdbc.sql(COLUMNS + " where id = ?").param(uploadId).query(JdbcUploads::entry).optional();
  }

  private static Entry entry(ResultSet row, int number) throws SQLException {
    return new Entry(
        row.getLong("id"),
        row.getLong("site_id"),
        new MeterRef(Rows.text(row, "meter"), Rows.text(row, "node")),
        Rows.optionalText(row, "mapping").map(MappingJson::read),
        State.valueOf(Rows.text(row, "state").toUpperCase(Locale.ROOT)),
        row.getDouble("progress"),
        Rows.text(row, "message"),
        Rows.instant(row, "asked"),
        Rows.optionalLong(row, "reading_id"));
  }

  @Override
  public List<RawFile> files(long uploadId) {
    return jdbc.sql(
            """
            select u.name, f.id, f.byte_count, f.sha256 from reading_upload_files u
            join stored_files f on f.id = u.file_id where u.upload_id = ? order by u.position
            """)
        .param(uploadId)
        .query(
            (row, number) ->
                (RawFile)
                    new StoredRawFile(
                        Rows.text(row, "name"),
                        new FileStore.Stored(
                            row.getLong("id"), row.getLong("byte_count"), Rows.text(row, "sha256")),
                        files))
        .list();
  }

  @Override
  public boolean start(long uploadId) {
    return jdbc.sql(
                """
                update reading_uploads set state = 'running', progress = 0, message = 'started'
                where id = ? and state in ('queued', 'running') and not cancel_asked
                """)
            .param(uploadId)
            .update()
        == 1;
  }

  @Override
  public boolean progress(long uploadId, double share, String message) {
    return rows.progress(uploadId, share, message);
  }

  @Override
  public boolean cancel(long uploadId) {
    boolean asked =
        jdbc.sql(
                    """
                    update reading_uploads set cancel_asked = true
                    where id = ? and state in ('waiting', 'queued', 'running')
                    """)
                .param(uploadId)
                .update()
            == 1;
    find(uploadId)
        .filter(u -> u.state() == State.QUEUED || u.state() == State.WAITING)
        .ifPresent(u -> end(uploadId, State.CANCELLED, "cancelled before it began"));
    return asked;
  }

  @Override
  public void finish(long uploadId, long readingId) {
    List<Long> left = new ArrayList<>();
    transaction.executeWithoutResult(
        status -> {
          jdbc.sql(
                  """
                  update reading_uploads set state = 'done', progress = 1, message = 'done',
                    reading_id = ? where id = ? and state = 'running'
                  """)
              .params(readingId, uploadId)
              .update();
          left.addAll(letGo(uploadId));
        });
    files.delete(left);
  }

  @Override
  public void end(long uploadId, State state, String message) {
    List<Long> left = new ArrayList<>();
    transaction.executeWithoutResult(
        status -> {
          jdbc.sql(
                  """
                  update reading_uploads set state = ?, message = ?
                  where id = ? and state in ('waiting', 'queued', 'running')
                  """)
              .params(state.word(), message, uploadId)
              .update();
          left.addAll(letGo(uploadId));
        });
    files.delete(left);
  }

  /** Gives the files that are left; what became a reading's file is the reading's. */
  private List<Long> letGo(long uploadId) {
    List<Long> owned =
        jdbc.sql(
                """
                select u.file_id from reading_upload_files u where u.upload_id = ?
                and not exists (select 1 from reading_files r where r.file_id = u.file_id)
                """)
            .param(uploadId)
            .query(Long.class)
            .list();
    jdbc.sql("delete from reading_upload_files where upload_id = ?").param(uploadId).update();
    return owned;
  }

  @Override
  public List<Long> recover() {
    jdbc.sql("select id from reading_uploads where state = 'running' and cancel_asked")
        .query(Long.class)
        .list()
        .forEach(id -> end(id, State.CANCELLED, "cancelled"));
    series.deleteHalfStored();
    files.deleteUnowned();
    return rows.requeue("waiting to be read again after a restart");
  }
}
