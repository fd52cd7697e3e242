package fourthwire.site;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A row of {@code supplies}: a source the site can run on. Grids give {@code faultLevelMva}
 * (three-phase, at {@code lineVoltageV}), generators the pair {@code generatorKva} and {@code
 * subtransientReactancePercent}.
 */
public record Supply(
    String name,
    double lineVoltageV,
    OptionalDouble faultLevelMva,
    OptionalDouble xOverR,
    Optional<SupplyRole> role,
    Optional<PhaseSystem> system,
    OptionalDouble zeroSequenceRatio,
    OptionalDouble generatorKva,
    OptionalDouble subtransientReactancePercent,
    Optional<String> connectsAt,
    OptionalDouble demandA) {
  /** Highest low voltage, IEC 60038: above it a supply is taken to have no neutral conductor. */
  public static final double LOW_VOLTAGE_V = 1000;

  /** Common practice, no source. */
  public static final double DEFAULT_GRID_X_OVER_R = 10;

  /** Common practice, no source. */
  public static final double DEFAULT_GENERATOR_X_OVER_R = 15;

  /** Whether this is a generating set. */
  public boolean isGenerator() {
    return generatorKva.isPresent();
  }

  /** The role, normal where not said. */
  public SupplyRole roleOrDefault() {
    return role.orElse(SupplyRole.NORMAL);
  }

  /** The system: four wires up to 1 kV and three above where not said. */
  public PhaseSystem systemOrDefault() {
    return system.orElse(
        lineVoltageV <= LOW_VOLTAGE_V
            ? PhaseSystem.THREE_PHASE_4_WIRE
            : PhaseSystem.THREE_PHASE_3_WIRE);
  }

  /** X/R at the fundamental, by default 10 for a grid and 15 for a generator. */
  public double xOverRorDefault() {
    return xOverR.orElse(isGenerator() ? DEFAULT_GENERATOR_X_OVER_R : DEFAULT_GRID_X_OVER_R);
  }
}
