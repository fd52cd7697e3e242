package fourthwire.metering.log;

import fourthwire.metering.Correction;
import fourthwire.metering.Correction.DropRepeats;
import fourthwire.metering.Correction.DropRows;
import fourthwire.metering.Correction.FormDistortion;
import fourthwire.metering.Correction.KeepWithin;
import fourthwire.metering.Correction.LeaveOut;
import fourthwire.metering.Correction.Reorder;
import fourthwire.metering.Correction.Rows;
import fourthwire.metering.Correction.Scale;
import fourthwire.metering.Correction.ShiftClock;
import fourthwire.metering.Correction.Step;
import fourthwire.metering.Correction.SumLines;
import fourthwire.metering.Correction.TurnSign;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Words the corrections that are offered for faults of a log. */
final class Offers {
  private static final int MOST_NAMED = 6;

  private final List<String> names;

  Offers(List<String> names) {
    this.names = names;
  }

  /** Corrections of rows that are known only when the fault has ended. */
  interface Of {
    List<Correction> rows(Rows rows);
  }

  /** Nothing known of these columns in these rows. */
  static Correction leaveOut(List<String> quantities, Rows rows) {
    String what =
        quantities.size() == 1
            ? quantities.get(0)
            : quantities.size() < 4
                ? joined(quantities)
                : "these " + quantities.size() + " quantities";
    return Correction.of(
        "Leave out " + what + " in these " + rows.count() + " rows",
        new LeaveOut(quantities, rows));
  }

  /** Nothing known of a column in some stretches. */
  static Correction leaveOut(String quantity, List<Rows> stretches) {
    List<Step> steps = new ArrayList<>();
    stretches.forEach(rows -> steps.add(new LeaveOut(List.of(quantity), rows)));
    return new Correction("Leave out the values of " + quantity + " that can't be", steps);
  }

  /** Only values between these count. */
  static Correction keepWithin(String quantity, double low, double high) {
    return Correction.of(
        "Leave out the values of " + quantity + " that can't be",
        new KeepWithin(quantity, low, high));
  }

  static Correction dropRepeats(Rows rows) {
    return Correction.of("Count each of these times once: its first row", new DropRepeats(rows));
  }

  /** Blocks of rows that stand in the file before. */
  static Correction dropRows(List<Rows> blocks) {
    List<Step> steps = new ArrayList<>();
    blocks.forEach(rows -> steps.add(new DropRows(rows)));
    return new Correction("Count each of these rows once: where it stands first", steps);
  }

  /** The rows from here on, or those before, moved so that they meet but for a gap. */
  static List<Correction> shift(long millis, long gapMillis, long row) {
    String by = LogClock.words(Math.abs(millis));
    String gap = gapMillis > 0 ? ", which leaves a gap of " + LogClock.words(gapMillis) : "";
    boolean later = millis > 0;
    return List.of(
        Correction.of(
            "Set the rows after the jump " + by + (later ? " later" : " earlier") + gap,
            new ShiftClock(millis, new Rows(row, Long.MAX_VALUE))),
        Correction.of(
            "Set the rows before the jump " + by + (later ? " earlier" : " later") + gap,
            new ShiftClock(-millis, new Rows(0, row))));
  }

  /** Those logged of a line whose sign turns with its clamp. */
  List<String> signed(String line) {
    return logged(
        line + ".active_w",
        line + ".power_factor",
        line + ".displacement_factor",
        line + ".reactive_var");
  }

  /** The columns of these names that are logged. */
  List<String> logged(String... wanted) {
    List<String> there = new ArrayList<>();
    for (String name : wanted) {
      if (names.contains(name)) {
        there.add(name);
      }
    }
    return there;
  }

  /** A line's powers the other way round; totals that were summed from them with them. */
  Correction turn(List<String> quantities, boolean totalFollows, Rows rows) {
    List<Step> steps = new ArrayList<>();
    steps.add(new TurnSign(quantities, rows));
    if (totalFollows) {
      steps.addAll(total(rows));
    }
    return new Correction(
        "Turn the sign of "
            + joined(quantities)
            + (totalFollows ? ", and form the total as the sum of the lines" : ""),
        steps);
  }

  /** The total of active power from the lines; what else is said of all lines is not known. */
  List<Step> total(Rows rows) {
    List<Step> steps = new ArrayList<>();
    steps.add(new SumLines("active_w", rows));
    List<String> rest =
        logged(
            "total.active_w.min",
            "total.active_w.max",
            "total.power_factor",
            "total.displacement_factor");
    if (!rest.isEmpty()) {
      steps.add(new LeaveOut(rest, rows));
    }
    return steps;
  }

  static Correction sum(String measure, Rows rows) {
    return Correction.of(
        "Form total." + measure + " as the sum of the lines", new SumLines(measure, rows));
  }

  /** These columns by the factor that undoes a ratio. */
  static Correction scale(List<String> quantities, double ratio, Rows rows) {
    double factor = LikelyRatio.of(1 / ratio);
    return Correction.of(
        "Multiply " + shortened(quantities) + " by " + LikelyRatio.text(factor),
        new Scale(quantities, factor, rows));
  }

  /** Many harmonics beside what they belong to are not named one by one. */
  private static String shortened(List<String> quantities) {
    List<String> plain = quantities.stream().filter(q -> !q.matches(".*_h\\d+_.*")).toList();
    return quantities.size() > MOST_NAMED && !plain.isEmpty() && plain.size() < quantities.size()
        ? joined(plain) + ", with their harmonics,"
        : joined(quantities);
  }

  /** Lines' powers by the factor that undoes a ratio; totals summed from them with them. */
  Correction rescale(List<String> powers, double ratio, boolean totalFollows, Rows rows) {
    Correction alone = scale(powers, ratio, rows);
    if (!totalFollows) {
      return alone;
    }
    List<Step> steps = new ArrayList<>(alone.steps());
    steps.addAll(total(rows));
    return new Correction(alone.sentence() + ", and form the total as the sum of the lines", steps);
  }

  static Correction formDistortion(String quantity, Rows rows) {
    return formDistortion(List.of(quantity), rows);
  }

  static Correction formDistortion(List<String> quantities, Rows rows) {
    List<Step> steps = new ArrayList<>();
    quantities.forEach(q -> steps.add(new FormDistortion(q, rows)));
    return new Correction("Form " + joined(quantities) + " from the harmonics", steps);
  }

  /**
   * Columns of lines under each other's names.
   *
   * @param order the line whose column each line takes
   * @param measures that move, such as {@code rms_a}
   */
  Reorder reorder(int[] order, List<String> measures, Rows rows) {
    Map<String, String> from = new LinkedHashMap<>();
    for (int line = 0; line < order.length; line++) {
      for (String measure : measures) {
        String to = LineDay.LINES[line] + "." + measure;
        String of = LineDay.LINES[order[line]] + "." + measure;
        if (order[line] != line && names.contains(to) && names.contains(of)) {
          from.put(to, of);
        }
      }
    }
    return new Reorder(from, rows);
  }

  /** Measures of L1 whose names begin so, lowest and highest of intervals too. */
  List<String> measures(String... starts) {
    List<String> found = new ArrayList<>();
    for (String name : names) {
      for (String start : starts) {
        if (name.startsWith("L1." + start)) {
          found.add(name.substring("L1.".length()));
        }
      }
    }
    return found;
  }

  /** Which lines an order exchanges, in words. */
  static String exchanged(int[] order) {
    List<String> moved = new ArrayList<>();
    List<String> from = new ArrayList<>();
    for (int line = 0; line < order.length; line++) {
      if (order[line] != line) {
        moved.add(LineDay.LINES[line]);
        from.add(LineDay.LINES[order[line]]);
      }
    }
    return moved.size() == 2
        ? "Exchange " + joined(moved)
        : "Take " + joined(moved) + " from the columns of " + joined(from);
  }

  static String joined(List<String> words) {
    int last = words.size() - 1;
    return last < 1
        ? String.join("", words)
        : String.join(", ", words.subList(0, last)) + " and " + words.get(last);
  }
}
