package fourthwire.limits;

/** How much a finding asks of its reader. */
public enum Severity {
  /** Over the limit, or over it with a probability of 50 % or more. */
  ACT,
  /** Over 80 % of the limit, or over the limit with a probability of 10 % or more. */
  WATCH,
  /** Information. */
  NOTE;

  /** The word used in the public interface. */
  public String word() {
    return name().toLowerCase(java.util.Locale.ROOT);
  }
}
