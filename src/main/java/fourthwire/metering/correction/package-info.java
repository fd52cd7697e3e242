/**
 * Corrections applied: a second set of values beside a log's rows as read, made anew from them
 * whenever it is wanted, so that nothing is left of a correction that was taken back.
 *
 * <p>Doors: {@link fourthwire.metering.correction.CorrectedSeries}, {@link
 * fourthwire.metering.correction.CorrectionRepository}. May use {@code metering}, {@code
 * metering.series} and {@code metering.log}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.correction;
