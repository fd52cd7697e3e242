package fourthwire.site;

import java.util.Arrays;
import java.util.Optional;

/** The load kinds of the survey, by the word the {@code kind} column uses. */
public enum LoadKind {
  RESISTIVE("resistive", Family.LINEAR),
  LINEAR("linear", Family.LINEAR),
  CAPACITOR_INPUT("capacitor-input", Family.SINGLE_PHASE),
  CAPACITOR_INPUT_CHOKE("capacitor-input-choke", Family.SINGLE_PHASE),
  PFC_CRITICAL("pfc-critical", Family.SINGLE_PHASE),
  PFC_CONTINUOUS("pfc-continuous", Family.SINGLE_PHASE),
  MAGNETIC_BALLAST("magnetic-ballast", Family.SINGLE_PHASE),
  PHASE_DIMMER("phase-dimmer", Family.SINGLE_PHASE),
  MOTOR("motor", Family.THREE_PHASE),
  SIX_PULSE("six-pulse", Family.THREE_PHASE),
  TWELVE_PULSE("twelve-pulse", Family.THREE_PHASE),
  ACTIVE_FRONT_END("active-front-end", Family.THREE_PHASE),
  MEASURED("measured", Family.ANY);

  /** What circuits a kind fits on, {@code contract} §2 "Lines". */
  public enum Family {
    /** Single-phase, or delta and star on three lines. */
    LINEAR,
    /** Line to neutral or line to line; equal parts on several lines with N. */
    SINGLE_PHASE,
    /** Needs all three lines. */
    THREE_PHASE,
    /** Takes the shape its circuit has. */
    ANY
  }

  private final String word;
  private final Family family;

  LoadKind(String word, Family family) {
    this.word = word;
    this.family = family;
  }

  /** The word used in survey tables. */
  public String word() {
    return word;
  }

  /** What circuits it fits on. */
  public Family family() {
    return family;
  }

  /**
   * What a demand below the rating means unless the survey says otherwise: true, each unit runs at
   * lower power; false, fewer units run at full power (public contract, section 3).
   */
  public boolean runsAtLowerPower() {
    return switch (this) {
      case RESISTIVE, LINEAR, PHASE_DIMMER, MAGNETIC_BALLAST, MEASURED -> false;
      default -> true;
    };
  }

  /** The kind of this word, if there is one. */
  public static Optional<LoadKind> find(String word) {
    return Arrays.stream(values()).filter(k -> k.word.equals(word)).findFirst();
  }
}
