package fourthwire.site;

import java.util.OptionalDouble;

/** A row of {@code filters}: a harmonic filter already installed. */
public record Filter(
    String name,
    String panel,
    Type type,
    OptionalDouble kvar,
    OptionalDouble ratedV,
    OptionalDouble tunedOrder,
    OptionalDouble qualityFactor,
    OptionalDouble ratedA,
    OptionalDouble impedancePercent) {
  /** How it works. */
  public enum Type {
    TUNED("tuned"),
    ACTIVE("active"),
    ZERO_SEQUENCE("zero-sequence");

    private final String word;

    Type(String word) {
      this.word = word;
    }

    /** The word used in survey tables. */
    public String word() {
      return word;
    }
  }
}
