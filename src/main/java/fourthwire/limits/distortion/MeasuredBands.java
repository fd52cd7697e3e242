package fourthwire.limits.distortion;

import fourthwire.limits.distortion.MeasuredBand.Values;
import fourthwire.quantity.PublishedTable;
import java.util.ArrayList;
import java.util.List;

/**
 * Limits of measured values by their percentiles: IEEE 519-2022 by day and week, EN 50160 and IEC
 * 61000-2-4 by week. The latter's levels are held against the 95 % of a week, as EN 50160 says it
 * for a public supply (our reading).
 */
public final class MeasuredBands {
  private static final PublishedTable FACTORS =
      PublishedTable.beside(MeasuredBands.class, "ieee519-percentiles.csv");
  private static final double EN_50160_PERCENT = 95;
  private static final double FREQUENCY_PERCENT = 99.5;
  private static final String FREQUENCY_OF_EN_50160 =
      "EN 50160:2010, clause 4.2.1, interconnected networks (from memory)";
  private static final String VOLTAGE_OF_EN_50160 = "EN 50160:2010, clause 4.2.2";
  private static final String UNBALANCE_OF_EN_50160 = "EN 50160:2010, clause 4.2.4";
  private static final String VOLTAGE_OF_PLANTS =
      "IEC 61000-2-4:2002, clause 5, Table 1, class 2 (from memory)";

  private MeasuredBands() {}

  /** Voltage distortion after IEEE 519: the table's limit times the percentile's factor. */
  public static List<MeasuredBand> voltage519(double limit, String basis) {
    return of519("voltage", limit, basis);
  }

  /** Current distortion likewise, percent of the demand current. */
  public static List<MeasuredBand> current519(double limit, String basis) {
    return of519("current", limit, basis);
  }

  private static List<MeasuredBand> of519(String quantity, double limit, String basis) {
    List<MeasuredBand> bands = new ArrayList<>();
    for (PublishedTable.Row row : FACTORS.rows()) {
      if (row.text("quantity").equals(quantity)) {
        Values values = row.number("value_s") == 600 ? Values.OF_A_WEEK : Values.OF_A_DAY;
        double factor = row.number("factor");
        bands.add(
            MeasuredBand.upTo(
                values,
                row.number("percentile"),
                factor * limit,
                factor == 1 ? basis : basis + ", times " + factor + " (from memory)"));
      }
    }
    return bands;
  }

  /** Distortion after EN 50160 or IEC 61000-2-4. */
  public static List<MeasuredBand> weekly95(double limit, String basis) {
    return List.of(MeasuredBand.upTo(Values.OF_A_WEEK, EN_50160_PERCENT, limit, basis));
  }

  /**
   * Rms of a public supply: 95 % of the week within 10 % of nominal, all of it within +10 and -15
   * %.
   *
   * @param nominalV of the same voltage, to neutral or between lines
   */
  public static List<MeasuredBand> supplyVoltage(double nominalV) {
    return List.of(
        new MeasuredBand(
            Values.OF_A_WEEK,
            EN_50160_PERCENT,
            0.9 * nominalV,
            1.1 * nominalV,
            VOLTAGE_OF_EN_50160),
        new MeasuredBand(
            Values.OF_A_WEEK, 100, 0.85 * nominalV, 1.1 * nominalV, VOLTAGE_OF_EN_50160));
  }

  /** Rms inside a plant of class 2: within 10 % of nominal. */
  public static List<MeasuredBand> plantVoltage(double nominalV) {
    return List.of(
        new MeasuredBand(
            Values.OF_A_WEEK, EN_50160_PERCENT, 0.9 * nominalV, 1.1 * nominalV, VOLTAGE_OF_PLANTS));
  }

  /**
   * Frequency of a public supply joined to an interconnected network: 99.5 % of a year's 10 s
   * values within 1 % of nominal, all of them within +4 and -6 %. Class 2 of IEC 61000-2-4 allows
   * the same 1 %.
   */
  public static List<MeasuredBand> frequency(double nominalHz) {
    return List.of(
        new MeasuredBand(
            Values.OF_A_YEAR,
            FREQUENCY_PERCENT,
            0.99 * nominalHz,
            1.01 * nominalHz,
            FREQUENCY_OF_EN_50160),
        new MeasuredBand(
            Values.OF_A_YEAR, 100, 0.94 * nominalHz, 1.04 * nominalHz, FREQUENCY_OF_EN_50160));
  }

  /** Negative on positive sequence of a public supply. */
  public static List<MeasuredBand> unbalance() {
    return List.of(MeasuredBand.upTo(Values.OF_A_WEEK, EN_50160_PERCENT, 2, UNBALANCE_OF_EN_50160));
  }
}
