/**
 * Series of logged values: chunks of rows as they are read and stored, columns coded in few bytes,
 * and statistics over any number of rows in bounded memory.
 *
 * <p>Door: {@link fourthwire.metering.series.LogSeries}. Uses nothing else of ours. Sources:
 * Hyndman and Fan (1996), definition 7, for percentiles; ISO 8601 for weeks that begin on Monday.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.series;
