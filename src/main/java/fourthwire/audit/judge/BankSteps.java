package fourthwire.audit.judge;

import fourthwire.audit.BankStep;
import fourthwire.audit.ImpedanceCurve;
import fourthwire.audit.plan.Compensation;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.plan.Place;
import fourthwire.audit.solve.Workers;
import fourthwire.quantity.Phasor;
import fourthwire.site.CapacitorBank;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

/**
 * The resonance of the network with each switched bank at each of its steps. The impedance at the
 * bank's panel is scanned once with the bank away, all others whole; each step then stands beside
 * it: Z·Zb/(Z + Zb) of the positive sequence (what unbalanced linear loads add between the
 * sequences is left out). Between the scan's orders Z is taken on a straight line.
 */
final class BankSteps {
  private static final int FINER = 20;

  private final Map<String, List<BankStep>> byPanel = new HashMap<>();

  BankSteps(
      Survey survey,
      Supply supply,
      SiteTree tree,
      List<Device> devices,
      NetworkPlan plan,
      Workers workers) {
    for (CapacitorBank bank : survey.capacitors()) {
      boolean switched = bank.steps().orElse(1) > 1;
      if (switched && plan.find(bank.panel()).filter(ImpedanceScan::hasSequences).isPresent()) {
        NetworkPlan away = NetworkPlan.of(without(survey, bank), supply, tree, devices, true);
        byPanel
            .computeIfAbsent(bank.panel(), p -> new ArrayList<>())
            .addAll(steps(bank, plan.get(bank.panel()), away, workers));
      }
    }
  }

  /** The steps of the switched banks at a panel. */
  List<BankStep> at(String panel) {
    return List.copyOf(byPanel.getOrDefault(panel, List.of()));
  }

  private static Survey without(Survey s, CapacitorBank bank) {
    return new Survey(
        s.settings(),
        s.supplies(),
        s.background(),
        s.transformers(),
        s.panels(),
        s.circuits(),
        s.loads(),
        s.spectra(),
        s.schedules(),
        s.capacitors().stream().filter(c -> c != bank).toList(),
        s.filters(),
        s.meters(),
        s.spotReadings());
  }

  private static List<BankStep> steps(
      CapacitorBank bank, Place place, NetworkPlan away, Workers workers) {
    int node = away.get(place.name()).networkNode();
    Phasor[] seen = new Phasor[ImpedanceCurve.POINTS];
    workers.each(
        seen.length,
        k ->
            seen[k] =
                away.network()
                    .factor(ImpedanceCurve.order(k))
                    .drivingPoint(node)
                    .positiveSequence());
    var whole = Compensation.bank(bank, place);
    int steps = bank.steps().orElse(1);
    List<BankStep> found = new ArrayList<>();
    for (int step = 1; step <= steps; step++) {
      var part = whole.times((double) step / steps);
      Curve curve = new Curve(seen, part);
      int in = step;
      curve
          .highest()
          .ifPresent(
              at ->
                  found.add(
                      new BankStep(
                          bank.name(),
                          in,
                          steps,
                          bank.kvar() * in / steps,
                          curve.order(at),
                          curve.ohm(at))));
    }
    return found;
  }

  /** The network beside some steps of a bank, finely. */
  private record Curve(Phasor[] seen, fourthwire.network.element.CapacitorBank bank) {
    double order(double point) {
      return ImpedanceCurve.FIRST_ORDER + point * ImpedanceCurve.STEP / FINER;
    }

    private Phasor network(int point) {
      int below = Math.min(point / FINER, seen.length - 2);
      double part = (double) point / FINER - below;
      return seen[below].times(1 - part).plus(seen[below + 1].times(part));
    }

    private double magnitude(int point) {
      Phasor z = network(point);
      Phasor b = bank.ohm(order(point));
      return z.times(b).over(z.plus(b)).magnitude();
    }

    /** The highest peak that stands above the network alone, between the points. */
    OptionalDouble highest() {
      int count = (seen.length - 1) * FINER + 1;
      double[] ohm = IntStream.range(0, count).mapToDouble(this::magnitude).toArray();
      int top = -1;
      for (int k : Peaks.maxima(count, p -> ohm[p])) {
        if (ohm[k] > network(k).magnitude() && (top < 0 || ohm[k] > ohm[top])) {
          top = k;
        }
      }
      return top < 0
          ? OptionalDouble.empty()
          : OptionalDouble.of(top + Peaks.vertex(ohm[top - 1], ohm[top], ohm[top + 1]).steps());
    }

    double ohm(double point) {
      int middle = (int) Math.rint(point);
      return Peaks.vertex(magnitude(middle - 1), magnitude(middle), magnitude(middle + 1)).ohm();
    }
  }
}
