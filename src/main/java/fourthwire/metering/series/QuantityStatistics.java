package fourthwire.metering.series;

/**
 * Statistics of one quantity over the rows as read, blanks left out; in its own unit. It hands out
 * its own arrays: they are not to be changed.
 *
 * @param count values that were there
 * @param p95 95th percentile, linear between the ordered values; NaN without any
 * @param weekCount by week: values that were there
 * @param weekP95 by week: 95th percentile; NaN without any
 * @param hourOfWeekMean means by local hour, Monday 00 h first; NaN without any
 */
public record QuantityStatistics(
    long count,
    double min,
    double mean,
    double max,
    double p95,
    double p99,
    long[] weekCount,
    double[] weekP95,
    double[] weekP99,
    double[] hourOfWeekMean) {}
