package fourthwire.load.rectifier.node;

import fourthwire.load.model.JointSolver;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.path.BridgeLoad;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/**
 * Rectifiers of one design side by side, on any number of lines: together they are one, and each
 * draws its part of its current.
 */
public final class AlikeRectifiers implements JointSolver {
  private final List<BridgeLoad> loads;
  private final double frequencyHz;
  private final Function<BridgeLoad, LoadSolver> newSolver;
  private Optional<LoadSolver> solver = Optional.empty();

  /**
   * Of loads that are the same per watt ({@link AlikeBridges#sameDesign}).
   *
   * @param newSolver makes a solver for all of them as one
   */
  public AlikeRectifiers(
      List<BridgeLoad> loads, double frequencyHz, Function<BridgeLoad, LoadSolver> newSolver) {
    this.loads = List.copyOf(loads);
    this.frequencyHz = frequencyHz;
    this.newSolver = newSolver;
  }

  /** Nothing where what lies before them is not the same per watt. */
  @Override
  public double felt(int load, SharedSource source) {
    boolean one = new AlikeBridges(loads, source).count() == 1;
    return one ? Felt.by(load, loads, source, frequencyHz) : 0;
  }

  @Override
  public double common(int load, SharedSource source) {
    return Felt.common(load, loads, source, frequencyHz);
  }

  @Override
  public void solve(PortSpectra[] emf, SharedSource source, PortSpectra[] current) {
    AlikeBridges alike = new AlikeBridges(loads, source);
    LoadSolver one = solver.orElseGet(() -> newSolver.apply(alike.asOne().get(0)));
    solver = Optional.of(one);
    PortSpectra drawn = new PortSpectra(emf[0].ports());
    one.solve(alike.emf(0, emf), alike.ohm(0, 0), alike.henry(0, 0), drawn);
    alike.share(0, drawn, current);
  }

  @Override
  public List<String> remarks() {
    return solver.map(LoadSolver::remarks).orElse(List.of());
  }
}
