package fourthwire.load.rectifier.node;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.List;

/**
 * Bridges that are the same per watt, each group taken as one: equal units in several rows, or
 * units of one design in several sizes. At one node they draw the same per watt, so a row in two
 * parts draws exactly what it does in one.
 */
public final class AlikeBridges implements SharedSource {
  /** Figures that differ by less, relative, are the same. */
  private static final double SAME = 1e-9;

  /** By how many e-folds diodes' currents may differ, and by how many ohms, times watts. */
  private static final double DIODES = 1.5;

  private static final double OHM_WATTS = 20;

  private final List<BridgeLoad> loads;
  private final SharedSource source;

  /** The bridges of each group, the first one speaking for all. */
  private final List<List<Integer>> groups = new ArrayList<>();

  AlikeBridges(List<BridgeLoad> loads, SharedSource source) {
    this.loads = loads;
    this.source = source;
    for (int k = 0; k < loads.size(); k++) {
      int bridge = k;
      groups.stream()
          .filter(group -> alike(group.get(0), bridge))
          .findFirst()
          .orElseGet(this::newGroup)
          .add(bridge);
    }
  }

  private List<Integer> newGroup() {
    List<Integer> group = new ArrayList<>();
    groups.add(group);
    return group;
  }

  private boolean alike(int a, int b) {
    BridgeLoad one = loads.get(a);
    BridgeLoad other = loads.get(b);
    return sameDesign(one, other)
        && same(own(a, b, source::ohm), own(b, a, source::ohm), source.ohm(a, a))
        && same(own(a, b, source::henry), own(b, a, source::henry), source.henry(a, a))
        && standAlike(a, b);
  }

  /**
   * Whether two are the same per watt. Their diodes may differ by so much as is worth under a tenth
   * of a volt, as units of one design have the same diode whatever their size.
   */
  public static boolean sameDesign(BridgeLoad a, BridgeLoad other) {
    BridgeLoad b = other.parallel(a.powerW() / other.powerW());
    return same(a.capacitanceF(), b.capacitanceF())
        && same(a.leadOhm(), b.leadOhm())
        && same(a.leadHenry(), b.leadHenry())
        && same(a.lineOhm(), b.lineOhm())
        && same(a.lineHenry(), b.lineHenry())
        && same(a.dcOhm(), b.dcOhm())
        && same(a.dcHenry(), b.dcHenry())
        && a.diode().emission() == b.diode().emission()
        && Math.abs(Math.log(a.diode().saturationA() / b.diode().saturationA())) < DIODES
        && Math.abs(a.diode().ohm() - b.diode().ohm()) * a.powerW() < OHM_WATTS;
  }

  private static boolean same(double a, double b) {
    return same(a, b, a);
  }

  /** Part of a matrix: a bridge's port and another's. */
  private interface Entry {
    double at(int bridge, int other);
  }

  /** What a bridge does not share with another, times its power. */
  private double own(int a, int b, Entry entry) {
    return (entry.at(a, a) - entry.at(a, b)) * loads.get(a).powerW() / loads.get(0).powerW();
  }

  /** Whether two bridges share the same with each of the others. */
  private boolean standAlike(int a, int b) {
    for (int k = 0; k < loads.size(); k++) {
      if (k != a
          && k != b
          && !(same(source.ohm(a, k), source.ohm(b, k), source.ohm(a, a))
              && same(source.henry(a, k), source.henry(b, k), source.henry(a, a)))) {
        return false;
      }
    }
    return true;
  }

  private static boolean same(double a, double b, double scale) {
    return Math.abs(a - b) <= SAME * Math.abs(scale);
  }

  int count() {
    return groups.size();
  }

  /** Each group as one bridge. */
  List<BridgeLoad> asOne() {
    return groups.stream()
        .map(g -> loads.get(g.get(0)).parallel(power(g) / loads.get(g.get(0)).powerW()))
        .toList();
  }

  private double power(List<Integer> group) {
    return group.stream().mapToDouble(k -> loads.get(k).powerW()).sum();
  }

  private double share(int bridge, List<Integer> group) {
    return loads.get(bridge).powerW() / power(group);
  }

  /** The electromotive force that a group sees. */
  PortSpectra emf(int group, PortSpectra[] emf) {
    PortSpectra mean = new PortSpectra(emf[0].ports());
    for (int k : groups.get(group)) {
      add(share(k, groups.get(group)), emf[k], mean);
    }
    return mean;
  }

  /** Gives each of a group its part of the current. */
  void share(int group, PortSpectra drawn, PortSpectra[] current) {
    for (int k : groups.get(group)) {
      current[k].clear();
      add(share(k, groups.get(group)), drawn, current[k]);
    }
  }

  private static void add(double factor, PortSpectra part, PortSpectra sum) {
    for (int port = 0; port < sum.ports(); port++) {
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        sum.re[port][h] += factor * part.re[port][h];
        sum.im[port][h] += factor * part.im[port][h];
      }
      sum.direct[port] += factor * part.direct[port];
    }
  }

  @Override
  public double ohm(int group, int other) {
    return between(group, other, source::ohm);
  }

  @Override
  public double henry(int group, int other) {
    return between(group, other, source::henry);
  }

  private double between(int group, int other, Entry entry) {
    double sum = 0;
    for (int a : groups.get(group)) {
      for (int b : groups.get(other)) {
        sum += share(a, groups.get(group)) * share(b, groups.get(other)) * entry.at(a, b);
      }
    }
    return sum;
  }
}
