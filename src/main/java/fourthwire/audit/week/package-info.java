/**
 * The site through a week: 168 hours from the schedules of its loads, equal hours solved once.
 *
 * <p>Door: {@link fourthwire.audit.week.Week}. May use {@code audit.judge}, {@code audit.plan} and
 * what those may use. Source: the public contract, sections 3 (a state's power) and 6.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit.week;
