package fourthwire.audit.plan;

import fourthwire.network.element.OrderLaw;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.site.Feeder;
import fourthwire.site.Feeder.Material;
import fourthwire.site.SiteSettings;
import fourthwire.site.conductor.ConductorData;
import fourthwire.site.conductor.ConductorSize;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * The impedance of a feeder from its columns: an override as it stands at every order, else
 * resistance and skin effect by the conductor's size, and a reactance in proportion to the order.
 *
 * <p>Source: the public contract, section 2, feeder columns. Empty neutral columns take the line's;
 * an override is of the whole feeder, a size of one of the parallel conductors.
 */
final class FeederPaths {
  private static final String ASSUMED_REACTANCE =
      "Feeder reactance taken as 0.08 Ω/km (common practice, no source).";
  private static final String NO_IMPEDANCE =
      "Neither size nor impedance of the feeder is known: it is taken to have none.";

  private final SiteSettings settings;

  /** One law object for conductors alike, so that the network evaluates it once an order. */
  private final Map<Double, OrderLaw> skinLaws = new HashMap<>();

  FeederPaths(SiteSettings settings) {
    this.settings = settings;
  }

  FeederPath of(Feeder feeder) {
    List<String> assumptions = new ArrayList<>();
    if (!feeder.hasImpedance()) {
      assumptions.add(NO_IMPEDANCE);
    } else if (feeder.resistanceOhmPerKm().isEmpty() && feeder.reactanceOhmPerKm().isEmpty()) {
      assumptions.add(ASSUMED_REACTANCE);
    }
    return new FeederPath(line(feeder), neutral(feeder), List.copyOf(assumptions));
  }

  private SeriesImpedance line(Feeder feeder) {
    OptionalDouble r = feeder.resistanceOhmPerKm();
    OptionalDouble x = feeder.reactanceOhmPerKm();
    if (r.isPresent() || x.isPresent()) {
      return override(feeder, r, x);
    }
    return feeder
        .conductorSize()
        .map(size -> ofSize(feeder, size, feeder.conductorsPerLine().orElse(1)))
        .orElse(SeriesImpedance.NONE);
  }

  private SeriesImpedance neutral(Feeder feeder) {
    OptionalDouble r = feeder.neutralResistanceOhmPerKm();
    OptionalDouble x = feeder.neutralReactanceOhmPerKm();
    if (r.isPresent() || x.isPresent()) {
      return override(
          feeder,
          r.isPresent() ? r : feeder.resistanceOhmPerKm(),
          x.isPresent() || r.isPresent() ? x : feeder.reactanceOhmPerKm());
    }
    int count = feeder.neutralConductors().orElse(1);
    if (feeder.neutralSize().isPresent()) {
      return ofSize(
          feeder, feeder.neutralSize().get(), feeder.conductorsPerLine().orElse(1) * count);
    }
    return line(feeder).times(1.0 / count);
  }

  private static SeriesImpedance override(Feeder feeder, OptionalDouble r, OptionalDouble x) {
    double km = feeder.lengthM().orElse(0) / 1000;
    return SeriesImpedance.of(r.orElse(0) * km, x.orElse(0) * km);
  }

  private SeriesImpedance ofSize(Feeder feeder, String sizeText, int parallel) {
    ConductorSize size =
        ConductorSize.find(sizeText)
            .orElseThrow(() -> new IllegalArgumentException("no conductor size " + sizeText));
    Material material = feeder.conductorMaterial().orElse(Material.COPPER);
    double perKm =
        ConductorData.dcOhmPerKm(size, material, settings.practice())
            .orElseThrow(
                () ->
                    new IllegalArgumentException(
                        "no resistance is printed for " + sizeText + " " + material.word()));
    double km = feeder.lengthM().orElse(0) / 1000 / parallel;
    double frequencyHz = settings.frequencyHz();
    return SeriesImpedance.of(
            perKm * ConductorData.skinRatio(perKm, frequencyHz) * km,
            ConductorData.DEFAULT_REACTANCE_OHM_PER_KM * km)
        .withResistanceLaw(skinLaws.computeIfAbsent(perKm, this::skinLaw));
  }

  private OrderLaw skinLaw(double dcOhmPerKm) {
    double frequencyHz = settings.frequencyHz();
    double atFundamental = ConductorData.skinRatio(dcOhmPerKm, frequencyHz);
    return order -> ConductorData.skinRatio(dcOhmPerKm, order * frequencyHz) / atFundamental;
  }
}
