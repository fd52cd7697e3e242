package fourthwire.site;

import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * The optional model columns of a load row, per unit of equipment; empty means the kind's default.
 * Units are in the names, as in the survey table.
 */
public record ModelColumns(
    OptionalDouble efficiency,
    OptionalDouble capacitanceUfPerW,
    OptionalDouble sourceResistanceOhm,
    OptionalDouble sourceInductanceUh,
    OptionalDouble diodeSaturationA,
    OptionalDouble diodeEmission,
    OptionalDouble diodeResistanceOhm,
    OptionalDouble lineChokePercent,
    OptionalDouble dcChokePercent,
    OptionalDouble firingDegrees,
    OptionalDouble inputFilterUf,
    OptionalDouble deadAngleDegrees,
    OptionalDouble residualPercent,
    OptionalDouble lockedRotorReactancePercent) {
  /** Each column by itself. */
  public enum Column {
    EFFICIENCY(ModelColumns::efficiency),
    CAPACITANCE_UF_PER_W(ModelColumns::capacitanceUfPerW),
    SOURCE_RESISTANCE_OHM(ModelColumns::sourceResistanceOhm),
    SOURCE_INDUCTANCE_UH(ModelColumns::sourceInductanceUh),
    DIODE_SATURATION_A(ModelColumns::diodeSaturationA),
    DIODE_EMISSION(ModelColumns::diodeEmission),
    DIODE_RESISTANCE_OHM(ModelColumns::diodeResistanceOhm),
    LINE_CHOKE_PERCENT(ModelColumns::lineChokePercent),
    DC_CHOKE_PERCENT(ModelColumns::dcChokePercent),
    FIRING_DEGREES(ModelColumns::firingDegrees),
    INPUT_FILTER_UF(ModelColumns::inputFilterUf),
    DEAD_ANGLE_DEGREES(ModelColumns::deadAngleDegrees),
    RESIDUAL_PERCENT(ModelColumns::residualPercent),
    LOCKED_ROTOR_REACTANCE_PERCENT(ModelColumns::lockedRotorReactancePercent);

    private final Function<ModelColumns, OptionalDouble> value;

    Column(Function<ModelColumns, OptionalDouble> value) {
      this.value = value;
    }

    /** Its value among these columns. */
    public OptionalDouble in(ModelColumns columns) {
      return value.apply(columns);
    }
  }

  /** Every column empty. */
  public static final ModelColumns NONE = of(column -> OptionalDouble.empty());

  /** The columns with these values. */
  public static ModelColumns of(Function<Column, OptionalDouble> values) {
    return new ModelColumns(
        values.apply(Column.EFFICIENCY),
        values.apply(Column.CAPACITANCE_UF_PER_W),
        values.apply(Column.SOURCE_RESISTANCE_OHM),
        values.apply(Column.SOURCE_INDUCTANCE_UH),
        values.apply(Column.DIODE_SATURATION_A),
        values.apply(Column.DIODE_EMISSION),
        values.apply(Column.DIODE_RESISTANCE_OHM),
        values.apply(Column.LINE_CHOKE_PERCENT),
        values.apply(Column.DC_CHOKE_PERCENT),
        values.apply(Column.FIRING_DEGREES),
        values.apply(Column.INPUT_FILTER_UF),
        values.apply(Column.DEAD_ANGLE_DEGREES),
        values.apply(Column.RESIDUAL_PERCENT),
        values.apply(Column.LOCKED_ROTOR_REACTANCE_PERCENT));
  }

  /** These columns, one of them with this value. */
  public ModelColumns with(Column column, double value) {
    return of(each -> each == column ? OptionalDouble.of(value) : each.in(this));
  }

  /** These columns, and where one is empty the other's. */
  public ModelColumns orElse(ModelColumns other) {
    return of(column -> column.in(this).isPresent() ? column.in(this) : column.in(other));
  }
}
