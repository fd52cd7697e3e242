/**
 * Text tables of meters: encoding, separator, decimal mark, header row, numbers and times as cells
 * hold them, row by row without an object for each cell.
 *
 * <p>Door: {@link fourthwire.intake.reading.table.TextTable}. Uses nothing else of ours.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.table;
