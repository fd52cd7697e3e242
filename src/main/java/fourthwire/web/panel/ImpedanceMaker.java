package fourthwire.web.panel;

import fourthwire.audit.BankStep;
import fourthwire.audit.DesignState;
import fourthwire.audit.ImpedanceCurve;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import fourthwire.web.figure.ImpedancePlot;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Makes the picture of a node's impedance over what would excite it, and the steps of its banks.
 */
final class ImpedanceMaker {
  private final Words words;
  private final NodeCase node;
  private final DesignState design;

  ImpedanceMaker(Words words, NodeCase node, DesignState design) {
    this.words = words;
    this.node = node;
    this.design = design;
  }

  StatesView.Impedance make(ImpedanceCurve curve) {
    List<Double> amps =
        IntStream.rangeClosed(2, Spectrum.HIGHEST_ORDER).mapToObj(this::largest).toList();
    List<Double> peaks =
        design.resonances().stream()
            .filter(r -> !r.series())
            .map(DesignState.Resonance::order)
            .toList();
    double most = amps.stream().mapToDouble(Double::doubleValue).max().orElse(0);
    String svg =
        ImpedancePlot.draw(
            new ImpedancePlot.Curve(
                ImpedanceCurve.POINTS, ImpedanceCurve::order, curve::ohm, amps, peaks),
            Numbers::ordinal,
            words.of("impedance.alternative", node.node().node()));
    return new StatesView.Impedance(
        svg,
        words.of(
            peaks.isEmpty() ? "impedance.caption" : "impedance.caption.peaks",
            Numbers.of(most, "A")),
        steps());
  }

  private double largest(int order) {
    return design.currentSpectrum().entrySet().stream()
        .filter(e -> e.getKey().isLine())
        .mapToDouble(e -> e.getValue().magnitude(order))
        .max()
        .orElse(0);
  }

  private Optional<NodePage.Grid> steps() {
    List<BankStep> steps = node.node().bankSteps();
    if (steps.isEmpty()) {
      return Optional.empty();
    }
    Grids grid =
        new Grids(
            words,
            words.of("steps-of-bank.title"),
            List.of(
                words.of("steps-of-bank.in"),
                words.of("steps-of-bank.kvar"),
                words.of("steps-of-bank.order"),
                words.of("steps-of-bank.ohm"),
                words.of("steps-of-bank.beside")));
    for (BankStep s : steps) {
      double flowing = largest((int) Math.rint(s.order()));
      grid.row(
          words.of("steps-of-bank.row", s.bank(), s.step(), s.steps()),
          List.of(
              Figure.of(s.kvar()), Figure.of(s.order()), Figure.of(s.ohm()), Figure.of(flowing)));
    }
    return Optional.of(grid.done());
  }
}
