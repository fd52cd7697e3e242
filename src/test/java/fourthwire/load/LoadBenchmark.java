package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.PortSpectra;
import fourthwire.site.LoadKind;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.openjdk.jmh.profile.GCProfiler;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;

/**
 * How long one load takes to its steady state, on one thread, and what it allocates:
 * capacitor-input supplies ({@link RectifierFleet}) from cold under odd orders to 49 and under all
 * orders to 50, and again after their voltage moved by 1e-4; corrected supplies and dimmers under
 * odd orders. Look at p0.50 (the median) and gc.alloc.rate.norm. About a minute.
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.load.LoadBenchmark
 * }</pre>
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 4, time = 1)
public class LoadBenchmark {
  private static final int SIZE = 256;

  private final RectifierFleet fleet = new RectifierFleet(SIZE, 3);
  private final PortSpectra odd = RectifierFleet.distorted(false);
  private final PortSpectra all = RectifierFleet.distorted(true);
  private final PortSpectra current = new PortSpectra(1);
  private final LoadSolver[] warm = new LoadSolver[SIZE];
  private final LoadModel corrected = model(LoadKind.PFC_CONTINUOUS);
  private final LoadModel dimmer = model(LoadKind.PHASE_DIMMER);
  private final LoadSolver warmCorrected = corrected.newSolver();
  private int next;
  private double moved;

  private static LoadModel model(LoadKind kind) {
    return LoadModels.of(LoadCases.request(kind, 150, 1, 1));
  }

  /** Starts the warm solvers. */
  @Setup
  public void prepare() {
    for (int n = 0; n < SIZE; n++) {
      warm[n] = fleet.model[n].newSolver();
    }
  }

  private int next() {
    next = (next + 1) % SIZE;
    if (next == 0) {
      moved = 1e-4 * RectifierFleet.VOLTS - moved;
      odd.re[0][3] += moved == 0 ? -1e-4 * RectifierFleet.VOLTS : moved;
    }
    return next;
  }

  /** From nothing, half a cycle. */
  @Benchmark
  public PortSpectra capacitorInputColdOdd() {
    fleet.solve(next(), odd, current);
    return current;
  }

  /** From nothing, the whole cycle. */
  @Benchmark
  public PortSpectra capacitorInputColdAll() {
    fleet.solve(next(), all, current);
    return current;
  }

  /** Again, its third order moved by 1e-4 of the voltage. */
  @Benchmark
  public PortSpectra capacitorInputWarm() {
    int n = next();
    warm[n].solve(odd, fleet.ohm[n], fleet.henry[n], current);
    return current;
  }

  /** From nothing. */
  @Benchmark
  public PortSpectra correctedCold() {
    corrected.newSolver().solve(odd, 0.2, 2e-4, current);
    return current;
  }

  /** Again. */
  @Benchmark
  public PortSpectra correctedWarm() {
    next();
    warmCorrected.solve(odd, 0.2, 2e-4, current);
    return current;
  }

  /** A dimmer has nothing to start from. */
  @Benchmark
  public PortSpectra dimmer() {
    dimmer.newSolver().solve(odd, 0.2, 2e-4, current);
    return current;
  }

  /** Runs it with the allocation profiler. */
  public static void main(String[] args) throws RunnerException {
    new Runner(
            new OptionsBuilder()
                .include(LoadBenchmark.class.getSimpleName())
                .addProfiler(GCProfiler.class)
                .build())
        .run();
  }
}
