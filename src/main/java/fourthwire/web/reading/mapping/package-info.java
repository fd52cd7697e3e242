/**
 * What a log's columns hold: proposed, looked at, corrected and confirmed by a person, once a meter
 * and layout.
 *
 * <p>Door: the controller. May use {@code jobs, intake, metering, site}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.reading.mapping;
