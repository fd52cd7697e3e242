package fourthwire.audit.judge;

import fourthwire.audit.DesignState;
import fourthwire.audit.DesignState.PrimaryState;
import fourthwire.audit.DesignState.TransformerState;
import fourthwire.audit.MeasuredState;
import fourthwire.audit.NodeResult;
import fourthwire.audit.judge.NodeCurrents.Demand;
import fourthwire.audit.plan.Place;
import fourthwire.audit.plan.TransformerPlate;
import fourthwire.limits.Finding;
import fourthwire.limits.loading.TransformerLoading;
import fourthwire.network.element.TransformerImpedance;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.HarmonicLoss;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.SymmetricalComponents;
import fourthwire.site.VectorGroup;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Puts one node's result together from the solution. */
public final class NodeReport {
  private static final Figure NOT_THREE_LINES = Figure.unknown("needs three lines");

  private final AuditContext context;
  private final Place place;
  private final Map<Conductor, Spectrum> currents;
  private final NodeVoltages voltages;
  private final NodeFindings findings;

  public NodeReport(AuditContext context, Place place) {
    this.context = context;
    this.place = place;
    this.currents =
        NodeCurrents.spectra(context.solution(), place.networkNode(), place.conductors());
    this.voltages = NodeVoltages.of(context.solution(), place);
    this.findings = new NodeFindings(context, place, currents, voltages);
  }

  /** The node's result. */
  public NodeResult result(List<MeasuredState> measured) {
    DesignState state = designState();
    List<Finding> found = findings.all(state);
    List<String> assumptions = new ArrayList<>(place.feeder().assumptions());
    place.transformer().ifPresent(t -> assumptions.addAll(t.plate().assumptions()));
    return new NodeResult(
        place.name(),
        place.node().kind(),
        place.node().parent(),
        context.supply().name(),
        Optional.of(state),
        "",
        measured,
        found,
        List.copyOf(assumptions));
  }

  private DesignState designState() {
    Demand demand = NodeFindings.demand(context, place, currents);
    NodePower power = NodePower.of(voltages, currents);
    List<Spectrum> lines = place.node().lines().stream().map(currents::get).toList();
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
        harmonicLossFactor(lines),
        Figure.of(lossesW()),
        sequences(lines).map(SymmetricalComponents::negativePercent).orElse(NOT_THREE_LINES),
        sequences(lines).map(SymmetricalComponents::zeroPercent).orElse(NOT_THREE_LINES),
        sequences(voltages.list())
            .map(SymmetricalComponents::negativePercent)
            .orElse(NOT_THREE_LINES),
        context.scan().at(place.name()),
        NeutralAdders.of(place, context.tree(), context.plan(), context.solution()));
  }

  private static Optional<SymmetricalComponents> sequences(List<Spectrum> three) {
    return three.size() == 3 ? Optional.of(SymmetricalComponents.of(three)) : Optional.empty();
  }

  private static Figure harmonicLossFactor(List<Spectrum> lines) {
    return lines.stream()
        .max(Comparator.comparingDouble(Spectrum::rms))
        .map(HarmonicLoss::harmonicLossFactor)
        .orElse(Figure.unknown("no lines"));
  }

  private TransformerState transformerState() {
    TransformerLoading loading = findings.transformer();
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

  /** Of the feeder, and of a transformer its windings. */
  private double lossesW() {
    if (place.transformer().isEmpty()) {
      return feederLossW(currents);
    }
    Place.TransformerPlace t = place.transformer().get();
    return feederLossW(NodeCurrents.spectra(context.solution(), t.networkNode(), t.conductors()))
        + windingLossW(t.plate());
  }

  /**
   * Of a neutral, the node's part: its returned current in step with what the neutral carries. That
   * is all of it, except where circuits share a neutral; their parts then sum to its heat.
   */
  private double feederLossW(Map<Conductor, Spectrum> spectra) {
    Spectrum neutral = spectra.getOrDefault(Conductor.N, Spectrum.ZERO);
    double watts = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      double lineSquare = 0;
      Phasor returned = Phasor.ZERO;
      for (Map.Entry<Conductor, Spectrum> e : spectra.entrySet()) {
        if (e.getKey().isLine()) {
          lineSquare += e.getValue().magnitude(h) * e.getValue().magnitude(h);
          returned = returned.plus(e.getValue().at(h));
        }
      }
      double neutralSquare = returned.times(neutral.at(h).conjugate()).re();
      watts += place.feeder().lossW(h, lineSquare, neutralSquare);
    }
    return watts;
  }

  /** Σ R(h)·I², the zero sequence on its own resistance; a centre-tapped half has half of it. */
  private double windingLossW(TransformerPlate plate) {
    TransformerImpedance z = plate.impedance();
    VectorGroup group = plate.plate().connection();
    List<Spectrum> lines = place.node().lines().stream().map(currents::get).toList();
    double watts = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      double square = 0;
      Phasor sum = Phasor.ZERO;
      for (Spectrum line : lines) {
        square += line.magnitude(h) * line.magnitude(h);
        sum = sum.plus(line.at(h));
      }
      if (group.isSinglePhase()) {
        watts += z.at(h).re() * square * (group.isSplitPhase() ? 0.5 : 1);
      } else {
        double zeroSquare = sum.magnitude() * sum.magnitude() / 3;
        watts += z.at(h).re() * (square - zeroSquare) + z.zeroSequenceAt(h).re() * zeroSquare;
      }
    }
    return watts;
  }
}
