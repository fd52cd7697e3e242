/**
 * How distorted a current or a voltage may be.
 *
 * <p>Doors: {@link fourthwire.limits.distortion.CurrentDistortion519}, {@link
 * fourthwire.limits.distortion.VoltageDistortion}, {@link
 * fourthwire.limits.distortion.VoltageQuality}, {@link
 * fourthwire.limits.distortion.ResonanceCheck}. Tables lie beside the package as text resources,
 * typed as printed. May use {@code quantity} and {@code limits}. Sources: IEEE 519-2014 and -2022;
 * IEC 61000-2-4:2002; EN 50160:2010; NEMA MG 1.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.limits.distortion;
