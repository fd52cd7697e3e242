package fourthwire.audit.measured;

import fourthwire.metering.assess.PeriodFigures.Column;
import fourthwire.metering.series.Series;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The columns of a log that limits are about, formed where they are not logged as limits ask. */
final class LogColumnsHeld {
  private static final Pattern VOLTAGE = Pattern.compile("(L[123](?:-L[123])?)\\.rms_v");
  private static final Pattern VOLTAGE_THD =
      Pattern.compile("(L[123](?:-L[123])?)\\.voltage_thd_percent");
  private static final Pattern VOLTAGE_ORDER =
      Pattern.compile("(L[123](?:-L[123])?)\\.voltage_h(\\d+)_(v|percent)");
  private static final Pattern CURRENT_ORDER =
      Pattern.compile("(L[123])\\.current_h(\\d+)_(a|percent)");
  private static final List<String> LINES = List.of("L1", "L2", "L3");

  private final Series log;

  LogColumnsHeld(Series log) {
    this.log = log;
  }

  /** Takes one order of one place. */
  interface OrderTaker {
    void take(String place, int order, Column column);
  }

  Optional<Column> find(String quantity) {
    int at = log.indexOf(quantity);
    return at < 0 ? Optional.empty() : Optional.of(chunk -> log.values(chunk, at));
  }

  Map<String, Column> voltages() {
    return matching(VOLTAGE);
  }

  Map<String, Column> voltageDistortions() {
    return matching(VOLTAGE_THD);
  }

  private Map<String, Column> matching(Pattern pattern) {
    Map<String, Column> found = new LinkedHashMap<>();
    for (String name : log.quantities()) {
      Matcher m = pattern.matcher(name);
      if (m.matches()) {
        found.put(m.group(1), find(name).orElseThrow());
      }
    }
    return found;
  }

  /** Percent of the fundamental; of the rms where no fundamental is logged. */
  void voltageOrders(OrderTaker taker) {
    for (String name : log.quantities()) {
      Matcher m = VOLTAGE_ORDER.matcher(name);
      if (m.matches() && Integer.parseInt(m.group(2)) > 1) {
        Column column = find(name).orElseThrow();
        Optional<Column> base =
            find(m.group(1) + ".voltage_h1_v").or(() -> find(m.group(1) + ".rms_v"));
        boolean percent = m.group(3).equals("percent");
        if (percent || base.isPresent()) {
          taker.take(
              m.group(1),
              Integer.parseInt(m.group(2)),
              percent ? column : percentOf(column, base.orElseThrow()));
        }
      }
    }
  }

  /** Percent of the demand current. */
  void currentOrders(double demandA, OrderTaker taker) {
    for (String name : log.quantities()) {
      Matcher m = CURRENT_ORDER.matcher(name);
      if (m.matches() && Integer.parseInt(m.group(2)) > 1) {
        amps(m.group(1), name, m.group(3).equals("percent"))
            .ifPresent(
                amps ->
                    taker.take(
                        m.group(1), Integer.parseInt(m.group(2)), scaled(amps, 100 / demandA)));
      }
    }
  }

  private Optional<Column> amps(String line, String order, boolean percent) {
    Optional<Column> column = find(order);
    return percent ? column.flatMap(c -> fundamental(line).map(f -> product(c, f, 0.01))) : column;
  }

  /** As logged, else the rms without its distortion. */
  private Optional<Column> fundamental(String line) {
    Optional<Column> rms = find(line + ".rms_a");
    Optional<Column> thd = find(line + ".current_thd_percent");
    return find(line + ".current_h1_a")
        .or(
            () ->
                rms.flatMap(
                    r ->
                        thd.map(
                            t ->
                                chunk -> {
                                  double[] first = r.of(chunk).clone();
                                  double[] share = t.of(chunk);
                                  Arrays.setAll(
                                      first, k -> first[k] / Math.hypot(1, share[k] / 100));
                                  return first;
                                })));
  }

  /** TDD by line: from its harmonics, else from its distortion and fundamental. */
  Map<String, Column> demandDistortions(double demandA) {
    Map<String, Column> found = new LinkedHashMap<>();
    for (String line : LINES) {
      List<Column> orders = new ArrayList<>();
      for (String name : log.quantities()) {
        Matcher m = CURRENT_ORDER.matcher(name);
        if (m.matches() && m.group(1).equals(line) && Integer.parseInt(m.group(2)) > 1) {
          amps(line, name, m.group(3).equals("percent")).ifPresent(orders::add);
        }
      }
      if (orders.size() > 2) {
        found.put(line, scaled(rootSum(orders), 100 / demandA));
      } else {
        find(line + ".current_thd_percent")
            .flatMap(t -> fundamental(line).map(f -> product(t, f, 1 / demandA)))
            .ifPresent(c -> found.put(line, c));
      }
    }
    return found;
  }

  private static Column rootSum(List<Column> orders) {
    return chunk -> {
      double[] sum = new double[0];
      for (Column order : orders) {
        double[] x = order.of(chunk);
        double[] into = sum.length == 0 ? new double[x.length] : sum;
        Arrays.setAll(into, k -> into[k] + x[k] * x[k]);
        sum = into;
      }
      double[] root = sum;
      Arrays.setAll(root, k -> Math.sqrt(root[k]));
      return root;
    };
  }

  private static Column percentOf(Column column, Column base) {
    return chunk -> {
      double[] part = column.of(chunk).clone();
      double[] whole = base.of(chunk);
      Arrays.setAll(part, k -> whole[k] > 0 ? 100 * part[k] / whole[k] : Double.NaN);
      return part;
    };
  }

  private static Column product(Column a, Column b, double factor) {
    return chunk -> {
      double[] x = a.of(chunk).clone();
      double[] y = b.of(chunk);
      Arrays.setAll(x, k -> factor * x[k] * y[k]);
      return x;
    };
  }

  private static Column scaled(Column a, double factor) {
    return chunk -> Arrays.stream(a.of(chunk)).map(v -> factor * v).toArray();
  }
}
