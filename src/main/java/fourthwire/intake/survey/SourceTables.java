package fourthwire.intake.survey;

import fourthwire.quantity.Conductor;
import fourthwire.site.Background;
import fourthwire.site.PhaseSystem;
import fourthwire.site.Practice;
import fourthwire.site.SiteSettings;
import fourthwire.site.Supply;
import fourthwire.site.SupplyRole;
import fourthwire.site.Transformer;
import fourthwire.site.VectorGroup;

/** The tables of the site, its supplies and its transformers. */
final class SourceTables {
  private static final int LOWEST_DISTORTION_ORDER = 2;
  private static final int HIGHEST_ORDER = 50;

  /** The keys of the site table, each as if it were a column. */
  static final Schema<SiteSettings> SITE =
      Schema.<SiteSettings>of("site")
          .required("name", Formats.TEXT, SiteSettings::name)
          .required("frequency_hz", Formats.oneOf(50, 60), SiteSettings::frequencyHz)
          .required(
              "practice", Formats.word(Practice.class, Practice::word), SiteSettings::practice)
          .optional("timezone", Formats.ZONE, SiteSettings::timezone)
          .optional("currency", Formats.NAME, SiteSettings::currency)
          .number("energy_price_per_kwh", Range.NOT_NEGATIVE, SiteSettings::energyPricePerKwh)
          .number(
              "demand_price_per_kva_month",
              Range.NOT_NEGATIVE,
              SiteSettings::demandPricePerKvaMonth)
          .number("power_factor_target", Range.SHARE_ABOVE_ZERO, SiteSettings::powerFactorTarget)
          .number("discount_rate_percent", Range.PERCENT, SiteSettings::discountRatePercent)
          .optional("pcc", Formats.NAME, SiteSettings::pcc)
          .build(SourceTables::settings);

  static final Schema<Supply> SUPPLIES =
      Schema.<Supply>of("supplies")
          .required("supply", Formats.NODE_NAME, Supply::name)
          .required("line_voltage_v", Formats.number(Range.ABOVE_ZERO), Supply::lineVoltageV)
          .number("fault_level_mva", Range.ABOVE_ZERO, Supply::faultLevelMva)
          .number("x_over_r", Range.NOT_NEGATIVE, Supply::xOverR)
          .optional("role", Formats.word(SupplyRole.class, SupplyRole::word), Supply::role)
          .optional("system", Formats.word(PhaseSystem.class, PhaseSystem::word), Supply::system)
          .number("zero_sequence_ratio", Range.ABOVE_ZERO, Supply::zeroSequenceRatio)
          .number("generator_kva", Range.ABOVE_ZERO, Supply::generatorKva)
          .number(
              "subtransient_reactance_percent",
              Range.PERCENT_ABOVE_ZERO,
              Supply::subtransientReactancePercent)
          .optional("connects_at", Formats.NAME, Supply::connectsAt)
          .number("demand_a", Range.ABOVE_ZERO, Supply::demandA)
          .build(SourceTables::supply);

  static final Schema<Background> BACKGROUND =
      Schema.<Background>of("background")
          .required("supply", Formats.NAME, Background::supply)
          .required(
              "order", Formats.integer(LOWEST_DISTORTION_ORDER, HIGHEST_ORDER), Background::order)
          .required("percent", Formats.number(Range.PERCENT), Background::percent)
          .number("degrees", Range.DEGREES, Background::degrees)
          .build(
              c ->
                  new Background(
                      c.text("supply"),
                      c.integer("order"),
                      c.number("percent"),
                      c.optionalNumber("degrees")));

  static final Schema<Transformer> TRANSFORMERS =
      Schema.<Transformer>of("transformers")
          .required("transformer", Formats.NODE_NAME, Transformer::name)
          .required("fed_from", Formats.NAME, Transformer::fedFrom)
          .required("rated_kva", Formats.number(Range.ABOVE_ZERO), Transformer::ratedKva)
          .required("primary_v", Formats.number(Range.ABOVE_ZERO), Transformer::primaryV)
          .required("secondary_v", Formats.number(Range.ABOVE_ZERO), Transformer::secondaryV)
          .required("connection", Formats.CONNECTION, Transformer::connection)
          .required(
              "impedance_percent",
              Formats.number(Range.PERCENT_ABOVE_ZERO),
              Transformer::impedancePercent)
          .number("load_loss_w", Range.NOT_NEGATIVE, Transformer::loadLossW)
          .number("no_load_loss_w", Range.NOT_NEGATIVE, Transformer::noLoadLossW)
          .number("winding_eddy_loss_percent", Range.PERCENT, Transformer::windingEddyLossPercent)
          .number(
              "zero_sequence_impedance_percent",
              Range.ABOVE_ZERO,
              Transformer::zeroSequenceImpedancePercent)
          .number("k_rating", Range.from(1), Transformer::kRating)
          .list("primary_lines", Formats.LINE_LIST, Transformer::primaryLines)
          .number("demand_a", Range.ABOVE_ZERO, Transformer::demandA)
          .part(FeederColumns.COLUMNS, Transformer::feeder)
          .build(SourceTables::transformer);

  private SourceTables() {}

  private static SiteSettings settings(Cells c) {
    return new SiteSettings(
        c.text("name"),
        c.integer("frequency_hz"),
        c.required("practice", Practice.class),
        c.optionalText("timezone"),
        c.optionalText("currency"),
        c.optionalNumber("energy_price_per_kwh"),
        c.optionalNumber("demand_price_per_kva_month"),
        c.optionalNumber("power_factor_target"),
        c.optionalNumber("discount_rate_percent"),
        c.optionalText("pcc"));
  }

  private static Supply supply(Cells c) {
    return new Supply(
        c.text("supply"),
        c.number("line_voltage_v"),
        c.optionalNumber("fault_level_mva"),
        c.optionalNumber("x_over_r"),
        c.optional("role", SupplyRole.class),
        c.optional("system", PhaseSystem.class),
        c.optionalNumber("zero_sequence_ratio"),
        c.optionalNumber("generator_kva"),
        c.optionalNumber("subtransient_reactance_percent"),
        c.optionalText("connects_at"),
        c.optionalNumber("demand_a"));
  }

  private static Transformer transformer(Cells c) {
    return new Transformer(
        c.text("transformer"),
        c.text("fed_from"),
        c.number("rated_kva"),
        c.number("primary_v"),
        c.number("secondary_v"),
        c.required("connection", VectorGroup.class),
        c.number("impedance_percent"),
        c.optionalNumber("load_loss_w"),
        c.optionalNumber("no_load_loss_w"),
        c.optionalNumber("winding_eddy_loss_percent"),
        c.optionalNumber("zero_sequence_impedance_percent"),
        c.optionalNumber("k_rating"),
        c.list("primary_lines", Conductor.class),
        c.optionalNumber("demand_a"),
        FeederColumns.feeder(c));
  }
}
