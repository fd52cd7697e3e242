package fourthwire.limits.equipment;

import fourthwire.quantity.Spectrum;

/**
 * Which of IEC 61000-3-2 and IEC 61000-3-12 a piece of equipment falls under, and whether its
 * current keeps within it.
 *
 * <p>To 16 A a line the former, above that to 75 A the latter, beyond neither. For choosing
 * equipment only: both are type tests at rated load on a stiff, sinusoidal supply, and say nothing
 * of what many pieces do together. Not covered: the relaxed limits of single observations, and the
 * partial odd harmonic current of orders 21 to 39.
 */
public final class EquipmentLimits {
  /** Above this rated current of a line neither standard holds (IEC 61000-3-12:2011, clause 1). */
  private static final double LARGEST_A = 75;

  private EquipmentLimits() {}

  /**
   * Holds a current against the limits of its equipment.
   *
   * @param current rms amps of one unit (of its most distorted line), at the angles it has where
   *     the fundamental of its own voltage (on three lines of L1 to neutral) stands at 0°
   */
  public static EquipmentJudgement judge(Equipment equipment, Spectrum current) {
    if (equipment.ratedA() <= SmallEquipment.largestA()) {
      return SmallEquipment.judge(equipment, current);
    }
    if (equipment.ratedA() <= LARGEST_A) {
      return LargeEquipment.judge(equipment, current);
    }
    return EquipmentJudgement.none(
        "No equipment standard",
        LargeEquipment.SCOPE,
        "over 75 A a line neither IEC 61000-3-2 nor IEC 61000-3-12 holds; the supplier sets what the"
            + " installation may draw");
  }
}
