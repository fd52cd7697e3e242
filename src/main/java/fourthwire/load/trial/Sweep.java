package fourthwire.load.trial;

import fourthwire.load.LoadModels;
import fourthwire.load.LoadRequest;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.site.ModelColumns;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleFunction;

/** The same equipment in a row of states, each solved from the one before. */
public final class Sweep {
  private Sweep() {}

  /**
   * One state.
   *
   * @param at load level, number of units or firing angle, as its row says
   * @param result empty where there is no steady state
   */
  public record Point(double at, Optional<TrialResult> result) {}

  /** Over the share of rated power, each in (0, 1]. */
  public static List<Point> overLevel(
      LoadRequest request, TrialSource source, List<Double> levels) {
    LoadRequest sized = LoadModels.sized(request);
    LoadTrial trial = new LoadTrial(sized, source);
    return over(
        levels,
        level -> {
          trial.take(sized.inState(sized.units(), level));
          return trial.solved();
        });
  }

  /** Over the number of equal units behind the one source: I(N, Z) = N/M·I(M, N/M·Z). */
  public static List<Point> overUnits(LoadRequest request, TrialSource source, List<Double> units) {
    LoadTrial trial = new LoadTrial(LoadModels.sized(request), source);
    return over(
        units,
        n -> {
          double times = n / request.units();
          trial.take(source.times(times));
          return trial.solved().times(times);
        });
  }

  /** Over a dimmer's firing angle, degrees. */
  public static List<Point> overFiring(
      LoadRequest request, TrialSource source, List<Double> degrees) {
    LoadTrial trial = new LoadTrial(request, source);
    return over(
        degrees,
        d -> {
          trial.take(request.withColumns(fired(d)));
          return trial.solved();
        });
  }

  private static List<Point> over(List<Double> values, DoubleFunction<TrialResult> solved) {
    return values.stream().map(v -> new Point(v, tried(v, solved))).toList();
  }

  private static Optional<TrialResult> tried(double at, DoubleFunction<TrialResult> solved) {
    try {
      return Optional.of(solved.apply(at));
    } catch (NoSteadyStateException none) {
      return Optional.empty();
    }
  }

  private static ModelColumns fired(double degrees) {
    return ModelColumns.NONE.with(ModelColumns.Column.FIRING_DEGREES, degrees);
  }
}
