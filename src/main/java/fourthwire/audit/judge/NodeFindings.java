package fourthwire.audit.judge;

import fourthwire.audit.plan.Place;
import fourthwire.audit.plan.TransformerPlate;
import fourthwire.limits.Check;
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

  /** Every figure held against a limit, whether or not there is anything to say of it. */
  List<Check> checks() {
    List<Check> checks = new ArrayList<>();
    if (place.transformer().isPresent()) {
      checks.addAll(transformer().checks());
    }
    feeder().ifPresent(feeder -> checks.addAll(feeder.checks()));
    if (place.node().kind() != SiteTree.Kind.CIRCUIT) {
      checks.addAll(currentDistortion());
      checks.addAll(voltageDistortion());
      VoltageQuality.unbalance(voltages.unbalancePercent()).ifPresent(checks::add);
      if (context.feedsMotors(place.name())) {
        checks.add(VoltageQuality.motorVoltage(voltages.list()));
      }
      checks.addAll(context.banks().at(place));
    }
    return checks;
  }

  /** What is said besides: what the cable factors do not cover, resonances, shared neutrals. */
  List<Finding> notes() {
    List<Finding> notes = new ArrayList<>();
    feeder().ifPresent(feeder -> notes.addAll(feeder.notes()));
    if (place.node().kind() != SiteTree.Kind.CIRCUIT) {
      notes.addAll(resonances());
    }
    notes.addAll(context.sharedNeutrals().at(place.name()));
    return notes;
  }

  /** The feeder's conductors (a transformer's: its primary's); a supply has none. */
  private Optional<NeutralLoading> feeder() {
    if (place.transformer().isPresent()) {
      return Optional.of(primaryFeeder());
    }
    if (place.node().kind() == SiteTree.Kind.SUPPLY) {
      return Optional.empty();
    }
    return Optional.of(
        ampacity(
            lines(currents),
            Optional.ofNullable(currents.get(Conductor.N)),
            context.ampacities().lines(place),
            context.ampacities().neutral(place)));
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

  private List<Check> currentDistortion() {
    Optional<Double> demand = known(context.demand(place).amps());
    Optional<Double> fault = known(context.faults().amps(place.name()));
    if (demand.isEmpty() || fault.isEmpty() || demand.get() <= 0) {
      return List.of();
    }
    return CurrentDistortion519.of(
            Edition519.IEEE_519_2022, place.node().nominalV(), fault.get(), demand.get())
        .checks(lines(currents), demand.get(), where());
  }

  private List<Check> voltageDistortion() {
    List<Check> checks =
        new ArrayList<>(
            VoltageDistortion.ieee519(Edition519.IEEE_519_2022, place.node().nominalV())
                .checks(voltages.spectra(), where()));
    if (context.practice() == Practice.IEC) {
      checks.addAll(
          VoltageDistortion.iec61000x2x4(PLANT_CLASS).checks(voltages.spectra(), where()));
    }
    return checks;
  }

  private AssessmentPoint where() {
    if (context.supply().isGenerator()) {
      return AssessmentPoint.GENERATOR;
    }
    return place.name().equals(context.pcc())
        ? AssessmentPoint.COMMON_COUPLING
        : AssessmentPoint.INSIDE;
  }

  private List<Finding> resonances() {
    List<ResonanceCheck.Peak> peaks =
        context.scan().at(place.name()).stream()
            .filter(r -> !r.series())
            .map(r -> new ResonanceCheck.Peak(r.order(), r.ohm(), r.bank()))
            .toList();
    List<Finding> findings = new ArrayList<>(ResonanceCheck.judge(peaks, withoutZeroSequence()));
    findings.addAll(ResonanceCheck.judge(steps(), withoutZeroSequence()));
    return findings;
  }

  /** The peaks of the switched banks here with some of their steps out. */
  private List<ResonanceCheck.Peak> steps() {
    return context.bankSteps().at(place.name()).stream()
        .filter(s -> s.step() < s.steps())
        .map(
            s ->
                new ResonanceCheck.Peak(
                    s.order(),
                    s.ohm(),
                    "%s with %d of %d steps in".formatted(s.bank(), s.step(), s.steps())))
        .toList();
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

  static Map<Conductor, Spectrum> lines(Map<Conductor, Spectrum> all) {
    Map<Conductor, Spectrum> lines = new LinkedHashMap<>();
    all.forEach(
        (conductor, spectrum) -> {
          if (conductor.isLine()) {
            lines.put(conductor, spectrum);
          }
        });
    return lines;
  }
}
