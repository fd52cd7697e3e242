package fourthwire.web.panel;

import fourthwire.web.support.Verdict;
import java.util.List;

/**
 * A node as a row of a list or tree.
 *
 * @param depth below the root of the tree
 * @param about what it is, a few words after its kind
 * @param rails the four conductors in little; empty where it is not supplied
 * @param neutral loading of the neutral, padded, with its mark
 * @param line loading of the most loaded line
 * @param voltageThd worst distortion of its voltage
 * @param below circuits fed from it that have findings of their own; empty where those are rows too
 */
public record NodeRow(
    String node,
    String name,
    String kindKey,
    int depth,
    String about,
    String rails,
    String line,
    String neutral,
    String voltageThd,
    Verdict verdict,
    String finding,
    List<Below> below) {

  /** How many circuits come to this verdict, in words. */
  public record Below(Verdict verdict, String text) {}
}
