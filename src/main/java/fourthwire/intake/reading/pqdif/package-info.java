/**
 * PQDIF files (IEEE 1159.3-2003): the chain of tagged records, their trees of elements, and in them
 * channels' values. Layout and the identifiers of records and elements are from memory of the
 * standard; units, phases, value types and characteristics are held against the task force's list
 * of standard identifiers, version 1.5. An identifier that is not known here leaves its element
 * unread, never guessed.
 *
 * <p>Doors: {@link fourthwire.intake.reading.pqdif.Pqdif}, {@link
 * fourthwire.intake.reading.pqdif.IntervalTable}. May use {@code metering}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.pqdif;
