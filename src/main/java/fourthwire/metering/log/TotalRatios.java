package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.WRONG_RATIO;

import fourthwire.metering.Correction;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Totals of power against the sum of the lines, or against the lines' volts times amps where their
 * powers are not logged. Thresholds are common practice, no source.
 */
final class TotalRatios {
  /** The effective apparent power of three lines is no sum: it may be larger by a half. */
  private static final double MOST_APPARENT = 1.6;

  /** Power factors as low as that, and steady all day, are no loads'. */
  private static final double LEAST_STEADY = 0.08;

  private static final double STEADY = 0.2;

  private final FlaggedDays flagged;

  TotalRatios(FlaggedDays flagged) {
    this.flagged = flagged;
  }

  void look(LogDay day) {
    for (String measure : List.of("active_w", "apparent_va")) {
      Optional<double[]> total = day.find("total." + measure);
      Optional<double[][]> lines = new LineDay(day).all(measure);
      if (total.isPresent() && lines.isPresent()) {
        againstLines(day, measure, total.get(), lines.get());
      } else if (total.isPresent()) {
        againstVoltAmps(day, measure, total.get());
      }
    }
  }

  private void againstLines(LogDay day, String measure, double[] total, double[][] p) {
    double median = Rows.median(day.rows(), k -> total[k] / (p[0][k] + p[1][k] + p[2][k]));
    double most = measure.equals("active_w") ? 1.05 : MOST_APPARENT;
    if (median < 0.95 || median > most) {
      flag(day, measure, median, "the sum of the lines", true, RowTest.NONE);
    }
  }

  private void againstVoltAmps(LogDay day, String measure, double[] total) {
    boolean active = measure.equals("active_w");
    Optional<double[][]> amps = new LineDay(day).all("rms_a");
    if (amps.isEmpty() || voltAmps(day, 0).isEmpty()) {
      return;
    }
    double[] sum = new double[day.rows()];
    java.util.Arrays.setAll(sum, k -> amps.get()[0][k] + amps.get()[1][k] + amps.get()[2][k]);
    Optional<double[]> factor =
        active ? day.find("total.power_factor") : Optional.<double[]>empty();
    double most = active && factor.isEmpty() ? 1.05 : active ? 1.25 : MOST_APPARENT;
    double median = Rows.loaded(sum, k -> ratio(day, measure, k));
    double apart = Rows.loaded(sum, k -> Math.abs(ratio(day, measure, k) / median - 1));
    double least = active && factor.isEmpty() ? apart < STEADY ? LEAST_STEADY : 0.02 : 0.8;
    if (median < least || median > most) {
      flag(
          day,
          measure,
          median,
          "the lines' volts times amps" + (factor.isPresent() ? " times power factor" : ""),
          false,
          RowTest.ofRatio((other, row) -> ratio(other, measure, row), median));
    }
  }

  /** A total on the lines' volts times amps; the active on that times power factor if logged. */
  private static double ratio(LogDay day, String measure, int row) {
    Optional<double[]> total = day.find("total." + measure);
    double factor =
        measure.equals("active_w")
            ? day.find("total.power_factor").map(f -> Math.abs(f[row])).orElse(1.0)
            : 1;
    return total.isEmpty()
        ? Double.NaN
        : Math.abs(total.get()[row]) / (voltAmps(day, row).orElse(Double.NaN) * factor);
  }

  private static Optional<Double> voltAmps(LogDay day, int row) {
    double sum = 0;
    for (String line : LineDay.LINES) {
      Optional<double[]> volts = new LineDay(day).volts(line);
      Optional<double[]> amps = day.find(line + ".rms_a");
      if (volts.isEmpty() || amps.isEmpty()) {
        return Optional.empty();
      }
      sum += volts.get()[row] * amps.get()[row];
    }
    return Optional.of(sum);
  }

  private void flag(
      LogDay day, String measure, double median, String of, boolean lines, RowTest test) {
    double likely = lines ? median : likely(day, measure, median);
    List<String> quantities = day.quantities();
    flagged.add(
        day,
        new FlaggedDays.Fault(
            WRONG_RATIO,
            "total." + measure,
            "The total, or one of the lines, is wrong.",
            String.format(
                Locale.ROOT,
                "The total of %s is %.3g times %s (median of the day)%s.",
                measure,
                median,
                of,
                PowerRatios.beyond(median, likely)),
            rows ->
                lines
                    ? corrected(measure, median, rows)
                    : either(quantities, measure, likely, rows),
            test));
  }

  /** Without a power factor: the instrument's ratio beyond a likely one. */
  private static double likely(LogDay day, String measure, double ratio) {
    boolean known = !measure.equals("active_w") || day.find("total.power_factor").isPresent();
    return known ? ratio : LikelyRatio.beyondPowerFactor(ratio);
  }

  /** The total, or the amps of all lines: nothing tells which. */
  private static List<Correction> either(
      List<String> quantities, String measure, double ratio, Correction.Rows rows) {
    if (!(ratio > 0)) {
      return List.of();
    }
    Correction total = Offers.scale(List.of("total." + measure), ratio, rows);
    List<String> amps =
        quantities.stream().filter(q -> q.matches("L[123]\\.(rms_a|current_h\\d+_a)")).toList();
    return LikelyRatio.isPrefix(ratio)
        ? List.of(total)
        : List.of(total, Offers.scale(amps, 1 / ratio, rows));
  }

  private static List<Correction> corrected(String measure, double ratio, Correction.Rows rows) {
    if (!(Math.abs(ratio) > 0)) {
      return List.of();
    }
    if (LikelyRatio.isPrefix(ratio)) {
      return List.of(Offers.scale(List.of("total." + measure), ratio, rows));
    }
    return measure.equals("active_w") ? List.of(Offers.sum(measure, rows)) : List.of();
  }
}
