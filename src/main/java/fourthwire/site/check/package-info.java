/**
 * What a survey must satisfy as a whole: names, the tree, conductors, loads on their circuits,
 * banks, feeders. A draft read row by row goes in; clear errors, or a survey whose references are
 * all resolved, come out.
 *
 * <p>Door: {@link fourthwire.site.check.SurveyChecks}. May use {@code site}, {@code site.conductor}
 * and {@code quantity}. Source: the public contract, section 2.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.site.check;
