package fourthwire.validation;

import static fourthwire.validation.QuantityChecks.known;

import fourthwire.quantity.Figure;
import fourthwire.site.Feeder;
import fourthwire.site.Feeder.Material;
import fourthwire.site.Practice;
import fourthwire.site.conductor.Ampacity;
import fourthwire.site.conductor.ConductorData;
import fourthwire.site.conductor.ConductorSize;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.ToDoubleFunction;
import java.util.stream.DoubleStream;

/** The conductor figures that validation files ask for, by name. */
final class ConductorChecks {
  private ConductorChecks() {}

  static Map<String, ToDoubleFunction<Inputs>> all() {
    Map<String, ToDoubleFunction<Inputs>> checks = new HashMap<>();
    checks.put("skin ratio", ConductorChecks::skinRatio);
    checks.put(
        "skin argument of 1 ohm/kft",
        in -> ConductorData.skinArgument(1 / 0.3048, in.number("hz")));
    checks.put("skin depth in mm", ConductorChecks::skinDepthMm);
    checks.put("dc ohm/km", in -> dcOhmPerKm(in));
    checks.put(
        "ac ohm/kft",
        in -> {
          double dc = dcOhmPerKm(in);
          return dc * ConductorData.skinRatio(dc, in.number("hz")) * 0.3048;
        });
    checks.put("ampacity", in -> known(ampacity(in.text("size"), in)));
    checks.put("smallest mm2", ConductorChecks::smallestMm2);
    return checks;
  }

  /** The resistance that gives this x at 50 Hz: R' = 8πf·10⁻⁷/x². */
  private static double skinRatio(Inputs in) {
    double x = in.number("x");
    return ConductorData.skinRatio(1000 * 8 * Math.PI * 50e-7 / (x * x), 50);
  }

  /** A round wire's x is √2 times its radius on the skin depth, so the depth follows from x. */
  private static double skinDepthMm(Inputs in) {
    double radiusMm = 10;
    double dcOhmPerKm = in.number("ohm_m") / (Math.PI * radiusMm * radiusMm * 1e-6) * 1000;
    return Math.sqrt(2) * radiusMm / ConductorData.skinArgument(dcOhmPerKm, in.number("hz"));
  }

  private static double dcOhmPerKm(Inputs in) {
    return ConductorData.dcOhmPerKm(
            ConductorSize.find(in.text("size")).orElseThrow(),
            in.has("material") ? Material.ALUMINIUM : Material.COPPER,
            in.text("practice").equals("iec") ? Practice.IEC : Practice.NORTH_AMERICA)
        .orElseThrow();
  }

  private static double smallestMm2(Inputs in) {
    return DoubleStream.of(1.5, 2.5, 4, 6, 10, 16, 25, 35)
        .filter(mm2 -> known(ampacity(mm2 + " mm2", in)) >= in.number("need_a"))
        .findFirst()
        .orElseThrow();
  }

  private static Figure ampacity(String size, Inputs in) {
    return Ampacity.ofLine(feeder(size, in)).amps();
  }

  private static Feeder feeder(String size, Inputs in) {
    Feeder u = Feeder.UNKNOWN;
    return new Feeder(
        u.lengthM(),
        Optional.of(size),
        in.has("material") ? Optional.of(Material.ALUMINIUM) : Optional.empty(),
        OptionalInt.empty(),
        Optional.empty(),
        OptionalInt.empty(),
        in.has("insulation") ? Optional.of(in.text("insulation")) : Optional.empty(),
        in.has("method") ? Optional.of(in.text("method")) : Optional.empty(),
        in.has("ambient_c") ? OptionalDouble.of(in.number("ambient_c")) : OptionalDouble.empty(),
        u.groupingFactor(),
        u.ampacityA(),
        u.neutralAmpacityA(),
        u.resistanceOhmPerKm(),
        u.reactanceOhmPerKm(),
        u.neutralResistanceOhmPerKm(),
        u.neutralReactanceOhmPerKm());
  }
}
