package fourthwire.audit.judge;

import fourthwire.audit.DesignState;
import fourthwire.audit.DesignState.PrimaryState;
import fourthwire.audit.DesignState.TransformerState;
import fourthwire.audit.MeasuredState;
import fourthwire.audit.NodeResult;
import fourthwire.audit.judge.NodeCurrents.Demand;
import fourthwire.audit.plan.Place;
import fourthwire.limits.loading.TransformerLoading;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.SymmetricalComponents;
import fourthwire.site.SiteTree;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Puts one node's result together from the solution. */
public final class NodeReport {
  static final Figure NOT_THREE_LINES = Figure.unknown("needs three lines");

  private final AuditContext context;
  private final Place place;
  private final NodeFigures figures;

  public NodeReport(AuditContext context, Place place) {
    this.context = context;
    this.place = place;
    this.figures = new NodeFigures(context, place);
  }

  /** The node's result. */
  public NodeResult result(List<MeasuredState> measured) {
    List<String> assumptions = new ArrayList<>(place.feeder().assumptions());
    place.transformer().ifPresent(t -> assumptions.addAll(t.plate().assumptions()));
    assumptions.addAll(context.solution().remarks(place.name()));
    for (SiteTree.Node circuit : context.tree().children(place.name())) {
      assumptions.addAll(context.solution().remarks(circuit.name()));
    }
    return bare(measured, assumptions)
        .withImpedance(context.scan().curve(place.name()), context.bankSteps().at(place.name()));
  }

  private NodeResult bare(List<MeasuredState> measured, List<String> assumptions) {
    return new NodeResult(
        place.name(),
        place.node().kind(),
        place.node().parent(),
        context.supply().name(),
        Optional.of(designState()),
        "",
        measured,
        figures.findings(),
        List.copyOf(assumptions));
  }

  private DesignState designState() {
    Map<Conductor, Spectrum> currents = figures.currents();
    NodeVoltages voltages = figures.voltages();
    Demand demand = context.demand(place);
    NodePower power = figures.power();
    List<Spectrum> lines = figures.lines();
    return new DesignState(
        NodeCurrents.lines(currents, context.ampacities().lines(place), demand),
        NodeCurrents.neutral(currents, context.ampacities().neutral(place)),
        voltages.figures(),
        voltages.neutralToEarthV(),
        currents,
        voltages.spectra(),
        power.whole(),
        power.basis(),
        power.byLine(),
        demand.amps(),
        demand.basis(),
        context.faults().amps(place.name()),
        place.transformer().map(t -> transformerState()),
        place.transformer().map(this::primaryState),
        figures.harmonicLossFactor(),
        Figure.of(figures.losses().wholeW()),
        sequences(lines).map(SymmetricalComponents::negativePercent).orElse(NOT_THREE_LINES),
        sequences(lines).map(SymmetricalComponents::zeroPercent).orElse(NOT_THREE_LINES),
        voltages.unbalancePercent(),
        context.scan().at(place.name()),
        NeutralAdders.of(place, context.tree(), context.plan(), context.solution()));
  }

  private static Optional<SymmetricalComponents> sequences(List<Spectrum> three) {
    return three.size() == 3 ? Optional.of(SymmetricalComponents.of(three)) : Optional.empty();
  }

  private TransformerState transformerState() {
    TransformerLoading loading = figures.transformer();
    return new TransformerState(
        loading.loadingPercent(), loading.kFactor(), loading.deratedKva(), loading.factorK());
  }

  private PrimaryState primaryState(Place.TransformerPlace primary) {
    Map<Conductor, Spectrum> spectra =
        NodeCurrents.spectra(context.solution(), primary.networkNode(), primary.conductors());
    Demand none = new Demand(Figure.unknown("TDD is given at the secondary"), "");
    return new PrimaryState(
        NodeCurrents.lines(spectra, context.ampacities().primaryLines(place), none),
        NodeCurrents.neutral(spectra, Ampacities.Path.NONE),
        spectra);
  }
}
