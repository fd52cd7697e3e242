package fourthwire.web.reading.series;

import fourthwire.web.panel.NodePage;
import java.util.List;

/**
 * What the page of a measure in order of size shows.
 *
 * @param about what the picture shows of which rows
 * @param curve the picture
 * @param figures percentiles, and the share of the time over the limit
 * @param hours of each quantity its week
 */
record SpreadPage(
    SeriesPage.Head head,
    List<Measures.Group> measures,
    String show,
    String title,
    String about,
    String curve,
    List<NodePage.Key> keys,
    List<LogLimits.Line> limits,
    NodePage.Grid figures,
    List<Hours> hours) {
  /**
   * Means by hour of the week.
   *
   * @param table days down, hours across, tinted by size
   */
  record Hours(String name, String table, String caption) {}
}
