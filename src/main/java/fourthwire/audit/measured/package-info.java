/**
 * A log's percentiles by day and week held against the limits that standards set for measured
 * values.
 *
 * <p>Door: {@link fourthwire.audit.measured.LogVerdicts}. May use {@code metering}, {@code limits},
 * {@code site} and {@code quantity}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit.measured;
