package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.IMPOSSIBLE_VALUE;
import static fourthwire.metering.QualityFinding.MISSING_VALUES;

import fourthwire.metering.Amount;
import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.series.QuantityStatistics;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Function;

/**
 * Values that can't be, and blanks. What can be is bounded by physics where it is (no rms is below
 * zero, no power factor above one) and by the column itself where it is not: an overflow mark
 * stands far above all the rest, and alone. Thresholds are common practice, no source.
 */
final class ImpossibleValues implements DayCheck {
  private final List<String> names;
  private final List<QuantityStatistics> statistics;
  private final List<Column> columns = new ArrayList<>();
  private final Seen[] seen;
  private final Seen blank = new Seen();
  private long values;

  /** Stretches of rows told one by one where bounds do not part what can be from what can't. */
  private static final int MOST_STRETCHES = 200;

  private static final class Seen {
    private final List<Correction.Rows> stretches = new ArrayList<>();
    private double low = Double.POSITIVE_INFINITY;
    private double high = Double.NEGATIVE_INFINITY;
    private double highestBelow = Double.NEGATIVE_INFINITY;
    private double lowestAbove = Double.POSITIVE_INFINITY;
    private long count;
    private double example;
    private Instant from = Instant.MAX;
    private Instant to = Instant.MIN;

    /**
     * A value that can't be.
     *
     * @param usual a value that can be
     */
    void take(LogDay day, int row, double value, double usual) {
      Instant at = Instant.ofEpochMilli(day.startMillis(row));
      Instant end = at.plusMillis(day.intervalMillis());
      example = count == 0 ? value : example;
      count++;
      from = at.isBefore(from) ? at : from;
      to = end.isAfter(to) ? end : to;
      highestBelow = value < usual ? Math.max(highestBelow, value) : highestBelow;
      lowestAbove = value > usual ? Math.min(lowestAbove, value) : lowestAbove;
      note(day.firstRow() + row);
    }

    private void note(long row) {
      int last = stretches.size() - 1;
      if (last >= 0 && stretches.get(last).to() == row) {
        stretches.set(last, new Correction.Rows(stretches.get(last).from(), row + 1));
      } else if (last < MOST_STRETCHES) {
        stretches.add(new Correction.Rows(row, row + 1));
      }
    }

    /** A value that can be. */
    void keep(double value) {
      low = Math.min(low, value);
      high = Math.max(high, value);
    }

    /**
     * By bounds where they part what can be from what can't, else row by row where these are few.
     */
    List<Correction> corrections(String quantity) {
      if (highestBelow < low && lowestAbove > high) {
        return low > high ? List.of() : List.of(Offers.keepWithin(quantity, low, high));
      }
      return stretches.size() < MOST_STRETCHES
          ? List.of(Offers.leaveOut(quantity, stretches))
          : List.of();
    }
  }

  /**
   * What is known of a column beforehand.
   *
   * @param bounds from its values of a day
   * @param clean whether its lowest and highest value of all are within bounds
   * @param low position of its lowest values; -1 for none
   * @param high position of its highest values; -1 for none
   * @param amps where it is the volts of a line, position of that line's amps; -1 for none
   */
  private record Column(
      Function<double[], Bounds> bounds, boolean clean, int low, int high, int amps) {}

  ImpossibleValues(List<String> names, List<QuantityStatistics> statistics, double nominalHz) {
    this.names = names;
    this.statistics = statistics;
    this.seen = new Seen[names.size()];
    for (int q = 0; q < seen.length; q++) {
      seen[q] = new Seen();
      columns.add(column(names, q, statistics.get(q), nominalHz));
    }
  }

  private static Column column(List<String> names, int q, QuantityStatistics of, double nominalHz) {
    String name = names.get(q);
    boolean volts = name.matches("L[123]\\.rms_v");
    int low = names.indexOf(name + ".min");
    int high = names.indexOf(name + ".max");
    int amps = volts ? names.indexOf(name.replace("rms_v", "rms_a")) : -1;
    String measure = name.replaceFirst("\\.(min|max)$", "");
    boolean alone = low < 0 && high < 0 && amps < 0 && !measure.endsWith(".rms_v");
    boolean clean = alone && fixed(measure, of, nominalHz).holdsAll(of.min(), of.max());
    return new Column(bounds(measure, of, nominalHz), clean, low, high, amps);
  }

  @Override
  public void take(LogDay day) {
    for (int q = 0; q < seen.length; q++) {
      double[] x = day.of(q);
      values += x.length;
      if (columns.get(q).clean()) {
        takeBlanks(day, x);
      } else {
        take(day, q, x);
      }
    }
  }

  private void takeBlanks(LogDay day, double[] x) {
    for (int row = 0; row < x.length; row++) {
      if (Double.isNaN(x[row])) {
        blank.take(day, row, Double.NaN, Double.NaN);
      }
    }
  }

  private void take(LogDay day, int q, double[] x) {
    Bounds bounds = columns.get(q).bounds().apply(x);
    boolean[] wrong = againstOthers(day, q, columns.get(q));
    double usual = statistics.get(q).p95();
    for (int row = 0; row < x.length; row++) {
      if (Double.isNaN(x[row])) {
        blank.take(day, row, Double.NaN, Double.NaN);
      } else if (wrong[row] || !bounds.holds(x, row) && !isOff(day, q, row)) {
        seen[q].take(day, row, x[row], usual);
      } else {
        seen[q].keep(x[row]);
      }
    }
  }

  /** Where there are no volts there is no frequency. */
  private boolean isOff(LogDay day, int q, int row) {
    return names.get(q).equals("frequency_hz")
        && day.of(q)[row] == 0
        && day.find("L1.rms_v").or(() -> day.find("L1.rms_a")).filter(x -> x[row] == 0).isPresent();
  }

  /** What a value may be; {@code alone} is the bound of one that neither neighbour comes near. */
  private record Bounds(double low, double high, double alone) {
    /** Whether all values from one to another may be. */
    boolean holdsAll(double least, double most) {
      return least >= Math.max(low, -alone) && most <= Math.min(high, alone);
    }

    boolean holds(double[] x, int row) {
      double v = x[row];
      if (v < low || v > high) {
        return false;
      }
      return Math.abs(v) <= alone
          || row > 0 && Math.abs(x[row - 1]) > alone / 3
          || row + 1 < x.length && Math.abs(x[row + 1]) > alone / 3;
    }
  }

  private static Function<double[], Bounds> bounds(
      String name, QuantityStatistics s, double nominalHz) {
    double none = Double.MAX_VALUE;
    if (name.endsWith(".rms_v")) {
      return x -> new Bounds(0, 2 * Math.max(Rows.median(x), 0.75 * s.p95()) + 1, none);
    }
    Bounds fixed = fixed(name, s, nominalHz);
    return x -> fixed;
  }

  private static Bounds fixed(String name, QuantityStatistics s, double nominalHz) {
    double none = Double.MAX_VALUE;
    if (name.endsWith("_factor")) {
      return new Bounds(-1.005, 1.005, none);
    }
    if (name.equals("frequency_hz")) {
      return new Bounds(0.85 * nominalHz, 1.15 * nominalHz, none);
    }
    if (name.endsWith("_deg")) {
      return new Bounds(-360, 360, none);
    }
    if (name.endsWith("energy_wh")) {
      return new Bounds(-none, none, none);
    }
    double usual = Math.max(Math.abs(s.p99()), s.p99() < 0 ? Math.abs(s.min()) : 0);
    if (name.endsWith("_w") || name.endsWith("_var")) {
      double bound = 20 * Math.max(usual, 100);
      return new Bounds(-bound, bound, 6 * Math.max(usual, 1000));
    }
    if (name.endsWith("_percent")) {
      return new Bounds(0, 1e4, 12 * Math.max(usual, 5));
    }
    return new Bounds(0, 20 * Math.max(usual, 1), 6 * Math.max(usual, 2));
  }

  /** A mean lies between its lowest and highest; no volts where amps and watts flow. */
  private boolean[] againstOthers(LogDay day, int q, Column column) {
    double[] x = day.of(q);
    boolean[] wrong = new boolean[x.length];
    for (int row = 0; row < x.length && column.low() + column.high() > -2; row++) {
      double slack = 1e-6 + 0.002 * Math.abs(x[row]);
      boolean below = column.low() >= 0 && x[row] < day.of(column.low())[row] - slack;
      boolean above = column.high() >= 0 && x[row] > day.of(column.high())[row] + slack;
      wrong[row] = below || above;
    }
    if (column.amps() >= 0) {
      dead(x, statistics.get(q), day.of(column.amps()), statistics.get(column.amps()), wrong);
    }
    return wrong;
  }

  private static void dead(
      double[] volts,
      QuantityStatistics usualVolts,
      double[] amps,
      QuantityStatistics usualAmps,
      boolean[] wrong) {
    double most = 0.05 * usualVolts.p95();
    double least = 0.2 * usualAmps.p95();
    for (int row = 0; row < volts.length; row++) {
      wrong[row] |= volts[row] >= 0 && volts[row] < most && amps[row] > least;
    }
  }

  @Override
  public List<QualityFinding> findings() {
    List<QualityFinding> findings = new ArrayList<>();
    for (int q = 0; q < seen.length; q++) {
      Seen s = seen[q];
      if (s.count > 0) {
        findings.add(
            finding(
                IMPOSSIBLE_VALUE,
                s,
                "They stand in the statistics over the rows as read.",
                String.format(
                    Locale.ROOT,
                    "%s: %d %s can't be, as %s.",
                    names.get(q),
                    s.count,
                    s.count == 1 ? "value" : "values",
                    Amount.read(s.example, names.get(q))),
                s.corrections(names.get(q))));
      }
    }
    if (blank.count > 0) {
      findings.add(
          finding(
              MISSING_VALUES,
              blank,
              "They are left out of the statistics.",
              String.format(
                  Locale.ROOT,
                  "%d of %d values are blank or marked as not measured.",
                  blank.count,
                  values),
              List.of()));
    }
    return findings;
  }

  private static QualityFinding finding(
      String code, Seen s, String effect, String sentence, List<Correction> corrections) {
    return new QualityFinding(
        code, Optional.of(new Period(s.from, s.to)), effect, sentence, corrections);
  }
}
