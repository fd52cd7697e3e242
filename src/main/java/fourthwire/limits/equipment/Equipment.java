package fourthwire.limits.equipment;

import java.util.OptionalDouble;

/**
 * One piece of equipment as its plate has it.
 *
 * @param use what it is for
 * @param ratedW active input power at rated load, watts
 * @param ratedA rms input current of each line at rated load, amps: the reference current of IEC
 *     61000-3-12
 * @param balancedThreePhase its three lines carry alike, a third of a cycle apart, with or without
 *     a neutral
 * @param lineToNeutralV nominal voltage, volts
 * @param shortCircuitRatio R_sce, the short-circuit power where it will stand on its own apparent
 *     power; empty: not known, so the least that the tables have
 */
public record Equipment(
    EquipmentUse use,
    double ratedW,
    double ratedA,
    boolean balancedThreePhase,
    double lineToNeutralV,
    OptionalDouble shortCircuitRatio) {}
