package fourthwire.site;

import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * How a transformer's windings are connected, as its rating plate says it: {@code Dyn11}, {@code
 * YNyn0}, {@code Dzn0}, {@code Ii0}, {@code Iii0}.
 *
 * <p>The clock number n means that the low side's positive sequence lags the high side's by n·30°
 * (its negative sequence leads by the same). Star and delta turn each other by an odd number, like
 * windings and delta-zigzag by an even one. Source: IEC 60076-1:2011, clause 7 (connection symbols;
 * from memory).
 *
 * @param primary the winding on the side of the supply
 * @param secondary the winding on the side of the loads
 * @param clock 0 to 11
 */
public record VectorGroup(Primary primary, Secondary secondary, int clock) {
  /** What the survey accepts, for messages. */
  public static final String SUPPORTED =
      "supported are a primary D, Y or YN with a secondary y, yn, d, z or zn and a clock number the"
          + " pair allows (even: Dd, Dz, Yy; odd: Dy, Yd, Yz; such as Dyn11, Dyn1, Yyn0, YNyn0,"
          + " YNd11, Dzn0, Yzn11), Ii0 (single-phase) and Iii0 (centre-tapped secondary)";

  private static final Pattern THREE_PHASE = Pattern.compile("(D|YN|Y)(YN|ZN|Y|Z|D)(\\d{1,2})?");

  /** The winding on the side of the supply. */
  public enum Primary {
    /** Delta. */
    D,
    /** Star, its star point not connected. */
    Y,
    /** Star, its star point tied to the neutral, or to earth where there is none. */
    YN,
    /** Single-phase. */
    I
  }

  /** The winding on the side of the loads. */
  public enum Secondary {
    /** Star, its star point not brought out. */
    Y("y"),
    /** Star with its star point earthed and brought out as the neutral. */
    YN("yn"),
    /** Delta. */
    D("d"),
    /** Zigzag, its star point not brought out. */
    Z("z"),
    /** Zigzag with its star point earthed and brought out as the neutral. */
    ZN("zn"),
    /** Single-phase, one end earthed and brought out as the neutral. */
    I("i"),
    /** Single-phase with its centre earthed and brought out as the neutral: split-phase. */
    CENTRE_TAPPED("ii");

    private final String symbol;

    Secondary(String symbol) {
      this.symbol = symbol;
    }
  }

  /** Refuses a pair or a clock number that no such transformer has. */
  public VectorGroup {
    boolean singlePhase = primary == Primary.I;
    if (singlePhase != (secondary == Secondary.I || secondary == Secondary.CENTRE_TAPPED)) {
      throw new IllegalArgumentException(
          "a single-phase winding pairs with a single-phase winding only; " + SUPPORTED);
    }
    if (singlePhase ? clock != 0 : (clock < 0 || clock > 11)) {
      throw new IllegalArgumentException(
          singlePhase
              ? "a single-phase transformer has clock number 0, not " + clock
              : "the clock number is 0 to 11, not " + clock);
    }
    if (!singlePhase && (clock % 2 != 0) != turnsByOddHours(primary, secondary)) {
      throw new IllegalArgumentException(
          "%s%s%d does not exist: %s%s has an %s clock number; %s"
              .formatted(
                  primary,
                  secondary.symbol,
                  clock,
                  primary,
                  secondary.symbol,
                  turnsByOddHours(primary, secondary) ? "odd" : "even",
                  SUPPORTED));
    }
  }

  /**
   * Reads a connection symbol; upper and lower case and blanks do not matter.
   *
   * @throws IllegalArgumentException saying what is wrong and what is supported
   */
  public static VectorGroup parse(String text) {
    String symbol = text.strip().toUpperCase(Locale.ROOT).replaceAll("\\s", "");
    if (symbol.equals("II0")) {
      return new VectorGroup(Primary.I, Secondary.I, 0);
    }
    if (symbol.equals("III0")) {
      return new VectorGroup(Primary.I, Secondary.CENTRE_TAPPED, 0);
    }
    Matcher matcher = THREE_PHASE.matcher(symbol);
    if (!matcher.matches()) {
      throw new IllegalArgumentException(
          "connection \"" + text + "\" is not supported; " + SUPPORTED);
    }
    if (matcher.group(3) == null) {
      throw new IllegalArgumentException(
          "connection \"" + text + "\" lacks its clock number; " + SUPPORTED);
    }
    return new VectorGroup(
        Primary.valueOf(matcher.group(1)),
        Secondary.valueOf(matcher.group(2)),
        Integer.parseInt(matcher.group(3)));
  }

  /** Single-phase primary: it is fed from two conductors, named in {@code primary_lines}. */
  public boolean isSinglePhase() {
    return primary == Primary.I;
  }

  /** Whether the secondary is a split-phase one. */
  public boolean isSplitPhase() {
    return secondary == Secondary.CENTRE_TAPPED;
  }

  /** The conductors its secondary has. */
  public PhaseSystem secondarySystem() {
    if (isSplitPhase()) {
      return PhaseSystem.SPLIT_PHASE;
    }
    if (isSinglePhase()) {
      return PhaseSystem.SINGLE_PHASE;
    }
    return hasSecondaryNeutral() ? PhaseSystem.THREE_PHASE_4_WIRE : PhaseSystem.THREE_PHASE_3_WIRE;
  }

  /** Whether the secondary has an earthed neutral that is brought out. */
  public boolean hasSecondaryNeutral() {
    return switch (secondary) {
      case YN, ZN, I, CENTRE_TAPPED -> true;
      case Y, D, Z -> false;
    };
  }

  /**
   * Whether zero sequence passes from one side to the other: star to star with both star points
   * connected, nothing else.
   */
  public boolean passesZeroSequence() {
    return primary == Primary.YN && secondary == Secondary.YN;
  }

  /**
   * Whether the primary itself is a path for the zero sequence of the side that feeds it: an
   * earthed star on a delta.
   */
  public boolean shuntsPrimaryZeroSequence() {
    return primary == Primary.YN && secondary == Secondary.D;
  }

  /**
   * The zero-sequence impedance seen from the secondary, in per cent on the transformer's rating,
   * where the survey does not say: that of the positive sequence for Dyn and YNyn, 50 % for Yyn
   * (three-limb core; common practice, no source), a tenth of the positive sequence's for a zigzag
   * (common practice, no source). It has no effect where the secondary has no neutral.
   *
   * @param impedancePercent short-circuit impedance in per cent
   */
  public double assumedZeroSequencePercent(double impedancePercent) {
    return switch (secondary) {
      case Z, ZN -> 0.1 * impedancePercent;
      case YN -> primary == Primary.Y ? 50 : impedancePercent;
      default -> impedancePercent;
    };
  }

  /** The connection symbol as on a rating plate. */
  public String symbol() {
    return primary + secondary.symbol + clock;
  }

  @Override
  public String toString() {
    return symbol();
  }

  private static boolean turnsByOddHours(Primary primary, Secondary secondary) {
    boolean delta = primary == Primary.D;
    return switch (secondary) {
      case Y, YN -> delta;
      case D, Z, ZN -> !delta;
      case I, CENTRE_TAPPED -> false;
    };
  }
}
