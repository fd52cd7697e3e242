package fourthwire.audit.judge;

import static fourthwire.quantity.Conductor.N;

import fourthwire.audit.DesignState.LineCurrent;
import fourthwire.audit.DesignState.NeutralCurrent;
import fourthwire.audit.plan.Numbering;
import fourthwire.audit.solve.SiteSolution;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/** The currents of one node as figures. */
final class NodeCurrents {
  private static final Figure NO_NEUTRAL = Figure.unknown("no neutral conductor here");

  private NodeCurrents() {}

  /** Lines against their ampacity and the demand current. */
  static Map<Conductor, LineCurrent> lines(
      Map<Conductor, Spectrum> spectra, Ampacities.Path path, Demand demand) {
    Map<Conductor, LineCurrent> lines = new LinkedHashMap<>();
    spectra.forEach(
        (conductor, spectrum) -> {
          if (conductor.isLine()) {
            Figure ampacity = path.ampacityA();
            lines.put(
                conductor,
                new LineCurrent(
                    Figure.of(spectrum.rms()),
                    Figure.of(spectrum.magnitude(1)),
                    Distortion.thdPercent(spectrum),
                    demand.tddPercent(spectrum),
                    ampacity.map(a -> 100 * spectrum.rms() / a),
                    ampacity,
                    path.name()));
          }
        });
    return lines;
  }

  /** The neutral against its ampacity and the lines' mean. */
  static NeutralCurrent neutral(Map<Conductor, Spectrum> spectra, Ampacities.Path path) {
    Spectrum neutral = spectra.get(N);
    if (neutral == null) {
      return new NeutralCurrent(NO_NEUTRAL, NO_NEUTRAL, NO_NEUTRAL, NO_NEUTRAL, "");
    }
    double rms = neutral.rms();
    double mean =
        spectra.entrySet().stream()
            .filter(e -> e.getKey().isLine())
            .mapToDouble(e -> e.getValue().rms())
            .average()
            .orElse(0);
    Figure ampacity = path.ampacityA();
    return new NeutralCurrent(
        Figure.of(rms),
        mean > 0 ? Figure.of(100 * rms / mean) : Figure.unknown("no line carries current"),
        ampacity.map(a -> 100 * rms / a),
        ampacity,
        path.name());
  }

  /** The spectra of some conductors of a network node. */
  static Map<Conductor, Spectrum> spectra(
      SiteSolution solution, int networkNode, Numbering conductors) {
    Map<Conductor, Spectrum> spectra = new EnumMap<>(Conductor.class);
    conductors
        .conductors()
        .forEach(c -> spectra.put(c, solution.current(networkNode, conductors, c)));
    return spectra;
  }

  /**
   * The demand current I_L that TDD stands on.
   *
   * @param amps I_L, or why there is none
   * @param basis where it comes from, one sentence
   */
  record Demand(Figure amps, String basis) {
    Figure tddPercent(Spectrum line) {
      Optional<Double> demand = amps.value().stream().boxed().findFirst();
      return demand.map(a -> Distortion.tddPercent(line, a)).orElse(Figure.unknown(amps.reason()));
    }
  }
}
