/**
 * Waveform captures: instantaneous values, their fundamental, spectra, powers and faults.
 *
 * <p>Door: {@link fourthwire.metering.capture.CaptureAnalysis}. May use {@code quantity}, {@code
 * site} and {@code metering}; samples stand in {@code .wave}, least squares in {@code .fit},
 * windows in {@code .window}. Sources: IEC 61000-4-30:2015 (events), IEEE 1459-2010 (powers).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.capture;
