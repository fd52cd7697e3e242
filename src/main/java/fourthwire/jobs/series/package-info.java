/**
 * What pages and scripts ask of a log that is stored: its values over a span of time in as many
 * steps as are wanted, its days, its percentiles.
 *
 * <p>Door: {@link fourthwire.jobs.series.StoredLogs}. May use {@code metering, site,
 * jobs.measured}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.jobs.series;
