package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.DISTORTION_MISREAD;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * A distortion that is a mean over a longer time than the rows say: it stands still for whole days,
 * or changes only every so many minutes, or is one mean for all lines. Its percentiles are then
 * lower than the truth. Thresholds are common practice, no source.
 */
final class HeldDistortion implements DayCheck {
  private static final int FEWEST_ROWS = 8;
  private static final int FEWEST_CHANGES = 20;
  private static final int FEWEST_HELD = 3;
  private static final long[] BLOCKS = {30, 60, 120, 180, 360};
  private static final long MINUTE_MILLIS = 60_000;
  private static final double NEARLY_ALL = 0.95;

  private final List<Column> columns = new ArrayList<>();
  private final LineMeans lines = new LineMeans();
  private final List<String> names;
  private long from = Long.MAX_VALUE;
  private long to = Long.MIN_VALUE;
  private long rows;
  private long interval;
  private boolean othersMove;

  HeldDistortion(List<String> names) {
    this.names = names;
    for (int q = 0; q < names.size(); q++) {
      if (names.get(q).endsWith("_thd_percent")) {
        columns.add(new Column(q));
      }
    }
  }

  private static final class Column {
    private final int quantity;
    private final boolean[] offBlock = new boolean[BLOCKS.length];
    private double before = Double.NaN;
    private long firstChange = Long.MIN_VALUE;
    private int changes;
    private int within;
    private int heldDays;
    private int heldBroken;
    private int values;
    private int rows;

    Column(int quantity) {
      this.quantity = quantity;
    }

    void take(LogDay day) {
      double[] x = day.of(quantity);
      int there = 0;
      within = 0;
      double last = Double.NaN;
      for (int row = 0; row < x.length; row++) {
        if (!Double.isNaN(x[row])) {
          there++;
          if (x[row] != before && !Double.isNaN(before)) {
            change(day.startMillis(row));
            within += Double.isNaN(last) ? 0 : 1;
          }
          last = x[row];
          before = last;
        }
      }
      rows += there;
      if (there >= FEWEST_ROWS && within == 0 && last != 0) {
        heldDays++;
        heldBroken += last == Math.rint(last) ? 0 : 1;
        values++;
      } else if (there > 0 && within > 0) {
        values++;
      }
    }

    private void change(long at) {
      changes++;
      firstChange = firstChange == Long.MIN_VALUE ? at : firstChange;
      for (int k = 0; k < BLOCKS.length; k++) {
        offBlock[k] |= (at - firstChange) % (BLOCKS[k] * MINUTE_MILLIS) != 0;
      }
    }

    /** Every day stands still, and not at whole numbers as a coarse meter would. */
    boolean isDaily() {
      return heldDays > 0 && heldDays == values && 2 * heldBroken > heldDays;
    }

    /** The longest of the blocks between which alone it changes, minutes; 0 for none. */
    long block(long intervalMillis) {
      for (int k = BLOCKS.length - 1; k >= 0; k--) {
        boolean held = BLOCKS[k] * MINUTE_MILLIS >= FEWEST_HELD * intervalMillis;
        if (held && changes >= FEWEST_CHANGES && !offBlock[k]) {
          return BLOCKS[k];
        }
      }
      return 0;
    }
  }

  /** Distortions of the three currents that are the same while the currents are not. */
  private static final class LineMeans {
    private int there;
    private int alike;
    private int moved;
    private int apart;
    private double before;

    void take(LogDay day) {
      Optional<double[][]> thd = new LineDay(day).all("current_thd_percent");
      Optional<double[][]> amps = new LineDay(day).all("rms_a");
      if (thd.isEmpty()) {
        return;
      }
      double[][] t = thd.get();
      for (int row = 0; row < day.rows(); row++) {
        double one = t[0][row];
        if (!Double.isNaN(one + t[1][row] + t[2][row]) && one > 0) {
          there++;
          boolean same = one == t[1][row] && one == t[2][row];
          alike += same ? 1 : 0;
          moved += same && one != before ? 1 : 0;
          before = one;
          double[] a = {
            amps.map(x -> x[0]).orElse(t[0])[row], amps.map(x -> x[1]).orElse(t[1])[row]
          };
          apart += Math.abs(a[0] - a[1]) > 0.02 * Math.max(a[0], a[1]) ? 1 : 0;
        }
      }
    }

    boolean isOne() {
      return there >= FEWEST_CHANGES
          && alike > NEARLY_ALL * there
          && moved >= FEWEST_CHANGES
          && apart > there / 2;
    }
  }

  @Override
  public void take(LogDay day) {
    columns.forEach(c -> c.take(day));
    lines.take(day);
    from = Math.min(from, day.startMillis(0));
    to = Math.max(to, day.startMillis(day.rows() - 1) + day.intervalMillis());
    interval = day.intervalMillis();
    rows += day.rows();
    othersMove |= othersMove(day);
  }

  /** Whether amps or volts move on a day: a meter that stands still is told elsewhere. */
  private static boolean othersMove(LogDay day) {
    for (String name : day.quantities()) {
      if (name.endsWith(".rms_a") || name.endsWith(".rms_v") || name.endsWith(".active_w")) {
        double[] x = day.find(name).orElse(new double[0]);
        int changes = 0;
        for (int row = 1; row < x.length; row++) {
          changes += x[row] != x[row - 1] ? 1 : 0;
        }
        if (2 * changes > day.rows()) {
          return true;
        }
      }
    }
    return false;
  }

  @Override
  public List<QualityFinding> findings() {
    List<QualityFinding> findings = new ArrayList<>();
    List<String> daily = new ArrayList<>();
    for (Column c : columns) {
      String name = names.get(c.quantity);
      long block = c.block(interval);
      if (othersMove && c.isDaily() && c.rows >= FEWEST_CHANGES) {
        daily.add(name);
        findings.add(finding(name, "stands still for whole days, as a daily mean does"));
      } else if (othersMove && block > 0) {
        findings.add(
            finding(
                name,
                String.format(
                    Locale.ROOT,
                    "changes only every %s, as a mean over that time does",
                    LogClock.words(block * MINUTE_MILLIS))));
      }
    }
    if (daily.isEmpty() && lines.isOne()) {
      findings.add(
          finding(
              List.of("L1.current_thd_percent", "L2.current_thd_percent", "L3.current_thd_percent"),
              "is the same as that of L2 and L3 in nearly every row, as one mean of all lines is"));
    }
    return findings;
  }

  private QualityFinding finding(String name, String what) {
    return finding(List.of(name), what);
  }

  /** Of columns that are alike; the first is named. */
  private QualityFinding finding(List<String> alike, String what) {
    String name = alike.get(0);
    Correction.Rows all = new Correction.Rows(0, rows);
    String start = name.replace("thd_percent", "h");
    boolean harmonics =
        names.stream().filter(n -> n.startsWith(start)).filter(n -> !n.contains("_deg")).count()
            >= FEWEST_HELD;
    return new QualityFinding(
        DISTORTION_MISREAD,
        Optional.of(new Period(Instant.ofEpochMilli(from), Instant.ofEpochMilli(to))),
        "Its percentiles are lower than the truth and can't be held against limits.",
        name + " " + what + ".",
        List.of(
            harmonics ? Offers.formDistortion(name, all) : Offers.leaveOut(List.of(name), all)));
  }
}
