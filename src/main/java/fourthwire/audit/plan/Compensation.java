package fourthwire.audit.plan;

import static fourthwire.quantity.Conductor.L1;
import static fourthwire.quantity.Conductor.L2;
import static fourthwire.quantity.Conductor.L3;
import static fourthwire.quantity.Conductor.N;

import fourthwire.network.NetworkBuilder;
import fourthwire.network.element.OrderAdmittance;
import fourthwire.network.element.SequenceAdmittance;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.Shunt;
import fourthwire.site.CapacitorBank;
import fourthwire.site.Filter;
import fourthwire.site.Survey;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * Capacitor banks and passive filters as admittances, all steps in.
 *
 * <p>Per leg of an isolated star: X_C = V²/Q of the capacitors alone at their rated voltage; a
 * detuned bank's reactor is X_L = p·X_C, a tuned filter's X_L = X_C/n². A zero-sequence filter is
 * open to the other sequences. Source: {@code reference formulas}, lossless fundamentals (for
 * example IEEE 1531-2003; from memory).
 */
public final class Compensation {
  /** Quality factor of a tuned filter where not known; common practice, no source. */
  private static final double DEFAULT_FILTER_QUALITY = 50;

  private final Survey survey;
  private final Map<String, Place> places;

  public Compensation(Survey survey, Map<String, Place> places) {
    this.survey = survey;
    this.places = places;
  }

  /** Adds every supplied bank and passive filter. */
  public void addTo(NetworkBuilder builder) {
    for (CapacitorBank bank : survey.capacitors()) {
      Place place = places.get(bank.panel());
      if (place != null) {
        builder.shunt(
            place.networkNode(),
            threeLegs(place, SequenceAdmittance.isolatedStar(leg(bank, place))));
      }
    }
    for (Filter filter : survey.filters()) {
      Place place = places.get(filter.panel());
      if (place != null && filter.type() != Filter.Type.ACTIVE) {
        builder.shunt(place.networkNode(), passive(filter, place));
      }
    }
  }

  private static Shunt threeLegs(Place place, SequenceAdmittance admittance) {
    Numbering number = place.conductors();
    return new Shunt.ThreeTerminal(
        number.of(L1),
        number.of(L2),
        number.of(L3),
        number.has(N) ? number.of(N) : Shunt.EARTH,
        admittance);
  }

  /** One leg of a bank between a line and the isolated star point. */
  public static OrderAdmittance leg(CapacitorBank bank, Place place) {
    double capacitive = capacitiveOhm(bank.kvar(), bank.ratedV(), place);
    double inductive = capacitive * bank.detuningPercent().orElse(0) / 100;
    double resistance =
        bank.qualityFactor().isPresent() ? inductive / bank.qualityFactor().getAsDouble() : 0;
    return OrderAdmittance.ofSeriesCapacitor(resistance, inductive, capacitive);
  }

  private static Shunt passive(Filter filter, Place place) {
    if (filter.type() == Filter.Type.ZERO_SEQUENCE) {
      double base =
          filter.ratedV().orElse(place.node().nominalV())
              / (Math.sqrt(3) * filter.ratedA().orElseThrow());
      double ohm = base * filter.impedancePercent().orElseThrow() / 100;
      return threeLegs(
          place,
          SequenceAdmittance.zeroSequenceOnly(
              OrderAdmittance.ofSeries(SeriesImpedance.of(0, ohm))));
    }
    double capacitive = capacitiveOhm(filter.kvar().orElseThrow(), filter.ratedV(), place);
    double order = filter.tunedOrder().orElseThrow();
    double inductive = capacitive / (order * order);
    double quality = filter.qualityFactor().orElse(DEFAULT_FILTER_QUALITY);
    return threeLegs(
        place,
        SequenceAdmittance.isolatedStar(
            OrderAdmittance.ofSeriesCapacitor(order * inductive / quality, inductive, capacitive)));
  }

  private static double capacitiveOhm(double kvar, OptionalDouble ratedV, Place place) {
    double volts = ratedV.orElse(place.node().nominalV());
    return volts * volts / (1000 * kvar);
  }
}
