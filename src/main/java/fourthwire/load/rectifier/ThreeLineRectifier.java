package fourthwire.load.rectifier;

import fourthwire.load.model.JointSolver;
import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.rectifier.loop.MultiPulseSolver;
import fourthwire.load.rectifier.node.AlikeBridges;
import fourthwire.load.rectifier.node.AlikeRectifiers;
import fourthwire.load.rectifier.path.BridgeLoad;
import java.util.List;

/** Bridges on three lines as the network sees them: a current that is injected, nothing linear. */
abstract class ThreeLineRectifier implements LoadModel {
  private final int bridges;
  private final BridgeLoad load;
  private final double frequencyHz;

  ThreeLineRectifier(int bridges, BridgeLoad load, double frequencyHz) {
    this.bridges = bridges;
    this.load = load;
    this.frequencyHz = frequencyHz;
  }

  @Override
  public final int ports() {
    return 3;
  }

  /** Others of the same design per watt: they draw the same per watt beside each other. */
  @Override
  public final boolean joins(LoadModel other) {
    return other instanceof ThreeLineRectifier t
        && t.bridges == bridges
        && AlikeBridges.sameDesign(load, t.load);
  }

  @Override
  public final JointSolver newJointSolver(List<LoadModel> all) {
    List<BridgeLoad> loads = all.stream().map(other -> ((ThreeLineRectifier) other).load).toList();
    return new AlikeRectifiers(
        loads, frequencyHz, one -> new MultiPulseSolver(bridges, one, frequencyHz));
  }

  @Override
  public final LoadSolver newSolver() {
    return new MultiPulseSolver(bridges, load, frequencyHz);
  }
}
