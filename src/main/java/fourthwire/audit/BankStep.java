package fourthwire.audit;

/**
 * The parallel resonance of the network with a switched bank at one of its steps, all other banks
 * whole.
 *
 * @param bank its name
 * @param step how many of its steps are in
 * @param steps how many it has
 * @param kvar what is in
 * @param order where the impedance at its panel peaks
 * @param ohm how high
 */
public record BankStep(String bank, int step, int steps, double kvar, double order, double ohm) {}
