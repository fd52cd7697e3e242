package fourthwire.limits.loading;

import java.util.function.Supplier;

/**
 * What harmonics leave of a cable's ampacity.
 *
 * @param line factor on the lines' ampacity
 * @param neutral factor on the neutral's ampacity
 * @param reason why, one sentence a page can show; made only where it is told
 * @param basis document, edition and clause
 */
public record AmpacityFactors(double line, double neutral, Supplier<String> reason, String basis) {}
