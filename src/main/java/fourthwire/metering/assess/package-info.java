/**
 * What standards ask of a log: percentiles over days and weeks with the share of the period that
 * was really there, and the demand current.
 *
 * <p>Doors: {@link fourthwire.metering.assess.DemandCurrent}, {@link
 * fourthwire.metering.assess.PeriodFigures}. May use {@code quantity}, {@code metering}, {@code
 * metering.series}. Sources: IEEE 519-2022, clauses 3.1, 4.2 to 4.5; IEC 61000-4-30:2015, 4.5; EN
 * 50160:2010, clause 4.2.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.metering.assess;
