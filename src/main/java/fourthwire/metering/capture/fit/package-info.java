/**
 * Sines of unknown amplitude, angle and frequency fitted to samples by least squares: exact for a
 * signal made of orders, whatever the sampling, and indifferent to samples that are missing.
 *
 * <p>Doors: {@link fourthwire.metering.capture.fit.HarmonicFit}, {@link
 * fourthwire.metering.capture.fit.Fundamental}. May use {@code quantity}. Source: IEEE 1057-2017
 * (fitting a sine of unknown frequency).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.capture.fit;
