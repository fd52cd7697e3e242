package fourthwire.site.conductor;

import fourthwire.quantity.Figure;
import fourthwire.quantity.PublishedTable;
import fourthwire.site.Feeder;
import fourthwire.site.Feeder.Material;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;

/**
 * Table ampacities of one conductor, taken to the ambient temperature: metric sizes by IEC
 * 60364-5-52 Annex B (copper, three loaded), American sizes by NFPA 70 Table 310.16, 75 °C column.
 *
 * <p>Empty columns: copper; PVC and method C for metric sizes (common practice, no source). The
 * correction for ambient temperature is √((working - ambient)/(working - 30 °C)), which is how
 * Table B.52.14 and Table 310.15(B)(1) are made.
 */
final class AmpacityTables {
  private static final PublishedTable IEC =
      PublishedTable.beside(AmpacityTables.class, "iec60364-5-52-annex-b.csv");
  private static final PublishedTable AMERICAN =
      PublishedTable.beside(AmpacityTables.class, "nec-310-16.csv");
  private static final double TABLE_AMBIENT_C = 30;

  private AmpacityTables() {}

  static Ampacity lookUp(Feeder feeder, ConductorSize size) {
    return size.series() == ConductorSize.Series.METRIC
        ? metric(feeder, size)
        : american(feeder, size);
  }

  private static Ampacity american(Feeder feeder, ConductorSize size) {
    Material material = feeder.conductorMaterial().orElse(Material.COPPER);
    OptionalDouble printed =
        AMERICAN.rows().stream()
            .filter(row -> row.text("size").equals(size.size()))
            .findFirst()
            .map(row -> row.optional(material.word()))
            .orElse(OptionalDouble.empty());
    String what = size.word() + " " + material.word() + ", " + AMERICAN.basis() + ", 75 °C column";
    return corrected(feeder, printed, ConductorData.AMERICAN_WORKING_C, what);
  }

  private static Ampacity metric(Feeder feeder, ConductorSize size) {
    if (feeder.conductorMaterial().orElse(Material.COPPER) != Material.COPPER) {
      return none("no table for aluminium in mm2: give ampacity_a");
    }
    boolean thermosetting = isThermosetting(feeder);
    String method = feeder.installation().orElse("C").strip().toUpperCase(Locale.ROOT);
    String column = method.toLowerCase(Locale.ROOT) + (thermosetting ? "_xlpe" : "_pvc");
    if (!List.of("b2_pvc", "c_pvc", "e_pvc", "c_xlpe", "e_xlpe").contains(column)) {
      return none(
          "no table for method "
              + method
              + (thermosetting ? " with XLPE" : " with PVC")
              + ": give ampacity_a");
    }
    OptionalDouble printed =
        IEC.rows().stream()
            .filter(row -> row.text("area_mm2").equals(size.size()))
            .findFirst()
            .map(row -> row.optional(column))
            .orElse(OptionalDouble.empty());
    String what =
        "%s copper, %s, method %s%s, %s"
            .formatted(
                size.word(),
                thermosetting ? "XLPE" : "PVC",
                method,
                feeder.installation().isEmpty() ? " (assumed)" : "",
                IEC.document() + ", Annex B" + (method.equals("B2") ? "" : " (from memory)"));
    return corrected(feeder, printed, thermosetting ? 90 : ConductorData.IEC_WORKING_C, what);
  }

  private static boolean isThermosetting(Feeder feeder) {
    String text = feeder.insulation().orElse("").toUpperCase(Locale.ROOT);
    return text.contains("XLPE") || text.contains("EPR") || text.contains("90");
  }

  private static Ampacity corrected(
      Feeder feeder, OptionalDouble printed, double workingC, String what) {
    if (printed.isEmpty()) {
      return none("no figure printed for " + what + ": give ampacity_a");
    }
    double ambient = feeder.ambientC().orElse(TABLE_AMBIENT_C);
    if (ambient >= workingC) {
      return none("ambient of " + ambient + " °C is above the conductor's working temperature");
    }
    double factor = Math.sqrt((workingC - ambient) / (workingC - TABLE_AMBIENT_C));
    return new Ampacity(Figure.of(printed.getAsDouble() * factor), what);
  }

  private static Ampacity none(String reason) {
    return new Ampacity(Figure.unknown(reason), "");
  }
}
