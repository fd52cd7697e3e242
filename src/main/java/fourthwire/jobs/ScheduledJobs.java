package fourthwire.jobs;

import com.github.kagkarlsson.scheduler.SchedulerClient;
import com.github.kagkarlsson.scheduler.task.Task;
import com.github.kagkarlsson.scheduler.task.TaskDescriptor;
import com.github.kagkarlsson.scheduler.task.helper.Tasks;
import java.time.Clock;
import java.util.function.LongConsumer;
import java.util.function.Supplier;

/**
 * The queue in the database, worked off by db-scheduler. A task's instance is the id of the audit
 * or upload; all else stands in our own tables. Readings go first: an audit shows them.
 */
public final class ScheduledJobs implements JobQueue {
  private static final TaskDescriptor<Void> AUDIT = TaskDescriptor.of("audit");
  private static final TaskDescriptor<Void> READING = TaskDescriptor.of("reading");
  private static final int AUDIT_PRIORITY = 10;
  private static final int READING_PRIORITY = 20;

  private final Supplier<SchedulerClient> client;
  private final Clock clock;

  /** Hands in to this scheduler, asked for when it is first needed. */
  public ScheduledJobs(Supplier<SchedulerClient> client, Clock clock) {
    this.client = client;
    this.clock = clock;
  }

  @Override
  public void addAudit(long auditId) {
    add(AUDIT, auditId, AUDIT_PRIORITY);
  }

  @Override
  public void addReading(long uploadId) {
    add(READING, uploadId, READING_PRIORITY);
  }

  private void add(TaskDescriptor<Void> task, long id, int priority) {
    client
        .get()
        .scheduleIfNotExists(
            task.instance(Long.toString(id)).priority(priority).build(), clock.instant());
  }

  /** The task that runs audits. */
  public static Task<Void> auditTask(LongConsumer run) {
    return task(AUDIT, run);
  }

  /** The task that reads uploads. */
  public static Task<Void> readingTask(LongConsumer run) {
    return task(READING, run);
  }

  private static Task<Void> task(TaskDescriptor<Void> descriptor, LongConsumer run) {
    return Tasks.oneTime(descriptor)
        .execute((instance, context) -> run.accept(Long.parseLong(instance.getId())));
  }
}
