package fourthwire.audit.solve;

import fourthwire.audit.plan.Device;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Background;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * The orders that can occur: all of 1 to 50 where a source, a given spectrum or a load has an even
 * one, else the odd ones. Computed loads draw alike half-waves as a rule; a bridge with a small
 * capacitor behind a soft source may hold a state only whose half-waves differ, which shows when it
 * is solved.
 */
final class OrdersInPlay {
  private final int[] orders;

  private OrdersInPlay(int[] orders) {
    this.orders = orders;
  }

  static OrdersInPlay of(List<Background> background, List<Device> devices) {
    boolean even =
        background.stream().anyMatch(b -> b.order() % 2 == 0 && b.percent() != 0)
            || devices.stream()
                .map(d -> d.placement().request().spectrum())
                .flatMap(Optional::stream)
                .anyMatch(OrdersInPlay::hasEven);
    return even ? all() : new OrdersInPlay(whole().filter(h -> h % 2 == 1).toArray());
  }

  /** All orders. */
  static OrdersInPlay all() {
    return new OrdersInPlay(whole().toArray());
  }

  private static IntStream whole() {
    return IntStream.rangeClosed(1, Spectrum.HIGHEST_ORDER);
  }

  /** Whether currents of even orders would be lost. */
  boolean oddOnly() {
    return orders[orders.length - 1] == Spectrum.HIGHEST_ORDER - 1;
  }

  private static boolean hasEven(Spectrum spectrum) {
    return IntStream.iterate(2, h -> h <= Spectrum.HIGHEST_ORDER, h -> h + 2)
        .anyMatch(h -> spectrum.magnitude(h) != 0);
  }

  int count() {
    return orders.length;
  }

  int at(int position) {
    return orders[position];
  }

  /** Writes these orders of a block of spectra into a row from its start on. */
  void copy(PortSpectra spectra, double[] row, int start) {
    int at = start;
    for (int port = 0; port < spectra.ports(); port++) {
      for (int order : orders) {
        row[at++] = spectra.re[port][order];
        row[at++] = spectra.im[port][order];
      }
    }
  }

  /**
   * Turns a row of phasors, ports one after the other, by an angle of the fundamental: order h by h
   * times it.
   */
  void turn(double[] phasors, double cos, double sin) {
    int step = orders.length > 1 ? orders[1] - orders[0] : 1;
    double stepCos = step == 1 ? cos : cos * cos - sin * sin;
    double stepSin = step == 1 ? sin : 2 * cos * sin;
    for (int at = 0; at < phasors.length; at += 2 * orders.length) {
      double c = cos;
      double s = sin;
      for (int k = at; k < at + 2 * orders.length; k += 2) {
        double re = phasors[k];
        phasors[k] = re * c - phasors[k + 1] * s;
        phasors[k + 1] = re * s + phasors[k + 1] * c;
        double next = c * stepCos - s * stepSin;
        s = s * stepCos + c * stepSin;
        c = next;
      }
    }
  }
}
