package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.NEUTRAL_NOT_SUM;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Duration;
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
final class NeutralSteps {
  /** Rows looked at on either side. */
  private static final int SIDE = 6;

  private static final double LEAST_FACTOR = 1.8;
  private static final double STEADY = 1.5;
  private static final double OF_LINES = 2;
  private static final double OF_WANDER = 2;
  private static final int FEWEST_DIGITS = 5;

  /** How far two steps may be from undoing each other, in the logarithm. */
  private static final double PAIRED = 0.35;

  private static final double NEAR = 1.05;

  /** What a step's factor, of few rows, is at most off by. */
  private static final double ROUGH = 1.25;

  private static final Duration A_DAY = Duration.ofDays(1);
  private static final int MOST_STEPS = 50;

  /** The last rows: N, L1, L2, L3 each; and when and where they stand. */
  private final double[][] last = new double[4][2 * SIDE];

  private final long[] at = new long[2 * SIDE];
  private final long[] row = new long[2 * SIDE];
  private final List<Step> steps = new ArrayList<>();
  private int filled;
  private double digit;
  private long begin = Long.MIN_VALUE;
  private long end;
  private long rows;

  /** From a row on N is so many times what it was. */
  private record Step(long row, long at, double factor) {}

  void take(LogDay day) {
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
    begin = begin == Long.MIN_VALUE ? day.startMillis(0) : begin;
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
    double sumBefore = 0;
    double sumAfter = 0;
    for (int line = 1; line < last.length; line++) {
      lines += Math.abs(median(last[line], SIDE) - median(last[line], 0));
      sumBefore += median(last[line], 0);
      sumAfter += median(last[line], SIDE);
    }
    double beside = after / before * sumBefore / sumAfter;
    boolean steady = isSteady(0) && isSteady(SIDE);
    double step = Math.abs(after - before);
    boolean told = step > FEWEST_DIGITS * digit;
    boolean own = step > OF_LINES * lines && step > OF_WANDER * Math.max(range(0), range(SIDE));
    double factor = after / before;
    boolean large = Math.max(factor, 1 / factor) >= LEAST_FACTOR;
    // A neutral written ten times too large outgrows the lines with any load that is switched.
    if (steady && told && own && large && Math.max(beside, 1 / beside) >= LEAST_FACTOR) {
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

  /** Beside what whole days have told, which a stretch between steps tells once, by its rows. */
  List<QualityFinding> findings(List<QualityFinding> told) {
    List<QualityFinding> all = new ArrayList<>(told);
    for (int k = 0; k < steps.size(); k++) {
      Step step = steps.get(k);
      boolean back = k + 1 < steps.size() && isUndone(step, steps.get(k + 1));
      QualityFinding found = back ? between(step, steps.get(++k)) : alone(step, told);
      all.removeIf(f -> f.code().equals(NEUTRAL_NOT_SUM) && isWithin(f, found, A_DAY));
      all.add(found);
    }
    return all;
  }

  private static boolean isUndone(Step step, Step next) {
    return Math.abs(Math.log(step.factor() * next.factor())) < PAIRED;
  }

  private static QualityFinding between(Step from, Step to) {
    double low = Math.min(from.factor(), 1 / to.factor());
    double high = Math.max(from.factor(), 1 / to.factor());
    return finding(
        from.factor(),
        LikelyRatio.usual(low / NEAR, high * NEAR).orElse(Math.sqrt(low * high)),
        new Correction.Rows(from.row(), to.row()),
        from.at(),
        to.at());
  }

  /** It was wrong up to the step where days before were told and none after, else from then on. */
  private QualityFinding alone(Step step, List<QualityFinding> told) {
    QualityFinding after =
        finding(
            step.factor(),
            likely(step.factor()),
            new Correction.Rows(step.row(), rows),
            step.at(),
            end);
    QualityFinding before =
        finding(
            step.factor(),
            likely(1 / step.factor()),
            new Correction.Rows(0, step.row()),
            begin,
            step.at());
    List<QualityFinding> days =
        told.stream().filter(f -> f.code().equals(NEUTRAL_NOT_SUM)).toList();
    boolean mended = !days.isEmpty() && days.stream().allMatch(f -> isWithin(f, before, A_DAY));
    return mended ? before : after;
  }

  private static double likely(double factor) {
    return LikelyRatio.usual(factor / ROUGH, factor * ROUGH).orElse(factor);
  }

  private static boolean isWithin(QualityFinding f, QualityFinding found, Duration more) {
    Period period = f.period().orElseThrow();
    Period in = found.period().orElseThrow();
    return !period.from().isBefore(in.from().minus(more))
        && !period.to().isAfter(in.to().plus(more));
  }

  private static QualityFinding finding(
      double seen, double factor, Correction.Rows in, long from, long to) {
    return new QualityFinding(
        NEUTRAL_NOT_SUM,
        Optional.of(new Period(Instant.ofEpochMilli(from), Instant.ofEpochMilli(to))),
        "The column mapped as N is not to be trusted.",
        String.format(
            Locale.ROOT,
            "N.rms_a is %.3g times what it was from one row to the next, while the lines' currents"
                + " go on: a sum can't change by more than its parts.",
            seen),
        List.of(
            Offers.scale(List.of("N.rms_a"), factor, in), Offers.leaveOut(List.of("N.rms_a"), in)));
  }
}
