/**
 * Work that outlives a request: audits, and the reading of uploaded meters' files. Its state is
 * stored, so it can be watched, cancelled, and run again after a restart. Corrections of large logs
 * outlive theirs too ({@link fourthwire.jobs.CorrectionRuns}), but are whole or not at all.
 *
 * <p>Doors: {@link fourthwire.jobs.AuditService} and {@link fourthwire.jobs.ReadingService} for who
 * asks; {@link fourthwire.jobs.AuditRun} and {@link fourthwire.jobs.ReadingRun} do the work, called
 * by the tasks of {@link fourthwire.jobs.JobQueue}; {@link fourthwire.jobs.JobRecovery} is what a
 * start does first. May use {@code audit}, {@code metering}, {@code site}, {@code intake}, {@code
 * json} and what they use; never {@code store}: it sees the storage doors the engine declares.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.jobs;
