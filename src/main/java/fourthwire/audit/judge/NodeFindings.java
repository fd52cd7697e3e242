package fourthwire.audit.judge;

import fourthwire.audit.DesignState;
import fourthwire.audit.judge.NodeCurrents.Demand;
import fourthwire.audit.plan.Place;
import fourthwire.audit.plan.TransformerPlate;
import fourthwire.limits.Finding;
import fourthwire.limits.distortion.AssessmentPoint;
import fourthwire.limits.distortion.CurrentDistortion519;
import fourthwire.limits.distortion.Edition519;
import fourthwire.limits.distortion.ResonanceCheck;
import fourthwire.limits.distortion.VoltageDistortion;
import fourthwire.limits.distortion.VoltageQuality;
import fourthwire.limits.loading.AmpacityRule;
import fourthwire.limits.loading.NeutralCase;
import fourthwire.limits.loading.NeutralLoading;
import fourthwire.limits.loading.TransformerCase;
import fourthwire.limits.loading.TransformerLoading;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Practice;
import fourthwire.site.SiteTree;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Holds one node's figures against the limits that its site's practice leads with. Distortion is
 * judged at boards, transformers and supplies; at a single circuit its limits mean nothing.
 */
final class NodeFindings {
  /** IEC 61000-2-4 class of a plant with mixed loads. */
  private static final int PLANT_CLASS = 2;

  private final AuditContext context;
  private final Place place;
  private final Map<Conductor, Spectrum> currents;
  private final NodeVoltages voltages;

  NodeFindings(
      AuditContext context, Place place, Map<Conductor, Spectrum> currents, NodeVoltages voltages) {
    this.context = context;
    this.place = place;
    this.currents = currents;
    this.voltages = voltages;
  }

  /** All findings, worst first. */
  List<Finding> all(DesignState state) {
    List<Finding> findings = new ArrayList<>(loading());
    if (place.node().kind() != SiteTree.Kind.CIRCUIT) {
      findings.addAll(currentDistortion(state));
      findings.addAll(voltageDistortion());
      findings.addAll(VoltageQuality.unbalance(state.voltageUnbalancePercent()));
      motorVoltage().ifPresent(findings::add);
      findings.addAll(context.banks().at(place));
      findings.addAll(resonances(state));
    }
    findings.addAll(context.sharedNeutrals().at(place.name()));
    findings.sort(Comparator.comparing(Finding::severity));
    return List.copyOf(findings);
  }

  private List<Finding> loading() {
    if (place.transformer().isPresent()) {
      List<Finding> findings = new ArrayList<>(transformer().findings());
      findings.addAll(primaryFeeder().findings());
      return findings;
    }
    if (place.node().kind() == SiteTree.Kind.SUPPLY) {
      return List.of();
    }
    return ampacity(
            lines(currents),
            Optional.ofNullable(currents.get(Conductor.N)),
            context.ampacities().lines(place),
            context.ampacities().neutral(place))
        .findings();
  }

  /** A transformer's loading by the published methods. */
  TransformerLoading transformer() {
    TransformerPlate plate = place.transformer().orElseThrow().plate();
    return TransformerLoading.of(
        new TransformerCase(
            plate.plate().ratedKva(),
            plate.ratedSecondaryA(),
            List.copyOf(lines(currents).values()),
            plate.eddyLossPu(),
            plate.plate().kRating()));
  }

  private NeutralLoading primaryFeeder() {
    Place.TransformerPlace primary = place.transformer().orElseThrow();
    Map<Conductor, Spectrum> spectra =
        NodeCurrents.spectra(context.solution(), primary.networkNode(), primary.conductors());
    return ampacity(
        lines(spectra),
        Optional.ofNullable(spectra.get(Conductor.N)),
        context.ampacities().primaryLines(place),
        Ampacities.Path.NONE);
  }

  private NeutralLoading ampacity(
      Map<Conductor, Spectrum> lines,
      Optional<Spectrum> neutral,
      Ampacities.Path linePath,
      Ampacities.Path neutralPath) {
    AmpacityRule rule =
        context.practice() == Practice.IEC
            ? AmpacityRule.THIRD_HARMONIC_CONTENT
            : AmpacityRule.CURRENT_CARRYING_COUNT;
    return NeutralLoading.of(
        new NeutralCase(
            rule,
            lines,
            neutral,
            linePath.ratings(),
            neutralPath.ratings(),
            context.nonlinear().at(place.name()),
            place.node().section() == SiteTree.Section.THREE_PHASE));
  }

  private List<Finding> currentDistortion(DesignState state) {
    Optional<Double> demand = known(state.demandA());
    Optional<Double> fault = known(state.shortCircuitA());
    if (demand.isEmpty() || fault.isEmpty() || demand.get() <= 0) {
      return List.of();
    }
    return CurrentDistortion519.of(
            Edition519.IEEE_519_2022, place.node().nominalV(), fault.get(), demand.get())
        .judge(lines(currents), demand.get(), where());
  }

  private List<Finding> voltageDistortion() {
    List<Finding> findings =
        new ArrayList<>(
            VoltageDistortion.ieee519(Edition519.IEEE_519_2022, place.node().nominalV())
                .judge(voltages.spectra(), where()));
    if (context.practice() == Practice.IEC) {
      findings.addAll(
          VoltageDistortion.iec61000x2x4(PLANT_CLASS).judge(voltages.spectra(), where()));
    }
    return findings;
  }

  private AssessmentPoint where() {
    if (context.supply().isGenerator()) {
      return AssessmentPoint.GENERATOR;
    }
    return place.name().equals(context.pcc())
        ? AssessmentPoint.COMMON_COUPLING
        : AssessmentPoint.INSIDE;
  }

  private Optional<Finding> motorVoltage() {
    return context.feedsMotors(place.name())
        ? VoltageQuality.motorVoltage(voltages.list())
        : Optional.empty();
  }

  private List<Finding> resonances(DesignState state) {
    List<ResonanceCheck.Peak> peaks =
        state.resonances().stream()
            .map(r -> new ResonanceCheck.Peak(r.order(), r.ohm(), r.bank()))
            .toList();
    return ResonanceCheck.judge(peaks, withoutZeroSequence());
  }

  /** A bank's star point is not earthed: zero sequence passes it by. */
  private List<Spectrum> withoutZeroSequence() {
    List<Spectrum> lines = List.copyOf(lines(currents).values());
    Spectrum zero = lines.stream().reduce(Spectrum.ZERO, Spectrum::plus).times(1.0 / lines.size());
    return lines.stream().map(line -> line.minus(zero)).toList();
  }

  private static Optional<Double> known(Figure figure) {
    return figure.value().stream().boxed().findFirst();
  }

  private static Map<Conductor, Spectrum> lines(Map<Conductor, Spectrum> all) {
    Map<Conductor, Spectrum> lines = new LinkedHashMap<>();
    all.forEach(
        (conductor, spectrum) -> {
          if (conductor.isLine()) {
            lines.put(conductor, spectrum);
          }
        });
    return lines;
  }

  /** The demand current this node's TDD stands on. */
  static Demand demand(AuditContext context, Place place, Map<Conductor, Spectrum> currents) {
    if (context.supply().isGenerator()) {
      return new Demand(Figure.unknown("no TDD on a generator"), "");
    }
    Optional<Double> surveyed = context.surveyedDemandA(place.name());
    if (surveyed.isPresent()) {
      return new Demand(Figure.of(surveyed.get()), "Demand current as surveyed.");
    }
    double largest =
        lines(currents).values().stream().mapToDouble(s -> s.magnitude(1)).max().orElse(0);
    return largest > 0
        ? new Demand(
            Figure.of(largest),
            "Largest line fundamental of the design state, none being surveyed.")
        : new Demand(Figure.unknown("no line carries current"), "");
  }
}
