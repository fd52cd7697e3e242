package fourthwire.audit.solve;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.Function;
import java.util.function.IntConsumer;

/**
 * A fixed number of threads, the caller's among them, that share the turns of a loop. Turns must
 * not touch each other's results; then the outcome is the same, to the last bit, however many
 * threads there are. For one caller at a time; to be closed.
 */
public final class Workers implements AutoCloseable {
  private final ExecutorService others;
  private final int threads;
  private final Runnable pulse;

  /**
   * Starts the threads.
   *
   * @param threads how many in all, 1 or more
   * @param pulse called by the caller's thread between its turns: says how far the work is, and
   *     throws to stop it
   */
  public Workers(int threads, Runnable pulse) {
    this.threads = threads;
    this.pulse = pulse;
    this.others =
        Executors.newFixedThreadPool(
            Math.max(1, threads - 1),
            work -> {
              Thread thread = new Thread(work, "audit");
              thread.setDaemon(true);
              return thread;
            });
  }

  /**
   * Runs every turn from 0 to count - 1. Where turns fail, what the first of them threw is thrown,
   * when no thread is at work any more.
   */
  public void each(int count, IntConsumer turn) {
    Loop loop = new Loop(count, turn);
    List<Future<?>> running = new ArrayList<>();
    for (int k = 1; k < Math.min(threads, count); k++) {
      running.add(others.submit(() -> loop.run(() -> {})));
    }
    try {
      loop.run(pulse);
    } catch (RuntimeException e) {
      loop.stopped = true;
      throw e;
    } finally {
      running.forEach(Workers::await);
    }
    loop.rethrow();
  }

  /** What a function makes of each item, in the items' order. */
  public <T, R> List<R> map(List<T> items, Function<T, R> function) {
    List<Optional<R>> results =
        new ArrayList<>(Collections.nCopies(items.size(), Optional.empty()));
    each(items.size(), k -> results.set(k, Optional.of(function.apply(items.get(k)))));
    return results.stream().map(Optional::orElseThrow).toList();
  }

  private static void await(Future<?> future) {
    boolean interrupted = false;
    while (!future.isDone()) {
      try {
        future.get();
      } catch (InterruptedException e) {
        interrupted = true;
      } catch (ExecutionException e) {
        throw new IllegalStateException("a loop catches what its turns throw", e);
      }
    }
    if (interrupted) {
      Thread.currentThread().interrupt();
    }
  }

  @Override
  public void close() {
    others.shutdownNow();
  }

  /**
   * One loop. Turns are handed out in order and every turn handed out is run, so the first that
   * fails is always found.
   */
  private static final class Loop {
    private final int count;
    private final IntConsumer turn;
    private final AtomicInteger next = new AtomicInteger();
    private final List<RuntimeException> thrown = new ArrayList<>();
    private int failed = Integer.MAX_VALUE;
    private volatile boolean stopped;

    Loop(int count, IntConsumer turn) {
      this.count = count;
      this.turn = turn;
    }

    void run(Runnable between) {
      while (!stopped) {
        int k = next.getAndIncrement();
        if (k >= count) {
          return;
        }
        try {
          turn.accept(k);
        } catch (RuntimeException e) {
          note(k, e);
        }
        between.run();
      }
    }

    private synchronized void note(int k, RuntimeException e) {
      stopped = true;
      if (k < failed) {
        failed = k;
        thrown.add(0, e);
      }
    }

    synchronized void rethrow() {
      if (!thrown.isEmpty()) {
        throw thrown.get(0);
      }
    }
  }
}
