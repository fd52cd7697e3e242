package fourthwire.audit;

import java.util.List;
import java.util.Map;

/**
 * How sure the figures of a node are, from draws of what the survey does not know exactly.
 *
 * @param draws how many sites were drawn and solved
 * @param seed what the draws started from: the same seed gives the same figures
 * @param range of each headline figure that the node has
 * @param ranked the figure whose doubt {@code inputs} explains
 * @param inputs what the doubt comes from, largest share first; together at most 1
 * @param clampNext at the supply: where a measurement would settle most of the site's verdicts, the
 *     best first; empty elsewhere, and where every verdict is settled
 */
public record NodeDoubt(
    int draws,
    long seed,
    Map<HeadlineFigure, Range> range,
    HeadlineFigure ranked,
    List<InputShare> inputs,
    List<ClampPoint> clampNext) {

  /** Percentiles 5, 50 and 95 over the draws. */
  public record Range(double p5, double p50, double p95) {}

  /**
   * One group of inputs and its share of the variance.
   *
   * @param input in words: a kind's parameter on the whole site, or a panel's own loads of a kind
   * @param share 0 to 1
   */
  public record InputShare(String input, double share) {}

  /**
   * A measuring point.
   *
   * @param node where to clamp all conductors
   * @param share what part of the doubt in the site's verdicts its currents would settle, 0 to 1
   */
  public record ClampPoint(String node, double share) {}
}
