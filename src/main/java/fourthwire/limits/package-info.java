/**
 * Published limits by document, edition and clause, and the findings they lead to.
 *
 * <p>Door: {@link fourthwire.limits.Finding}. May use {@code quantity}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.limits;
