package fourthwire.web.reading.series;

import java.util.List;

/**
 * What the page of a log's orders over time shows.
 *
 * @param sources whose orders there are to choose from
 * @param about what a step is, in words
 * @param axis the time below the strips
 * @param basis of the limits, a sentence each
 * @param without why there are none, a sentence; else empty
 */
record OrdersPage(
    SeriesPage.Head head,
    List<Measures.Option> sources,
    String of,
    boolean common,
    String title,
    String about,
    Heads heads,
    String axis,
    List<Row> rows,
    List<String> basis,
    String without) {
  /** Column heads: which steps' percentiles the figures are. */
  record Heads(String typical, String highest, String when) {}

  /**
   * An order.
   *
   * @param svg its 95th percentile over time
   * @param typical the median of the steps' 95th percentiles
   * @param when the step of the highest
   */
  record Row(String order, String svg, String typical, String highest, String when, String limit) {}

  /** Whether any order has a limit. */
  public boolean limited() {
    return rows.stream().anyMatch(r -> !r.limit().isEmpty());
  }
}
