package fourthwire.metering.log;

import java.util.Arrays;
import java.util.Locale;
import java.util.OptionalDouble;

/** The ratio that was set wrongly, of the one that a log shows. Common practice, no source. */
final class LikelyRatio {
  private static final double NEAR = 0.02;

  /** As exact as meters are. */
  private static final double MOST_POWER_FACTOR = 1.02;

  /** Decades first, then the steps of clamp ranges and transformers of five amps. */
  private static final double[] USUAL = {
    10, 100, 1000, 5, 2, 20, 50, 4, 3, 25, 40, 30, 15, 6, 8, 12, 60, 80, 200, 500
  };

  private LikelyRatio() {}

  /** A ratio of instruments or units where one is near: whole numbers, √3, thousands. */
  static double of(double factor) {
    for (double thousands : new double[] {1e-6, 1e-3, 1e3, 1e6}) {
      if (Math.abs(factor / thousands - 1) < 0.2) {
        return thousands;
      }
    }
    double up = Math.max(factor, 1 / factor);
    double size = Math.pow(10, Math.max(0, Math.floor(Math.log10(up))));
    double whole = Math.rint(up / size) * size;
    double near =
        Math.abs(up / whole - 1) < NEAR
            ? whole
            : Math.abs(up / Math.sqrt(3) - 1) < NEAR
                ? Math.sqrt(3)
                : Double.parseDouble(String.format(Locale.ROOT, "%.3g", up));
    return factor >= 1 ? near : 1 / near;
  }

  /** The roundest ratio that instruments are set to between two; empty where there is none. */
  static OptionalDouble usual(double low, double high) {
    if (high < 1) {
      OptionalDouble up = usual(1 / high, 1 / low);
      return up.isPresent() ? OptionalDouble.of(1 / up.getAsDouble()) : up;
    }
    return Arrays.stream(USUAL).filter(f -> f >= low && f <= high).findFirst();
  }

  /** Of an active power on volts times amps that a power factor is part of, at most one. */
  static double beyondPowerFactor(double ratio) {
    for (double least : new double[] {0.8, 0.65}) {
      OptionalDouble likely = usual(ratio / MOST_POWER_FACTOR, ratio / least);
      if (likely.isPresent()) {
        return likely.getAsDouble();
      }
    }
    return ratio;
  }

  /** Whether a factor is about that of another prefix of the unit: W for kW. */
  static boolean isPrefix(double factor) {
    double likely = of(factor);
    return likely >= 1000 || likely <= 0.001;
  }

  /** As a person writes it. */
  static String text(double factor) {
    return factor == Math.sqrt(3)
        ? "√3"
        : factor == 1 / Math.sqrt(3)
            ? "1/√3"
            : String.format(Locale.ROOT, "%.4g", factor)
                .replaceFirst("(\\.\\d*?)0+$", "$1")
                .replaceFirst("\\.$", "");
  }
}
