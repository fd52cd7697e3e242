package fourthwire.metering.capture;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;

/**
 * How clamps and voltage leads stand to each other, judged by the fundamentals' angles.
 *
 * <p>A load's current stands within {@value #WIDEST_DEGREES}° of its line's voltage (common
 * practice, no source: a displacement factor of 0.5). Where the lines as named do not, the fewest
 * exchanges and turnings of clamps are looked for that make them.
 */
final class Wiring {
  private static final double WIDEST_DEGREES = 60;
  private static final int[][] ORDERS = {
    {0, 1, 2}, {0, 2, 1}, {1, 0, 2}, {2, 1, 0}, {1, 2, 0}, {2, 0, 1}
  };

  private Wiring() {}

  /**
   * What the currents' clamps are on.
   *
   * @param onLine the line whose voltage each clamp's current fits, by the line it is named after
   * @param turned clamps that point the wrong way
   */
  record Clamps(Map<Conductor, Conductor> onLine, List<Conductor> turned) {
    /** Clamps that stand on another line than their name says. */
    List<Conductor> exchanged() {
      return onLine.keySet().stream().filter(l -> onLine.get(l) != l).toList();
    }
  }

  /** Whether the voltages L1, L2, L3 follow each other backwards. */
  static boolean voltagesRunBackwards(List<Phasor> v) {
    Phasor a = Phasor.polar(1, 120);
    Phasor forward = v.get(0).plus(v.get(1).times(a)).plus(v.get(2).times(a).times(a));
    Phasor backward = v.get(0).plus(v.get(1).times(a).times(a)).plus(v.get(2).times(a));
    return backward.magnitude() > 2 * forward.magnitude();
  }

  /**
   * The least change of clamps that fits every current to a voltage; empty where the clamps fit as
   * they are, or where no change fits.
   *
   * @param lines lines with both, at least two
   */
  static Optional<Clamps> mended(
      List<Conductor> lines,
      Function<Conductor, Phasor> voltage,
      Function<Conductor, Phasor> current) {
    Optional<Clamps> best = Optional.empty();
    int fewest = Integer.MAX_VALUE;
    for (int[] order : ORDERS) {
      List<Conductor> onto = permuted(lines, order);
      for (int turns = 0; !onto.isEmpty() && turns < 1 << lines.size(); turns++) {
        Clamps clamps = clamps(lines, onto, turns);
        int changes = 2 * clamps.exchanged().size() + 2 * clamps.turned().size();
        if (changes < fewest && fits(clamps, voltage, current)) {
          fewest = changes;
          best = Optional.of(clamps);
        }
      }
    }
    return fewest == 0 ? Optional.empty() : best;
  }

  private static List<Conductor> permuted(List<Conductor> lines, int[] order) {
    List<Conductor> onto = new ArrayList<>();
    for (int k = 0; k < lines.size(); k++) {
      if (order[k] >= lines.size()) {
        return List.of();
      }
      onto.add(lines.get(order[k]));
    }
    return onto;
  }

  private static Clamps clamps(List<Conductor> lines, List<Conductor> onto, int turns) {
    Map<Conductor, Conductor> onLine = new LinkedHashMap<>();
    List<Conductor> turned = new ArrayList<>();
    for (int k = 0; k < lines.size(); k++) {
      onLine.put(lines.get(k), onto.get(k));
      if ((turns >> k & 1) == 1) {
        turned.add(lines.get(k));
      }
    }
    return new Clamps(onLine, turned);
  }

  private static boolean fits(
      Clamps clamps, Function<Conductor, Phasor> voltage, Function<Conductor, Phasor> current) {
    return clamps.onLine().entrySet().stream()
        .allMatch(
            e -> {
              Phasor i = current.apply(e.getKey());
              double sign = clamps.turned().contains(e.getKey()) ? -1 : 1;
              return Math.abs(between(voltage.apply(e.getValue()), i.times(sign)))
                  <= WIDEST_DEGREES;
            });
  }

  private static double between(Phasor v, Phasor i) {
    return v.times(i.conjugate()).degrees();
  }
}
