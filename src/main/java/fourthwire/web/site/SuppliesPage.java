package fourthwire.web.site;

import fourthwire.web.support.Verdict;
import java.util.List;
import java.util.OptionalLong;

/**
 * The same site on each of its supplies, board by board.
 *
 * @param supplies one column of figures each, the normal one first
 * @param rows boards and transformers, as the normal supply feeds them
 */
record SuppliesPage(long siteId, String siteName, List<Column> supplies, List<Row> rows) {

  /**
   * A supply.
   *
   * @param audit the newest finished one on it; empty: none yet
   * @param verdict how many findings to act on and to watch, in words; empty without an audit
   */
  record Column(String supply, OptionalLong audit, String verdict) {}

  /** A node. */
  record Row(String node, int depth, List<Cells> cells) {}

  /**
   * A node on one supply.
   *
   * @param unsupplied why there are no figures; else empty
   */
  record Cells(
      OptionalLong audit,
      String unsupplied,
      String line,
      String neutral,
      String voltageThd,
      Verdict verdict) {}
}
