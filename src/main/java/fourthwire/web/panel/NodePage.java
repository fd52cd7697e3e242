package fourthwire.web.panel;

import fourthwire.web.support.Column;
import fourthwire.web.support.Reasons;
import fourthwire.web.support.Verdict;
import java.util.List;
import java.util.Optional;

/**
 * What the page of a node shows, ready to be set.
 *
 * @param kindKey message key of what it is
 * @param facts what the survey says of it, one line
 * @param unsupplied why there is no design state, else empty text
 * @param states how sure it is, its week, its impedance
 */
public record NodePage(
    long siteId,
    String siteName,
    long auditId,
    int surveyRevision,
    String supply,
    String name,
    String kindKey,
    String facts,
    List<Crumb> path,
    VerdictLine verdict,
    String unsupplied,
    Optional<Rails> rails,
    Optional<Pictures> pictures,
    List<Finding> findings,
    Optional<Grid> voltage,
    Optional<Grid> power,
    Optional<Grid> transformer,
    Optional<Grid> primary,
    List<String> resonances,
    List<Grid> measured,
    List<Branch> branches,
    List<Working.Line> addingWorking,
    List<String> assumptions,
    StatesView states) {

  /** Whether what hangs here adds to a neutral. */
  public boolean adding() {
    return branches.stream().anyMatch(b -> !b.amps().isEmpty());
  }

  /** A node above this one. */
  public record Crumb(String name) {}

  /**
   * The verdict.
   *
   * @param about what the worst finding is about, a few words; empty without one
   * @param sure how sure it is, a few words
   */
  public record VerdictLine(Verdict verdict, String about, String sure) {}

  /** The four conductors. */
  public record Rails(
      List<RailRow> rows,
      String caption,
      String heat,
      List<Reasons.Reason> reasons,
      Grid figures) {}

  /** One conductor. */
  public record RailRow(
      String name, boolean neutral, String svg, Column.Cell amps, String shape, String share) {}

  /** The pictures side by side; the voltage's is empty where its distortion is not known. */
  public record Pictures(
      String spectrum,
      String spectrumOf,
      String cycle,
      List<Key> keys,
      Grid orders,
      String voltage,
      String voltageOf) {}

  /** An entry of a picture's key. */
  public record Key(String svg, String name) {}

  /**
   * A finding.
   *
   * @param steps how its figure comes about; empty where the sentence says all
   */
  public record Finding(
      Verdict verdict,
      String sentence,
      String figure,
      String basis,
      String probability,
      List<String> steps) {}

  /**
   * What hangs directly on the node.
   *
   * @param lines of a circuit, else empty
   * @param known how its loads are known; empty for a panel
   * @param amps what it adds to the neutral, padded; empty without one
   * @param share the same in per cent of the neutral's current
   */
  public record Branch(NodeRow row, String lines, String known, String amps, String share) {}

  /**
   * A table of figures.
   *
   * @param title its caption
   * @param heads column heads, the first over the row names
   * @param working how its figures come about
   */
  public record Grid(
      String title,
      List<String> heads,
      List<GridRow> rows,
      List<Reasons.Reason> reasons,
      List<Working.Line> working) {}

  /** A row of a table of figures. */
  public record GridRow(String name, List<Column.Cell> cells) {}
}
