package fourthwire.intake.reading.pqdif;

import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.Optional;
import java.util.regex.Pattern;

/** What the interval data of a PQDIF file are called here. */
final class ColumnName {
  private static final Pattern HARMONIC =
      Pattern.compile(
          "(?i)(?<![\\p{L}\\d])(?:h|harm|harmonic|order)[\\s_.-]*\\d{1,2}(?!\\d)"
              + "|(?<!\\d)\\d{1,2}(?:st|nd|rd|th)\\s+harm");

  private ColumnName() {}

  /**
   * The quantity's name with its statistic, or the channel's own name where that is not settled.
   */
  static String of(ValueSeries.Origin o) {
    Statistic statistic =
        switch (o.statistic()) {
          case MIN -> Statistic.MIN;
          case MAX -> Statistic.MAX;
          case MEAN -> Statistic.MEAN;
          case INSTANT -> Statistic.INSTANT;
        };
    return quantity(o)
        .map(q -> q + "." + statistic.word())
        .orElse((own(o) + " " + statistic.word() + unit(o)).replace('"', ' '));
  }

  /**
   * A channel's own name; conductor and quantity are added to an order of harmonics, and where what
   * it holds has an identifier that is not known here its name must not be taken for that.
   */
  private static String own(ValueSeries.Origin o) {
    if (o.kind() != ValueSeries.Kind.OTHER) {
      return o.channel();
    }
    String measures =
        switch (o.measures()) {
          case VOLTAGE -> " voltage ";
          case CURRENT -> " current ";
          case OTHER -> " ";
        };
    return HARMONIC.matcher(o.channel()).find()
        ? o.phase().place() + measures + o.channel()
        : o.channel() + " unidentified";
  }

  private static String unit(ValueSeries.Origin o) {
    boolean harmonic = HARMONIC.matcher(o.channel()).find();
    return switch (harmonic ? o.unit() : SeriesUnit.OTHER) {
      case VOLTS -> " [V]";
      case AMPS -> " [A]";
      case PERCENT -> " [%]";
      case DEGREES -> " [deg]";
      default -> "";
    };
  }

  /** To the unit of the quantity. */
  static double factor(ValueSeries.Origin o) {
    return o.unit() == SeriesUnit.PER_UNIT && o.kind() == ValueSeries.Kind.DISTORTION ? 100 : 1;
  }

  private static Optional<String> quantity(ValueSeries.Origin o) {
    String measure =
        switch (o.kind()) {
          case RMS ->
              o.unit() == SeriesUnit.VOLTS ? "rms_v" : o.unit() == SeriesUnit.AMPS ? "rms_a" : "";
          case DISTORTION ->
              o.measures() == ValueSeries.Measures.CURRENT
                  ? "current_thd_percent"
                  : o.measures() == ValueSeries.Measures.VOLTAGE ? "voltage_thd_percent" : "";
          case ACTIVE_POWER -> o.unit() == SeriesUnit.WATTS ? "active_w" : "";
          case REACTIVE_POWER -> o.unit() == SeriesUnit.VARS ? "reactive_var" : "";
          case APPARENT_POWER -> o.unit() == SeriesUnit.VOLT_AMPERES ? "apparent_va" : "";
          case POWER_FACTOR -> "power_factor";
          case DISPLACEMENT_FACTOR -> "displacement_factor";
          case FREQUENCY -> "frequency_hz";
          case ENERGY -> o.unit() == SeriesUnit.WATT_HOURS ? "energy_wh" : "";
          case INSTANTANEOUS, UNSAID, OTHER -> "";
        };
    String name = measure.equals("frequency_hz") ? measure : o.phase().place() + "." + measure;
    return MeasuredQuantity.ofLog(name).map(MeasuredQuantity::name);
  }
}
