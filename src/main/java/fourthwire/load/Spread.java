package fourthwire.load;

import java.util.Locale;

/**
 * A figure that is not known exactly: what it usually is, and the range that nine of ten lie in.
 *
 * @param low fifth percentile
 * @param typical the usual figure
 * @param high ninety-fifth percentile
 */
public record Spread(double low, double typical, double high) {
  /** Refuses figures out of order. */
  public Spread {
    if (!(low <= typical && typical <= high)) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT, "a spread of %.4g, %.4g, %.4g is out of order", low, typical, high));
    }
  }

  /** Reads {@code low..typical..high}, or one number that has no spread. */
  static Spread parse(String text) {
    String[] parts = text.split("\\.\\.", -1);
    if (parts.length != 1 && parts.length != 3) {
      throw new IllegalArgumentException("not a spread: " + text);
    }
    return new Spread(
        Double.parseDouble(parts[0]),
        Double.parseDouble(parts[parts.length / 2]),
        Double.parseDouble(parts[parts.length - 1]));
  }

  /** Whether the figure is taken as exact. */
  public boolean isExact() {
    return low == high;
  }
}
