package fourthwire.web.load;

import fourthwire.web.panel.NodePage.Grid;
import fourthwire.web.support.Verdict;
import java.util.List;
import java.util.Optional;

/**
 * The answer as it is shown.
 *
 * @param title the heading: the equipment and what its current is like
 * @param about kind, size and supply in a few words
 * @param verdict act where the equipment standard is not kept, else none
 * @param standing which standard and class, and whether it is kept
 * @param sentences what there is to say, the limits first
 * @param answer everything drawn and listed; empty where there is no steady state
 * @param model the model in words
 * @param granted what was taken for granted
 * @param query the question, for links to this very answer
 */
record LoadPage(
    String title,
    String about,
    Verdict verdict,
    String standing,
    List<String> sentences,
    Optional<Answer> answer,
    Model model,
    List<Fact> granted,
    String query) {

  /** Pictures and tables. */
  record Answer(
      String cycle,
      List<Key> cycleKeys,
      String spectrum,
      String spectrumOf,
      List<Grid> figures,
      List<Chart> charts,
      Limits limits) {}

  /** An entry of a picture's key. */
  record Key(String svg, String name) {}

  /** How figures move with one quantity: percentages, and the power factor under them. */
  record Chart(
      String id,
      String title,
      String svg,
      String factor,
      List<Key> keys,
      String sentence,
      Grid figures) {}

  /**
   * Every order beside its limit.
   *
   * @param held whether any order has a limit
   */
  record Limits(boolean held, String basis, List<OrderRow> orders, List<TotalRow> totals) {}

  /** An order. */
  record OrderRow(
      String order, String amps, String percent, String degrees, String limit, String verdict) {}

  /** A limit of the whole current. */
  record TotalRow(String name, String figure, String limit, String verdict) {}

  /** A model in words. */
  record Model(String name, String equations, String assumed, String source, String preset) {}

  /** A name and what goes for it. */
  record Fact(String name, String text) {}
}
