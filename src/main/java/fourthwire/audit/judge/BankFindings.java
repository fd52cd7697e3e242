package fourthwire.audit.judge;

import fourthwire.audit.plan.Compensation;
import fourthwire.audit.plan.Place;
import fourthwire.audit.solve.SiteSolution;
import fourthwire.limits.Check;
import fourthwire.limits.loading.CapacitorLoading;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.CapacitorBank;
import fourthwire.site.Practice;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Capacitor banks held against what capacitors bear: current, voltage and reactive power. */
final class BankFindings {
  private final Survey survey;
  private final SiteSolution solution;

  BankFindings(Survey survey, SiteSolution solution) {
    this.survey = survey;
    this.solution = solution;
  }

  /** Of the banks at a panel. */
  List<Check> at(Place place) {
    List<Check> checks = new ArrayList<>();
    for (CapacitorBank bank : survey.capacitors()) {
      if (bank.panel().equals(place.name())) {
        checks.addAll(CapacitorLoading.checks(worstPhase(bank, place), standard()));
      }
    }
    return checks;
  }

  private CapacitorLoading.Standard standard() {
    return survey.settings().practice() == Practice.IEC
        ? CapacitorLoading.Standard.IEC_60831
        : CapacitorLoading.Standard.IEEE_18;
  }

  private CapacitorLoading.Phase worstPhase(CapacitorBank bank, Place place) {
    List<Spectrum> legs = legVoltages(place);
    return legs.stream()
        .map(v -> phase(bank, place, v))
        .max(Comparator.comparingDouble(phase -> phase.current().rms()))
        .orElseThrow();
  }

  /** Line to the isolated star point, which stands at the mean of the lines. */
  private List<Spectrum> legVoltages(Place place) {
    List<Spectrum> lines = new ArrayList<>();
    for (Conductor line : place.node().lines()) {
      lines.add(solution.potential(place.networkNode(), place.conductors().of(line)));
    }
    Spectrum star = lines.stream().reduce(Spectrum.ZERO, Spectrum::plus).times(1.0 / lines.size());
    return lines.stream().map(v -> v.minus(star)).toList();
  }

  private static CapacitorLoading.Phase phase(CapacitorBank bank, Place place, Spectrum leg) {
    fourthwire.network.element.CapacitorBank element = Compensation.bank(bank, place);
    double ratedV = bank.ratedV().orElse(place.node().nominalV()) / Math.sqrt(3);
    double ratedVar = 1000 * bank.kvar() / 3;
    Spectrum current = Spectrum.of(h -> leg.at(h).over(element.ohm(h)));
    Spectrum across =
        Spectrum.of(h -> current.at(h).times(new Phasor(0, -element.capacitiveOhm() / h)));
    return new CapacitorLoading.Phase(bank.name(), current, across, ratedV, ratedVar);
  }
}
