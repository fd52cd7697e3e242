package fourthwire.intake.reading.pqdif;

/** Conductors of channels by their number (from memory). */
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
  NET("", "total"),
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
