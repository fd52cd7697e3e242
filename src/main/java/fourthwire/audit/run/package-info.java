/**
 * The audit from survey to result.
 *
 * <p>Door: {@link fourthwire.audit.run.HarmonicAudit}. May use every engine package.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit.run;
