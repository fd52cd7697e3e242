package fourthwire.site;

import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * A row of {@code capacitors}: a three-phase bank whose star point is not earthed.
 *
 * @param kvar of the capacitors alone at {@code ratedV}
 * @param ratedV line to line; empty: the panel's nominal voltage
 * @param detuningPercent reactor in per cent of the capacitive reactance; empty: none
 * @param qualityFactor X_L/R of the reactor at the fundamental; empty: no resistance
 */
public record CapacitorBank(
    String name,
    String panel,
    double kvar,
    OptionalDouble ratedV,
    OptionalDouble detuningPercent,
    OptionalDouble qualityFactor,
    OptionalInt steps) {}
