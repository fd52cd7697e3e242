package fourthwire.metering;

import java.util.List;
import java.util.Optional;

/**
 * One thing that is wrong with a reading, or that its reader must know before trusting it.
 *
 * @param code what it is, one of the constants here
 * @param period when; empty where it holds for the whole reading
 * @param effect what it does to the figures, one sentence
 * @param sentence what was seen, with the figures, one sentence
 * @param corrections what would mend it, the likeliest first; none where nothing can
 */
public record QualityFinding(
    String code,
    Optional<Period> period,
    String effect,
    String sentence,
    List<Correction> corrections) {
  /** Copies the list. */
  public QualityFinding {
    corrections = List.copyOf(corrections);
  }

  /** One that nothing can mend. */
  public QualityFinding(String code, Optional<Period> period, String effect, String sentence) {
    this(code, period, effect, sentence, List.of());
  }

  /** The channel or column taken as the neutral is not the sum of the line currents. */
  public static final String NEUTRAL_NOT_SUM = "neutral-not-sum-of-lines";

  /** A line's current runs against its power: its clamp points the wrong way. */
  public static final String REVERSED_CLAMP = "reversed-clamp";

  /** Currents or voltages stand under each other's names. */
  public static final String SWAPPED_LINES = "swapped-lines";

  /** Active power is not what volts times amps allow: a wrong ratio or unit. */
  public static final String WRONG_RATIO = "wrong-ratio";

  /** A distortion that its own harmonics do not make: averaged otherwise, or on another base. */
  public static final String DISTORTION_MISREAD = "distortion-misread";

  /** Rows are missing. */
  public static final String GAP = "gap";

  /** Rows stand there more than once. */
  public static final String REPEATED_ROWS = "repeated-rows";

  /** The clock was set: time runs back, or off the grid of intervals. */
  public static final String CLOCK_JUMP = "clock-jump";

  /** A value that never moves although it must. */
  public static final String FLAT_LINE = "flat-line";

  /** A value that can't be. */
  public static final String IMPOSSIBLE_VALUE = "impossible-value";

  /** Cells or samples are blank or marked as not measured. */
  public static final String MISSING_VALUES = "missing-values";

  /** Too short for the standard measuring windows. */
  public static final String SHORT_RECORD = "short-record";

  /** Samples stand at the end of the instrument's range. */
  public static final String CLIPPED = "clipped";

  /** A direct component where the current or voltage should have none. */
  public static final String DIRECT_COMPONENT = "direct-component";
}
