package fourthwire.audit;

import com.sun.management.OperatingSystemMXBean;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.LoadPlacements;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.run.HarmonicAudit;
import fourthwire.audit.solve.CoupledSolver;
import fourthwire.audit.solve.Workers;
import fourthwire.load.DesignPowers;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.testsupport.MixedSite;
import java.lang.management.ManagementFactory;
import java.lang.management.MemoryPoolMXBean;
import java.lang.management.MemoryType;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * How long a mixed site ({@link MixedSite}) takes, step by step: wall time and processor time, the
 * latter less disturbed by what else runs. Arguments: panels, circuits, repetitions of the design
 * state, threads; the last repetition is warm. With a fifth one, a number of draws, a whole audit
 * follows: the week, and the draws.
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -Xmx1500m -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.audit.SiteBenchmark 1000 18000 2 2
 * }</pre>
 */
public final class SiteBenchmark {
  private static final OperatingSystemMXBean MACHINE =
      (OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean();

  private long wall = System.nanoTime();
  private long processor = MACHINE.getProcessCpuTime();
  private String stage = "start";

  private SiteBenchmark() {}

  /** Runs it. */
  public static void main(String[] args) {
    Survey survey = MixedSite.survey(Integer.parseInt(args[0]), Integer.parseInt(args[1]), 1);
    for (int n = 0; n < Integer.parseInt(args[2]); n++) {
      new SiteBenchmark().run(survey, Integer.parseInt(args[3]));
    }
    if (args.length > 4) {
      new SiteBenchmark().audit(survey, Integer.parseInt(args[3]), Integer.parseInt(args[4]));
    }
    long peak =
        ManagementFactory.getMemoryPoolMXBeans().stream()
            .filter(pool -> pool.getType() == MemoryType.HEAP)
            .map(MemoryPoolMXBean::getPeakUsage)
            .mapToLong(usage -> usage.getUsed())
            .sum();
    System.out.printf("peak heap at most %.0f MB%n", peak / 1e6);
  }

  private void run(Survey survey, int threads) {
    try (Workers workers = new Workers(threads, () -> {})) {
      SiteTree tree = SiteTree.of(survey);
      DesignPowers known = new DesignPowers();
      List<Device> devices = workers.map(LoadPlacements.of(survey, tree), p -> Device.of(p, known));
      lap("load models");
      NetworkPlan plan = NetworkPlan.of(survey, survey.normalSupply(), tree, devices, true);
      lap("network plan");
      CoupledSolver solver = new CoupledSolver(survey, workers);
      solver.solve(plan, devices, (share, message) -> lap("  until " + message));
      lap("  until the end");
      solver.solve(plan, devices, Progress.SILENT);
      lap("the same state again");
    }
  }

  private void audit(Survey survey, int threads, int draws) {
    AuditRequest request =
        new AuditRequest(survey, Optional.empty(), Map.of(), true, draws, AuditRequest.SEED);
    new HarmonicAudit(threads).run(request, (share, message) -> stage(message));
    lap(stage);
  }

  /** A lap where another stage begins; a stage's messages differ in their numbers only. */
  private void stage(String message) {
    String next = message.replaceAll("\\d+", "#");
    if (!next.equals(stage)) {
      lap(stage);
      stage = next;
    }
  }

  private void lap(String what) {
    long now = System.nanoTime();
    long used = MACHINE.getProcessCpuTime();
    System.out.printf(
        "%-50s %8.0f ms %8.0f ms of processors%n",
        what, (now - wall) / 1e6, (used - processor) / 1e6);
    wall = System.nanoTime();
    processor = MACHINE.getProcessCpuTime();
  }
}
