package fourthwire.site;

/** What a supply is for. */
public enum SupplyRole {
  NORMAL("normal"),
  STANDBY("standby");

  private final String word;

  SupplyRole(String word) {
    this.word = word;
  }

  /** The word used in survey tables. */
  public String word() {
    return word;
  }
}
