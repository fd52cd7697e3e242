package fourthwire.audit;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.site.Survey;
import fourthwire.testsupport.MixedSite;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;

/**
 * How long a running audit leaves its listener without a word, and how long it takes to stop once
 * the listener says so: a whole audit of a mixed site ({@link MixedSite}) with its week and draws,
 * then the same one stopped at random moments. A cancel is heard within the longest of both
 * together. Arguments: panels, circuits, draws, how many are stopped.
 *
 * <pre>{@code
 * mvn -q test-compile dependency:build-classpath -Dmdep.outputFile=target/classpath
 * java -Xmx1500m -cp target/test-classes:target/classes:$(cat target/classpath) \
 *     fourthwire.audit.CancelBenchmark 100 1800 20 10
 * }</pre>
 */
public final class CancelBenchmark {
  private CancelBenchmark() {}

  /** Runs it. */
  public static void main(String[] args) {
    Survey survey = MixedSite.survey(Integer.parseInt(args[0]), Integer.parseInt(args[1]), 1);
    AuditRequest request =
        new AuditRequest(
            survey, Optional.empty(), Map.of(), true, Integer.parseInt(args[2]), AuditRequest.SEED);
    Listener whole = new Listener(Long.MAX_VALUE);
    run(request, whole);
    double seconds = whole.seconds();
    System.out.printf("whole audit %.1f s%n", seconds);
    whole.printSilences();
    SplittableRandom random = new SplittableRandom(1);
    List<Double> stops = new ArrayList<>();
    for (int n = 0; n < Integer.parseInt(args[3]); n++) {
      Listener stopped = new Listener((long) (random.nextDouble() * seconds * 1e9));
      run(request, stopped);
      stops.add(stopped.secondsToStop());
    }
    System.out.printf("longest from the listener's stop to the end: %.2f s%n", max(stops));
  }

  private static void run(AuditRequest request, Listener listener) {
    try {
      new HarmonicAudit().run(request, listener);
    } catch (Progress.CancelledException e) {
      listener.ended = System.nanoTime();
    }
  }

  private static double max(List<Double> values) {
    return values.isEmpty() ? 0 : Collections.max(values);
  }

  /** Notes when it heard what, and stops the run at its time. */
  private static final class Listener implements Progress {
    private final long begun = System.nanoTime();
    private final long stopAfter;
    private final List<String> silences = new ArrayList<>();
    private long last = begun;
    private long stopped;
    private long ended;
    private double longest;

    Listener(long stopAfter) {
      this.stopAfter = stopAfter;
    }

    @Override
    public void at(double share, String message) {
      long now = System.nanoTime();
      double silence = (now - last) / 1e9;
      if (silence > longest) {
        longest = silence;
        silences.add(String.format("%.2f s before %.3f %s", silence, share, message));
      }
      last = now;
      if (now - begun > stopAfter) {
        stopped = now;
        throw new CancelledException();
      }
    }

    double seconds() {
      return (System.nanoTime() - begun) / 1e9;
    }

    double secondsToStop() {
      return stopped == 0 ? 0 : (ended - stopped) / 1e9;
    }

    void printSilences() {
      System.out.println("longest silences, each longer than all before it:");
      silences.forEach(s -> System.out.println("  " + s));
    }
  }
}
