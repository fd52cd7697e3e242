/**
 * A site's survey: taken in, refused with all that is wrong, shown, handed out again.
 *
 * <p>Door: the controller. May use {@code intake, site}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.survey;
