package fourthwire.site;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A row of {@code loads}: equipment of one kind on a circuit. Exactly one of {@code kind}, {@code
 * preset} and {@code spectrum} is given ({@code kind} {@link LoadKind#MEASURED} may stand beside a
 * spectrum), and one of the ratings.
 *
 * @param quantity how many
 * @param ratedW electrical input of each, watts
 */
public record Load(
    String name,
    String circuit,
    String panel,
    Optional<LoadKind> kind,
    Optional<String> preset,
    Optional<String> spectrum,
    double quantity,
    OptionalDouble ratedW,
    OptionalDouble ratedVa,
    OptionalDouble ratedA,
    OptionalDouble demandFactor,
    Optional<String> schedule,
    Optional<PartLoad> partLoad,
    OptionalDouble displacementFactor,
    OptionalDouble lowW,
    OptionalDouble highW,
    Optional<Confidence> confidence,
    ModelColumns columns) {
  /** What part load means for a group of units. */
  public enum PartLoad {
    LOWER_POWER("lower-power"),
    FEWER_UNITS("fewer-units");

    private final String word;

    PartLoad(String word) {
      this.word = word;
    }

    /** The word used in survey tables. */
    public String word() {
      return word;
    }
  }

  /** Where the rating is known from. */
  public enum Confidence {
    MEASURED("measured"),
    NAMEPLATE("nameplate"),
    COUNTED("counted"),
    GUESS("guess");

    private final String word;

    Confidence(String word) {
      this.word = word;
    }

    /** The word used in survey tables. */
    public String word() {
      return word;
    }
  }

  /** Its circuit's name on the whole site, {@code panel:circuit}. */
  public String circuitId() {
    return panel + ":" + circuit;
  }
}
