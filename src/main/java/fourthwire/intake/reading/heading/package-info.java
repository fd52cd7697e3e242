/**
 * What the heading of a column or the name of a channel says it holds: exact quantity names of the
 * public contract, and the trade's words and letters.
 *
 * <p>Door: {@link fourthwire.intake.reading.heading.Heading}. May use {@code metering}. The words
 * are common practice, no source; conductor names after IEC 60445, letter symbols after IEC 60027.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.heading;
