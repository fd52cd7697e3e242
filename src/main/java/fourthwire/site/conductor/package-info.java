/**
 * What a conductor of a given size is: its resistance, skin effect and ampacity, from published
 * tables kept as text resources beside the package.
 *
 * <p>Doors: {@link fourthwire.site.conductor.ConductorSize}, {@link
 * fourthwire.site.conductor.ConductorData}, {@link fourthwire.site.conductor.Ampacity}. May use
 * {@code quantity} and {@code site}. Sources: IEC 60228:2004; IEC 60287-1-1; IEC 60364-5-52:2009
 * Annex B; NFPA 70-2023 Chapter 9 Table 8 and Table 310.16.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.site.conductor;
