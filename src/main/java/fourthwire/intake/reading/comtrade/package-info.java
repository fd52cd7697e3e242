/**
 * COMTRADE records (IEEE C37.111-1991, -1999 and -2013, the last also IEC 60255-24): configuration
 * and data file, or one CFF file, ASCII, BINARY, BINARY32 and FLOAT32.
 *
 * <p>Door: {@link fourthwire.intake.reading.comtrade.Comtrade}. Uses nothing else of ours.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.comtrade;
