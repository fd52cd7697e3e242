package fourthwire.validation;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/**
 * The inputs column of a validation file: {@code name=value; name=value}. A spectrum is {@code
 * order:magnitude} or {@code order:magnitude@degrees}, separated by spaces; the word {@code cos}
 * before it says that its angles are cosine-referenced, as in most printed tables.
 */
final class Inputs {
  private final Map<String, String> values = new HashMap<>();

  Inputs(String text) {
    for (String part : text.split(";")) {
      String[] pair = part.strip().split("=", 2);
      if (pair.length == 2) {
        values.put(pair[0].strip(), pair[1].strip());
      }
    }
  }

  String text(String name) {
    String value = values.get(name);
    if (value == null) {
      throw new IllegalArgumentException("no input " + name + " in " + values);
    }
    return value;
  }

  boolean has(String name) {
    return values.containsKey(name);
  }

  double number(String name) {
    return Double.parseDouble(text(name));
  }

  int whole(String name) {
    return Integer.parseInt(text(name));
  }

  Spectrum spectrum(String name) {
    String text = text(name);
    boolean cosine = text.startsWith("cos ");
    Map<Integer, Phasor> phasors = new HashMap<>();
    for (String item : (cosine ? text.substring(4) : text).split(" ")) {
      String[] orderAndRest = item.split(":");
      String[] polar = orderAndRest[1].split("@");
      int order = Integer.parseInt(orderAndRest[0]);
      double degrees = polar.length > 1 ? Double.parseDouble(polar[1]) : 0;
      // The contract's conversion: φ = a - 90°·(h - 1) for angles against a cosine.
      double sine = cosine ? degrees - 90 * (order - 1) : degrees;
      phasors.put(order, Phasor.polar(Double.parseDouble(polar[0]), sine));
    }
    return Spectrum.of(h -> phasors.getOrDefault(h, Phasor.ZERO));
  }

  List<Spectrum> spectra(String... names) {
    return Stream.of(names).map(this::spectrum).toList();
  }

  /** Three lines that carry copies of one spectrum a third of a cycle apart. */
  List<Spectrum> balanced(String name) {
    return rotated(spectrum(name));
  }

  static List<Spectrum> rotated(Spectrum line1) {
    return Stream.of(0, 1, 2)
        .map(k -> Spectrum.of(h -> line1.at(h).turned(-120.0 * h * k)))
        .toList();
  }
}
