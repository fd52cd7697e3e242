package fourthwire.web.figure;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;

/** Round values along an axis: steps of 1, 2, 2.5 or 5 times a power of ten. */
record Ticks(double step, double end) {
  private static final double[] ROUND = {1, 2, 2.5, 5, 10};

  /** Ticks from 0 that reach at least {@code highest} in about {@code count} steps. */
  static Ticks upTo(double highest, int count) {
    double reach = highest > 0 ? highest : 1;
    double raw = reach / count;
    double power = Math.pow(10, Math.floor(Math.log10(raw)));
    double step = 10 * power;
    for (double round : ROUND) {
      if (round * power >= raw * 0.999) {
        step = round * power;
        break;
      }
    }
    return new Ticks(step, step * Math.ceil(reach / step - 1e-9));
  }

  /** The values, 0 first. */
  List<Double> values() {
    List<Double> values = new ArrayList<>();
    for (int i = 0; i * step <= end * 1.0001; i++) {
      values.add(i * step);
    }
    return values;
  }

  /** A value's text, with no more decimals than the step needs. */
  String text(double value) {
    int decimals = new BigDecimal(step).round(new MathContext(3)).stripTrailingZeros().scale();
    String text = Svg.rounded(value, Math.max(0, decimals));
    return text.replace('-', '\u2212');
  }
}
