package fourthwire.metering;

/**
 * Statistics of one logged quantity over the rows as read, blanks left out; in its own unit.
 *
 * @param count values that were there
 * @param p95 95th percentile, linear between the ordered values
 * @param p99 99th percentile, likewise
 */
public record QuantitySummary(
    long count, double min, double mean, double max, double p95, double p99) {}
