/**
 * Interval logs: how one is going to be read, and its rows read into columns by workers.
 *
 * <p>Door: {@link fourthwire.intake.reading.log.LogFormat}. May use {@code intake.reading} with its
 * {@code format}, {@code unit}, {@code heading} and {@code table}, and {@code metering}. Sources:
 * the public contract, section 4.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.log;
