package fourthwire.site;

import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * The feeder columns of a transformer, panel or circuit: the conductors that feed it. Ampacities
 * are of the whole feeder as installed, before any harmonic factor. Empty means not known.
 */
public record Feeder(
    OptionalDouble lengthM,
    Optional<String> conductorSize,
    Optional<Material> conductorMaterial,
    OptionalInt conductorsPerLine,
    Optional<String> neutralSize,
    OptionalInt neutralConductors,
    Optional<String> insulation,
    Optional<String> installation,
    OptionalDouble ambientC,
    OptionalDouble groupingFactor,
    OptionalDouble ampacityA,
    OptionalDouble neutralAmpacityA,
    OptionalDouble resistanceOhmPerKm,
    OptionalDouble reactanceOhmPerKm,
    OptionalDouble neutralResistanceOhmPerKm,
    OptionalDouble neutralReactanceOhmPerKm) {
  /** A feeder of which nothing is known: it has no impedance. */
  public static final Feeder UNKNOWN =
      new Feeder(
          OptionalDouble.empty(),
          Optional.empty(),
          Optional.empty(),
          OptionalInt.empty(),
          Optional.empty(),
          OptionalInt.empty(),
          Optional.empty(),
          Optional.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty());

  /** Conductor metal. */
  public enum Material {
    COPPER("copper"),
    ALUMINIUM("aluminium");

    private final String word;

    Material(String word) {
      this.word = word;
    }

    /** The word used in survey tables. */
    public String word() {
      return word;
    }
  }

  /** Whether a size or an override gives the feeder an impedance. */
  public boolean hasImpedance() {
    return conductorSize.isPresent()
        || resistanceOhmPerKm.isPresent()
        || reactanceOhmPerKm.isPresent();
  }
}
