package fourthwire.load;

import fourthwire.site.LoadKind;
import java.util.Locale;
import java.util.OptionalDouble;

/** Refuses impossible load parameters, each with a sentence that says how to mend it. */
final class RequestCheck {
  private RequestCheck() {}

  static void check(LoadRequest r) {
    String kind = r.kind().word();
    require(r.ports() == 1 || r.ports() == 3, "%s stands on one line pair or on three lines", kind);
    boolean three = r.kind().family() == LoadKind.Family.THREE_PHASE;
    require(!three || r.ports() == 3, "%s needs three lines", kind);
    boolean single = r.kind().family() == LoadKind.Family.SINGLE_PHASE;
    require(!single || r.ports() == 1, "%s is single-phase", kind);
    positive(kind, "frequency", r.frequencyHz(), "Hz");
    positive(kind, "nominal voltage", r.nominalPortV(), "V");
    positive(kind, "rating", Ratings.amount(r.rating()), "");
    positive(kind, "quantity", r.units(), "");
    positive(kind, "demand", r.demand(), "");
    require(r.demand() <= 1, "demand of %s is %.4g; it goes from 0 to 1", kind, r.demand());
    displacement(kind, r.displacementFactor());
    columns(r);
    if (r.kind() == LoadKind.MEASURED) {
      spectrum(r);
    }
  }

  private static void displacement(String kind, OptionalDouble factor) {
    if (factor.isPresent()) {
      double f = Math.abs(factor.getAsDouble());
      require(
          f > 0 && f <= 1,
          "displacement_factor of %s is %.4g; it goes from 0 to 1, negative for leading",
          kind,
          factor.getAsDouble());
    }
  }

  private static void columns(LoadRequest r) {
    String kind = r.kind().word();
    r.columns().efficiency().ifPresent(x -> range(kind, "efficiency", x, 0.01, 1));
    r.columns()
        .capacitanceUfPerW()
        .ifPresent(x -> range(kind, "capacitance_uf_per_w", x, 1e-3, 1e4));
    r.columns()
        .sourceResistanceOhm()
        .ifPresent(x -> range(kind, "source_resistance_ohm", x, 0, 1e6));
    r.columns().sourceInductanceUh().ifPresent(x -> range(kind, "source_inductance_uh", x, 0, 1e9));
    r.columns().diodeSaturationA().ifPresent(x -> range(kind, "diode_saturation_a", x, 1e-18, 1));
    r.columns().diodeEmission().ifPresent(x -> range(kind, "diode_emission", x, 0.1, 10));
    r.columns().diodeResistanceOhm().ifPresent(x -> range(kind, "diode_resistance_ohm", x, 0, 1e4));
    r.columns().lineChokePercent().ifPresent(x -> range(kind, "line_choke_percent", x, 0, 100));
    r.columns().dcChokePercent().ifPresent(x -> range(kind, "dc_choke_percent", x, 0, 100));
    r.columns().firingDegrees().ifPresent(x -> range(kind, "firing_degrees", x, 0, 179));
    r.columns().inputFilterUf().ifPresent(x -> range(kind, "input_filter_uf", x, 0, 1e5));
    r.columns().deadAngleDegrees().ifPresent(x -> range(kind, "dead_angle_degrees", x, 0, 80));
    r.columns().residualPercent().ifPresent(x -> range(kind, "residual_percent", x, 0, 100));
    r.columns()
        .lockedRotorReactancePercent()
        .ifPresent(x -> range(kind, "locked_rotor_reactance_percent", x, 0.1, 100));
  }

  private static void spectrum(LoadRequest r) {
    require(r.spectrum().isPresent(), "a measured load needs its spectrum");
    var shape = r.spectrum().orElseThrow();
    require(shape.magnitude(1) > 0, "a spectrum needs its order 1");
    require(
        shape.re(1) > 1e-6 * shape.magnitude(1)
            || !(r.rating() instanceof LoadRequest.Rating.Watts),
        "the fundamental of the spectrum stands at %.4g degrees, so it draws no active power; rate"
            + " the load in VA or A",
        shape.at(1).degrees());
  }

  private static void positive(String kind, String name, double value, String unit) {
    require(
        value > 0 && value < Double.POSITIVE_INFINITY,
        "%s of %s is %.4g %s; it must be more than 0",
        name,
        kind,
        value,
        unit);
  }

  private static void range(String kind, String name, double value, double low, double high) {
    require(
        value >= low && value <= high,
        "%s of %s is %.4g; accepted is %.4g to %.4g",
        name,
        kind,
        value,
        low,
        high);
  }

  private static void require(boolean holds, String sentence, Object... values) {
    if (!holds) {
      throw new IllegalArgumentException(String.format(Locale.ROOT, sentence, values).trim());
    }
  }
}
