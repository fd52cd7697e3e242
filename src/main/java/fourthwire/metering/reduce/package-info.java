/**
 * A log's rows reduced to what a picture of some width, or a table, can show: steps of time with
 * the least, mean and largest value of each, days and how complete they are, values in order of
 * size, means by hour of the week.
 *
 * <p>Door: {@link fourthwire.metering.reduce.LogSpan}. Uses {@code metering.series}. Sources: ISO
 * 8601 for days, for weeks that begin on Monday and for lengths of time; Hyndman and Fan (1996),
 * definition 7, for percentiles.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.reduce;
