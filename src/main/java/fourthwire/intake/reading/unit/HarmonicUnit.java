package fourthwire.intake.reading.unit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Whether the harmonics of one conductor are in amps or volts, or percent of the fundamental. */
final class HarmonicUnit {
  private static final double NEAR = 0.1;

  private final Map<Integer, double[]> orders;
  private final Optional<double[]> rms;
  private final Optional<double[]> distortionPercent;
  private String reason = "";

  HarmonicUnit(
      Map<Integer, double[]> orders, Optional<double[]> rms, Optional<double[]> distortionPercent) {
    this.orders = orders;
    this.rms = rms;
    this.distortionPercent = distortionPercent;
  }

  /** True for percent; empty where the values do not settle it. */
  Optional<Boolean> percent() {
    Optional<double[]> first = Optional.ofNullable(orders.get(1));
    boolean hundred = first.isPresent() && isHundred(first.get());
    boolean asRms = near(SampledColumns.ratioOf(first, rms), 0.6, 1.02);
    if (first.isPresent() && hundred != asRms) {
      reason = hundred ? "as order 1 is 100." : "as order 1 is nearly the rms value.";
      return Optional.of(hundred);
    }
    return first.isPresent() && hundred ? Optional.empty() : bySum(first);
  }

  String reason() {
    return reason;
  }

  private static boolean isHundred(double[] first) {
    double low = SampledColumns.percentile(first, 2);
    double high = SampledColumns.percentile(first, 98);
    return low > 99.8 && high < 100.2;
  }

  /** The orders above 1 together make the THD, in one of the units. */
  private Optional<Boolean> bySum(Optional<double[]> first) {
    List<double[]> above = new ArrayList<>();
    orders.forEach(
        (order, x) -> {
          if (order > 1) {
            above.add(x);
          }
        });
    if (above.isEmpty()) {
      return Optional.empty();
    }
    double[] sum = SampledColumns.rootSum(above);
    double share = SampledColumns.ratioOf(Optional.of(sum), distortionPercent);
    Optional<double[]> fundamental =
        first.or(() -> rms.map(total -> SampledColumns.rootRest(total, sum)));
    Optional<double[]> made = fundamental.map(f -> SampledColumns.quotient(sum, f, 100));
    boolean percent = near(share, 1 - NEAR, 1 + NEAR / 10);
    boolean amount = near(SampledColumns.ratioOf(made, distortionPercent), 1 - NEAR, 1 + NEAR / 10);
    if (percent && amount) {
      percent = isSteady(Optional.of(sum));
      amount = isSteady(made);
    }
    if (percent != amount) {
      reason = "as together they make the distortion.";
      return Optional.of(percent);
    }
    boolean tooLarge = SampledColumns.ratioOf(Optional.of(sum), rms) > 1.05;
    if (!percent && tooLarge && distortionPercent.isEmpty()) {
      reason = "as they are larger than the rms value.";
      return Optional.of(true);
    }
    return Optional.empty();
  }

  /** Whether it makes the distortion in nearly every row. */
  private boolean isSteady(Optional<double[]> made) {
    double[] share =
        made.flatMap(m -> distortionPercent.map(d -> SampledColumns.quotient(m, d, 1)))
            .orElse(new double[0]);
    return near(SampledColumns.percentile(share, 5), 0.97, 1.03)
        && near(SampledColumns.percentile(share, 95), 0.97, 1.03);
  }

  private static boolean near(double x, double from, double to) {
    return x >= from && x <= to;
  }
}
