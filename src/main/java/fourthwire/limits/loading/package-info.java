/**
 * What conductors, transformers and capacitor banks carry of a distorted current.
 *
 * <p>Doors: {@link fourthwire.limits.loading.NeutralLoading} (neutral and line of a feeder, with
 * the harmonic factor of the site's practice), {@link
 * fourthwire.limits.loading.TransformerLoading}, {@link
 * fourthwire.limits.loading.CapacitorLoading}. Tables lie beside the package as text resources,
 * typed as printed. May use {@code quantity} and {@code limits}. Sources: IEC 60364-5-52:2009 Annex
 * E; NFPA 70-2023, 310.15; IEEE C57.110-2018; EN 50464-3; UL 1561; IEEE 18-2012; IEC 60831-1:2014.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.limits.loading;
