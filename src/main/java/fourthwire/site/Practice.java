package fourthwire.site;

/** Which family of installation rules leads at a site. */
public enum Practice {
  IEC("iec"),
  NORTH_AMERICA("north-america");

  private final String word;

  Practice(String word) {
    this.word = word;
  }

  /** The word used in survey tables. */
  public String word() {
    return word;
  }
}
