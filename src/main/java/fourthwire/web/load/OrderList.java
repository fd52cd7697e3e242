package fourthwire.web.load;

import fourthwire.load.LoadModels;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.web.support.Words;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Orders typed into one field: {@code 3 80 180; 5 55} is order, percent of the fundamental and, if
 * known, degrees, entry by entry; new lines separate as semicolons do.
 */
final class OrderList {
  /** As the survey's tables have it: a voltage's order, and a current's. */
  private static final double MOST_OF_VOLTAGE = 100;

  private static final double MOST_OF_CURRENT = 1000;

  private final Map<Integer, Phasor> phasors = new HashMap<>();
  private final Set<Integer> seen = new HashSet<>();
  private final int lowest;
  private final double mostPercent;
  private final double fundamentalDegrees;
  private String wrong = "";

  private OrderList(int lowest, double mostPercent, double fundamentalDegrees) {
    this.lowest = lowest;
    this.mostPercent = mostPercent;
    this.fundamentalDegrees = fundamentalDegrees;
  }

  /** A voltage's distortion; degrees left out are 0, as in the survey's background table. */
  static Optional<Spectrum> background(Typed typed, String field, Words words) {
    return read(new OrderList(2, MOST_OF_VOLTAGE, 0), typed, field, words);
  }

  /**
   * A current's spectrum on a fundamental of 1; degrees left out are those of a pulse at the crest.
   *
   * @param fundamentalDegrees the fundamental's where none are typed
   */
  static Optional<Spectrum> current(
      Typed typed, String field, double fundamentalDegrees, Words words) {
    OrderList list = new OrderList(1, MOST_OF_CURRENT, fundamentalDegrees);
    list.phasors.put(1, Phasor.polar(1, fundamentalDegrees));
    return read(list, typed, field, words).map(s -> s.times(1 / s.magnitude(1)));
  }

  private static Optional<Spectrum> read(OrderList list, Typed typed, String field, Words words) {
    for (String entry : typed.text(field).split("[;\\n\\r]+")) {
      if (!entry.isBlank() && !list.take(entry.strip())) {
        list.wrong = entry.strip();
        break;
      }
    }
    if (!list.wrong.isEmpty()) {
      typed.error(
          field,
          words.of("loads.error.orders", list.wrong, list.lowest, Typed.bound(list.mostPercent)));
      return Optional.empty();
    }
    return Optional.of(Spectrum.of(h -> list.phasors.getOrDefault(h, Phasor.ZERO)));
  }

  private boolean take(String entry) {
    String[] parts = entry.split("[ \\t]+");
    if (parts.length < 2 || parts.length > 3 || !parts[0].matches("\\d{1,2}")) {
      return false;
    }
    int order = Integer.parseInt(parts[0]);
    OptionalDouble percent = Typed.parsed(parts[1]);
    OptionalDouble degrees =
        parts.length == 3 ? Typed.parsed(parts[2]) : OptionalDouble.of(assumed(order));
    double share = percent.orElse(-1);
    if (order < lowest
        || order > Spectrum.HIGHEST_ORDER
        || degrees.isEmpty()
        || !(share >= (order == 1 ? 1 : 0) && share <= mostPercent)
        || !seen.add(order)) {
      return false;
    }
    phasors.put(order, Phasor.polar(share / 100, degrees.getAsDouble()));
    return true;
  }

  private double assumed(int order) {
    return order == 1
        ? fundamentalDegrees
        : lowest == 1 ? LoadModels.assumedHarmonicDegrees(order) : 0;
  }
}
