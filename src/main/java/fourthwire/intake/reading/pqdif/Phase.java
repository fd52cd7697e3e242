package fourthwire.intake.reading.pqdif;

/**
 * Conductors of channels by their number (IEEE 1159.3, the task force's list of standard
 * identifiers, version 1.5, phases). The sum of lines and neutral is no total: it is nothing in a
 * four-wire network.
 */
public enum Phase {
  NONE("", ""),
  AN("A", "L1"),
  BN("B", "L2"),
  CN("C", "L3"),
  NG("N", "N"),
  AB("AB", "L1-L2"),
  BC("BC", "L2-L3"),
  CA("CA", "L3-L1"),
  RESIDUAL("RES", "N"),
  NET("", ""),
  POSITIVE("", ""),
  NEGATIVE("", ""),
  ZERO("", ""),
  TOTAL("", "total");

  private final String letters;
  private final String place;

  Phase(String letters, String place) {
    this.letters = letters;
    this.place = place;
  }

  static Phase of(double number) {
    return number >= 0 && number < values().length ? values()[(int) number] : NONE;
  }

  /** As a recorder's phase field has it. */
  public String letters() {
    return letters;
  }

  /** As a quantity's name has it; empty text for none. */
  public String place() {
    return place;
  }
}
