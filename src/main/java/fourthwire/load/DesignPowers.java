package fourthwire.load;

import fourthwire.load.model.LoadModel;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.concurrent.ConcurrentHashMap;
import java.util.function.DoubleFunction;

/**
 * The direct-current powers found so far, so that equal equipment in many rows is sized once. Made
 * for one audit and dropped with it; for any number of threads.
 */
public final class DesignPowers {
  private final Map<LoadRequest, Double> known = new ConcurrentHashMap<>();

  /** The rated power of one unit in the model's own variable, watts ({@link DesignPower}). */
  double of(LoadRequest request, DoubleFunction<LoadModel> unit) {
    return known.computeIfAbsent(oneUnit(request), one -> new DesignPower(one).find(unit));
  }

  /** What the rated power does not depend on set aside. */
  private static LoadRequest oneUnit(LoadRequest r) {
    return new LoadRequest(
        r.kind(),
        r.ports(),
        r.frequencyHz(),
        r.nominalPortV(),
        r.rating(),
        1,
        1,
        true,
        OptionalDouble.empty(),
        r.columns(),
        r.spectrum());
  }
}
