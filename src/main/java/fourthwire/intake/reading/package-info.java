/**
 * Meters' files, as the rest of the service sees them: what is known beforehand, how a file is
 * going to be read, what must be asked.
 *
 * <p>Door: {@link fourthwire.intake.reading.ReadingReader}. Uses {@code metering}. The packages
 * below do the work: {@code upload} finds the format, {@code log} and {@code wave} read rows and
 * samples over {@code table}, {@code comtrade} and {@code pqdif}; {@code heading}, {@code channel}
 * and {@code unit} say what a column holds. Sources: the public contract, section 4.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading;
