package fourthwire.audit.judge;

import static fourthwire.quantity.Conductor.N;

import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.plan.Place;
import fourthwire.network.DrivingPoints;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import java.util.List;

/**
 * The short-circuit current at each node: nominal voltage over the impedance at the fundamental,
 * loads and banks away. Three lines: the three-phase fault; one or two: between the line and the
 * neutral, or the two lines.
 */
final class FaultLevels {
  private final NetworkPlan bare;
  private final DrivingPoints points;
  private final boolean generator;

  FaultLevels(NetworkPlan bare, boolean generator) {
    this.bare = bare;
    this.generator = generator;
    this.points = bare.network().factor(1).drivingPoints();
  }

  Figure amps(String node) {
    if (generator) {
      return Figure.unknown("not solved on a generator");
    }
    Place place = bare.get(node);
    double ohm = ohm(place);
    if (ohm == 0) {
      return Figure.unknown("no impedance lies before this node");
    }
    boolean lineToNeutral = place.node().hasNeutral() || place.node().lines().size() == 3;
    double volts = lineToNeutral ? place.node().lineToNeutralV() : place.node().nominalV();
    return Figure.of(volts / ohm);
  }

  private double ohm(Place place) {
    List<Conductor> lines = place.node().lines();
    var point = points.at(place.networkNode());
    int first = place.conductors().of(lines.get(0));
    if (lines.size() == 3 && first == 0) {
      return point.positiveSequence().magnitude();
    }
    Conductor other = place.node().hasNeutral() ? N : lines.get(1);
    return point.between(first, place.conductors().of(other)).magnitude();
  }
}
