package fourthwire.intake.reading.unit;

import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.heading.Heading.Meaning;
import java.util.List;
import java.util.Optional;

/**
 * Prefixes of powers and currents: units are a thousand apart, so that volts times amps tell W from
 * kW.
 */
final class PowerUnits {
  private static final double[] PREFIXES = {1, 1e3, 1e6};

  private final OpenHeadings open;

  PowerUnits(OpenHeadings open) {
    this.open = open;
  }

  void settlePowers() {
    open.each(Meaning.UNIT_OPEN, ".*\\.(active_w|apparent_va)", this::power);
    open.each(Meaning.UNIT_OPEN, ".*\\.reactive_var", this::reactive);
  }

  void settleCurrents() {
    open.each(Meaning.LIKELY, ".*\\.rms_a", this::current);
  }

  /** By a power whose unit is known: a thousand times too much or too little is a prefix. */
  private Heading current(String column) {
    Heading h = open.of(column);
    String line = OpenHeadings.place(h);
    double share = open.values().ratio(open.find(line + ".active_w"), voltAmps(line));
    if (Double.isNaN(share) || share == 0 || OpenHeadings.within(share, 0.02, 1.1)) {
      return h;
    }
    for (double prefix : new double[] {1e3, 1e-3}) {
      if (OpenHeadings.within(share / prefix, 0.02, 1.1)) {
        return open.scaled(
            column, prefix, prefix > 1 ? "kA, as its power shows" : "mA, as its power shows");
      }
    }
    return h;
  }

  private Heading power(String column) {
    Heading h = open.of(column);
    double share =
        open.values().ratio(Optional.of(open.values().of(column)), voltAmps(OpenHeadings.place(h)));
    double least = h.quantity().endsWith("apparent_va") ? 0.7 : 0.03;
    for (double prefix : PREFIXES) {
      if (OpenHeadings.within(prefix * share, least, 1.15)) {
        return open.scaled(
            column, prefix, unit(prefix, h.quantity()) + ", as volts times amps show");
      }
    }
    return likeOthers(column).orElse(h);
  }

  /** Powers that nothing else tells of are written as all the others of the file are. */
  private Optional<Heading> likeOthers(String column) {
    List<Double> others = prefixes();
    return others.size() == 1
        ? Optional.of(
            open.scaled(
                column,
                others.get(0),
                unit(others.get(0), open.of(column).quantity()) + ", as the other powers are"))
        : Optional.empty();
  }

  private List<Double> prefixes() {
    return open.all().values().stream()
        .filter(o -> o.meaning() == Meaning.LIKELY || o.meaning() == Meaning.CLEAR)
        .filter(o -> o.quantity().endsWith(".active_w") || o.quantity().endsWith(".apparent_va"))
        .map(Heading::factor)
        .distinct()
        .toList();
  }

  /** Never above volts times amps, and written as the other powers are. */
  private Heading reactive(String column) {
    Heading h = open.of(column);
    double share =
        open.values().ratio(Optional.of(open.values().of(column)), voltAmps(OpenHeadings.place(h)));
    Optional<Heading> alike = likeOthers(column);
    boolean can =
        alike.isPresent() && (Double.isNaN(share) || alike.get().factor() * share <= 1.15);
    return can ? alike.get() : h;
  }

  private static String unit(double prefix, String quantity) {
    String base =
        quantity.endsWith("active_w") && !quantity.endsWith("reactive_var")
            ? "W"
            : quantity.endsWith("apparent_va") ? "VA" : "var";
    return (prefix == 1 ? "" : prefix == 1e3 ? "k" : "M") + base;
  }

  /** Volts times amps of a line, or summed over the lines; empty where they are not known. */
  private Optional<double[]> voltAmps(String place) {
    if (!place.equals("total")) {
      return product(place);
    }
    Optional<double[]> sum = Optional.empty();
    for (String line : List.of("L1", "L2", "L3")) {
      Optional<double[]> one = product(line);
      if (one.isPresent()) {
        sum = Optional.of(sum.map(s -> SampledColumns.sum(s, one.get())).orElse(one.get()));
      }
    }
    return sum;
  }

  private Optional<double[]> product(String line) {
    Optional<double[]> amps = open.find(line + ".rms_a");
    Optional<double[]> volts =
        open.find(line + ".rms_v")
            .or(() -> open.find("L1-L2.rms_v").map(v -> SampledColumns.times(v, 1 / Math.sqrt(3))))
            .or(() -> open.find("L1.rms_v"));
    return amps.isPresent() && volts.isPresent()
        ? Optional.of(SampledColumns.product(volts.get(), amps.get()))
        : Optional.empty();
  }
}
