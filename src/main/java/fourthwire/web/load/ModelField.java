package fourthwire.web.load;

import static fourthwire.site.LoadKind.CAPACITOR_INPUT;
import static fourthwire.site.LoadKind.CAPACITOR_INPUT_CHOKE;
import static fourthwire.site.LoadKind.PFC_CONTINUOUS;
import static fourthwire.site.LoadKind.PFC_CRITICAL;
import static fourthwire.site.LoadKind.SIX_PULSE;
import static fourthwire.site.LoadKind.TWELVE_PULSE;

import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Arrays;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.Function;

/** The survey's model columns as fields of the form: which kinds have them, and in what range. */
enum ModelField {
  EFFICIENCY("efficiency", 0.01, 1, Kinds.RECTIFIERS, ModelColumns::efficiency),
  CAPACITANCE("capacitance_uf_per_w", 1e-3, 1e4, Kinds.RECTIFIERS, ModelColumns::capacitanceUfPerW),
  SOURCE_RESISTANCE(
      "source_resistance_ohm", 0, 1e6, Kinds.RECTIFIERS, ModelColumns::sourceResistanceOhm),
  SOURCE_INDUCTANCE(
      "source_inductance_uh", 0, 1e9, Kinds.RECTIFIERS, ModelColumns::sourceInductanceUh),
  LINE_CHOKE("line_choke_percent", 0, 100, Kinds.RECTIFIERS, ModelColumns::lineChokePercent),
  DC_CHOKE("dc_choke_percent", 0, 100, Kinds.RECTIFIERS, ModelColumns::dcChokePercent),
  DIODE_SATURATION(
      "diode_saturation_a", 1e-18, 1, Kinds.RECTIFIERS, ModelColumns::diodeSaturationA),
  DIODE_EMISSION("diode_emission", 0.1, 10, Kinds.RECTIFIERS, ModelColumns::diodeEmission),
  DIODE_RESISTANCE(
      "diode_resistance_ohm", 0, 1e4, Kinds.RECTIFIERS, ModelColumns::diodeResistanceOhm),
  FIRING("firing_degrees", 0, 179, Set.of(LoadKind.PHASE_DIMMER), ModelColumns::firingDegrees),
  INPUT_FILTER("input_filter_uf", 0, 1e5, Kinds.PFC, ModelColumns::inputFilterUf),
  DEAD_ANGLE("dead_angle_degrees", 0, 80, Kinds.PFC, ModelColumns::deadAngleDegrees),
  RESIDUAL("residual_percent", 0, 100, Kinds.RESIDUAL, ModelColumns::residualPercent),
  LOCKED_ROTOR(
      "locked_rotor_reactance_percent",
      0.1,
      100,
      Set.of(LoadKind.MOTOR),
      ModelColumns::lockedRotorReactancePercent);

  private final String column;
  private final double low;
  private final double high;
  private final Set<LoadKind> kinds;
  private final Function<ModelColumns, OptionalDouble> value;

  ModelField(
      String column,
      double low,
      double high,
      Set<LoadKind> kinds,
      Function<ModelColumns, OptionalDouble> value) {
    this.column = column;
    this.low = low;
    this.high = high;
    this.kinds = kinds;
    this.value = value;
  }

  /** The survey's column, which is the field's name too. */
  String column() {
    return column;
  }

  double low() {
    return low;
  }

  double high() {
    return high;
  }

  /** What these columns hold in it. */
  OptionalDouble of(ModelColumns columns) {
    return value.apply(columns);
  }

  /** The fields a kind has. */
  static List<ModelField> of(LoadKind kind) {
    return Arrays.stream(values()).filter(f -> f.kinds.contains(kind)).toList();
  }

  /** The columns that these values make. */
  static ModelColumns columns(Map<ModelField, Double> values) {
    Function<ModelField, OptionalDouble> of =
        f -> values.containsKey(f) ? OptionalDouble.of(values.get(f)) : OptionalDouble.empty();
    return new ModelColumns(
        of.apply(EFFICIENCY),
        of.apply(CAPACITANCE),
        of.apply(SOURCE_RESISTANCE),
        of.apply(SOURCE_INDUCTANCE),
        of.apply(DIODE_SATURATION),
        of.apply(DIODE_EMISSION),
        of.apply(DIODE_RESISTANCE),
        of.apply(LINE_CHOKE),
        of.apply(DC_CHOKE),
        of.apply(FIRING),
        of.apply(INPUT_FILTER),
        of.apply(DEAD_ANGLE),
        of.apply(RESIDUAL),
        of.apply(LOCKED_ROTOR));
  }

  /** Sets of kinds that fields share. */
  private static final class Kinds {
    static final Set<LoadKind> RECTIFIERS =
        EnumSet.of(CAPACITOR_INPUT, CAPACITOR_INPUT_CHOKE, SIX_PULSE, TWELVE_PULSE);
    static final Set<LoadKind> PFC = EnumSet.of(PFC_CONTINUOUS, PFC_CRITICAL);
    static final Set<LoadKind> RESIDUAL =
        EnumSet.of(
            PFC_CONTINUOUS, PFC_CRITICAL, LoadKind.MAGNETIC_BALLAST, LoadKind.ACTIVE_FRONT_END);

    private Kinds() {}
  }
}
