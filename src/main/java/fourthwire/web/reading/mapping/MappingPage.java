package fourthwire.web.reading.mapping;

import java.util.List;

/**
 * What the page of a waiting log shows.
 *
 * @param meter where it was taken, in words
 * @param asked what is open beside the columns
 * @param noneKnown whether no column's heading says what it holds
 * @param groups the columns by how sure their meaning is
 * @param kinds of columns, each of several, for which one choice can be made
 * @param rows when the first rows are, as written and as understood
 */
record MappingPage(
    long upload,
    String meter,
    List<String> headings,
    TimeFields time,
    List<String> asked,
    boolean noneKnown,
    List<Group> groups,
    List<Kind> kinds,
    List<When> rows,
    List<Choice> places,
    List<Choice> measures,
    List<Choice> statistics) {

  /**
   * Columns of one degree of certainty.
   *
   * @param key message key of the degree
   * @param folded whether they are shown on demand
   */
  record Group(String key, boolean folded, List<ColumnRow> columns) {}

  /**
   * A column.
   *
   * @param number of its fields
   * @param kind of the columns that one choice can be made for; empty text for none
   * @param written its first cells
   * @param understood the same as they would be read; empty text where it would not be
   * @param question what is open; empty text for nothing
   */
  record ColumnRow(
      int number,
      String kind,
      String heading,
      String written,
      String understood,
      Measure measure,
      String statistic,
      String factor,
      String question) {}

  /**
   * Columns of one kind.
   *
   * @param value what is measured, or {@code open} where that is asked
   * @param label the same in words
   * @param orders whether they are of harmonic orders
   */
  record Kind(String value, String label, int count, boolean orders) {}

  /** A first row: as written, as understood. */
  record When(String written, String understood) {}

  /** An entry of a list to choose from. */
  record Choice(String value, String text) {}

  /**
   * The fields of the time.
   *
   * @param calendar whether the order of day and month is a question at all
   * @param reason why the order is what it is
   */
  record TimeFields(
      String date,
      String clock,
      boolean calendar,
      String format,
      String reason,
      String zone,
      String stamp,
      String interval) {}
}
