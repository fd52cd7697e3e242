package fourthwire.testsupport;

import fourthwire.audit.Audit;
import fourthwire.audit.AuditRequest;
import fourthwire.audit.AuditResult;
import fourthwire.audit.Progress;
import fourthwire.site.SiteTree;
import java.util.List;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.atomic.AtomicInteger;

/** An audit whose figures mean nothing, that waits until it is let go, telling how far it is. */
public final class SlowAudit implements Audit {
  private static final int PAUSE_MS = 20;

  /** Opens when a run has begun. */
  public final CountDownLatch begun = new CountDownLatch(1);

  /** Runs that began. */
  public final AtomicInteger runs = new AtomicInteger();

  private final CountDownLatch letGo = new CountDownLatch(1);

  /** Lets this and all later runs go to their end. */
  public SlowAudit letGo() {
    letGo.countDown();
    return this;
  }

  @Override
  public AuditResult run(AuditRequest request, Progress progress) {
    runs.incrementAndGet();
    begun.countDown();
    progress.at(0.1, "solving");
    while (letGo.getCount() > 0) {
      pause();
      progress.at(0.5, "solving");
    }
    RandomResults random = new RandomResults(5);
    return new AuditResult(
        request.supply().orElse("GRID"),
        "test",
        List.of("IEEE 519-2022"),
        SiteTree.of(request.survey()).nodes().stream().map(n -> random.node(n.name())).toList(),
        List.of());
  }

  private static void pause() {
    try {
      Thread.sleep(PAUSE_MS);
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException(e);
    }
  }
}
