package fourthwire.intake.reading.pqdif;

import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.Optional;

/** What the interval data of a PQDIF file are called here. */
final class ColumnName {
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
        .orElse((o.channel() + " " + statistic.word()).replace('"', ' '));
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
          case INSTANTANEOUS, OTHER -> "";
        };
    String name = measure.equals("frequency_hz") ? measure : o.phase().place() + "." + measure;
    return MeasuredQuantity.ofLog(name).map(MeasuredQuantity::name);
  }
}
