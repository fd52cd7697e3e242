/**
 * Electrical quantities: phasors, spectra, distortion and power figures, as pure functions.
 *
 * <p>Door: {@link fourthwire.quantity.Spectrum}. Uses nothing else of ours. Sources: IEEE 1459-2010
 * (powers), IEC 60445 (conductor names), the sine reference of the public contract: a phasor of
 * order <i>h</i> stands for √2·X<sub>h</sub>·sin(hωt + φ<sub>h</sub>).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.quantity;
