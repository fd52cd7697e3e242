package fourthwire.audit.judge;

import static fourthwire.quantity.Conductor.N;

import fourthwire.audit.DesignState.NeutralAdder;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.plan.Place;
import fourthwire.audit.solve.SiteSolution;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.SiteTree;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * What each child adds to a node's neutral: the projection of the sum of its line currents on the
 * neutral current, order by order. The parts sum to the neutral's rms exactly, whatever the angles.
 */
final class NeutralAdders {
  private NeutralAdders() {}

  static List<NeutralAdder> of(
      Place place, SiteTree tree, NetworkPlan plan, SiteSolution solution) {
    if (!place.node().hasNeutral()) {
      return List.of();
    }
    Spectrum neutral = solution.current(place.networkNode(), place.conductors(), N);
    double rms = neutral.rms();
    List<NeutralAdder> adders = new ArrayList<>();
    for (SiteTree.Node child : tree.children(place.name())) {
      if (child.hasNeutral() && child.kind() != SiteTree.Kind.TRANSFORMER && rms > 0) {
        Spectrum returned = sumOfLines(plan.get(child.name()), solution);
        adders.add(new NeutralAdder(child.name(), projection(returned, neutral) / rms));
      }
    }
    adders.sort(Comparator.comparingDouble(NeutralAdder::amps).reversed());
    return List.copyOf(adders);
  }

  private static Spectrum sumOfLines(Place child, SiteSolution solution) {
    return child.node().lines().stream()
        .map(line -> solution.current(child.networkNode(), child.conductors(), line))
        .reduce(Spectrum.ZERO, Spectrum::plus);
  }

  private static double projection(Spectrum part, Spectrum whole) {
    double sum = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      Phasor w = whole.at(h);
      sum += part.re(h) * w.re() + part.im(h) * w.im();
    }
    return sum;
  }
}
