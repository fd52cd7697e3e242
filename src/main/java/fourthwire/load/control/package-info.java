/**
 * Equipment whose control shapes its current: power-factor-corrected supplies and phase dimmers.
 *
 * <p>Doors: {@link fourthwire.load.control.PowerFactorCorrected}, {@link
 * fourthwire.load.control.PhaseDimmer}. May use {@code quantity} and {@code load.model}.
 *
 * <p>Sources stand at each class: closed forms, and fits to published ranges.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.control;
