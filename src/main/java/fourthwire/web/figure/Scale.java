package fourthwire.web.figure;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * An axis that holds values from one to another in round steps; it begins at zero unless they lie
 * well away from it.
 *
 * @param low where it begins
 * @param ticks its steps above {@code low}
 */
record Scale(double low, Ticks ticks) {
  private static final double NEAR_ZERO = 0.5;

  /** Holds these values in about so many steps; empty where there are none. */
  static Optional<Scale> holding(double least, double largest, int steps) {
    if (Double.isNaN(least) || Double.isNaN(largest)) {
      return Optional.empty();
    }
    if (least >= 0 && least <= NEAR_ZERO * largest || least == largest && least >= 0) {
      return Optional.of(new Scale(0, Ticks.upTo(largest, steps)));
    }
    double step = Ticks.upTo(largest - Math.min(least, largest), steps).step();
    double low = step * Math.floor(least / step + 1e-9);
    return Optional.of(new Scale(low, Ticks.upTo(Math.max(step, largest - low), steps)));
  }

  /** Where it ends. */
  double high() {
    return low + ticks.end();
  }

  /** Whether a value lies on it. */
  boolean holds(double value) {
    return value >= low && value <= high();
  }

  /** The round values on it, lowest first. */
  List<Double> values() {
    List<Double> values = new ArrayList<>();
    ticks.values().forEach(v -> values.add(low + v));
    return values;
  }

  /** A value's text. */
  String text(double value) {
    return ticks.text(value);
  }

  /** How far down a value stands in a picture this high; 0 is its top. */
  double down(double value, double height) {
    return height * (1 - (value - low) / ticks.end());
  }

  /** Draws its values as hairlines from one height on, named at the left, the unit at the top. */
  void draw(Svg svg, double topPx, double heightPx, String unit) {
    List<Double> values = values();
    for (double value : values) {
      double y = topPx + down(value, heightPx);
      String classes = value == low ? "axis" : "rule";
      svg.add("line", "class", classes, "x1", 0, "x2", "100%", "y1", y, "y2", y);
      boolean last = value == values.get(values.size() - 1);
      String text = last ? text(value) + "\u202f" + unit : text(value);
      svg.text(text, "x", 0, "dx", -6, "y", y + 4, "text-anchor", "end");
    }
  }
}
