package fourthwire.audit.solve;

import fourthwire.network.DrivingPoints;
import fourthwire.network.Excitation;
import fourthwire.network.FactoredOrder;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import fourthwire.network.Trunk;
import fourthwire.quantity.Spectrum;
import java.util.Optional;
import java.util.function.BiConsumer;

/** What the network answers, order by order, to currents that change at some of its boards. */
final class BoardResponse {
  private final TreeNetwork network;
  private final FactoredOrder[] factors;
  private final OrdersInPlay orders;
  private final Workers workers;
  private final Excitation[] excitations = new Excitation[Spectrum.HIGHEST_ORDER + 1];
  private final OrderSolution[] solutions = new OrderSolution[Spectrum.HIGHEST_ORDER + 1];

  BoardResponse(
      TreeNetwork network, FactoredOrder[] factors, OrdersInPlay orders, Workers workers) {
    this.network = network;
    this.factors = factors;
    this.orders = orders;
    this.workers = workers;
    for (int k = 0; k < orders.count(); k++) {
      int h = orders.at(k);
      excitations[h] = network.excitation();
      solutions[h] = factors[h].solve(excitations[h]);
    }
  }

  TreeNetwork network() {
    return network;
  }

  OrdersInPlay orders() {
    return orders;
  }

  Workers workers() {
    return workers;
  }

  /** Hands over the driving-point impedances of every order, by its position. */
  void eachDrivingPoints(BiConsumer<Integer, DrivingPoints> taker) {
    workers.each(orders.count(), k -> taker.accept(k, factors[orders.at(k)].drivingPoints()));
  }

  /** The orders solved last, on the trunk they were solved on. */
  OrderSolution[] solutions() {
    return solutions;
  }

  /**
   * Solves.
   *
   * @param trunk reaches all boards of the row, and where else something is fed
   * @param drawn row of what is drawn
   * @param feed adds what else is fed into an order, by its position, if anything is
   * @param potentials receives the row of potentials
   */
  void find(
      Trunk trunk,
      BoardRow row,
      double[] drawn,
      Optional<BiConsumer<Excitation, Integer>> feed,
      double[] potentials) {
    workers.each(
        orders.count(),
        position -> {
          Excitation excitation = excitations[orders.at(position)];
          for (int c = 0; c < row.count(); c++) {
            int at = c * row.perConductor() + 2 * position;
            excitation.set(row.conductor(c), -drawn[at], -drawn[at + 1]);
          }
          feed.ifPresent(more -> more.accept(excitation, position));
          OrderSolution solution = solutions[orders.at(position)];
          factors[orders.at(position)].solve(excitation, solution, trunk);
          for (int c = 0; c < row.count(); c++) {
            int at = c * row.perConductor() + 2 * position;
            potentials[at] = solution.potentialRe(row.conductor(c));
            potentials[at + 1] = solution.potentialIm(row.conductor(c));
          }
          leaveEmpty(excitation, row, feed.isPresent());
        });
  }

  private static void leaveEmpty(Excitation excitation, BoardRow row, boolean more) {
    if (more) {
      excitation.clear();
    } else {
      for (int c = 0; c < row.count(); c++) {
        excitation.set(row.conductor(c), 0, 0);
      }
    }
  }
}
