package fourthwire.audit.plan;

import fourthwire.load.LoadRequest.Rating;
import fourthwire.load.Preset;
import fourthwire.load.Presets;
import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What one unit of a load row is: its kind and model columns, a preset's where the row names one
 * and leaves a column empty.
 *
 * @param kind the load kind
 * @param rating the row's rating
 * @param displacementFactor the row's, else the preset's
 * @param row the model columns of the row
 * @param preset the preset it names
 */
record Equipment(
    LoadKind kind,
    Rating rating,
    OptionalDouble displacementFactor,
    ModelColumns row,
    Optional<Preset> preset) {

  static Equipment of(Load load) {
    Optional<Preset> preset = load.preset().flatMap(Presets::find);
    LoadKind kind = load.kind().or(() -> preset.map(Preset::kind)).orElse(LoadKind.MEASURED);
    OptionalDouble displacement =
        load.displacementFactor().isPresent()
            ? load.displacementFactor()
            : preset.map(Preset::displacementFactor).orElse(OptionalDouble.empty());
    return new Equipment(kind, rating(load), displacement, load.columns(), preset);
  }

  /**
   * The model columns of one unit.
   *
   * @param portV nominal voltage of its port (line to line on three lines)
   * @param shares how many ports a unit is spread over
   */
  ModelColumns columns(double portV, int shares) {
    return preset.map(p -> row.orElse(p.columns(roughW(portV) / shares, portV))).orElse(row);
  }

  /** About how many watts a unit draws, for what a preset sizes by its power. */
  private double roughW(double portV) {
    if (rating instanceof Rating.Watts watts) {
      return watts.w();
    }
    if (rating instanceof Rating.VoltAmperes va) {
      return va.va();
    }
    double lines = kind.family() == LoadKind.Family.THREE_PHASE ? Math.sqrt(3) : 1;
    return ((Rating.Amps) rating).a() * portV * lines;
  }

  private static Rating rating(Load load) {
    if (load.ratedW().isPresent()) {
      return new Rating.Watts(load.ratedW().getAsDouble());
    }
    if (load.ratedVa().isPresent()) {
      return new Rating.VoltAmperes(load.ratedVa().getAsDouble());
    }
    return new Rating.Amps(load.ratedA().orElseThrow());
  }
}
