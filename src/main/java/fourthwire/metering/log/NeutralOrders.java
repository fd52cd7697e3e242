package fourthwire.metering.log;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * What the orders of the lines leave for the neutral: the fundamentals a third of a cycle apart at
 * the angles of their powers, orders of three in step, the rest as if not together. Between the
 * least and the most of it the neutral may be anything; beyond it all day long its ratio is wrong.
 * A neutral below is told only where thirds are those of single loads. Thresholds are common
 * practice, no source.
 */
final class NeutralOrders {
  private static final int HIGHEST = 50;
  private static final int FEWEST_ORDERS = 3;
  private static final int MOST_ROWS = 200;
  private static final double UNDER_LOAD = 0.3;
  private static final double ABOVE = 1.1;
  private static final double BELOW = 0.75;
  private static final double NEARLY_ALL = 0.8;

  /** Thirds of single loads stand in step in the neutral, but for so much. */
  private static final double IN_STEP = 0.75;

  private static final double LARGE_THIRDS = 0.12;
  private static final double STEADY = 0.15;

  /** Where powers do not tell it. */
  private static final double UNKNOWN_COSINE = Math.cos(Math.toRadians(10));

  private static final double LEAST_COSINE = 0.6;
  private static final double MOST_COSINE = 1.1;

  /** Displacements of the lines of one board differ by no more, as a rule. */
  private static final double MOST_APART = Math.toRadians(20);

  private static final double THIRD_OF_CYCLE = 2 * Math.PI / 3;

  private final double[][] amps;
  private final boolean percent;
  private final List<Order> orders = new ArrayList<>();
  private final List<Optional<double[]>> watts = new ArrayList<>();
  private final List<Optional<double[]>> volts = new ArrayList<>();

  /** An order above the first as logged, of the lines. */
  private record Order(int order, double[][] lines) {}

  /** What a neutral may be, would be of lines alike in power factor, and the share of thirds. */
  private record Made(double least, double usual, double most, double thirds) {}

  /** The neutral on what is made of the orders, how far rows are from it, and if it can't be. */
  private record Ratio(double usual, double apart, boolean far) {}

  private NeutralOrders(LogDay day, double[][] amps) {
    this.amps = amps;
    LineDay lines = new LineDay(day);
    this.percent = lines.all("current_h3_a").isEmpty();
    for (int order = 2; order <= HIGHEST; order++) {
      int number = order;
      lines
          .all("current_h" + order + (percent ? "_percent" : "_a"))
          .ifPresent(x -> orders.add(new Order(number, x)));
    }
    for (String line : LineDay.LINES) {
      watts.add(day.find(line + ".active_w"));
      volts.add(lines.volts(line));
    }
  }

  /**
   * The neutral on what the orders make of it, median of the day, where that is too far off in
   * nearly all rows under load; else, or where the orders are not logged, empty.
   */
  static Optional<Double> off(LogDay day, double[] neutral, double[][] amps) {
    return of(day, neutral, amps).filter(Ratio::far).map(Ratio::usual);
  }

  /** The same where it is so nearly the same in all rows that one ratio explains it. */
  static Optional<Double> steady(LogDay day, double[] neutral, double[][] amps) {
    return of(day, neutral, amps).filter(r -> r.apart() < STEADY).map(Ratio::usual);
  }

  private static Optional<Ratio> of(LogDay day, double[] neutral, double[][] amps) {
    NeutralOrders made = new NeutralOrders(day, amps);
    boolean logged =
        made.orders.size() >= FEWEST_ORDERS && made.orders.stream().anyMatch(o -> o.order() == 3);
    return logged ? Optional.of(made.ratio(neutral)) : Optional.empty();
  }

  private Ratio ratio(double[] neutral) {
    double least = UNDER_LOAD * Rows.median(neutral.length, this::sum);
    double digit = Rows.digit(neutral);
    int there = 0;
    int above = 0;
    int below = 0;
    double[] ratio = new double[neutral.length];
    double[] thirds = new double[neutral.length];
    Arrays.fill(ratio, Double.NaN);
    Arrays.fill(thirds, Double.NaN);
    for (int k = 0; k < neutral.length; k += 1 + neutral.length / MOST_ROWS) {
      Made made = made(k);
      if (sum(k) > least && !Double.isNaN(neutral[k] + made.most())) {
        there++;
        above += neutral[k] > ABOVE * made.most() + 2 * digit ? 1 : 0;
        below += neutral[k] < BELOW * made.least() - 2 * digit ? 1 : 0;
        ratio[k] = neutral[k] / made.usual();
        thirds[k] = made.thirds();
      }
    }
    double usual = Rows.median(ratio);
    double apart = Rows.median(ratio.length, k -> Math.abs(ratio[k] / usual - 1));
    boolean single = Rows.median(thirds) > LARGE_THIRDS && apart < STEADY;
    boolean far = above > NEARLY_ALL * there || single && below > NEARLY_ALL * there;
    return new Ratio(usual, apart, far);
  }

  private double sum(int row) {
    return amps[0][row] + amps[1][row] + amps[2][row];
  }

  private Made made(int row) {
    double[] squares = new double[amps.length];
    for (Order order : orders) {
      for (int line = 0; line < squares.length; line++) {
        double x = order.lines()[line][row] * (percent ? 0.01 : 1);
        squares[line] += x * x;
      }
    }
    double[] first = new double[amps.length];
    for (int line = 0; line < first.length; line++) {
      double rms = amps[line][row];
      first[line] =
          percent
              ? rms / Math.sqrt(1 + squares[line])
              : Math.sqrt(Math.max(0, rms * rms - squares[line]));
    }
    double inStep = 0;
    double apart = 0;
    double thirds = 0;
    for (Order order : orders) {
      double sum = 0;
      for (int line = 0; line < first.length; line++) {
        double x = order.lines()[line][row] * (percent ? 0.01 * first[line] : 1);
        sum += x;
        apart += order.order() % 3 == 0 ? 0 : x * x;
      }
      inStep += order.order() % 3 == 0 ? sum * sum : 0;
      thirds += order.order() == 3 ? sum : 0;
    }
    Bounds of = fundamentals(first, row);
    return new Made(
        Math.hypot(of.least(), IN_STEP * thirds),
        Math.sqrt(of.usual() * of.usual() + inStep),
        Math.sqrt(of.most() * of.most() + inStep + apart),
        thirds / sum(row));
  }

  private record Bounds(double least, double usual, double most) {}

  /** A line may lag or lead by what its power allows, but the lines not much apart. */
  private Bounds fundamentals(double[] first, int row) {
    double[] lag = new double[first.length];
    double[] lead = new double[first.length];
    for (int line = 0; line < lag.length; line++) {
      lag[line] = Math.acos(cosine(line, first[line], row));
      lead[line] = Math.max(-lag[line], lag[line] - MOST_APART);
    }
    double least = Double.POSITIVE_INFINITY;
    double most = 0;
    for (int leads = 0; leads < 8; leads++) {
      double sum = sum(first, lag, lead, leads);
      least = Math.min(least, sum);
      most = Math.max(most, sum);
    }
    return new Bounds(least, sum(first, lag, lead, 0), most);
  }

  /** Of phasors a third of a cycle apart, the lines of the set bits leading. */
  private static double sum(double[] first, double[] lag, double[] lead, int leads) {
    double x = 0;
    double y = 0;
    for (int line = 0; line < first.length; line++) {
      double at = ((leads >> line & 1) == 0 ? lag : lead)[line] + THIRD_OF_CYCLE * line;
      x += first[line] * Math.cos(at);
      y += first[line] * Math.sin(at);
    }
    return Math.hypot(x, y);
  }

  /** NaN, nothing is told, where it feeds back, or its watts or amps seem wrong themselves. */
  private double cosine(int line, double first, int row) {
    if (watts.get(line).isEmpty() || volts.get(line).isEmpty()) {
      return UNKNOWN_COSINE;
    }
    double share = watts.get(line).get()[row] / (volts.get(line).get()[row] * first);
    return share > LEAST_COSINE && share < MOST_COSINE ? Math.min(1, share) : Double.NaN;
  }
}
