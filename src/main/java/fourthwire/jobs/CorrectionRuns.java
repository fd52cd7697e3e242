package fourthwire.jobs;

import java.time.Duration;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.FutureTask;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import java.util.function.DoubleConsumer;

/**
 * Corrections on their way, of each log one at a time, in the background: a page can show how far a
 * large log's is. It is made whole or not at all, so what a stop or a cancel interrupts leaves the
 * log as it was, and nothing of it is stored.
 */
public final class CorrectionRuns implements AutoCloseable {
  private static final int AT_ONCE = 2;

  private final CorrectionService service;
  private final Stop stop;
  private final Map<Long, Run> runs = new ConcurrentHashMap<>();
  private final ExecutorService worker =
      Executors.newFixedThreadPool(
          AT_ONCE,
          work -> {
            Thread thread = new Thread(work, "correction");
            thread.setDaemon(true);
            return thread;
          });

  /** By this service. */
  public CorrectionRuns(CorrectionService service, Stop stop) {
    this.service = service;
    this.stop = stop;
  }

  /**
   * How far one is.
   *
   * @param share that is done, 0 to 1
   * @param failure why it ended without being made; empty while it runs
   */
  public record State(double share, String failure) {}

  /** Work that tells how far it is. */
  @FunctionalInterface
  interface Work<T> {
    T run(DoubleConsumer listener);
  }

  /** One on its way. */
  private static final class Run {
    private volatile double share;
    private volatile boolean isCancelled;
    private volatile String failure = "";
  }

  /**
   * Makes a correction that a finding offers; the reading must be there.
   *
   * @param finding position among the reading's findings
   * @param offer position among the finding's corrections
   * @return its id; empty where it takes longer than the caller's patience and goes on
   * @throws RefusedException where there is no such finding or offer, the finding is mended, or
   *     another correction of the log is on its way
   */
  public Optional<Long> make(long readingId, int finding, int offer, Duration patience) {
    return start(
        readingId, patience, listener -> service.make(readingId, finding, offer, listener));
  }

  /** Takes a correction back, likewise; tells whether it held. */
  public Optional<Boolean> undo(long readingId, long correctionId, Duration patience) {
    return start(readingId, patience, listener -> service.undo(readingId, correctionId, listener));
  }

  /** Starts work on a reading and waits for its end as long as that. */
  <T> Optional<T> start(long readingId, Duration patience, Work<T> work) {
    Run run = new Run();
    Run there = runs.compute(readingId, (id, r) -> r == null || !r.failure.isEmpty() ? run : r);
    if (there != run) {
      throw new RefusedException(
          "another correction of this log is on its way; wait until it is done");
    }
    FutureTask<T> task = new FutureTask<>(call(readingId, run, work));
    worker.execute(task);
    return await(task, patience);
  }

  private <T> Callable<T> call(long readingId, Run run, Work<T> work) {
    return () -> {
      try {
        T made = work.run(share -> at(run, share));
        runs.remove(readingId, run);
        return made;
      } catch (RefusedException | CancellationException | Stop.StoppedException ended) {
        runs.remove(readingId, run);
        throw ended;
      } catch (RuntimeException | Error unforeseen) {
        run.failure = Failure.sentence("The correction of reading " + readingId, unforeseen);
        throw unforeseen;
      }
    };
  }

  private void at(Run run, double share) {
    stop.check();
    if (run.isCancelled) {
      throw new CancellationException("the correction was stopped before it was made");
    }
    run.share = Math.max(run.share, share);
  }

  private static <T> Optional<T> await(FutureTask<T> task, Duration patience) {
    try {
      return Optional.of(task.get(patience.toMillis(), TimeUnit.MILLISECONDS));
    } catch (TimeoutException longer) {
      return Optional.empty();
    } catch (InterruptedException interrupted) {
      Thread.currentThread().interrupt();
      return Optional.empty();
    } catch (ExecutionException ended) {
      if (ended.getCause() instanceof CancellationException cancelled) {
        throw new RefusedException(String.valueOf(cancelled.getMessage()));
      }
      if (ended.getCause() instanceof RuntimeException cause) {
        throw cause;
      }
      throw new IllegalStateException(ended.getCause());
    }
  }

  /**
   * Of the correction of a reading that is on its way, or failed last; empty where there is none.
   */
  public Optional<State> of(long readingId) {
    return Optional.ofNullable(runs.get(readingId)).map(r -> new State(r.share, r.failure));
  }

  /** Stops the correction of a reading that is on its way, and forgets one that failed. */
  public void cancel(long readingId) {
    Run run = runs.get(readingId);
    if (run != null) {
      run.isCancelled = true;
      if (!run.failure.isEmpty()) {
        runs.remove(readingId, run);
      }
    }
  }

  @Override
  public void close() {
    worker.shutdownNow();
  }
}
