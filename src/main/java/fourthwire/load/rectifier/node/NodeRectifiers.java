package fourthwire.load.rectifier.node;

import fourthwire.load.model.JointSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.NoSteadyStateException.Why;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.CycleTable;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Periodic steady state of single-phase rectifiers side by side, in each of which one pair of
 * diodes conducts at a time ({@link NodeBridges}, {@link NodeSearch}). Those that are the same per
 * watt draw the same per watt and are solved as one ({@link AlikeBridges}).
 *
 * <p>Checked against circuit-simulator results with the same diodes (test resources {@code
 * load/rectifiers}).
 */
public final class NodeRectifiers implements JointSolver {
  /** A capacitor under this share of the crest is empty: no supply runs on it. */
  private static final double LEAST_SHARE = 0.05;

  private final List<BridgeLoad> loads;
  private final double frequencyHz;
  private Optional<Work> work = Optional.empty();

  /** Of loads without a choke behind their bridges. */
  public NodeRectifiers(List<BridgeLoad> loads, double frequencyHz) {
    this.loads = List.copyOf(loads);
    this.frequencyHz = frequencyHz;
  }

  /** The bridges as they are followed, and the state they had last. */
  private record Work(NodeBridges bridges, NodeSearch search, int count) {
    Work(int count) {
      this(new NodeBridges(count), count);
    }

    private Work(NodeBridges bridges, int count) {
      this(bridges, new NodeSearch(bridges, count), count);
    }
  }

  @Override
  public double felt(int load, SharedSource source) {
    return Felt.by(load, loads, source, frequencyHz);
  }

  @Override
  public double common(int load, SharedSource source) {
    return Felt.common(load, loads, source, frequencyHz);
  }

  @Override
  public void solve(PortSpectra[] emf, SharedSource source, PortSpectra[] current) {
    AlikeBridges alike = new AlikeBridges(loads, source);
    Work now =
        work.filter(w -> w.count() == alike.count()).orElseGet(() -> new Work(alike.count()));
    work = Optional.of(now);
    NodeBridges bridges = now.bridges();
    double peak = fill(bridges, alike, emf);
    bridges.floorV = LEAST_SHARE * peak;
    bridges.set(alike.asOne(), alike, peak, 1 / (frequencyHz * CycleTable.CELLS));
    boolean mirrored = Arrays.stream(bridges.emf).allMatch(table -> table.halfWave);
    if (!now.search().find(section(emf[0]), mirrored, peak, bridges.step.power)) {
      throw refusal(now.search().emptied(), peak, alike);
    }
    write(now, alike, current);
  }

  private static double fill(NodeBridges bridges, AlikeBridges alike, PortSpectra[] emf) {
    double peak = 0;
    for (int g = 0; g < alike.count(); g++) {
      PortSpectra seen = alike.emf(g, emf);
      bridges.emf[g].fill(seen.re[0], seen.im[0]);
      peak = Math.max(peak, bridges.emf[g].peak());
    }
    if (!(peak > 0) || Double.isInfinite(peak)) {
      throw new NoSteadyStateException("a capacitor-input rectifier has no voltage to draw from");
    }
    return peak;
  }

  /** The node 15° after the fundamental's upward zero crossing, usually without current. */
  private static double section(PortSpectra emf) {
    double turns = -Math.atan2(emf.im[0][1], emf.re[0][1]) / (2 * Math.PI) + 15.0 / 360;
    return Math.floor((turns - Math.floor(turns)) * CycleTable.CELLS);
  }

  private static void write(Work found, AlikeBridges alike, PortSpectra[] current) {
    boolean halfWave = found.search().halfWave();
    PortSpectra drawn = new PortSpectra(1);
    for (int g = 0; g < alike.count(); g++) {
      found.bridges().trace[g].harmonics(halfWave, drawn.re[0], drawn.im[0]);
      drawn.direct[0] = found.bridges().trace[g].direct(halfWave);
      alike.share(g, drawn, current);
    }
  }

  private NoSteadyStateException refusal(boolean emptied, double peak, SharedSource source) {
    return NoSteadyStateException.of(
            "capacitor-input rectifiers of %s W on one connection find no steady state together at"
                + " %s V peak behind %s ohm and %s mH: %s",
            loads.stream().mapToDouble(BridgeLoad::powerW).sum(),
            peak,
            source.ohm(0, 0),
            source.henry(0, 0) * 1e3,
            emptied
                ? "the source cannot give what they ask for"
                : "their currents do not repeat from cycle to cycle")
        .since(emptied ? Why.TOO_MUCH : Why.NO_REPEAT);
  }
}
