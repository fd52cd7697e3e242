package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.NEUTRAL_NOT_SUM;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * A neutral that is another multiple from one row to the next while the lines' currents go on: the
 * sum of currents can't change by more than they do, so its clamp's ratio did. Thresholds are
 * common practice, no source.
 */
final class NeutralSteps implements DayCheck {
  /** Rows looked at on either side. */
  private static final int SIDE = 6;

  private static final double LEAST_FACTOR = 1.8;
  private static final double STEADY = 1.5;
  private static final double OF_LINES = 2;
  private static final double OF_WANDER = 2;
  private static final double PAIRED = 0.2;
  private static final int FEWEST_DIGITS = 5;
  private static final int MOST_STEPS = 50;

  /** The last rows: N, L1, L2, L3 each; and when and where they stand. */
  private final double[][] last = new double[4][2 * SIDE];

  private final long[] at = new long[2 * SIDE];
  private final long[] row = new long[2 * SIDE];
  private final List<Step> steps = new ArrayList<>();
  private int filled;
  private double digit;
  private long end;
  private long rows;

  /** From a row on N is so many times what it was. */
  private record Step(long row, long at, double factor) {}

  @Override
  public void take(LogDay day) {
    rows = day.firstRow() + day.rows();
    Optional<double[]> neutral = day.find("N.rms_a");
    Optional<double[][]> lines = new LineDay(day).all("rms_a");
    if (neutral.isEmpty() || lines.isEmpty()) {
      return;
    }
    digit = Rows.digit(neutral.get());
    for (int k = 0; k < day.rows(); k++) {
      double[] now = {neutral.get()[k], lines.get()[0][k], lines.get()[1][k], lines.get()[2][k]};
      if (Arrays.stream(now).allMatch(x -> x > 0)) {
        push(now, day.startMillis(k), day.firstRow() + k);
      }
    }
    end = day.startMillis(day.rows() - 1) + day.intervalMillis();
  }

  private void push(double[] now, long time, long number) {
    for (int c = 0; c < now.length; c++) {
      System.arraycopy(last[c], 1, last[c], 0, 2 * SIDE - 1);
      last[c][2 * SIDE - 1] = now[c];
    }
    System.arraycopy(at, 1, at, 0, 2 * SIDE - 1);
    System.arraycopy(row, 1, row, 0, 2 * SIDE - 1);
    at[2 * SIDE - 1] = time;
    row[2 * SIDE - 1] = number;
    filled = Math.min(filled + 1, 2 * SIDE);
    if (filled == 2 * SIDE && steps.size() < MOST_STEPS) {
      look();
    }
  }

  private void look() {
    double sudden = last[0][SIDE] / last[0][SIDE - 1];
    boolean next = row[SIDE] - row[SIDE - 1] == 1;
    if (!next || Math.max(sudden, 1 / sudden) < LEAST_FACTOR) {
      return;
    }
    double before = median(last[0], 0);
    double after = median(last[0], SIDE);
    double lines = 0;
    for (int line = 1; line < last.length; line++) {
      lines += Math.abs(median(last[line], SIDE) - median(last[line], 0));
    }
    boolean steady = isSteady(0) && isSteady(SIDE);
    double step = Math.abs(after - before);
    boolean told = step > FEWEST_DIGITS * digit;
    boolean own = step > OF_LINES * lines && step > OF_WANDER * Math.max(range(0), range(SIDE));
    double factor = after / before;
    if (steady && told && own && Math.max(factor, 1 / factor) >= LEAST_FACTOR) {
      steps.add(new Step(row[SIDE], at[SIDE], factor));
    }
  }

  private boolean isSteady(int from) {
    double[] side = side(from);
    return side[SIDE - 1] < STEADY * side[0];
  }

  /** How far N wanders on a side. */
  private double range(int from) {
    double[] side = side(from);
    return side[SIDE - 1] - side[0];
  }

  /** N by size. */
  private double[] side(int from) {
    double[] side = Arrays.copyOfRange(last[0], from, from + SIDE);
    Arrays.sort(side);
    return side;
  }

  private static double median(double[] x, int from) {
    double[] side = Arrays.copyOfRange(x, from, from + SIDE);
    Arrays.sort(side);
    return (side[SIDE / 2 - 1] + side[SIDE / 2]) / 2;
  }

  @Override
  public List<QualityFinding> findings() {
    List<QualityFinding> findings = new ArrayList<>();
    for (int k = 0; k < steps.size(); k++) {
      Step from = steps.get(k);
      boolean back =
          k + 1 < steps.size() && Math.abs(from.factor() * steps.get(k + 1).factor() - 1) < PAIRED;
      findings.add(
          back
              ? finding(from, steps.get(k + 1).row(), steps.get(k + 1).at())
              : finding(from, rows, end));
      k += back ? 1 : 0;
    }
    return findings;
  }

  private static QualityFinding finding(Step from, long toRow, long to) {
    Correction.Rows in = new Correction.Rows(from.row(), toRow);
    return new QualityFinding(
        NEUTRAL_NOT_SUM,
        Optional.of(new Period(Instant.ofEpochMilli(from.at()), Instant.ofEpochMilli(to))),
        "The column mapped as N is not to be trusted.",
        String.format(
            Locale.ROOT,
            "N.rms_a is %.3g times what it was from one row to the next, while the lines' currents"
                + " go on: a sum can't change by more than its parts.",
            from.factor()),
        List.of(
            Offers.scale(List.of("N.rms_a"), from.factor(), in),
            Offers.leaveOut(List.of("N.rms_a"), in)));
  }
}
