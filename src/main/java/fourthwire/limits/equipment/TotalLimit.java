package fourthwire.limits.equipment;

/**
 * A figure of the whole current beside its limit.
 *
 * @param name in words: {@code THD}, {@code THC}, {@code PWHC}, or what the waveform must do
 * @param figure the figure
 * @param limit what it may be
 * @param unit of both, as printed
 * @param atLeast whether the figure must reach the limit instead of staying under it
 */
public record TotalLimit(String name, double figure, double limit, String unit, boolean atLeast) {
  /** A figure that must stay within its limit. */
  static TotalLimit atMost(String name, double figure, double limit, String unit) {
    return new TotalLimit(name, figure, limit, unit, false);
  }

  /** Whether the limit is kept. */
  public boolean met() {
    return atLeast ? figure >= limit : figure <= limit;
  }

  /** How far the limit is used, 1 at the limit. */
  public double ofLimit() {
    return atLeast ? limit / figure : figure / limit;
  }
}
