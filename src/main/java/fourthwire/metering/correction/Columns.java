package fourthwire.metering.correction;

import fourthwire.metering.Correction.FormDistortion;
import fourthwire.metering.Correction.KeepWithin;
import fourthwire.metering.Correction.LeaveOut;
import fourthwire.metering.Correction.Reorder;
import fourthwire.metering.Correction.Rows;
import fourthwire.metering.Correction.Scale;
import fourthwire.metering.Correction.Step;
import fourthwire.metering.Correction.SumLines;
import fourthwire.metering.Correction.TurnSign;
import fourthwire.metering.series.Series;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/** The values of a corrected log by quantity, rows left out still among them. */
final class Columns {
  private static final List<String> LINES = List.of("L1", "L2", "L3");

  private final Series read;
  private final long[] firstRow;
  private final List<LeaveOut> leftOut;
  private final List<KeepWithin> bounds;
  private final List<TurnSign> turned;
  private final List<Scale> scales;
  private final List<Reorder> reorders;
  private final List<SumLines> sums;
  private final List<FormDistortion> distortions;
  private final Distortions formed;
  private final Map<String, Boolean> changed = new ConcurrentHashMap<>();

  Columns(Series read, List<Step> steps) {
    this.read = read;
    this.firstRow = CorrectedSeries.firstRows(read);
    this.leftOut = of(steps, LeaveOut.class);
    this.bounds = of(steps, KeepWithin.class);
    this.turned = of(steps, TurnSign.class);
    this.scales = of(steps, Scale.class);
    this.reorders = of(steps, Reorder.class);
    this.sums = of(steps, SumLines.class);
    this.distortions = of(steps, FormDistortion.class);
    this.formed = new Distortions(read.quantities());
  }

  /** The steps of one kind, in their order. */
  static <S extends Step> List<S> of(List<Step> steps, Class<S> kind) {
    return steps.stream().filter(kind::isInstance).map(kind::cast).toList();
  }

  /** First of a chunk's rows that are meant. */
  static int begin(Rows rows, long firstRow, int length) {
    return (int) Math.max(0, Math.min(length, rows.from() - firstRow));
  }

  /** The one after the last of them. */
  static int end(Rows rows, long firstRow, int length) {
    return (int) Math.max(0, Math.min(length, rows.to() - firstRow));
  }

  /** Asked for each column of every chunk. */
  boolean changes(String quantity) {
    return changed.computeIfAbsent(quantity, this::findChange);
  }

  private boolean findChange(String quantity) {
    return distortions.stream().anyMatch(d -> d.quantity().equals(quantity))
        || sums.stream().anyMatch(s -> quantity.equals("total." + s.measure()))
        || reorders.stream().anyMatch(r -> r.from().containsKey(quantity))
        || changesItself(quantity);
  }

  private boolean changesItself(String quantity) {
    String base = base(quantity);
    return leftOut.stream().anyMatch(l -> l.quantities().contains(quantity))
        || bounds.stream().anyMatch(b -> b.quantity().equals(quantity))
        || turned.stream().anyMatch(t -> t.quantities().contains(base))
        || scales.stream().anyMatch(s -> s.quantities().contains(base));
  }

  /** A quantity's name without what tells lowest or highest of its intervals. */
  private static String base(String quantity) {
    return quantity.replaceFirst("\\.(min|max)$", "");
  }

  /** A column of a chunk, not to be changed. */
  double[] of(int chunk, String quantity) {
    if (!changes(quantity)) {
      return read.values(chunk, read.indexOf(quantity));
    }
    double[] values = summed(chunk, quantity);
    for (FormDistortion d : distortions) {
      if (d.quantity().equals(quantity)) {
        double[] of = formed.of(quantity, name -> summed(chunk, name));
        values = mixed(values, of, d.rows(), chunk);
      }
    }
    return values;
  }

  private double[] summed(int chunk, String quantity) {
    double[] values = reordered(chunk, quantity);
    for (SumLines sum : sums) {
      if (quantity.equals("total." + sum.measure())) {
        double[] total = new double[values.length];
        for (String line : LINES) {
          double[] x = reordered(chunk, line + "." + sum.measure());
          Arrays.setAll(total, k -> total[k] + x[k]);
        }
        values = mixed(values, total, sum.rows(), chunk);
      }
    }
    return values;
  }

  /** Reorders that meet in the same rows follow each other. */
  private double[] reordered(int chunk, String quantity) {
    return reordered(chunk, quantity, reorders.size());
  }

  private double[] reordered(int chunk, String quantity, int first) {
    if (first == 0) {
      return scaled(chunk, quantity);
    }
    Reorder last = reorders.get(first - 1);
    double[] values = reordered(chunk, quantity, first - 1);
    String from = last.from().getOrDefault(quantity, quantity);
    return from.equals(quantity) || !touches(last.rows(), chunk)
        ? values
        : mixed(values, reordered(chunk, from, first - 1), last.rows(), chunk);
  }

  private boolean touches(Rows rows, int chunk) {
    int length = read.rows(chunk);
    return begin(rows, firstRow[chunk], length) < end(rows, firstRow[chunk], length);
  }

  /** A copy with these rows taken from another column. */
  private double[] mixed(double[] values, double[] other, Rows rows, int chunk) {
    double[] mixed = values.clone();
    int from = begin(rows, firstRow[chunk], mixed.length);
    int to = end(rows, firstRow[chunk], mixed.length);
    System.arraycopy(other, from, mixed, from, to - from);
    return mixed;
  }

  private double[] scaled(int chunk, String quantity) {
    double[] values = signed(chunk, quantity);
    String base = base(quantity);
    for (Scale scale : scales) {
      if (scale.quantities().contains(base)) {
        double[] scaled = Arrays.stream(values).map(v -> v * scale.factor()).toArray();
        values = mixed(values, scaled, scale.rows(), chunk);
      }
    }
    return values;
  }

  /** Of the other sign the lowest is what was the highest. */
  private double[] signed(int chunk, String quantity) {
    double[] values = known(chunk, quantity);
    String base = base(quantity);
    for (TurnSign turn : turned) {
      if (turn.quantities().contains(base)) {
        String other = opposite(quantity);
        double[] of = read.indexOf(other) < 0 ? none(values.length) : known(chunk, other);
        double[] negated = Arrays.stream(of).map(v -> 0 - v).toArray();
        values = mixed(values, negated, turn.rows(), chunk);
      }
    }
    return values;
  }

  private static String opposite(String quantity) {
    return quantity.endsWith(".min")
        ? base(quantity) + ".max"
        : quantity.endsWith(".max") ? base(quantity) + ".min" : quantity;
  }

  private static double[] none(int length) {
    double[] none = new double[length];
    Arrays.fill(none, Double.NaN);
    return none;
  }

  private double[] known(int chunk, String quantity) {
    double[] values = read.values(chunk, read.indexOf(quantity));
    if (leftOut.isEmpty() && bounds.isEmpty()) {
      return values;
    }
    double[] known = values.clone();
    for (LeaveOut left : leftOut) {
      if (left.quantities().contains(quantity)) {
        Arrays.fill(
            known,
            begin(left.rows(), firstRow[chunk], known.length),
            end(left.rows(), firstRow[chunk], known.length),
            Double.NaN);
      }
    }
    for (KeepWithin b : bounds) {
      if (b.quantity().equals(quantity)) {
        Arrays.setAll(
            known, k -> known[k] < b.low() || known[k] > b.high() ? Double.NaN : known[k]);
      }
    }
    return known;
  }
}
