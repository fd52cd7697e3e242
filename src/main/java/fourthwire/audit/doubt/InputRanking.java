package fourthwire.audit.doubt;

import fourthwire.audit.NodeDoubt.InputShare;
import fourthwire.site.LoadKind;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Where the doubt in a figure comes from: at most {@value #MOST_GROUPS} groups of inputs, a kind's
 * parameter or amount on the whole site, or a panel's own loads of a kind. The amounts of a panel's
 * rows stand together, each by its watts.
 */
final class InputRanking {
  private static final int MOST_GROUPS = 60;

  /** No more groups than a third of the draws: chance would explain too much. */
  private static final int DRAWS_A_GROUP = 3;

  /** What explains less than this is not told. */
  private static final double WORTH_TELLING = 0.01;

  private static final int MOST_TOLD = 8;

  private final List<Group> groups;
  private final Explained explained;

  private InputRanking(List<Group> groups, int draws) {
    this.groups = groups;
    this.explained = new Explained(groups.stream().map(Group::score).toList(), draws);
  }

  /**
   * A group.
   *
   * @param name in words
   * @param weightW about how many watts of doubt it holds, to choose the largest by
   * @param score its deviate by draw
   */
  private record Group(String name, double weightW, float[] score) {}

  static InputRanking of(DrawnLoads loads, int draws) {
    List<Group> shared = new ArrayList<>();
    for (OpenInput input : loads.inputs()) {
      if (!(input instanceof OpenInput.RowAmount)) {
        shared.add(new Group(input.name(), Double.POSITIVE_INFINITY, loads.deviates(input)));
      }
    }
    List<Group> own = panelGroups(loads, draws);
    own.sort(Comparator.comparingDouble(Group::weightW).reversed());
    int most = Math.min(MOST_GROUPS, Math.max(1, draws / DRAWS_A_GROUP));
    shared.addAll(own);
    return new InputRanking(List.copyOf(shared.subList(0, Math.min(most, shared.size()))), draws);
  }

  private static List<Group> panelGroups(DrawnLoads loads, int draws) {
    record PanelKind(String panel, LoadKind kind) {}
    Map<PanelKind, float[]> scores = new LinkedHashMap<>();
    Map<PanelKind, Double> squares = new LinkedHashMap<>();
    for (int k = 0; k < loads.loads().size(); k++) {
      OpenLoad load = loads.loads().get(k);
      PanelKind key = new PanelKind(load.placement().load().panel(), load.kind());
      float[] score = scores.computeIfAbsent(key, p -> new float[draws]);
      float[] deviates = loads.deviates(loads.row(k));
      double watts = load.roughSpreadW();
      for (int d = 0; d < draws; d++) {
        score[d] += (float) (watts * deviates[d]);
      }
      squares.merge(key, watts * watts, Double::sum);
    }
    List<Group> groups = new ArrayList<>();
    scores.forEach(
        (key, score) ->
            groups.add(
                new Group(
                    "Power of each " + key.kind().word() + " load on " + key.panel(),
                    Math.sqrt(squares.getOrDefault(key, 0.0)),
                    score)));
    return groups;
  }

  /** The groups by their share of a figure's variance, largest first. */
  List<InputShare> of(float[] figure) {
    double[] shares = explained.shares(figure);
    double sum = Math.max(1, Arrays.stream(shares).sum());
    List<InputShare> ranked = new ArrayList<>();
    for (int g = 0; g < shares.length; g++) {
      if (shares[g] >= WORTH_TELLING) {
        ranked.add(new InputShare(groups.get(g).name(), Math.rint(1000 * shares[g] / sum) / 1000));
      }
    }
    ranked.sort(Comparator.comparingDouble(InputShare::share).reversed());
    return List.copyOf(ranked.subList(0, Math.min(MOST_TOLD, ranked.size())));
  }
}
