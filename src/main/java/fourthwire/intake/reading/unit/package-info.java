/**
 * What headings leave open and values settle: units that are not written, harmonics in amps or in
 * percent, columns of no conductor.
 *
 * <p>Door: {@link fourthwire.intake.reading.unit.OpenUnits}. May use {@code intake.reading.heading}
 * and {@code intake.reading.table}. Sources: none but the laws between volts, amps, watts and
 * harmonics.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.intake.reading.unit;
