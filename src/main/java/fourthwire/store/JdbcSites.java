package fourthwire.store;

import fourthwire.json.Documents;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import fourthwire.site.SurveyCodec;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalInt;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionTemplate;

/** Sites and the revisions of their surveys, each as its canonical zip. */
final class JdbcSites implements SiteRepository {
  /** Every file that belongs to a site; ids of one table never stand twice. */
  private static final String FILES_OF_SITE =
      """
      select file_id from survey_revisions where site_id = :site
      union select f.file_id from reading_files f
        join readings r on r.id = f.reading_id where r.site_id = :site
      union select f.file_id from reading_upload_files f
        join reading_uploads u on u.id = f.upload_id where u.site_id = :site
      """;

  private static final int NODES_AT_ONCE = 500;

  /** Surveys kept decoded. */
  private static final int MOST_DECODED = 4;

  private final JdbcClient jdbc;
  private final TransactionTemplate transaction;
  private final FileStore files;
  private final SeriesTables series;
  private final SurveyCodec codec;

  /** The surveys used last, by the id of their file, which never changes. */
  private final Map<Long, Survey> decoded =
      Collections.synchronizedMap(
          new LinkedHashMap<>(16, 0.75f, true) {
            @Override
            protected boolean removeEldestEntry(Map.Entry<Long, Survey> eldest) {
              return size() > MOST_DECODED;
            }
          });

  private final Clock clock;

  JdbcSites(
      JdbcClient jdbc,
      TransactionTemplate transaction,
      FileStore files,
      SeriesTables series,
      SurveyCodec codec,
      Clock clock) {
    this.jdbc = jdbc;
    this.transaction = transaction;
    this.files = files;
    this.series = series;
    this.codec = codec;
    this.clock = clock;
  }

  @Override
  public long create(Survey survey, List<String> warnings) {
    byte[] zip = codec.encode(survey);
    return Objects.requireNonNull(
        transaction.execute(
            status -> {
              long id =
                  Rows.insert(
                      jdbc.sql(
                              "insert into sites (name, latest_revision, created) values (?, 1, ?)")
                          .params(survey.settings().name(), Rows.now(clock)));
              addRevision(id, 1, zip, warnings);
              return id;
            }));
  }

  @Override
  public OptionalInt revise(long siteId, Survey survey, List<String> warnings) {
    byte[] zip = codec.encode(survey);
    return Objects.requireNonNull(
        transaction.execute(
            status -> {
              if (!raise(siteId, survey.settings().name())) {
                return OptionalInt.empty();
              }
              int revision = find(siteId).orElseThrow().latestRevision();
              addRevision(siteId, revision, zip, warnings);
              return OptionalInt.of(revision);
            }));
  }

  /** Raises the latest revision; the row stays locked until the transaction ends. */
  private boolean raise(long siteId, String name) {
    return jdbc.sql("update sites set latest_revision = latest_revision + 1, name = ? where id = ?")
            .params(name, siteId)
            .update()
        == 1;
  }

  private void addRevision(long siteId, int revision, byte[] zip, List<String> warnings) {
    jdbc.sql(
            """
            insert into survey_revisions (site_id, revision, file_id, warnings, created)
            values (?, ?, ?, ?, ?)
            """)
        .params(
            siteId, revision, files.save(zip).id(), Documents.ofTexts(warnings), Rows.now(clock))
        .update();
  }

  @Override
  public List<Entry> list() {
    return jdbc.sql("select id, name, latest_revision from sites order by name, id")
        .query(JdbcSites::entry)
        .list();
  }

  @Override
  public Optional<Entry> find(long siteId) {
    return jdbc.sql("select id, name, latest_revision from sites where id = ?")
        .param(siteId)
        .query(JdbcSites::entry)
        .optional();
  }

  private static Entry entry(ResultSet row, int number) throws SQLException {
    return new Entry(row.getLong("id"), Rows.text(row, "name"), row.getInt("latest_revision"));
  }

  @Override
  public List<Revision> revisions(long siteId) {
    return jdbc.sql(
            """
            select r.revision, r.created, f.sha256, r.warnings from survey_revisions r
            join stored_files f on f.id = r.file_id
            where r.site_id = ? order by r.revision desc
            """)
        .param(siteId)
        .query(
            (row, number) ->
                new Revision(
                    row.getInt("revision"),
                    Rows.instant(row, "created"),
                    Rows.text(row, "sha256"),
                    Documents.texts(Rows.text(row, "warnings"))))
        .list();
  }

  @Override
  public Survey survey(long siteId, int revision) {
    long file =
        jdbc.sql("select file_id from survey_revisions where site_id = ? and revision = ?")
            .params(siteId, revision)
            .query(Long.class)
            .single();
    return decoded.computeIfAbsent(file, id -> codec.decode(files.bytes(id)));
  }

  /**
   * What is large goes first and in pieces, as a database keeps what it may have to undo: rows of
   * logs, then results of audits; the files last, when nothing refers to them.
   */
  @Override
  public boolean delete(long siteId) {
    jdbc.sql("update reading_uploads set cancel_asked = true where site_id = ?")
        .param(siteId)
        .update();
    ids("select id from readings where site_id = ?", siteId).forEach(series::delete);
    ids("select id from audits where site_id = ?", siteId).forEach(this::deleteNodes);
    List<Long> owned = new ArrayList<>();
    boolean gone =
        Boolean.TRUE.equals(
            transaction.execute(
                status -> {
                  owned.addAll(
                      jdbc.sql(FILES_OF_SITE).param("site", siteId).query(Long.class).list());
                  return jdbc.sql("delete from sites where id = ?").param(siteId).update() == 1;
                }));
    files.delete(owned);
    return gone;
  }

  private List<Long> ids(String sql, long siteId) {
    return jdbc.sql(sql).param(siteId).query(Long.class).list();
  }

  private void deleteNodes(long auditId) {
    String nodes = "delete from audit_nodes where audit_id = ? and position >= ? and position < ?";
    int from = 0;
    while (jdbc.sql(nodes).params(auditId, from, from + NODES_AT_ONCE).update() > 0) {
      from += NODES_AT_ONCE;
    }
  }
}
