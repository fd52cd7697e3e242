/**
 * The file formats of meters: interval logs as CSV or xlsx, waveform captures as COMTRADE (IEEE
 * C37.111), PQDIF (IEEE 1159.3) or CSV, and the mapping of their columns and channels to
 * quantities.
 *
 * <p>Door: {@link fourthwire.intake.reading.ReadingReader}. May use {@code quantity}, {@code site}
 * and {@code metering}. Sources: the public contract, section 4; IEEE C37.111-1991, -1999 and -2013
 * (IEC 60255-24).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading;
