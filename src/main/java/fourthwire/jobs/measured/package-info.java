/**
 * What readings say of each node, in the shape an audit sets beside its computed figures.
 *
 * <p>Door: {@link fourthwire.jobs.measured.MeasuredStates}. May use {@code audit}, {@code
 * metering}, {@code site}, {@code quantity}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.jobs.measured;
