package fourthwire.audit.plan;

import static fourthwire.quantity.Conductor.N;

import fourthwire.network.NetworkBuilder;
import fourthwire.network.element.CapacitorBank;
import fourthwire.network.element.OrderAdmittance;
import fourthwire.network.element.SequenceAdmittance;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.Shunt;
import fourthwire.site.Filter;
import fourthwire.site.Survey;
import java.util.Map;

/**
 * Capacitor banks and passive filters as admittances, all steps in. A zero-sequence filter is a
 * reactance on its own rating, open to the other sequences.
 */
public final class Compensation {
  /** Quality factor of a tuned filter where not known; common practice, no source. */
  private static final double DEFAULT_FILTER_QUALITY = 50;

  private final Survey survey;
  private final Map<String, Place> places;

  /** Of these places, by name. */
  Compensation(Survey survey, Map<String, Place> places) {
    this.survey = survey;
    this.places = places;
  }

  /** Adds every supplied bank and passive filter. */
  void addTo(NetworkBuilder builder) {
    for (fourthwire.site.CapacitorBank bank : survey.capacitors()) {
      Place place = places.get(bank.panel());
      if (place != null) {
        builder.shunt(place.networkNode(), bank(bank, place).shunt());
      }
    }
    for (Filter filter : survey.filters()) {
      Place place = places.get(filter.panel());
      if (place != null && filter.type() != Filter.Type.ACTIVE) {
        builder.shunt(place.networkNode(), passive(filter, place));
      }
    }
  }

  /** A surveyed bank at its panel. */
  public static CapacitorBank bank(fourthwire.site.CapacitorBank bank, Place place) {
    return CapacitorBank.detuned(
        bank.kvar(),
        bank.ratedV().orElse(place.node().nominalV()),
        bank.detuningPercent().orElse(0),
        bank.qualityFactor());
  }

  private static Shunt passive(Filter filter, Place place) {
    double volts = filter.ratedV().orElse(place.node().nominalV());
    if (filter.type() == Filter.Type.TUNED) {
      return CapacitorBank.tuned(
              filter.kvar().orElseThrow(),
              volts,
              filter.tunedOrder().orElseThrow(),
              filter.qualityFactor().orElse(DEFAULT_FILTER_QUALITY))
          .shunt();
    }
    double baseOhm = volts / (Math.sqrt(3) * filter.ratedA().orElseThrow());
    double ohm = baseOhm * filter.impedancePercent().orElseThrow() / 100;
    return Shunt.threeLines(
        place.conductors().has(N) ? place.conductors().of(N) : Shunt.EARTH,
        SequenceAdmittance.zeroSequenceOnly(OrderAdmittance.ofSeries(SeriesImpedance.of(0, ohm))));
  }
}
