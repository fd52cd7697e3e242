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
  private int version;

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

  int ports() {
    return from.length;
  }

  void clear() {
    Arrays.fill(byColumn, 0);
    version++;
  }

  /** Another number each time it is made anew. */
  int version() {
    return version;
  }

  /**
   * Becomes the slope K of one port as it is seen from behind a series impedance Z: (1 + K·Z)⁻¹·K.
   *
   * @param loopOhm both parts, order by order
   */
  void take(PlaceSlope bare, double[] loopOhm) {
    int size = size();
    double[][] matrix = new double[size][size];
    double[][] sides = new double[size][size];
    for (int column = 0; column < size; column += 2) {
      double r = loopOhm[column];
      double x = loopOhm[column + 1];
      for (int row = 0; row < size; row++) {
        double re = bare.byColumn[column * size + row];
        double im = bare.byColumn[(column + 1) * size + row];
        sides[row][column] = re;
        sides[row][column + 1] = im;
        matrix[row][column] = re * r + im * x;
        matrix[row][column + 1] = im * r - re * x;
      }
      matrix[column][column] += 1;
      matrix[column + 1][column + 1] += 1;
    }
    new DenseLu(matrix).solve(sides);
    for (int column = 0; column < size; column++) {
      for (int row = 0; row < size; row++) {
        byColumn[column * size + row] = (float) sides[row][column];
      }
    }
  }

  /** What its first port sees of a feeder; both parts, order by order. */
  double[] loop(FeederOhms feeder) {
    return feeder.loop(from[0], to);
  }

  /** Adds D to a matrix over all conductors of its board, where D·(their potentials) is drawn. */
  void addTo(double[][] matrix, FeederOhms board) {
    for (int line = 0; line < from.length; line++) {
      for (int other = 0; other < from.length; other++) {
        addBlock(matrix, board, line, other);
      }
    }
  }

  private void addBlock(double[][] matrix, FeederOhms board, int line, int other) {
    int top = board.position(from[line]) * perPort;
    int left = board.position(from[other]) * perPort;
    int back = to < 0 ? -1 : board.position(to) * perPort;
    for (int column = 0; column < perPort; column++) {
      int at = (other * perPort + column) * size() + line * perPort;
      for (int row = 0; row < perPort; row++) {
        double siemens = byColumn[at + row];
        matrix[top + row][left + column] += siemens;
        if (back >= 0) {
          matrix[top + row][back + column] -= siemens;
          matrix[back + row][left + column] -= siemens;
          matrix[back + row][back + column] += siemens;
        }
      }
    }
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
