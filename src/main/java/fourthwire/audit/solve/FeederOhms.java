package fourthwire.audit.solve;

import fourthwire.network.DrivingPoint;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Phasor;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;

/**
 * What lies between a board and one above it, or between it and all sources: by how much its
 * conductors' potentials fall for each ampere drawn there, order by order.
 */
final class FeederOhms {
  private final int[] starts;
  private final int orders;

  /** Both parts, by order, conductor that falls and conductor that draws. */
  private final double[] ohm;

  private FeederOhms(TreeNetwork network, int node, BoardRow row, int orders) {
    this.starts = new int[network.conductors(node)];
    Arrays.setAll(starts, c -> row.start(network.index(node, c)));
    this.orders = orders;
    this.ohm = new double[2 * orders * starts.length * starts.length];
  }

  /** From each board of a row to one above it. */
  static List<FeederOhms> below(List<BoardAbove> above, BoardRow row, BoardResponse response) {
    int[] nodes = row.nodes().toArray();
    List<FeederOhms> feeders = whole(row, response);
    response.eachDrivingPoints(
        (position, points) -> {
          for (int b = 0; b < nodes.length; b++) {
            DrivingPoint point = points.at(above.get(b).node());
            feeders.get(b).take(position, point, above.get(b).conductors(), -1);
          }
        });
    return feeders;
  }

  /** From each board of a row to the sources. */
  static List<FeederOhms> whole(BoardRow row, BoardResponse response) {
    int[] nodes = row.nodes().toArray();
    int orders = response.orders().count();
    List<FeederOhms> feeders =
        IntStream.of(nodes)
            .mapToObj(node -> new FeederOhms(response.network(), node, row, orders))
            .toList();
    response.eachDrivingPoints(
        (position, points) -> {
          for (int b = 0; b < nodes.length; b++) {
            int[] own = IntStream.range(0, feeders.get(b).size()).toArray();
            feeders.get(b).take(position, points.at(nodes[b]), own, 1);
          }
        });
    return feeders;
  }

  private void take(int position, DrivingPoint point, int[] conductors, int sign) {
    int at = 2 * position * size() * size();
    for (int fall : conductors) {
      for (int drawing : conductors) {
        Phasor z = point.at(fall, drawing);
        ohm[at++] += sign * z.re();
        ohm[at++] += sign * z.im();
      }
    }
  }

  int size() {
    return starts.length;
  }

  /** Which of the board's conductors begins there in the row. */
  int position(int start) {
    int c = 0;
    while (starts[c] != start) {
      c++;
    }
    return c;
  }

  /** The start in the row of one of the board's conductors. */
  int start(int conductor) {
    return starts[conductor];
  }

  /**
   * What a port of these conductors, by their starts in the row, sees of it; both parts by order.
   */
  double[] loop(int line, int back) {
    int a = position(line);
    double[] loop = new double[2 * orders];
    for (int k = 0; k < orders; k++) {
      loop[2 * k] = re(k, a, a);
      loop[2 * k + 1] = im(k, a, a);
      if (back >= 0) {
        int b = position(back);
        loop[2 * k] += re(k, b, b) - re(k, a, b) - re(k, b, a);
        loop[2 * k + 1] += im(k, b, b) - im(k, a, b) - im(k, b, a);
      }
    }
    return loop;
  }

  double re(int position, int fall, int drawing) {
    return ohm[2 * ((position * size() + fall) * size() + drawing)];
  }

  double im(int position, int fall, int drawing) {
    return ohm[2 * ((position * size() + fall) * size() + drawing) + 1];
  }

  /** Takes from potentials what these currents let fall. */
  void fall(double[] drawn, double[] potentials) {
    for (int k = 0; k < orders; k++) {
      for (int a = 0; a < starts.length; a++) {
        double re = 0;
        double im = 0;
        for (int b = 0; b < starts.length; b++) {
          double zRe = re(k, a, b);
          double zIm = im(k, a, b);
          double iRe = drawn[starts[b] + 2 * k];
          double iIm = drawn[starts[b] + 2 * k + 1];
          re += zRe * iRe - zIm * iIm;
          im += zRe * iIm + zIm * iRe;
        }
        potentials[starts[a] + 2 * k] -= re;
        potentials[starts[a] + 2 * k + 1] -= im;
      }
    }
  }
}
