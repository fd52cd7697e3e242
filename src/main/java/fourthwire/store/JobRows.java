package fourthwire.store;

import java.util.List;
import org.springframework.jdbc.core.simple.JdbcClient;

/** What audits and uploads share: rows that are queued, run and end. */
final class JobRows {
  private final JdbcClient jdbc;
  private final String table;

  /** Of this table of ours, with its columns state, progress, message and cancel_asked. */
  JobRows(JdbcClient jdbc, String table) {
    this.jdbc = jdbc;
    this.table = table;
  }

  /** Notes progress of a running one; false if it does not run or a cancel was asked for. */
  boolean progress(long id, double share, String message) {
    String running = " where id = ? and state = 'running' and not cancel_asked";
    return jdbc.sql("update " + table + " set progress = ?, message = ?" + running)
            .params(share, message, id)
            .update()
        == 1;
  }

  /** Queues again what was running; gives every queued one, oldest first. */
  List<Long> requeue(String message) {
    jdbc.sql(
            "update "
                + table
                + " set state = 'queued', progress = 0, message = ? where state = 'running'")
        .param(message)
        .update();
    return jdbc.sql("select id from " + table + " where state = 'queued' order by id")
        .query(Long.class)
        .list();
  }
}
