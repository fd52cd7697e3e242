package fourthwire.audit.judge;

import static fourthwire.quantity.Conductor.N;

import fourthwire.audit.DesignState.LineVoltage;
import fourthwire.audit.plan.Place;
import fourthwire.audit.solve.SiteSolution;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.SymmetricalComponents;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The voltages of one node: lines to the node's own neutral, or where there is none line to line.
 *
 * @param spectra by line, {@code L1}, or by pair, {@code L1-L2}
 * @param nominalV what each is nominally, volts
 * @param neutralToEarthV rms, unknown without a neutral
 */
record NodeVoltages(Map<String, Spectrum> spectra, double nominalV, Figure neutralToEarthV) {

  static NodeVoltages of(SiteSolution solution, Place place) {
    List<Conductor> lines = place.node().lines();
    Map<String, Spectrum> spectra = new LinkedHashMap<>();
    if (place.node().hasNeutral()) {
      Spectrum neutral = potential(solution, place, N);
      lines.forEach(
          line -> spectra.put(line.name(), potential(solution, place, line).minus(neutral)));
      return new NodeVoltages(spectra, place.node().lineToNeutralV(), Figure.of(neutral.rms()));
    }
    int pairs = lines.size() == 2 ? 1 : lines.size();
    for (int k = 0; k < pairs; k++) {
      Conductor line = lines.get(k);
      Conductor next = lines.get((k + 1) % lines.size());
      spectra.put(
          line + "-" + next,
          potential(solution, place, line).minus(potential(solution, place, next)));
    }
    return new NodeVoltages(
        spectra, place.node().nominalV(), Figure.unknown("no neutral conductor here"));
  }

  private static Spectrum potential(SiteSolution solution, Place place, Conductor conductor) {
    return solution.potential(place.networkNode(), place.conductors().of(conductor));
  }

  boolean toNeutral() {
    return neutralToEarthV.value().isPresent();
  }

  /** |V2|/|V1| at the fundamental. */
  Figure unbalancePercent() {
    return spectra.size() == 3
        ? SymmetricalComponents.of(list()).negativePercent()
        : NodeReport.NOT_THREE_LINES;
  }

  List<Spectrum> list() {
    return List.copyOf(spectra.values());
  }

  Map<String, LineVoltage> figures() {
    Map<String, LineVoltage> figures = new LinkedHashMap<>();
    spectra.forEach(
        (name, v) ->
            figures.put(
                name,
                new LineVoltage(
                    Figure.of(v.rms()),
                    Figure.of(v.magnitude(1)),
                    Distortion.thdPercent(v),
                    Figure.of(100 * (nominalV - v.magnitude(1)) / nominalV))));
    return figures;
  }
}
