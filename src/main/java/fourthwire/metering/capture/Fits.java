package fourthwire.metering.capture;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Every channel of a capture over its window, with what follows from several of them sample by
 * sample: the sum of the line currents, and line-to-line voltages.
 */
final class Fits {
  /** Line-to-line voltages, each the first line's minus the second's. */
  static final List<String> PAIRS = List.of("L1-L2", "L2-L3", "L3-L1");

  static final List<Conductor> LINES = List.of(Conductor.L1, Conductor.L2, Conductor.L3);

  private static final String SUM = "sum.i";

  private final Map<String, HarmonicFit> byQuantity = new LinkedHashMap<>();
  private final double referenceDegrees;

  Fits(Capture capture, Window window) {
    Map<String, double[]> samples = new LinkedHashMap<>();
    for (Capture.Channel c : capture.channels()) {
      capture.find(c.quantity()).ifPresent(x -> samples.put(c.quantity(), x));
    }
    derive(samples);
    double[] t = capture.timesS();
    samples.forEach(
        (quantity, x) ->
            byQuantity.put(
                quantity,
                HarmonicFit.of(t, x, window.samples(), window.frequencyHz(), window.orders())));
    this.referenceDegrees = reference();
  }

  private static void derive(Map<String, double[]> samples) {
    List<double[]> lines = new ArrayList<>();
    LINES.forEach(l -> Optional.ofNullable(samples.get(l + ".i")).ifPresent(lines::add));
    if (lines.size() == LINES.size()) {
      double[] sum = new double[lines.get(0).length];
      lines.forEach(x -> add(sum, x, 1));
      samples.put(SUM, sum);
    }
    for (String pair : PAIRS) {
      double[] first = samples.get(pair.substring(0, 2) + ".v");
      double[] second = samples.get(pair.substring(3) + ".v");
      if (first != null && second != null && !samples.containsKey(pair + ".v")) {
        double[] difference = first.clone();
        add(difference, second, -1);
        samples.put(pair + ".v", difference);
      }
    }
  }

  private static void add(double[] into, double[] x, double factor) {
    for (int k = 0; k < into.length; k++) {
      into[k] += factor * x[k];
    }
  }

  /** Angle at the first sample of L1's voltage, else of the first voltage, else current. */
  private double reference() {
    List<String> candidates = new ArrayList<>(List.of("L1.v", "L2.v", "L3.v"));
    PAIRS.forEach(p -> candidates.add(p + ".v"));
    LINES.forEach(l -> candidates.add(l + ".i"));
    return candidates.stream()
        .map(this::find)
        .flatMap(Optional::stream)
        .findFirst()
        .map(fit -> fit.at(1).degrees())
        .orElse(0.0);
  }

  /** The fit of a quantity. */
  Optional<HarmonicFit> find(String quantity) {
    return Optional.ofNullable(byQuantity.get(quantity));
  }

  /** The current of a conductor's channel. */
  Optional<HarmonicFit> current(Conductor conductor) {
    return find(conductor + ".i");
  }

  /** The voltage of a line to neutral. */
  Optional<HarmonicFit> voltage(Conductor line) {
    return find(line + ".v");
  }

  /** The sum of the three line currents, where all were recorded. */
  Optional<HarmonicFit> sumOfLines() {
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
        .mapToDouble(HarmonicFit::alternatingRms)
        .average()
        .orElse(0);
  }

  /** Orders 1 to 50 on the common time reference. */
  Spectrum spectrum(HarmonicFit fit) {
    return fit.spectrum(referenceDegrees);
  }
}
