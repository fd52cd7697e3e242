package fourthwire.load.rectifier;

import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.NoSteadyStateException.Why;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.loop.TwoPathSolver;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.OnePathSearch;
import fourthwire.load.rectifier.path.PulseTrace;
import java.util.Optional;

/**
 * Periodic steady state of the capacitor-input rectifier, by shooting.
 *
 * <p>Where one pair of diodes conducts at a time, the state is found by {@link OnePathSearch}.
 * Where the state that repeats in mirrored halves is not stable, the circuit goes to one that
 * repeats only after the whole cycle, with even orders in its current; it is looked for, and
 * refused where it does not settle either.
 *
 * <p>Where the march shows that a choke behind the bridge drives its current past the voltage's
 * crossing, one path is not enough and both pairs of diodes are followed ({@link TwoPathSolver}).
 *
 * <p>An instance is a few numbers (the last state, to start from); the workspace is the thread's.
 */
final class CapacitorInputSolver implements LoadSolver {
  private static final String TOO_MUCH = "the source cannot give what the load asks for";

  private static final String NO_REPEAT = "the current does not repeat from cycle to cycle";

  private static final String HUNTS =
      "its choke and capacitor swing against its constant power, and the current does not repeat"
          + " from cycle to cycle; more capacitance or a smaller choke behind the bridge settles"
          + " it";

  private static final ThreadLocal<OnePathSearch> WORKSPACE =
      ThreadLocal.withInitial(OnePathSearch::new);

  private final BridgeLoad load;
  private final double frequencyHz;

  /** The thread's workspace, taken for each solve. */
  private OnePathSearch search = WORKSPACE.get();

  private double lastV;
  private double lastI;

  /** Follows both pairs of diodes where the choke's current was found to pass the crossing. */
  private Optional<TwoPathSolver> twoPaths = Optional.empty();

  CapacitorInputSolver(BridgeLoad load, double frequencyHz) {
    this.load = load;
    this.frequencyHz = frequencyHz;
  }

  @Override
  public void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    search = WORKSPACE.get();
    search.prepare(load, frequencyHz, emf, seriesOhm, seriesHenry, lastV, lastI);
    if (twoPaths.isEmpty() && onePath(current)) {
      return;
    }
    if (!followBoth(emf, seriesOhm, seriesHenry, current)) {
      NoSteadyStateException refusal = refusal();
      forget();
      throw refusal;
    }
  }

  /** Whether one path at a time gives the current; else both are followed from here on. */
  private boolean onePath(PortSpectra current) {
    boolean found = search.find();
    if (load.dcHenry() > 0 && (!found || search.freewheels())) {
      twoPaths = Optional.of(new TwoPathSolver(load, frequencyHz));
      return false;
    }
    if (found) {
      lastV = search.lastV;
      lastI = search.lastI;
      search.trace().harmonics(search.halfWave(), current.re[0], current.im[0]);
      current.direct[0] = search.trace().direct(search.halfWave());
    }
    return found;
  }

  private boolean followBoth(
      PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    return twoPaths.isPresent()
        && twoPaths.get().solve(emf, search.peak(), seriesOhm, seriesHenry, current);
  }

  /** Forgets the last state: the next solution starts cold. */
  void forget() {
    lastV = 0;
    lastI = 0;
    twoPaths = Optional.empty();
  }

  private NoSteadyStateException refusal() {
    boolean emptied = twoPaths.map(TwoPathSolver::emptied).orElse(search.emptied());
    boolean hunts = twoPaths.isPresent() && twoPaths.get().hunts();
    return NoSteadyStateException.of(
            "a capacitor-input rectifier of %s W finds no steady state at %s V peak behind %s ohm"
                + " and %s mH: %s",
            load.powerW(),
            search.peak(),
            search.ohm(),
            search.henry() * 1e3,
            hunts ? HUNTS : emptied ? TOO_MUCH : NO_REPEAT)
        .since(emptied ? Why.TOO_MUCH : Why.NO_REPEAT);
  }

  /** Whether that record is half a cycle, whose mirror image is the other. */
  boolean halfWave() {
    return twoPaths.map(TwoPathSolver::halfWave).orElse(search.halfWave());
  }

  /** How many recorded currents make up the port's, the second counting against the first. */
  int paths() {
    return twoPaths.isPresent() ? 2 : 1;
  }

  /** A recorded current of the last solution on this thread: amps at positions in cells. */
  PulseTrace trace(int path) {
    return twoPaths.map(both -> both.trace(path)).orElse(search.trace());
  }
}
