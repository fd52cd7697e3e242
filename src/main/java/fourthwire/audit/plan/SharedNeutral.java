package fourthwire.audit.plan;

import fourthwire.site.Circuit;
import fourthwire.site.Feeder;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;

/**
 * The one neutral of circuits that share it: its columns stand on one row or alike on all, its
 * length is the longest (public contract, section 2).
 */
public final class SharedNeutral {
  private SharedNeutral() {}

  /**
   * A feeder whose neutral is the shared one: the row that says most of it, at the longest length.
   */
  public static Feeder feeder(List<Circuit> group) {
    Feeder f =
        group.stream()
            .map(Circuit::feeder)
            .max(Comparator.comparingInt(SharedNeutral::neutralColumns))
            .orElseThrow();
    OptionalDouble length =
        group.stream()
            .map(c -> c.feeder().lengthM())
            .filter(OptionalDouble::isPresent)
            .mapToDouble(OptionalDouble::getAsDouble)
            .max();
    return new Feeder(
        length,
        f.conductorSize(),
        f.conductorMaterial(),
        f.conductorsPerLine(),
        f.neutralSize(),
        f.neutralConductors(),
        f.insulation(),
        f.installation(),
        f.ambientC(),
        f.groupingFactor(),
        f.ampacityA(),
        f.neutralAmpacityA(),
        f.resistanceOhmPerKm(),
        f.reactanceOhmPerKm(),
        f.neutralResistanceOhmPerKm(),
        f.neutralReactanceOhmPerKm());
  }

  private static int neutralColumns(Feeder f) {
    int known = 0;
    known += f.neutralSize().isPresent() ? 2 : 0;
    known += f.neutralConductors().isPresent() ? 2 : 0;
    known += f.neutralAmpacityA().isPresent() ? 2 : 0;
    known += f.neutralResistanceOhmPerKm().isPresent() ? 2 : 0;
    known += f.neutralReactanceOhmPerKm().isPresent() ? 2 : 0;
    return known + (f.hasImpedance() ? 1 : 0);
  }
}
