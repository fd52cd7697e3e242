package fourthwire.intake.survey;

import fourthwire.site.Feeder;
import java.util.List;

/** The feeder columns, which transformers, panels and circuits share. */
final class FeederColumns {
  static final List<Column<Feeder>> COLUMNS =
      Schema.<Feeder>of("feeder")
          .number("length_m", Range.ABOVE_ZERO, Feeder::lengthM)
          .optional("conductor_size", Formats.SIZE, Feeder::conductorSize)
          .optional(
              "conductor_material",
              Formats.word(Feeder.Material.class, Feeder.Material::word),
              Feeder::conductorMaterial)
          .count("conductors_per_line", Feeder::conductorsPerLine)
          .optional("neutral_size", Formats.SIZE, Feeder::neutralSize)
          .count("neutral_conductors", Feeder::neutralConductors)
          .optional("insulation", Formats.NAME, Feeder::insulation)
          .optional("installation", Formats.NAME, Feeder::installation)
          .number("ambient_c", Range.of(-50, 100), Feeder::ambientC)
          .number("grouping_factor", Range.SHARE_ABOVE_ZERO, Feeder::groupingFactor)
          .number("ampacity_a", Range.ABOVE_ZERO, Feeder::ampacityA)
          .number("neutral_ampacity_a", Range.ABOVE_ZERO, Feeder::neutralAmpacityA)
          .number("resistance_ohm_per_km", Range.NOT_NEGATIVE, Feeder::resistanceOhmPerKm)
          .number("reactance_ohm_per_km", Range.NOT_NEGATIVE, Feeder::reactanceOhmPerKm)
          .number(
              "neutral_resistance_ohm_per_km",
              Range.NOT_NEGATIVE,
              Feeder::neutralResistanceOhmPerKm)
          .number(
              "neutral_reactance_ohm_per_km", Range.NOT_NEGATIVE, Feeder::neutralReactanceOhmPerKm)
          .build(FeederColumns::feeder)
          .columns();

  private FeederColumns() {}

  static Feeder feeder(Cells c) {
    return new Feeder(
        c.optionalNumber("length_m"),
        c.optionalText("conductor_size"),
        c.optional("conductor_material", Feeder.Material.class),
        c.optionalInteger("conductors_per_line"),
        c.optionalText("neutral_size"),
        c.optionalInteger("neutral_conductors"),
        c.optionalText("insulation"),
        c.optionalText("installation"),
        c.optionalNumber("ambient_c"),
        c.optionalNumber("grouping_factor"),
        c.optionalNumber("ampacity_a"),
        c.optionalNumber("neutral_ampacity_a"),
        c.optionalNumber("resistance_ohm_per_km"),
        c.optionalNumber("reactance_ohm_per_km"),
        c.optionalNumber("neutral_resistance_ohm_per_km"),
        c.optionalNumber("neutral_reactance_ohm_per_km"));
  }
}
