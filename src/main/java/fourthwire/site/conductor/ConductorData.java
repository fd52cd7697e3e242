package fourthwire.site.conductor;

import fourthwire.quantity.PublishedTable;
import fourthwire.site.Feeder.Material;
import fourthwire.site.Practice;
import java.util.OptionalDouble;

/**
 * Resistance of round conductors at working temperature and at harmonic orders.
 *
 * <p>Skin effect by the fit of IEC 60287-1-1, 2.1.1 (k<sub>s</sub> = 1), within 0.6 % of the exact
 * Bessel solution to x = 8. Proximity effect is left out: conductors bundled in a conduit have
 * more.
 */
public final class ConductorData {
  /**
   * Reactance of a low-voltage conductor at the fundamental, ohm/km; common practice, no source.
   */
  public static final double DEFAULT_REACTANCE_OHM_PER_KM = 0.08;

  /** Working temperature under the IEC practice (PVC at full load), °C. */
  static final double IEC_WORKING_C = 70;

  /** Working temperature of the North American table, °C. */
  static final double AMERICAN_WORKING_C = 75;

  private static final double FEET_PER_KM = 1000 / 0.3048;

  private ConductorData() {}

  /**
   * Direct-current resistance of one conductor at its working temperature: 70 °C under the IEC
   * practice, 75 °C under the North American.
   *
   * @return ohm/km; empty where the tables print no such conductor (small aluminium)
   */
  public static OptionalDouble dcOhmPerKm(
      ConductorSize size, Material material, Practice practice) {
    double workingC = practice == Practice.IEC ? IEC_WORKING_C : AMERICAN_WORKING_C;
    if (size.series() == ConductorSize.Series.METRIC) {
      // IEC 60228 prints 20 °C; coefficients at 20 °C: copper 0.00393, aluminium 0.00403 1/K.
      double perK = material == Material.COPPER ? 0.00393 : 0.00403;
      String column = material == Material.COPPER ? "copper_class_2" : "aluminium_class_2";
      return scaled(
          row(ConductorSize.IEC_60228, "area_mm2", size).optional(column),
          1 + perK * (workingC - 20));
    }
    // Chapter 9 Table 8 prints 75 °C; its note's coefficients at 75 °C: 0.00323, 0.00330 1/K.
    double perK = material == Material.COPPER ? 0.00323 : 0.00330;
    String column = material == Material.COPPER ? "copper_uncoated" : "aluminium";
    return scaled(
        row(ConductorSize.TABLE_8, "size", size).optional(column),
        FEET_PER_KM / 1000 * (1 + perK * (workingC - 75)));
  }

  /**
   * Argument x of the skin effect: √(8πf·10⁻⁷/R′), R′ the direct-current resistance in ohm/m.
   *
   * @param dcOhmPerKm of one conductor at working temperature
   */
  public static double skinArgument(double dcOhmPerKm, double frequencyHz) {
    return Math.sqrt(8 * Math.PI * frequencyHz * 1e-7 / (dcOhmPerKm / 1000));
  }

  /**
   * Alternating on direct-current resistance by skin effect, 1 or more (IEC 60287-1-1, 2.1.1).
   *
   * @param dcOhmPerKm of one conductor at working temperature
   */
  public static double skinRatio(double dcOhmPerKm, double frequencyHz) {
    double x = skinArgument(dcOhmPerKm, frequencyHz);
    if (x <= 2.8) {
      double x4 = x * x * x * x;
      return 1 + x4 / (192 + 0.8 * x4);
    }
    return x <= 3.8 ? 1 - 0.136 - 0.0177 * x + 0.0563 * x * x : 1 + 0.354 * x - 0.733;
  }

  private static OptionalDouble scaled(OptionalDouble value, double factor) {
    return value.isPresent()
        ? OptionalDouble.of(value.getAsDouble() * factor)
        : OptionalDouble.empty();
  }

  private static PublishedTable.Row row(PublishedTable table, String column, ConductorSize size) {
    return table.rows().stream()
        .filter(r -> r.text(column).equals(size.size()))
        .findFirst()
        .orElseThrow();
  }
}
