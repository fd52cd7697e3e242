/**
 * What readings say of each node, in the shape an audit sets beside its computed figures.
 *
 * <p>Doors: {@link fourthwire.jobs.measured.MeasuredStates}, {@link
 * fourthwire.jobs.measured.LogAssessments}, {@link fourthwire.jobs.measured.SiteZone}. May use
 * {@code audit}, {@code metering}, {@code site}, {@code quantity}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.jobs.measured;
