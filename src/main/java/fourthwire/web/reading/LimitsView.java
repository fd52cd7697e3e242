package fourthwire.web.reading;

import fourthwire.web.support.Verdict;
import java.util.List;

/**
 * A log held against the limits of measured values.
 *
 * @param set which set of rows, a sentence
 */
record LimitsView(String set, List<Row> rows, List<String> notes) {

  /**
   * One limit.
   *
   * @param what is held against it, with the place that comes nearest
   * @param counted which values of which period
   * @param verdict the mark it gets
   * @param outcome in words, with how many periods came out so
   * @param periods all of them
   */
  record Row(
      String what,
      String counted,
      String basis,
      String figure,
      String limit,
      String when,
      String share,
      Verdict verdict,
      String outcome,
      List<Period> periods) {}

  /** A day or week. */
  record Period(
      String from, String place, String figure, String limit, String share, String outcome) {}
}
