package fourthwire.store;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.AuditResult;
import fourthwire.audit.NodeResult;
import fourthwire.audit.NodeSummary;
import fourthwire.audit.Progress;
import fourthwire.json.Documents;
import fourthwire.json.StoredNode;
import fourthwire.json.SummaryJson;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.springframework.jdbc.core.BatchPreparedStatementSetter;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.transaction.support.TransactionTemplate;

/** Audits, and each node's result as a document of its own. */
final class JdbcAudits implements AuditRepository {
  private static final String COLUMNS =
      """
      select id, site_id, revision, supply, draws, state, progress, message, asked, engine_version,
        editions, notes from audits
      """;

  private static final double ALMOST_DONE = 0.99;
  private static final int NODES_AT_A_TIME = 256;

  private final JdbcClient jdbc;
  private final JdbcTemplate template;
  private final TransactionTemplate transaction;
  private final Clock clock;
  private final JobRows rows;

  JdbcAudits(JdbcClient jdbc, JdbcTemplate template, TransactionTemplate transaction, Clock clock) {
    this.jdbc = jdbc;
    this.template = template;
    this.transaction = transaction;
    this.clock = clock;
    this.rows = new JobRows(jdbc, "audits");
  }

  @Override
  public long create(long siteId, int surveyRevision, Optional<String> supply, int draws) {
    return Rows.insert(
        jdbc.sql(
                """
                insert into audits (site_id, revision, supply, draws, state, progress, message,
                  cancel_asked, asked, editions, notes)
                values (?, ?, ?, ?, 'queued', 0, 'waiting', false, ?, '[]', '[]')
                """)
            .params(siteId, surveyRevision)
            .param(supply.orElse(null))
            .param(draws)
            .param(Rows.now(clock)));
  }

  @Override
  public Optional<Entry> find(long auditId) {
    return jdbc.sql(COLUMNS + " where id = ?").param(auditId).query(JdbcAudits::entry).optional();
  }

  @Override
  public List<Entry> ofSite(long siteId) {
    return jdbc.sql(COLUMNS + " where site_id = ? order by id desc")
        .param(siteId)
        .query(JdbcAudits::entry)
        .list();
  }

  private static Entry entry(ResultSet row, int number) throws SQLException {
    return new Entry(
        row.getLong("id"),
        row.getLong("site_id"),
        row.getInt("revision"),
        Rows.optionalText(row, "supply"),
        row.getInt("draws"),
        State.valueOf(Rows.text(row, "state").toUpperCase(Locale.ROOT)),
        row.getDouble("progress"),
        Rows.text(row, "message"),
        Rows.instant(row, "asked"),
        Rows.optionalText(row, "engine_version"),
        Documents.texts(Rows.text(row, "editions")),
        Documents.texts(Rows.text(row, "notes")));
  }

  @Override
  public boolean start(long auditId) {
    return jdbc.sql(
                """
                update audits set state = 'running', progress = 0, message = 'started', started = ?
                where id = ? and state in ('queued', 'running') and not cancel_asked
                """)
            .params(Rows.now(clock), auditId)
            .update()
        == 1;
  }

  @Override
  public boolean progress(long auditId, double share, String message) {
    return rows.progress(auditId, share, message);
  }

  @Override
  public boolean cancel(long auditId) {
    int stopped =
        jdbc.sql(
                """
                update audits set state = 'cancelled', message = 'cancelled before it began',
                  cancel_asked = true, ended = ? where id = ? and state = 'queued'
                """)
            .params(Rows.now(clock), auditId)
            .update();
    int asked =
        jdbc.sql("update audits set cancel_asked = true where id = ? and state = 'running'")
            .param(auditId)
            .update();
    return stopped + asked > 0;
  }

  @Override
  public List<Long> recover() {
    jdbc.sql(
            """
            update audits set state = 'cancelled', message = 'cancelled', ended = ?
            where state = 'running' and cancel_asked
            """)
        .param(Rows.now(clock))
        .update();
    return rows.requeue("waiting to run again after a restart");
  }

  @Override
  public void finish(long auditId, AuditResult result, Progress progress) {
    List<StoredRow> nodes = madeReady(result.nodes(), progress);
    transaction.executeWithoutResult(
        status -> {
          if (markDone(auditId, result)) {
            addNodes(auditId, nodes);
          } else {
            end(auditId, State.CANCELLED, "cancelled");
          }
        });
  }

  /** A node as its row holds it. */
  private record StoredRow(String node, byte[] brief, byte[] document) {
    static StoredRow of(NodeResult node) {
      return new StoredRow(
          node.node(), StoredNode.bytes(NodeSummary.of(node)), StoredNode.bytes(node));
    }
  }

  private static List<StoredRow> madeReady(List<NodeResult> nodes, Progress progress) {
    List<StoredRow> rows = new ArrayList<>();
    while (rows.size() < nodes.size()) {
      progress.at(ALMOST_DONE, "Storing the results, node " + (rows.size() + 1));
      int end = Math.min(nodes.size(), rows.size() + NODES_AT_A_TIME);
      rows.addAll(nodes.subList(rows.size(), end).parallelStream().map(StoredRow::of).toList());
    }
    return rows;
  }

  private boolean markDone(long auditId, AuditResult result) {
    return jdbc.sql(
                """
                update audits set state = 'done', progress = 1, message = 'done', ended = ?,
                  engine_version = ?, editions = ?, notes = ?
                where id = ? and state = 'running' and not cancel_asked
                """)
            .params(
                Rows.now(clock),
                result.engineVersion(),
                Documents.ofTexts(result.editions()),
                Documents.ofTexts(result.notes()),
                auditId)
            .update()
        == 1;
  }

  private void addNodes(long auditId, List<StoredRow> nodes) {
    template.batchUpdate(
        """
        insert into audit_nodes (audit_id, position, node, brief, document)
        values (?, ?, ?, ?, ?)
        """,
        new BatchPreparedStatementSetter() {
          @Override
          public void setValues(PreparedStatement insert, int i) throws SQLException {
            StoredRow row = nodes.get(i);
            insert.setLong(1, auditId);
            insert.setInt(2, i);
            insert.setString(3, row.node());
            insert.setBytes(4, row.brief());
            insert.setBytes(5, row.document());
          }

          @Override
          public int getBatchSize() {
            return nodes.size();
          }
        });
  }

  @Override
  public void end(long auditId, State state, String message) {
    jdbc.sql(
            """
            update audits set state = ?, message = ?, ended = ?
            where id = ? and state in ('queued', 'running')
            """)
        .params(state.word(), message, Rows.now(clock), auditId)
        .update();
  }

  @Override
  public List<NodeSummary> summaries(long auditId) {
    return jdbc
        .sql("select brief, summary from audit_nodes where audit_id = ? order by position")
        .param(auditId)
        .query(JdbcAudits::summary)
        .list()
        .stream()
        .sorted(NodeSummary.WORST_FIRST)
        .toList();
  }

  private static NodeSummary summary(ResultSet row, int number) throws SQLException {
    byte[] brief = row.getBytes("brief");
    return brief == null ? SummaryJson.read(Rows.text(row, "summary")) : StoredNode.row(brief);
  }

  @Override
  public List<NodeResult> nodes(long auditId) {
    return jdbc.sql("select document from audit_nodes where audit_id = ? order by position")
        .param(auditId)
        .query(JdbcAudits::node)
        .list();
  }

  @Override
  public Optional<NodeResult> node(long auditId, String node) {
    return jdbc.sql("select document from audit_nodes where audit_id = ? and node = ?")
        .params(auditId, node)
        .query(JdbcAudits::node)
        .optional();
  }

  private static NodeResult node(ResultSet row, int number) throws SQLException {
    return StoredNode.result(row.getBytes("document"));
  }
}
