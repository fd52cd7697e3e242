package fourthwire.web.reading.series;

import fourthwire.web.panel.NodePage;
import java.util.List;

/**
 * What the page of a log over time shows.
 *
 * @param head what log, which part of it
 * @param pictures a measure each, under one time axis
 * @param overview the whole log with the part framed; empty text where the whole is shown
 * @param notes what is wrong with the log in this part
 * @param elsewhere how many more notes lie outside it
 */
record SeriesPage(
    Head head,
    List<Measures.Group> measures,
    String show,
    String also,
    boolean together,
    List<Picture> pictures,
    String overview,
    List<Note> notes,
    int elsewhere) {
  /**
   * What all pages of a log have.
   *
   * @param heading what it tells, or what it is of
   * @param period the part shown, in words
   * @param from as a form's field takes it
   * @param understood whether the part asked for could be shown
   * @param choice whether there are rows as corrected beside those as read
   * @param rows {@code read} for those as read; empty for what is shown unasked
   * @param ways to other parts
   */
  record Head(
      long id,
      String meter,
      String node,
      String heading,
      String period,
      String from,
      String to,
      boolean understood,
      boolean choice,
      String rows,
      List<Span.Way> ways) {}

  /**
   * A measure.
   *
   * @param about how long a step is, in words
   * @param limits in sentences
   * @param keys what its lines look like, where all share one axis
   * @param figures the same in a few steps
   * @param readout what a script asks the interface for to tell values under the pointer
   */
  record Picture(
      String title,
      String about,
      String svg,
      List<LogLimits.Line> limits,
      List<NodePage.Key> keys,
      NodePage.Grid figures,
      Readout readout) {}

  /**
   * Where the picture's values come from.
   *
   * @param address of the interface, all but the quantity
   * @param quantities separated by spaces
   * @param places their names, likewise
   * @param factor what values are multiplied by to be in {@code unit}
   */
  record Readout(String address, String quantities, String places, double factor, String unit) {}

  /** Something wrong with the log, numbered as on the time axis. */
  record Note(String number, String when, String sentence) {}
}
