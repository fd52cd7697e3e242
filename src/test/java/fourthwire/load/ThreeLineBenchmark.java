package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.SixPulse;
import fourthwire.load.rectifier.TwelvePulse;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
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
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;

/**
 * A converged solution of a 15 kW drive behind 1 % of source reactance, cold (a new solver) and
 * warm (again at a voltage moved by 0.02 %), median of single solves. About two minutes.
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.load.ThreeLineBenchmark
 * }</pre>
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 3, time = 1)
public class ThreeLineBenchmark {
  private static final double WATTS = 15e3;
  private static final double BASE_OHM = 400 * 400 / WATTS;
  private static final double OMEGA = 2 * Math.PI * 50;

  /** Pulses per cycle. */
  @Param({"6", "12"})
  public int pulses;

  /** Chokes: none, 3 % in the lines, 4 % behind the bridge. */
  @Param({"none", "line", "direct"})
  public String choke;

  /** Line a 3 % low, with 3 % of the fifth order and 2 % of the seventh, or neither. */
  @Param({"false", "true"})
  public boolean unbalanced;

  private final PortSpectra emf = new PortSpectra(3);
  private final PortSpectra current = new PortSpectra(3);
  private LoadModel model = new SixPulse(load(0, 0), 50);
  private LoadSolver kept = model.newSolver();
  private boolean higher;

  /** Makes the drive and its voltage. */
  @Setup
  public void prepare() {
    double line = choke.equals("line") ? 0.03 * BASE_OHM * pulses / 6 : 0;
    BridgeLoad load = load(line, choke.equals("direct") ? 0.04 * BASE_OHM : 0);
    model = pulses == 6 ? new SixPulse(load, 50) : new TwelvePulse(load, 50);
    kept = model.newSolver();
    for (int k = 0; k < 3; k++) {
      add(k, 1, unbalanced && k == 0 ? 224 : 231);
      if (unbalanced) {
        add(k, 5, -0.03 * 231);
        add(k, 7, 0.02 * 231);
      }
    }
  }

  private static BridgeLoad load(double line, double direct) {
    return new BridgeLoad(
        WATTS,
        1e-7 * WATTS,
        0.002 * BASE_OHM + line / 15,
        line / OMEGA,
        direct / 10,
        direct / OMEGA,
        new Diode(3e-11, 1.2, 1e-3));
  }

  private void add(int k, int order, double volts) {
    double angle = -order * k * 2 * Math.PI / 3;
    emf.re[k][order] += volts * Math.cos(angle);
    emf.im[k][order] += volts * Math.sin(angle);
  }

  /** From nothing. */
  @Benchmark
  public double cold() {
    return solve(model.newSolver());
  }

  /** From the solution before. */
  @Benchmark
  public double warm() {
    higher = !higher;
    for (int k = 0; k < 3; k++) {
      emf.re[k][1] *= higher ? 1.0002 : 1 / 1.0002;
      emf.im[k][1] *= higher ? 1.0002 : 1 / 1.0002;
    }
    return solve(kept);
  }

  private double solve(LoadSolver solver) {
    solver.solve(emf, 0.001 * BASE_OHM, 0.01 * BASE_OHM / OMEGA, current);
    return current.re[0][1];
  }

  /** Runs it. */
  public static void main(String[] args) throws RunnerException {
    new Runner(new OptionsBuilder().include(ThreeLineBenchmark.class.getSimpleName()).build())
        .run();
  }
}
