/**
 * How sure an audit is: sites drawn from what the survey leaves open, each solved like the site
 * itself; percentiles, probabilities, and where the doubt comes from.
 *
 * <p>Door: {@link fourthwire.audit.doubt.Doubt}. May use {@code audit.judge}, {@code audit.plan}
 * and what those may use. Sources: M. D. McKay, R. J. Beckman, W. J. Conover, "A comparison of
 * three methods for selecting values of input variables", Technometrics 21 (1979); M. J. Wichura,
 * algorithm AS 241, Applied Statistics 37 (1988); R. J. Hyndman, Y. Fan, The American Statistician
 * 50 (1996); J. W. Pratt, "Dividing the indivisible" (1987).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit.doubt;
