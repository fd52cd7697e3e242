/**
 * Waveform captures: instantaneous values, their fundamental, spectra, powers and faults.
 *
 * <p>Door: {@link fourthwire.metering.capture.CaptureAnalysis}. May use {@code quantity}, {@code
 * site} and {@code metering}. Sources: IEEE 1057-2017 (fitting a sine of unknown frequency), IEC
 * 61000-4-7:2002+A1:2008 and IEC 61000-4-30:2015 (windows), IEEE 1459-2010 (powers).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.capture;
