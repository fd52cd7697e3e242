package fourthwire.intake.survey;

import fourthwire.quantity.Conductor;
import fourthwire.site.CapacitorBank;
import fourthwire.site.Circuit;
import fourthwire.site.Filter;
import fourthwire.site.Instrument;
import fourthwire.site.Lines;
import fourthwire.site.Meter;
import fourthwire.site.Panel;
import fourthwire.site.PhaseSystem;
import fourthwire.site.SpotReading;
import java.time.LocalDateTime;

/** The tables of panels and of what is connected or measured at them, loads apart. */
final class DistributionTables {
  private static final Range TUNED_ORDER = new Range(1, false, 50);
  private static final Range DETUNING = new Range(0, true, 50);
  private static final Range DISTORTION = Range.of(0, 1000);

  static final Schema<Panel> PANELS =
      Schema.<Panel>of("panels")
          .required("panel", Formats.NODE_NAME, Panel::name)
          .required("fed_from", Formats.NAME, Panel::fedFrom)
          .optional("system", Formats.word(PhaseSystem.class, PhaseSystem::word), Panel::system)
          .list("parent_lines", Formats.LINE_LIST, Panel::parentLines)
          .number("bus_rating_a", Range.ABOVE_ZERO, Panel::busRatingA)
          .number("neutral_bus_rating_a", Range.ABOVE_ZERO, Panel::neutralBusRatingA)
          .number("demand_a", Range.ABOVE_ZERO, Panel::demandA)
          .part(FeederColumns.COLUMNS, Panel::feeder)
          .build(DistributionTables::panel);

  static final Schema<Circuit> CIRCUITS =
      Schema.<Circuit>of("circuits")
          .required("circuit", Formats.NAME, Circuit::name)
          .required("panel", Formats.NAME, Circuit::panel)
          .required("lines", Formats.LINES, Circuit::lines)
          .number("breaker_a", Range.ABOVE_ZERO, Circuit::breakerA)
          .optional("shared_neutral", Formats.NAME, Circuit::sharedNeutral)
          .part(FeederColumns.COLUMNS, Circuit::feeder)
          .build(DistributionTables::circuit);

  static final Schema<CapacitorBank> CAPACITORS =
      Schema.<CapacitorBank>of("capacitors")
          .required("capacitor", Formats.NAME, CapacitorBank::name)
          .required("panel", Formats.NAME, CapacitorBank::panel)
          .required("kvar", Formats.number(Range.ABOVE_ZERO), CapacitorBank::kvar)
          .number("rated_v", Range.ABOVE_ZERO, CapacitorBank::ratedV)
          .number("detuning_percent", DETUNING, CapacitorBank::detuningPercent)
          .number("quality_factor", Range.ABOVE_ZERO, CapacitorBank::qualityFactor)
          .count("steps", CapacitorBank::steps)
          .build(DistributionTables::bank);

  static final Schema<Filter> FILTERS =
      Schema.<Filter>of("filters")
          .required("filter", Formats.NAME, Filter::name)
          .required("panel", Formats.NAME, Filter::panel)
          .required("type", Formats.word(Filter.Type.class, Filter.Type::word), Filter::type)
          .number("kvar", Range.ABOVE_ZERO, Filter::kvar)
          .number("rated_v", Range.ABOVE_ZERO, Filter::ratedV)
          .number("tuned_order", TUNED_ORDER, Filter::tunedOrder)
          .number("quality_factor", Range.ABOVE_ZERO, Filter::qualityFactor)
          .number("rated_a", Range.ABOVE_ZERO, Filter::ratedA)
          .number("impedance_percent", Range.PERCENT_ABOVE_ZERO, Filter::impedancePercent)
          .build(DistributionTables::filter);

  static final Schema<Meter> METERS =
      Schema.<Meter>of("meters")
          .required("meter", Formats.NAME, Meter::name)
          .required("at", Formats.NAME, Meter::at)
          .number("ct_ratio", Range.ABOVE_ZERO, Meter::ctRatio)
          .list("ct_reversed", Formats.CONDUCTOR_LIST, Meter::ctReversed)
          .optional(
              "instrument", Formats.word(Instrument.class, Instrument::word), Meter::instrument)
          .build(DistributionTables::meter);

  static final Schema<SpotReading> SPOT_READINGS =
      Schema.<SpotReading>of("spot_readings")
          .required("at", Formats.NAME, SpotReading::at)
          .optional("time", Formats.TIME, SpotReading::time)
          .number("l1_a", Range.NOT_NEGATIVE, SpotReading::l1A)
          .number("l2_a", Range.NOT_NEGATIVE, SpotReading::l2A)
          .number("l3_a", Range.NOT_NEGATIVE, SpotReading::l3A)
          .number("n_a", Range.NOT_NEGATIVE, SpotReading::nA)
          .number("l1_v", Range.NOT_NEGATIVE, SpotReading::l1V)
          .number("l2_v", Range.NOT_NEGATIVE, SpotReading::l2V)
          .number("l3_v", Range.NOT_NEGATIVE, SpotReading::l3V)
          .number("kw", Range.ANY, SpotReading::kw)
          .number("power_factor", Range.of(-1, 1), SpotReading::powerFactor)
          .number("thd_percent", DISTORTION, SpotReading::thdPercent)
          .optional(
              "instrument",
              Formats.word(Instrument.class, Instrument::word),
              SpotReading::instrument)
          .build(DistributionTables::spotReading);

  private DistributionTables() {}

  private static Panel panel(Cells c) {
    return new Panel(
        c.text("panel"),
        c.text("fed_from"),
        c.optional("system", PhaseSystem.class),
        c.list("parent_lines", Conductor.class),
        c.optionalNumber("bus_rating_a"),
        c.optionalNumber("neutral_bus_rating_a"),
        c.optionalNumber("demand_a"),
        FeederColumns.feeder(c));
  }

  private static Circuit circuit(Cells c) {
    return new Circuit(
        c.text("circuit"),
        c.text("panel"),
        c.required("lines", Lines.class),
        c.optionalNumber("breaker_a"),
        c.optionalText("shared_neutral"),
        FeederColumns.feeder(c));
  }

  private static CapacitorBank bank(Cells c) {
    return new CapacitorBank(
        c.text("capacitor"),
        c.text("panel"),
        c.number("kvar"),
        c.optionalNumber("rated_v"),
        c.optionalNumber("detuning_percent"),
        c.optionalNumber("quality_factor"),
        c.optionalInteger("steps"));
  }

  private static Filter filter(Cells c) {
    return new Filter(
        c.text("filter"),
        c.text("panel"),
        c.required("type", Filter.Type.class),
        c.optionalNumber("kvar"),
        c.optionalNumber("rated_v"),
        c.optionalNumber("tuned_order"),
        c.optionalNumber("quality_factor"),
        c.optionalNumber("rated_a"),
        c.optionalNumber("impedance_percent"));
  }

  private static Meter meter(Cells c) {
    return new Meter(
        c.text("meter"),
        c.text("at"),
        c.optionalNumber("ct_ratio"),
        c.list("ct_reversed", Conductor.class),
        c.optional("instrument", Instrument.class));
  }

  private static SpotReading spotReading(Cells c) {
    return new SpotReading(
        c.text("at"),
        c.optional("time", LocalDateTime.class),
        c.optionalNumber("l1_a"),
        c.optionalNumber("l2_a"),
        c.optionalNumber("l3_a"),
        c.optionalNumber("n_a"),
        c.optionalNumber("l1_v"),
        c.optionalNumber("l2_v"),
        c.optionalNumber("l3_v"),
        c.optionalNumber("kw"),
        c.optionalNumber("power_factor"),
        c.optionalNumber("thd_percent"),
        c.optional("instrument", Instrument.class));
  }
}
