/**
 * One kind of equipment tried by itself behind a source: what it draws, what that does to the
 * voltage it stands at, and how both move with its load and with the number of units.
 *
 * <p>Doors: {@link fourthwire.load.trial.LoadTrial} for one state, {@link
 * fourthwire.load.trial.Sweep} for a row of them. A site with a network is an audit's business. May
 * use {@code quantity}, {@code site}, {@code load} and {@code load.model}.
 *
 * <p>Source: D. G. Anderson, Iterative procedures for nonlinear integral equations, Journal of the
 * ACM 12, 1965; H. F. Walker and P. Ni, Anderson acceleration for fixed-point iterations, SIAM
 * Journal on Numerical Analysis 49, 2011.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.trial;
