package fourthwire.site.check;

import fourthwire.site.Feeder;
import fourthwire.site.Feeder.Material;
import fourthwire.site.Practice;
import fourthwire.site.Transformer;
import fourthwire.site.conductor.ConductorData;
import fourthwire.site.conductor.ConductorSize;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/** Whether feeders can be given an impedance, and transformers' losses fit their impedance. */
final class FeederCheck {
  private static final String LENGTH = "length_m";
  private static final List<String> NEED_LENGTH =
      List.of(
          "conductor_size",
          "neutral_size",
          "resistance_ohm_per_km",
          "reactance_ohm_per_km",
          "neutral_resistance_ohm_per_km",
          "neutral_reactance_ohm_per_km");
  private static final double W_PER_KVA_PERCENT = 10;

  private final SurveyDraft draft;
  private final Remarks remarks;

  FeederCheck(SurveyDraft draft, Remarks remarks) {
    this.draft = draft;
    this.remarks = remarks;
  }

  void check() {
    checkAll(draft.transformers(), t -> t.feeder());
    checkAll(draft.panels(), p -> p.feeder());
    checkAll(draft.circuits(), c -> c.feeder());
    draft.transformers().rows().forEach(this::checkLosses);
  }

  private <T> void checkAll(DraftTable<T> table, Function<T, Feeder> feeder) {
    for (DraftRow<T> row : table.rows()) {
      checkLength(row);
      checkSize(row, "conductor_size", feeder.apply(row.content()), Feeder::conductorSize);
      checkSize(row, "neutral_size", feeder.apply(row.content()), Feeder::neutralSize);
    }
  }

  private void checkLength(DraftRow<?> row) {
    if (!row.sound(LENGTH) || !row.cell(LENGTH).isEmpty()) {
      return;
    }
    NEED_LENGTH.stream()
        .filter(c -> row.sound(c) && !row.cell(c).isEmpty())
        .findFirst()
        .ifPresent(
            c ->
                remarks.error(
                    row, LENGTH, "length_m is needed beside %s, in metres above 0.".formatted(c)));
  }

  /** The tables print no resistance for some sizes of aluminium. */
  private void checkSize(
      DraftRow<?> row, String column, Feeder feeder, Function<Feeder, Optional<String>> size) {
    if (!row.sound(column, "conductor_material") || size.apply(feeder).isEmpty()) {
      return;
    }
    Material material = feeder.conductorMaterial().orElse(Material.COPPER);
    boolean printed =
        size.apply(feeder)
            .flatMap(ConductorSize::find)
            .filter(s -> ConductorData.dcOhmPerKm(s, material, Practice.IEC).isPresent())
            .isPresent();
    if (!printed) {
      remarks.error(
          row,
          column,
          "No published resistance is known for this size in %s. Choose a size of the tables or give"
                  .formatted(material.word())
              + " resistance_ohm_per_km instead.");
    }
  }

  private void checkLosses(DraftRow<Transformer> row) {
    Transformer t = row.content();
    if (t.loadLossW().isEmpty() || !row.sound("load_loss_w", "rated_kva", "impedance_percent")) {
      return;
    }
    double resistancePercent = t.loadLossW().getAsDouble() / (W_PER_KVA_PERCENT * t.ratedKva());
    if (resistancePercent > t.impedancePercent()) {
      remarks.error(
          row,
          "load_loss_w",
          ("The loss makes a resistance of %.4g %% on %.5g kVA, more than the impedance of %.4g %%."
                  + " Check the three figures of the rating plate.")
              .formatted(resistancePercent, t.ratedKva(), t.impedancePercent()));
    }
  }
}
