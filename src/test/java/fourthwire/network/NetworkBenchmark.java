package fourthwire.network;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;

/**
 * How long all odd orders to 49 take on one thread: assembling every impedance and admittance,
 * eliminating, and solving, on sites of 100 to 10,000 panels with 20 circuits each. Prints the
 * exponent of the growth. About 40 seconds.
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.network.NetworkBenchmark
 * }</pre>
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(value = 1, jvmArgs = "-Xmx1200m")
@Warmup(iterations = 2, time = 1)
@Measurement(iterations = 3, time = 1)
public class NetworkBenchmark {
  /** Panels of the site. */
  @Param({"100", "300", "1000", "3000", "10000"})
  public int panels;

  private TreeNetwork network;
  private OrderSolution solution;
  private final List<Excitation> excitations = new ArrayList<>();
  private final List<Integer> orders = new ArrayList<>();

  /** Makes the site and its circuits' currents. */
  @Setup
  public void prepare() {
    SiteScaleNetwork site = new SiteScaleNetwork(panels, 11);
    network = site.network;
    for (int order = 1; order < 50; order += 2) {
      orders.add(order);
      excitations.add(site.excitation(order, 1000));
    }
    solution = network.factor(1).solve(excitations.get(0));
  }

  /** Assembles, eliminates and solves 25 orders. */
  @Benchmark
  public double allOrders() {
    double sum = 0;
    for (int k = 0; k < orders.size(); k++) {
      network.factor(orders.get(k)).solve(excitations.get(k), solution);
      sum += solution.currentRe(0);
    }
    return sum;
  }

  /** Runs it and prints the exponent of the least-squares line through the logarithms. */
  public static void main(String[] args) throws RunnerException {
    Collection<RunResult> results =
        new Runner(new OptionsBuilder().include(NetworkBenchmark.class.getSimpleName()).build())
            .run();
    double n = results.size();
    double sx = 0;
    double sy = 0;
    double sxx = 0;
    double sxy = 0;
    for (RunResult result : results) {
      double x = Math.log(Double.parseDouble(result.getParams().getParam("panels")));
      double y = Math.log(result.getPrimaryResult().getScore());
      sx += x;
      sy += y;
      sxx += x * x;
      sxy += x * y;
    }
    System.out.printf("time grows with panels^%.3f%n", (n * sxy - sx * sy) / (n * sxx - sx * sx));
  }
}
