/**
 * Waveform captures out of COMTRADE, PQDIF and text: channels proposed as quantities, samples on
 * one time axis.
 *
 * <p>Doors: {@link fourthwire.intake.reading.wave.ComtradeFormat}, {@link
 * fourthwire.intake.reading.wave.PqdifCapture} and {@link
 * fourthwire.intake.reading.wave.TextCapture}. May use {@code intake.reading} with its {@code
 * format}, {@code channel}, {@code comtrade}, {@code heading}, {@code pqdif} and {@code table}, and
 * {@code metering}. Sources: IEEE C37.111-1991, -1999 and -2013 (IEC 60255-24), IEEE 1159.3.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.wave;
