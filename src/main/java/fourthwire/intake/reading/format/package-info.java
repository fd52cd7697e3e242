/**
 * What every format of meters' files shares: the file itself, the signature of its layout, the
 * mapping that was given, remembered or proposed for it, progress.
 *
 * <p>Door: {@link fourthwire.intake.reading.format.Format}. May use {@code intake.reading}, {@code
 * intake.reading.heading}, {@code intake.reading.table} and {@code metering}. Sources: the public
 * contract, section 4.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.format;
