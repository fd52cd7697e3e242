package fourthwire.site;

/** What kind of instrument a reading comes from. */
public enum Instrument {
  TRUE_RMS("true-rms"),
  AVERAGE_RESPONDING("average-responding"),
  CLASS_A("class-a"),
  CLASS_S("class-s");

  private final String word;

  Instrument(String word) {
    this.word = word;
  }

  /** The word used in survey tables. */
  public String word() {
    return word;
  }
}
