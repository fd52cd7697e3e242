package fourthwire.site;

import java.util.OptionalDouble;

/**
 * A row of {@code background}: one order of the voltage distortion already on a supply.
 *
 * @param supply the supply
 * @param order 2 to 50
 * @param percent of the supply's fundamental
 * @param degrees against the supply's own fundamental; 0 where not known
 */
public record Background(String supply, int order, double percent, OptionalDouble degrees) {}
