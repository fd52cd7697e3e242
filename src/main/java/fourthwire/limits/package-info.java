/**
 * Findings: one figure held against one published limit, with document, edition and clause.
 *
 * <p>Here is what all findings share: their shape, their codes, the rule of act and watch, and the
 * list of editions. The limits themselves: {@code limits.loading} for neutrals, lines, transformers
 * and capacitor banks, {@code limits.distortion} for currents and voltages, {@code
 * limits.equipment} for choosing single pieces of equipment. Door: {@link
 * fourthwire.limits.Finding}. May use {@code quantity}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.limits;
