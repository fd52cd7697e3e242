package fourthwire.audit.solve;

import static fourthwire.quantity.Conductor.N;

import fourthwire.audit.plan.Place;
import fourthwire.network.Excitation;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Conductor;
import fourthwire.site.Filter;
import java.util.Arrays;
import java.util.List;

/**
 * An active filter at its panel: it feeds the panel the harmonics of what hangs below, orders 2 to
 * 25, so that they do not come from above; up to its rated current per line (three times that in
 * the neutral), all orders of a line clipped in one proportion. Without a neutral it leaves zero
 * sequence alone. Source: the public contract and methods; a screening model, no source.
 */
final class ActiveFilter {
  private static final int HIGHEST_ORDER = 25;

  private final int node;
  private final double ratedA;
  private final int[] lines;
  private final int neutral;
  private final int offset;
  private final double[] parts;

  private ActiveFilter(int node, double ratedA, int[] lines, int neutral, int offset) {
    this.node = node;
    this.ratedA = ratedA;
    this.lines = lines;
    this.neutral = neutral;
    this.offset = offset;
    this.parts = new double[lines.length];
    Arrays.fill(parts, 1);
  }

  /**
   * The filter at its place.
   *
   * @param offset where its currents start in the whole state
   */
  static ActiveFilter of(Filter filter, Place place, TreeNetwork network, int offset) {
    List<Conductor> lines = place.node().lines();
    return new ActiveFilter(
        place.networkNode(),
        filter.ratedA().orElseThrow(),
        lines.stream()
            .mapToInt(l -> network.index(place.networkNode(), place.conductors().of(l)))
            .toArray(),
        place.node().hasNeutral()
            ? network.index(place.networkNode(), place.conductors().of(N))
            : -1,
        offset);
  }

  /** The network's node it feeds. */
  int node() {
    return node;
  }

  int ports() {
    return lines.length;
  }

  int offset() {
    return offset;
  }

  /**
   * What it would feed at these currents.
   *
   * @param x the whole state, amps: what it fed when these currents were solved
   * @param g receives what it feeds now, in its place
   */
  void solve(OrdersInPlay orders, OrderSolution[] solutions, double[] x, double[] g) {
    int perLine = 2 * orders.count();
    for (int line = 0; line < lines.length; line++) {
      for (int k = 0; k < orders.count(); k++) {
        int at = offset + line * perLine + 2 * k;
        int h = orders.at(k);
        boolean taken = h > 1 && h <= HIGHEST_ORDER;
        g[at] = taken ? solutions[h].currentRe(lines[line]) + x[at] : 0;
        g[at + 1] = taken ? solutions[h].currentIm(lines[line]) + x[at + 1] : 0;
      }
    }
    if (neutral < 0) {
      removeZeroSequence(g, offset, perLine);
    }
    clip(g, perLine);
  }

  private void removeZeroSequence(double[] g, int start, int perLine) {
    for (int k = 0; k < perLine; k++) {
      double mean = 0;
      for (int line = 0; line < lines.length; line++) {
        mean += g[start + line * perLine + k] / lines.length;
      }
      for (int line = 0; line < lines.length; line++) {
        g[start + line * perLine + k] -= mean;
      }
    }
  }

  /**
   * Each line to its rated current, all its orders in one proportion; without a neutral all lines
   * alike, so that what sums to zero goes on summing to zero.
   */
  private void clip(double[] g, int perLine) {
    double smallest = 1;
    for (int line = 0; line < lines.length; line++) {
      double square = 0;
      for (int k = 0; k < perLine; k++) {
        double amps = g[offset + line * perLine + k];
        square += amps * amps;
      }
      parts[line] = square > ratedA * ratedA ? ratedA / Math.sqrt(square) : 1;
      smallest = Math.min(smallest, parts[line]);
    }
    if (neutral < 0) {
      Arrays.fill(parts, smallest);
    }
    for (int line = 0; line < lines.length; line++) {
      for (int k = 0; k < perLine; k++) {
        g[offset + line * perLine + k] *= parts[line];
      }
    }
  }

  /**
   * What the filter answers to a small change.
   *
   * @param response the change of the currents
   * @param y the change of the filters' currents
   * @param into receives the answer, in its place
   * @param shift by how much later than in the whole state the filters' currents stand in both
   */
  void answer(OrdersInPlay orders, OrderSolution[] response, double[] y, double[] into, int shift) {
    int perLine = 2 * orders.count();
    int start = offset + shift;
    for (int line = 0; line < lines.length; line++) {
      for (int k = 0; k < orders.count(); k++) {
        int at = start + line * perLine + 2 * k;
        int h = orders.at(k);
        boolean taken = h > 1 && h <= HIGHEST_ORDER;
        double re = response[h].currentRe(lines[line]) + y[at];
        double im = response[h].currentIm(lines[line]) + y[at + 1];
        into[at] = taken ? parts[line] * re : 0;
        into[at + 1] = taken ? parts[line] * im : 0;
      }
    }
    if (neutral < 0) {
      removeZeroSequence(into, start, perLine);
    }
  }

  /**
   * Feeds the order at this position of the state into the panel, and takes it from the neutral.
   */
  void feed(Excitation excitation, OrdersInPlay orders, int position, double[] x, int shift) {
    for (int line = 0; line < lines.length; line++) {
      int at = shift + offset + 2 * (line * orders.count() + position);
      excitation.inject(lines[line], x[at], x[at + 1]);
      if (neutral >= 0) {
        excitation.inject(neutral, -x[at], -x[at + 1]);
      }
    }
  }
}
