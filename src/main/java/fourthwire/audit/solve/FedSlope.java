package fourthwire.audit.solve;

import fourthwire.network.TreeNetwork;

/** What hangs at a place, as boards above see it: behind the feeder between. */
final class FedSlope {
  private final PlaceSlope bare;
  private final PlaceSlope behind;
  private final double[] loopOhm;
  private int version = -1;

  /** Of three lines, what their feeder changes is left aside. */
  FedSlope(PlaceSlope bare, FeederOhms feeder, TreeNetwork network, BoardRow row) {
    this.bare = bare;
    this.loopOhm = bare.loop(feeder);
    this.behind = bare.ports() == 1 ? new PlaceSlope(bare.place(), network, row) : bare;
  }

  /** Takes up what changed since the last time, if it was more than a correction. */
  void renew() {
    if (behind != bare && version != bare.version()) {
      behind.take(bare, loopOhm);
    }
    version = bare.version();
  }

  /** Whether the feeder between counts. */
  boolean isBehind() {
    return behind != bare;
  }

  /** As it is seen from above. */
  PlaceSlope seen() {
    return behind;
  }
}
