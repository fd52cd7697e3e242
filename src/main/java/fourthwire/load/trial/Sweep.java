package fourthwire.load.trial;

import fourthwire.load.LoadModels;
import fourthwire.load.LoadRequest;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.NoSteadyStateException.Why;
import fourthwire.site.ModelColumns;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleFunction;

/** The same equipment in a row of states, each solved for itself. */
public final class Sweep {
  private Sweep() {}

  /**
   * One state.
   *
   * @param at load level, number of units or firing angle, as its row says
   * @param result empty where there is no steady state
   * @param why there is none; empty where there is one
   */
  public record Point(double at, Optional<TrialResult> result, Optional<Why> why) {}

  /** Over the share of rated power, each in (0, 1]. */
  public static List<Point> overLevel(
      LoadRequest request, TrialSource source, List<Double> levels) {
    LoadRequest sized = LoadModels.sized(request);
    return over(levels, level -> sized.inState(sized.units(), level), source);
  }

  /** Over the number of equal units behind the one source. */
  public static List<Point> overUnits(LoadRequest request, TrialSource source, List<Double> units) {
    LoadRequest sized = LoadModels.sized(request);
    return over(units, n -> sized.inState(n, sized.demand()), source);
  }

  /** Over a dimmer's firing angle, degrees. */
  public static List<Point> overFiring(
      LoadRequest request, TrialSource source, List<Double> degrees) {
    return over(degrees, d -> request.withColumns(fired(d)), source);
  }

  /** Each state by itself; the equipment is sized once. */
  private static List<Point> over(
      List<Double> values, DoubleFunction<LoadRequest> request, TrialSource source) {
    return values.stream().map(v -> tried(v, request.apply(v), source)).toList();
  }

  private static Point tried(double at, LoadRequest request, TrialSource source) {
    try {
      return new Point(at, Optional.of(LoadTrial.solve(request, source)), Optional.empty());
    } catch (NoSteadyStateException none) {
      return new Point(at, Optional.empty(), Optional.of(none.why()));
    }
  }

  private static ModelColumns fired(double degrees) {
    return ModelColumns.NONE.with(ModelColumns.Column.FIRING_DEGREES, degrees);
  }
}
