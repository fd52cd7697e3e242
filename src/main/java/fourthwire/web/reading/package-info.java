/**
 * Meters' files: handed in, listed, and what each says.
 *
 * <p>Door: the controller. May use {@code jobs, metering, intake, json, site} and the pictures of
 * {@code web.figure}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.reading;
