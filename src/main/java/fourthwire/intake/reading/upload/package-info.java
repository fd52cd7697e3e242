/**
 * An upload sorted out: zips opened, workbooks turned into tables, the format of what is in it
 * found by its content.
 *
 * <p>Door: {@link fourthwire.intake.reading.upload.FormatReader}. May use {@code intake.reading}
 * and all its packages. Sources: the public contract, section 4; ECMA-376 for workbooks.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.upload;
