package fourthwire.web.load;

import fourthwire.site.LoadKind;
import java.util.OptionalDouble;

/**
 * What an empty field stands for, so that the page can say it. The engine applies its own defaults;
 * a test holds these beside them.
 */
final class LoadDefaults {
  private static final double LOW_VOLTAGE_V = 160;

  private LoadDefaults() {}

  /** Watts of one unit (common practice, no source). */
  static double watts(LoadKind kind) {
    return switch (kind) {
      case RESISTIVE, LINEAR -> 2000;
      case CAPACITOR_INPUT, CAPACITOR_INPUT_CHOKE -> 100;
      case PFC_CRITICAL -> 90;
      case PFC_CONTINUOUS, MEASURED -> 500;
      case MAGNETIC_BALLAST -> 44;
      case PHASE_DIMMER -> 300;
      case MOTOR, SIX_PULSE -> 7500;
      case ACTIVE_FRONT_END -> 30_000;
      case TWELVE_PULSE -> 90_000;
    };
  }

  /** Nominal volts: across one port, between lines on three. */
  static double volts(boolean threeLines, double hertz) {
    boolean sixty = hertz == 60;
    return threeLines ? (sixty ? 480 : 400) : sixty ? 120 : 230;
  }

  /** Displacement factor of a kind that has one. */
  static OptionalDouble displacement(LoadKind kind) {
    return switch (kind) {
      case LINEAR, MEASURED, PHASE_DIMMER, ACTIVE_FRONT_END -> OptionalDouble.of(1);
      case MOTOR -> OptionalDouble.of(0.85);
      case MAGNETIC_BALLAST -> OptionalDouble.of(0.5);
      default -> OptionalDouble.empty();
    };
  }

  /**
   * A model column; empty where nothing stands for it, or where it is found (efficiency).
   *
   * @param portV nominal volts
   * @param ratedW watts of one unit
   */
  static OptionalDouble of(ModelField field, LoadKind kind, double portV, double ratedW) {
    boolean three = kind == LoadKind.SIX_PULSE || kind == LoadKind.TWELVE_PULSE;
    boolean critical = kind == LoadKind.PFC_CRITICAL;
    return switch (field) {
      case CAPACITANCE -> OptionalDouble.of(capacitance(three, portV));
      case SOURCE_RESISTANCE -> OptionalDouble.of((three ? 0.002 : 0.02) * portV * portV / ratedW);
      case SOURCE_INDUCTANCE -> OptionalDouble.of(0);
      case DC_CHOKE ->
          kind == LoadKind.CAPACITOR_INPUT_CHOKE ? OptionalDouble.empty() : OptionalDouble.of(0);
      case LINE_CHOKE -> OptionalDouble.of(kind == LoadKind.CAPACITOR_INPUT_CHOKE ? 3 : 0);
      case DIODE_SATURATION -> OptionalDouble.of(3e-11);
      case DIODE_EMISSION -> OptionalDouble.of(1.2);
      case DIODE_RESISTANCE -> OptionalDouble.of(0.001);
      case FIRING -> OptionalDouble.of(90);
      case INPUT_FILTER -> OptionalDouble.of(1e-3 * ratedW);
      case DEAD_ANGLE -> OptionalDouble.of(critical ? 9 : 11);
      case RESIDUAL -> residual(kind);
      case LOCKED_ROTOR -> OptionalDouble.of(17);
      case EFFICIENCY -> OptionalDouble.empty();
    };
  }

  private static double capacitance(boolean three, double portV) {
    return three ? 0.04 * (400 / portV) * (400 / portV) : portV < LOW_VOLTAGE_V ? 2 : 1;
  }

  private static OptionalDouble residual(LoadKind kind) {
    return switch (kind) {
      case PFC_CRITICAL -> OptionalDouble.of(3);
      case PFC_CONTINUOUS -> OptionalDouble.of(0);
      default -> OptionalDouble.empty();
    };
  }
}
