package fourthwire.load.rectifier;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.rectifier.loop.MultiPulseSolver;
import fourthwire.load.rectifier.path.BridgeLoad;

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

  @Override
  public final LoadSolver newSolver() {
    return new MultiPulseSolver(bridges, load, frequencyHz);
  }
}
