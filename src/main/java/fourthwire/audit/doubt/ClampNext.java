package fourthwire.audit.doubt;

import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.NodeDoubt.ClampPoint;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * Where a measurement would settle most of the verdicts. A verdict of probability p is open by p·(1
 * - p), the variance of a yes that comes true with p; a measuring point settles of that what its
 * currents explain of the checked figure's variance over the draws.
 */
final class ClampNext {
  /** The most open verdicts are looked at, so that a site of any size is done at once. */
  private static final int MOST_VERDICTS = 100;

  private static final int MOST_POINTS = 3;
  private static final double WORTH_TELLING = 0.05;

  private final int draws;
  private final List<Verdict> open;
  private final double doubt;

  /** Of every node of the site. */
  ClampNext(Stream<NodeDraws> nodes, int draws) {
    this.draws = draws;
    this.open =
        nodes
            .flatMap(n -> n.ofLimit().entrySet().stream().map(e -> verdict(n, e)))
            .filter(v -> v.doubt() > 0)
            .sorted(Comparator.comparingDouble(Verdict::doubt).reversed())
            .limit(MOST_VERDICTS)
            .toList();
    this.doubt = open.stream().mapToDouble(Verdict::doubt).sum();
  }

  private record Verdict(double doubt, float[] ofLimit) {}

  private static Verdict verdict(NodeDraws node, Map.Entry<String, float[]> check) {
    double p = node.probability(check.getKey());
    return new Verdict(p * (1 - p), check.getValue());
  }

  /** The best of these measuring points, best first; none where every verdict is settled. */
  List<ClampPoint> best(Map<String, NodeDraws> points) {
    if (open.isEmpty()) {
      return List.of();
    }
    List<ClampPoint> ranked = new ArrayList<>();
    points.forEach((node, currents) -> ranked.add(new ClampPoint(node, settled(currents))));
    ranked.removeIf(p -> p.share() < WORTH_TELLING);
    ranked.sort(
        Comparator.comparingDouble(ClampPoint::share).reversed().thenComparing(ClampPoint::node));
    return List.copyOf(ranked.subList(0, Math.min(MOST_POINTS, ranked.size())));
  }

  private double settled(NodeDraws node) {
    List<float[]> currents =
        Stream.concat(HeadlineFigure.LINES.stream(), Stream.of(HeadlineFigure.NEUTRAL_RMS))
            .map(node::figure)
            .flatMap(Optional::stream)
            .toList();
    Explained by = new Explained(currents, draws);
    double settled = open.stream().mapToDouble(v -> v.doubt() * by.share(v.ofLimit())).sum();
    return Math.rint(1000 * settled / doubt) / 1000;
  }
}
