package fourthwire.store;

import fourthwire.json.MappingJson;
import fourthwire.json.ReadingJson;
import fourthwire.metering.LogResult;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import java.util.function.DoublePredicate;
import java.util.stream.Collectors;
import org.springframework.dao.DuplicateKeyException;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionTemplate;

/** Readings: the files as they came, the mapping they were read by, the result as a document. */
final class JdbcReadings implements ReadingRepository {
  private static final String COLUMNS =
      """
      select r.id, r.site_id, r.meter, m.node, r.sha256, r.added, r.mapping, r.result
      from readings r join meters m on m.site_id = r.site_id and m.name = r.meter
      """;

  private final JdbcClient jdbc;
  private final TransactionTemplate transaction;
  private final FileStore files;
  private final SeriesTables series;
  private final Clock clock;

  JdbcReadings(
      JdbcClient jdbc,
      TransactionTemplate transaction,
      FileStore files,
      SeriesTables series,
      Clock clock) {
    this.series = series;
    this.jdbc = jdbc;
    this.transaction = transaction;
    this.files = files;
    this.clock = clock;
  }

  @Override
  public long add(Addition addition, DoublePredicate goesOn) {
    String sha256 = sha256(addition.files());
    remember(addition.siteId(), addition.meter(), addition.layout(), addition.confirmed());
    return same(addition.siteId(), addition.meter().name(), sha256)
        .orElseGet(() -> store(addition, sha256, goesOn));
  }

  /** Rows in pieces, files in parts; only the last step makes a reading of them. */
  private long store(Addition addition, String sha256, DoublePredicate goesOn) {
    long id = insert(addition);
    List<Long> stored = new ArrayList<>();
    try {
      addition.reading().log().flatMap(LogResult::detail).ifPresent(d -> series.add(id, d, goesOn));
      addition.files().forEach(file -> stored.add(stored(file)));
      transaction.executeWithoutResult(status -> complete(id, sha256, addition.files(), stored));
      return id;
    } catch (DuplicateKeyException meanwhile) {
      takeBack(id, addition.files(), stored, meanwhile);
      return same(addition.siteId(), addition.meter().name(), sha256).orElseThrow(() -> meanwhile);
    } catch (RuntimeException | Error e) {
      takeBack(id, addition.files(), stored, e);
      throw e;
    }
  }

  /** Deletes what was stored of a reading that can't be whole; else the next start does. */
  private void takeBack(long id, List<RawFile> raw, List<Long> stored, Throwable why) {
    try {
      series.deleteHalfStored(id);
      for (int k = 0; k < stored.size(); k++) {
        if (!(raw.get(k) instanceof StoredRawFile)) {
          files.delete(stored.subList(k, k + 1));
        }
      }
    } catch (RuntimeException again) {
      why.addSuppressed(again);
    }
  }

  @Override
  public void remember(
      long siteId, MeterRef meter, String layout, Optional<ReadingMapping> confirmed) {
    transaction.executeWithoutResult(
        status -> {
          putMeter(siteId, meter);
          confirmed.ifPresent(mapping -> putLayout(siteId, meter.name(), layout, mapping));
        });
  }

  /** Of one file its own; of several, of their digests in name order. */
  private static String sha256(List<RawFile> files) {
    if (files.size() == 1) {
      return files.get(0).sha256();
    }
    String digests =
        files.stream()
            .sorted(Comparator.comparing(RawFile::name))
            .map(RawFile::sha256)
            .collect(Collectors.joining());
    MessageDigest digest = FileStore.sha256();
    return HexFormat.of().formatHex(digest.digest(digests.getBytes(StandardCharsets.US_ASCII)));
  }

  private Optional<Long> same(long siteId, String meter, String sha256) {
    return jdbc.sql("select id from readings where site_id = ? and meter = ? and sha256 = ?")
        .params(siteId, meter, sha256)
        .query(Long.class)
        .optional();
  }

  @Override
  public Optional<Entry> same(long siteId, String meter, List<RawFile> same) {
    return same(siteId, meter, sha256(same)).flatMap(this::find);
  }

  /**
   * Made and committed at once: two files of a new meter may come at the same time, and the rows of
   * a large one take long to store.
   */
  private void putMeter(long siteId, MeterRef meter) {
    jdbc.sql("insert into meters (site_id, name, node) values (?, ?, ?) on conflict do nothing")
        .params(siteId, meter.name(), meter.node())
        .update();
    jdbc.sql("update meters set node = ? where site_id = ? and name = ?")
        .params(meter.node(), siteId, meter.name())
        .update();
  }

  private void putLayout(long siteId, String meter, String layout, ReadingMapping confirmed) {
    String mapping = MappingJson.write(confirmed).toString();
    jdbc.sql(
            """
            insert into meter_layouts (site_id, meter, layout, mapping) values (?, ?, ?, ?)
            on conflict do nothing
            """)
        .params(siteId, meter, layout, mapping)
        .update();
    jdbc.sql(
            """
            update meter_layouts set mapping = ?
            where site_id = ? and meter = ? and layout = ?
            """)
        .params(mapping, siteId, meter, layout)
        .update();
  }

  private long insert(Addition addition) {
    return Rows.insert(
        jdbc.sql(
                """
                insert into readings (site_id, meter, added, mapping, result)
                values (?, ?, ?, ?, ?)
                """)
            .params(
                addition.siteId(),
                addition.meter().name(),
                Rows.now(clock),
                MappingJson.write(addition.mapping()).toString(),
                ReadingJson.write(addition.reading()).toString()));
  }

  private void complete(long id, String sha256, List<RawFile> raw, List<Long> stored) {
    for (int k = 0; k < raw.size(); k++) {
      jdbc.sql(
              "insert into reading_files (reading_id, position, name, file_id) values (?, ?, ?, ?)")
          .params(id, k, raw.get(k).name(), stored.get(k))
          .update();
    }
    int there = jdbc.sql("update readings set sha256 = ? where id = ?").params(sha256, id).update();
    if (there == 0) {
      throw new IllegalStateException("its site was deleted while it was being stored");
    }
  }

  /** A file that an upload brought into the database stays where it is. */
  private long stored(RawFile file) {
    if (file instanceof StoredRawFile there) {
      return there.stored().id();
    }
    try (InputStream in = file.open()) {
      return files.save(in).id();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public List<Entry> ofSite(long siteId) {
    return jdbc.sql(COLUMNS + " where r.site_id = ? and r.sha256 is not null order by r.id desc")
        .param(siteId)
        .query(this::entry)
        .list();
  }

  @Override
  public Optional<Entry> find(long readingId) {
    return jdbc.sql(COLUMNS + " where r.id = ? and r.sha256 is not null")
        .param(readingId)
        .query(this::entry)
        .optional();
  }

  private Entry entry(ResultSet row, int number) throws SQLException {
    long id = row.getLong("id");
    return new Entry(
        id,
        row.getLong("site_id"),
        new MeterRef(Rows.text(row, "meter"), Rows.text(row, "node")),
        fileNames(id),
        Rows.text(row, "sha256"),
        Rows.instant(row, "added"),
        MappingJson.read(Rows.text(row, "mapping")),
        ReadingJson.read(Rows.text(row, "result")));
  }

  private List<String> fileNames(long readingId) {
    return jdbc.sql("select name from reading_files where reading_id = ? order by position")
        .param(readingId)
        .query(String.class)
        .list();
  }

  @Override
  public boolean delete(long readingId) {
    List<Long> owned = new ArrayList<>();
    series.delete(readingId);
    boolean gone =
        Boolean.TRUE.equals(
            transaction.execute(
                status -> {
                  owned.addAll(
                      jdbc.sql("select file_id from reading_files where reading_id = ?")
                          .param(readingId)
                          .query(Long.class)
                          .list());
                  return jdbc.sql("delete from readings where id = ?").param(readingId).update()
                      == 1;
                }));
    files.delete(owned);
    return gone;
  }

  @Override
  public Optional<ReadingMapping> mapping(long siteId, String meter, String layout) {
    return jdbc.sql(
            "select mapping from meter_layouts where site_id = ? and meter = ? and layout = ?")
        .params(siteId, meter, layout)
        .query(String.class)
        .optional()
        .map(MappingJson::read);
  }

  @Override
  public List<MeterRef> meters(long siteId) {
    return jdbc.sql("select name, node from meters where site_id = ? order by name")
        .param(siteId)
        .query((row, number) -> new MeterRef(Rows.text(row, "name"), Rows.text(row, "node")))
        .list();
  }
}
