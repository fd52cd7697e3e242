package fourthwire.audit.plan;

import fourthwire.load.LoadRequest.Rating;
import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;

/**
 * What one unit of a load row is: its kind and model columns, a preset's where the row names one.
 *
 * @param kind the load kind
 * @param columns the row's model columns over the preset's
 * @param rating the row's rating
 */
record Equipment(LoadKind kind, ModelColumns columns, Rating rating) {
  static Equipment of(Load load) {
    LoadKind kind = load.kind().orElse(LoadKind.MEASURED);
    return new Equipment(kind, load.columns(), rating(load));
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
