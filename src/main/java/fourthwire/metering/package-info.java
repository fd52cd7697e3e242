/**
 * What meters recorded: interval logs and waveform captures as values, their analysis, and what is
 * wrong with them.
 *
 * <p>Doors: {@link fourthwire.metering.log.LogAnalysis} and {@link
 * fourthwire.metering.capture.CaptureAnalysis} turn values into a {@link
 * fourthwire.metering.Reading}; {@link fourthwire.metering.ReadingRepository} keeps it. File
 * formats are read elsewhere ({@code intake}). May use {@code quantity} and {@code site}. Sources:
 * the public contract, sections 4 and 5; IEEE 1459-2010 (powers); IEC 61000-4-7 and IEC 61000-4-30
 * (windows and aggregation).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering;
