package fourthwire.metering.log;

import java.util.Optional;

/**
 * A power of a line on its volts times amps: P = V·I·power factor and S = V·I (IEEE 1459-2010,
 * 3.1.2).
 */
enum LineRatio {
  ACTIVE("Active", ".active_w"),
  APPARENT("Apparent", ".apparent_va"),

  /**
   * Active and reactive power together, where a line that also feeds back has next to no active.
   */
  FUNDAMENTAL("Fundamental apparent", ".active_w");

  private final String word;
  private final String measure;

  LineRatio(String word, String measure) {
    this.word = word;
    this.measure = measure;
  }

  /** As a sentence begins. */
  String word() {
    return word;
  }

  /** The quantity of a line. */
  String of(String line) {
    return line + measure;
  }

  /** In a row; the active on volts times amps times power factor if that is logged. */
  double at(LogDay day, String line, int row) {
    Optional<double[]> volts = new LineDay(day).volts(line);
    Optional<double[]> amps = day.find(line + ".rms_a");
    Optional<double[]> power = day.find(of(line));
    Optional<double[]> reactive = day.find(line + ".reactive_var");
    boolean lacking = power.isEmpty() || this == FUNDAMENTAL && reactive.isEmpty();
    if (volts.isEmpty() || amps.isEmpty() || lacking) {
      return Double.NaN;
    }
    double factor =
        this == ACTIVE
            ? day.find(line + ".power_factor").map(f -> Math.abs(f[row])).orElse(1.0)
            : 1;
    double watts = Math.abs(power.get()[row]);
    double value = this == FUNDAMENTAL ? Math.hypot(watts, reactive.get()[row]) : watts;
    return value / (volts.get()[row] * amps.get()[row] * factor);
  }

  /** Its median of a day; NaN where it is not logged. */
  double usual(LogDay day, String line) {
    return day.find(line + ".rms_a")
        .map(a -> Rows.loaded(a, row -> at(day, line, row)))
        .orElse(Double.NaN);
  }
}
