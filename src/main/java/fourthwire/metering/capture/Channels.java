package fourthwire.metering.capture;

import fourthwire.quantity.Conductor;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.ToDoubleBiFunction;

/**
 * Every channel of a capture over its analysed cycles, with what follows from several of them
 * sample by sample: the sum of the line currents, and line-to-line voltages.
 */
final class Channels {
  /** Line-to-line voltages, each the first line's minus the second's. */
  static final List<String> PAIRS = List.of("L1-L2", "L2-L3", "L3-L1");

  static final List<Conductor> LINES = List.of(Conductor.L1, Conductor.L2, Conductor.L3);

  /** The sum of the line currents. */
  static final String SUM = "sum.i";

  /** The neutral's own channel. */
  static final String NEUTRAL = "N.i";

  private final Map<String, ChannelFigures> byQuantity;
  private final ToDoubleBiFunction<String, String> product;

  /**
   * Channels and sums of them.
   *
   * @param product mean product of two of {@link #products}, direct components left out
   */
  Channels(Map<String, ChannelFigures> byQuantity, ToDoubleBiFunction<String, String> product) {
    this.byQuantity = new LinkedHashMap<>(byQuantity);
    this.product = product;
  }

  /**
   * A sum of channels that was not recorded itself.
   *
   * @param of the channels
   * @param factors of each
   */
  record Sum(String quantity, List<String> of, List<Double> factors) {}

  /** The sums that can be formed of these channels. */
  static List<Sum> sums(List<String> channels) {
    List<Sum> sums = new ArrayList<>();
    List<String> lines = LINES.stream().map(l -> l + ".i").toList();
    if (channels.containsAll(lines)) {
      sums.add(new Sum(SUM, lines, List.of(1.0, 1.0, 1.0)));
    }
    for (String pair : PAIRS) {
      List<String> both = List.of(pair.substring(0, 2) + ".v", pair.substring(3) + ".v");
      if (channels.containsAll(both) && !channels.contains(pair + ".v")) {
        sums.add(new Sum(pair + ".v", both, List.of(1.0, -1.0)));
      }
    }
    return sums;
  }

  /** The products that figures are made of, of what is among these quantities. */
  static List<List<String>> products(List<String> quantities) {
    List<List<String>> products = new ArrayList<>();
    LINES.forEach(l -> products.add(List.of(l + ".v", l + ".i")));
    products.add(List.of("L2-L3.v", "L2.i"));
    products.add(List.of("L3-L1.v", "L1.i"));
    products.add(List.of(NEUTRAL, SUM));
    return products.stream().filter(quantities::containsAll).toList();
  }

  /** A quantity. */
  Optional<ChannelFigures> find(String quantity) {
    return Optional.ofNullable(byQuantity.get(quantity));
  }

  /** The current of a conductor's channel. */
  Optional<ChannelFigures> current(Conductor conductor) {
    return find(conductor + ".i");
  }

  /** The voltage of a line to neutral. */
  Optional<ChannelFigures> voltage(Conductor line) {
    return find(line + ".v");
  }

  /** The sum of the three line currents, where all were recorded. */
  Optional<ChannelFigures> sumOfLines() {
    return find(SUM);
  }

  /** Lines whose current was recorded. */
  List<Conductor> lines() {
    return LINES.stream().filter(l -> current(l).isPresent()).toList();
  }

  /** Lines whose current and voltage to neutral were recorded. */
  List<Conductor> linesWithPower() {
    return lines().stream().filter(l -> voltage(l).isPresent()).toList();
  }

  /** Mean of the lines' rms currents, amps. */
  double meanLineA() {
    return lines().stream()
        .map(this::current)
        .flatMap(Optional::stream)
        .mapToDouble(ChannelFigures::rms)
        .average()
        .orElse(0);
  }

  /** Active power of a voltage and a current, watts. */
  double activeW(String voltage, String current) {
    return product.applyAsDouble(voltage, current);
  }

  /** Active power of a line. */
  double activeW(Conductor line) {
    return activeW(line + ".v", line + ".i");
  }

  /** Mean product of the neutral's channel with the sum of the lines, A². */
  double neutralTimesSum() {
    return product.applyAsDouble(NEUTRAL, SUM);
  }

  /**
   * The quantity whose fundamental is the reference of all angles: L1's voltage, else the first
   * voltage, else the first line current.
   */
  static Optional<String> reference(List<String> quantities) {
    List<String> candidates = new ArrayList<>(List.of("L1.v", "L2.v", "L3.v"));
    PAIRS.forEach(p -> candidates.add(p + ".v"));
    LINES.forEach(l -> candidates.add(l + ".i"));
    return candidates.stream().filter(quantities::contains).findFirst();
  }
}
