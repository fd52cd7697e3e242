/**
 * Interval logs: rows of values over equal intervals, their statistics and faults.
 *
 * <p>Door: {@link fourthwire.metering.log.LogAnalysis}. May use {@code quantity}, {@code site} and
 * {@code metering}. Sources: the public contract, section 5 (statistics over the rows as read).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.log;
