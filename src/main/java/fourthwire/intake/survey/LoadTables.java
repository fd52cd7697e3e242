package fourthwire.intake.survey;

import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.site.Schedule;
import fourthwire.site.SpectrumTable;
import fourthwire.site.check.SpectrumRow;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/** The tables of loads, spectra and schedules. */
final class LoadTables {
  private static final int HIGHEST_ORDER = 50;
  private static final int HOURS = 24;
  private static final Range OF_FUNDAMENTAL = Range.of(0, 1000);

  private static final Format<Double> RATED_W =
      new Format<>(LoadTables::ratedW, Numbers::print, Double.NaN, true);

  static final Schema<Load> LOADS =
      Schema.<Load>of("loads")
          .required("load", Formats.NAME, Load::name)
          .required("circuit", Formats.NAME, Load::circuit)
          .optional("panel", Formats.NAME, l -> Optional.of(l.panel()))
          .optional("kind", Formats.word(LoadKind.class, LoadKind::word), Load::kind)
          .optional("preset", Formats.NAME, Load::preset)
          .optional("spectrum", Formats.NAME, Load::spectrum)
          .required("quantity", Formats.number(Range.ABOVE_ZERO), Load::quantity)
          .number("rated_w", RATED_W, Load::ratedW)
          .number("rated_va", Range.ABOVE_ZERO, Load::ratedVa)
          .number("rated_a", Range.ABOVE_ZERO, Load::ratedA)
          .number("demand_factor", Range.SHARE, Load::demandFactor)
          .optional("schedule", Formats.NAME, Load::schedule)
          .optional(
              "part_load", Formats.word(Load.PartLoad.class, Load.PartLoad::word), Load::partLoad)
          .number("displacement_factor", Range.of(-1, 1), Load::displacementFactor)
          .number("low_w", Range.ABOVE_ZERO, Load::lowW)
          .number("high_w", Range.ABOVE_ZERO, Load::highW)
          .optional(
              "confidence",
              Formats.word(Load.Confidence.class, Load.Confidence::word),
              Load::confidence)
          .part(modelColumns(), Load::columns)
          .build(LoadTables::load);

  static final Schema<SpectrumRow> SPECTRA =
      Schema.<SpectrumRow>of("spectra")
          .required("spectrum", Formats.NAME, SpectrumRow::spectrum)
          .required("order", Formats.integer(1, HIGHEST_ORDER), r -> r.order().order())
          .required("percent", Formats.number(OF_FUNDAMENTAL), r -> r.order().percent())
          .number("degrees", Range.DEGREES, r -> r.order().degrees())
          .build(
              c ->
                  new SpectrumRow(
                      c.text("spectrum"),
                      new SpectrumTable.Row(
                          c.integer("order"), c.number("percent"), c.optionalNumber("degrees"))));

  static final Schema<Schedule> SCHEDULES = schedules();

  private LoadTables() {}

  private static double ratedW(String text, boolean decimalComma) {
    double watts = Numbers.parse(text, decimalComma);
    if (watts < 0) {
      throw new IllegalArgumentException(
          "A negative rated_w is refused: generation is not modelled. Accepted are watts above 0.");
    }
    return Range.ABOVE_ZERO.checked(watts);
  }

  private static Schema<Schedule> schedules() {
    Schema.Builder<Schedule> schema =
        Schema.<Schedule>of("schedules")
            .required("schedule", Formats.NAME, Schedule::name)
            .required(
                "days", Formats.word(Schedule.Days.class, Schedule.Days::word), Schedule::days);
    for (int hour = 0; hour < HOURS; hour++) {
      int h = hour;
      schema.required(hourColumn(h), Formats.number(Range.SHARE), s -> s.shares().get(h));
    }
    return schema.build(
        c ->
            new Schedule(
                c.text("schedule"),
                c.required("days", Schedule.Days.class),
                IntStream.range(0, HOURS).mapToObj(h -> c.number(hourColumn(h))).toList()));
  }

  private static String hourColumn(int hour) {
    return "h%02d".formatted(hour);
  }

  private static List<Column<ModelColumns>> modelColumns() {
    return Schema.<ModelColumns>of("model")
        .number("efficiency", Range.SHARE_ABOVE_ZERO, ModelColumns::efficiency)
        .number("capacitance_uf_per_w", Range.ABOVE_ZERO, ModelColumns::capacitanceUfPerW)
        .number("source_resistance_ohm", Range.NOT_NEGATIVE, ModelColumns::sourceResistanceOhm)
        .number("source_inductance_uh", Range.NOT_NEGATIVE, ModelColumns::sourceInductanceUh)
        .number("diode_saturation_a", Range.ABOVE_ZERO, ModelColumns::diodeSaturationA)
        .number("diode_emission", Range.ABOVE_ZERO, ModelColumns::diodeEmission)
        .number("diode_resistance_ohm", Range.NOT_NEGATIVE, ModelColumns::diodeResistanceOhm)
        .number("line_choke_percent", Range.PERCENT, ModelColumns::lineChokePercent)
        .number("dc_choke_percent", Range.PERCENT, ModelColumns::dcChokePercent)
        .number("firing_degrees", Range.of(0, 180), ModelColumns::firingDegrees)
        .number("input_filter_uf", Range.NOT_NEGATIVE, ModelColumns::inputFilterUf)
        .number("dead_angle_degrees", Range.of(0, 90), ModelColumns::deadAngleDegrees)
        .number("residual_percent", Range.PERCENT, ModelColumns::residualPercent)
        .number(
            "locked_rotor_reactance_percent",
            Range.PERCENT_ABOVE_ZERO,
            ModelColumns::lockedRotorReactancePercent)
        .build(LoadTables::columns)
        .columns();
  }

  private static ModelColumns columns(Cells c) {
    return new ModelColumns(
        c.optionalNumber("efficiency"),
        c.optionalNumber("capacitance_uf_per_w"),
        c.optionalNumber("source_resistance_ohm"),
        c.optionalNumber("source_inductance_uh"),
        c.optionalNumber("diode_saturation_a"),
        c.optionalNumber("diode_emission"),
        c.optionalNumber("diode_resistance_ohm"),
        c.optionalNumber("line_choke_percent"),
        c.optionalNumber("dc_choke_percent"),
        c.optionalNumber("firing_degrees"),
        c.optionalNumber("input_filter_uf"),
        c.optionalNumber("dead_angle_degrees"),
        c.optionalNumber("residual_percent"),
        c.optionalNumber("locked_rotor_reactance_percent"));
  }

  private static Load load(Cells c) {
    return new Load(
        c.text("load"),
        c.text("circuit"),
        c.optionalText("panel").orElse(""),
        c.optional("kind", LoadKind.class),
        c.optionalText("preset"),
        c.optionalText("spectrum"),
        c.number("quantity"),
        c.optionalNumber("rated_w"),
        c.optionalNumber("rated_va"),
        c.optionalNumber("rated_a"),
        c.optionalNumber("demand_factor"),
        c.optionalText("schedule"),
        c.optional("part_load", Load.PartLoad.class),
        c.optionalNumber("displacement_factor"),
        c.optionalNumber("low_w"),
        c.optionalNumber("high_w"),
        c.optional("confidence", Load.Confidence.class),
        columns(c));
  }
}
