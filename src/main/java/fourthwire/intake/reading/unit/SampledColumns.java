package fourthwire.intake.reading.unit;

import fourthwire.intake.reading.table.TextTable;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntToDoubleFunction;

/** Values of the first rows of a table, column by column, as written. */
public final class SampledColumns {
  private static final int ROWS = 1000;

  /** Energies of a few intervals may rise by themselves. */
  private static final int FEW_ROWS = 12;

  private static final double LEAST_STEPS = 5;

  private final Map<String, double[]> columns = new LinkedHashMap<>();
  private final List<String> openNumbers;

  public SampledColumns(TextTable table) {
    List<String> headings = table.headings();
    List<double[]> rows = new ArrayList<>();
    table.forEach(
        row -> {
          double[] values = new double[headings.size()];
          for (int k = 0; k < values.length; k++) {
            double v = row.value(k);
            values[k] = Double.isFinite(v) ? v : Double.NaN;
          }
          rows.add(values);
          return rows.size() < ROWS;
        });
    for (int k = 0; k < headings.size(); k++) {
      int column = k;
      columns.put(headings.get(k), rows.stream().mapToDouble(r -> r[column]).toArray());
    }
    this.openNumbers = table.openNumbers();
  }

  List<String> openNumbers() {
    return openNumbers;
  }

  double[] of(String column) {
    return columns.getOrDefault(column, new double[0]);
  }

  /** Median of a column's absolute values; NaN without any. */
  double median(String column) {
    return percentile(of(column), 50);
  }

  /** Whether values go one way only, in steps that are small beside them. */
  boolean isCounter(String column) {
    double[] x = Arrays.stream(of(column)).filter(v -> !Double.isNaN(v)).toArray();
    int rising = 0;
    int falling = 0;
    double largest = 0;
    for (int k = 1; k < x.length; k++) {
      rising += x[k] > x[k - 1] ? 1 : 0;
      falling += x[k] < x[k - 1] ? 1 : 0;
      largest = Math.max(largest, Math.abs(x[k] - x[k - 1]));
    }
    boolean oneWay = (rising == 0) != (falling == 0);
    double end = x.length == 0 ? 0 : Math.max(x[0], x[x.length - 1]);
    return oneWay && x.length > FEW_ROWS && end > LEAST_STEPS * largest;
  }

  /** Median of the rows' ratios; NaN where one of the two is not there. */
  double ratio(Optional<double[]> a, Optional<double[]> b) {
    return ratioOf(a, b);
  }

  static double ratioOf(Optional<double[]> a, Optional<double[]> b) {
    return a.isPresent() && b.isPresent()
        ? percentile(quotient(a.get(), b.get(), 1), 50)
        : Double.NaN;
  }

  static double percentile(double[] x, double percent) {
    double[] there = new double[x.length];
    int count = 0;
    for (double v : x) {
      if (!Double.isNaN(v)) {
        there[count++] = Math.abs(v);
      }
    }
    Arrays.sort(there, 0, count);
    return count == 0 ? Double.NaN : there[(int) Math.round((count - 1) * percent / 100)];
  }

  static double[] product(double[] a, double[] b) {
    return rows(a.length, k -> a[k] * b[k]);
  }

  static double[] sum(double[] a, double[] b) {
    return rows(a.length, k -> a[k] + b[k]);
  }

  static double[] times(double[] a, double factor) {
    return rows(a.length, k -> a[k] * factor);
  }

  /** Ratio where the second is not next to nothing. */
  static double[] quotient(double[] a, double[] b, double factor) {
    return rows(a.length, k -> Math.abs(b[k]) > 1e-9 ? factor * a[k] / b[k] : Double.NaN);
  }

  /** Root of the sum of squares; blanks count as nothing. */
  static double[] rootSum(List<double[]> all) {
    return rows(
        all.get(0).length,
        k -> Math.sqrt(all.stream().mapToDouble(x -> Double.isNaN(x[k]) ? 0 : x[k] * x[k]).sum()));
  }

  /** What is left of a total in squares. */
  static double[] rootRest(double[] total, double[] part) {
    return rows(total.length, k -> Math.sqrt(Math.max(0, total[k] * total[k] - part[k] * part[k])));
  }

  private static double[] rows(int length, IntToDoubleFunction of) {
    double[] made = new double[length];
    Arrays.setAll(made, of);
    return made;
  }
}
