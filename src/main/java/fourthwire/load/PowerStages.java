package fourthwire.load;

import fourthwire.site.LoadKind;

/**
 * Which control a power-factor-corrected supply of a size is built with: critical conduction up to
 * about 300 W, continuous above, where the peak current of twice the mean would cost too much
 * (common practice, no source). Presets follow it, and so does advice on replacing supplies.
 */
public final class PowerStages {
  /** Rated watts up to which the critical mode is usual. */
  public static final double CRITICAL_UP_TO_W = 300;

  private PowerStages() {}

  /**
   * The kind a corrected supply of this size is.
   *
   * @param ratedW the most it is built to draw, watts
   */
  public static LoadKind corrected(double ratedW) {
    return ratedW <= CRITICAL_UP_TO_W ? LoadKind.PFC_CRITICAL : LoadKind.PFC_CONTINUOUS;
  }
}
