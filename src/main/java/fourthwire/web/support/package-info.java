/**
 * How figures, names and verdicts are written, the same on every page.
 *
 * <p>Doors: {@link fourthwire.web.support.Numbers}, {@link fourthwire.web.support.Column}, {@link
 * fourthwire.web.support.Verdict}, {@link fourthwire.web.support.Words}. May use {@code quantity},
 * {@code limits}, {@code audit} and {@code site}. Source for the writing of numbers and units: ISO
 * 80000-1:2022, clause 7 (from memory): unit after a space, minus sign, groups of three digits by a
 * thin space.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.web.support;
