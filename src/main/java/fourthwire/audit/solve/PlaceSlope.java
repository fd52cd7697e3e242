package fourthwire.audit.solve;

import fourthwire.network.TreeNetwork;
import java.util.Arrays;

/**
 * How the current that is drawn at a place of the network follows the voltage there: the sum of
 * many loads' slopes, all ports, orders and both parts of a phasor.
 */
final class PlaceSlope {
  private final PortPlace place;
  private final int[] from;
  private final int to;
  private final int perPort;
  private final float[] byColumn;

  /** No load at all, where potentials and currents stand in such a row. */
  PlaceSlope(PortPlace place, TreeNetwork network, BoardRow row) {
    this.place = place;
    this.from = Arrays.stream(place.fromIndices(network)).map(row::start).toArray();
    this.to = place.to() == PortPlace.NONE ? -1 : row.start(place.toIndex(network));
    this.perPort = row.perConductor();
    this.byColumn = new float[size() * size()];
  }

  PortPlace place() {
    return place;
  }

  int size() {
    return from.length * perPort;
  }

  void clear() {
    Arrays.fill(byColumn, 0);
  }

  /** So many loads of this slope more; only what was learned of it, once it has been added. */
  void add(OrdersInPlay orders, LoadSlope load, double count) {
    load.addTo(orders, count, byColumn);
  }

  void add(PlaceSlope part) {
    for (int i = 0; i < byColumn.length; i++) {
      byColumn[i] += part.byColumn[i];
    }
  }

  /** The voltages of its ports among these potentials. */
  double[] voltages(double[] potentials) {
    double[] volts = new double[size()];
    int at = 0;
    for (int line : from) {
      for (int k = 0; k < perPort; k++) {
        volts[at++] = potentials[line + k] - (to < 0 ? 0 : potentials[to + k]);
      }
    }
    return volts;
  }

  /** Draws a current of its ports: adds it to what its conductors give. */
  void draw(double[] current, double[] drawn) {
    int at = 0;
    for (int line : from) {
      for (int k = 0; k < perPort; k++) {
        drawn[line + k] += current[at];
        if (to >= 0) {
          drawn[to + k] -= current[at];
        }
        at++;
      }
    }
  }

  /** Draws what follows from these potentials. */
  void answer(double[] potentials, double[] drawn) {
    double[] volts = voltages(potentials);
    float[] answer = new float[volts.length];
    for (int column = 0; column < volts.length; column++) {
      float factor = (float) volts[column];
      int start = column * volts.length;
      for (int row = 0; row < answer.length; row++) {
        answer[row] += factor * byColumn[start + row];
      }
    }
    double[] current = new double[answer.length];
    for (int i = 0; i < current.length; i++) {
      current[i] = answer[i];
    }
    draw(current, drawn);
  }
}
