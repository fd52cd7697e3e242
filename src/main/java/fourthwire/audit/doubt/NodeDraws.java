package fourthwire.audit.doubt;

import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.NodeDoubt.Range;
import fourthwire.audit.judge.NodeFigures;
import fourthwire.limits.Check;
import fourthwire.quantity.Percentiles;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * One node over the draws: its headline figures, and each checked figure on its limit. Every draw
 * has its own place, so that several can be filled at once. What the design state does not have is
 * not kept.
 */
final class NodeDraws {
  private static final MathContext DIGITS = new MathContext(6);
  private static final double LOW = 5;
  private static final double MIDDLE = 50;
  private static final double HIGH = 95;

  private final Map<HeadlineFigure, float[]> figures = new EnumMap<>(HeadlineFigure.class);
  private final Map<String, float[]> ofLimit = new LinkedHashMap<>();

  NodeDraws(NodeFigures design, int draws) {
    double[] known = design.headline();
    for (HeadlineFigure figure : HeadlineFigure.values()) {
      if (!Double.isNaN(known[figure.ordinal()])) {
        figures.put(figure, new float[draws]);
      }
    }
    design.checks().forEach(check -> ofLimit.put(check.key(), new float[draws]));
  }

  /** Fills the place of a draw. */
  void put(int draw, NodeFigures node) {
    double[] drawn = node.headline();
    figures.forEach((figure, values) -> values[draw] = (float) drawn[figure.ordinal()]);
    for (Check check : node.checks()) {
      float[] values = ofLimit.get(check.key());
      if (values != null) {
        values[draw] = (float) (check.figure() / check.limit());
      }
    }
  }

  /** Percentiles of each figure. */
  Map<HeadlineFigure, Range> ranges() {
    Map<HeadlineFigure, Range> ranges = new EnumMap<>(HeadlineFigure.class);
    figures.forEach((figure, values) -> range(values).ifPresent(r -> ranges.put(figure, r)));
    return ranges;
  }

  private static Optional<Range> range(float[] values) {
    double[] sorted = new double[values.length];
    Arrays.setAll(sorted, k -> values[k]);
    sorted = Arrays.stream(sorted).filter(x -> !Double.isNaN(x)).sorted().toArray();
    return sorted.length == 0
        ? Optional.empty()
        : Optional.of(
            new Range(
                rounded(Percentiles.expected(sorted, LOW)),
                rounded(Percentiles.expected(sorted, MIDDLE)),
                rounded(Percentiles.expected(sorted, HIGH))));
  }

  /** No more digits than the draws are kept with. */
  private static double rounded(double value) {
    return new BigDecimal(value).round(DIGITS).doubleValue();
  }

  /**
   * In what part of the draws a check was over its limit; 0 where it is not one of the design's.
   */
  double probability(String check) {
    return Optional.ofNullable(ofLimit.get(check)).map(NodeDraws::over).orElse(0.0);
  }

  private static double over(float[] ofLimit) {
    int over = 0;
    for (float value : ofLimit) {
      over += value > 1 ? 1 : 0;
    }
    return (double) over / ofLimit.length;
  }

  /** A figure by draw; empty where the node does not have it. */
  Optional<float[]> figure(HeadlineFigure figure) {
    return Optional.ofNullable(figures.get(figure));
  }

  /** Each check's figure on its limit, by draw. */
  Map<String, float[]> ofLimit() {
    return Map.copyOf(ofLimit);
  }
}
