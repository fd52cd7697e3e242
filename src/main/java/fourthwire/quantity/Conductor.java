package fourthwire.quantity;

/** The four conductors of a low-voltage system, named as in IEC 60445. */
public enum Conductor {
  L1,
  L2,
  L3,
  N;

  /** Whether this is a line conductor, that is not the neutral. */
  public boolean isLine() {
    return this != N;
  }
}
