package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.limits.Finding;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Transformer;
import fourthwire.web.support.FindingText;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.ToDoubleFunction;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/**
 * How a finding's figure comes about, step by step with this node's own figures, so that a reader
 * can follow it with a pocket calculator.
 */
final class FindingWorking {
  private static final int MOST_ORDERS = 7;
  private static final double PERCENT = 100;

  private final Words words;
  private final NodeCase node;
  private final DesignState design;

  FindingWorking(Words words, NodeCase node, DesignState design) {
    this.words = words;
    this.node = node;
    this.design = design;
  }

  /** The steps; none for a check that its sentence says in full. */
  List<String> steps(Finding finding) {
    return switch (finding.code()) {
      case "neutral-ampacity" -> neutral(finding);
      case "line-ampacity" -> line(finding);
      case "current-tdd" -> tdd(finding);
      case "current-order" -> order(finding);
      case "transformer-loading" -> transformer();
      case "transformer-k-rating" -> kFactor();
      case "voltage-thd" -> voltageThd();
      case "voltage-order" -> voltageOrder(finding);
      case "voltage-unbalance" ->
          List.of(words.of("steps.unbalance", percent(finding.figure().value())));
      case "motor-voltage" -> List.of(words.of("steps.motor", number(finding.figure())));
      case "other-triplens" ->
          List.of(words.of("steps.triplens", percent(finding.figure().value())));
      case "resonance" -> List.of(words.of("steps.resonance"));
      default -> List.of();
    };
  }

  private List<String> neutral(Finding finding) {
    List<String> steps = new ArrayList<>();
    Optional.ofNullable(design.currentSpectrum().get(Conductor.N))
        .ifPresent(n -> steps.add(rootOfSquares("I(N)", n, "A")));
    steps.addAll(
        ampacity(finding, design.neutral().ampacityA().value(), design.neutral().ampacityBasis()));
    return steps;
  }

  private List<String> line(Finding finding) {
    List<String> steps = new ArrayList<>();
    Optional<Map.Entry<Conductor, Spectrum>> worst = worstLine(Spectrum::rms);
    worst.ifPresent(
        l -> steps.add(rootOfSquares("I(" + name(l.getKey()) + ")", l.getValue(), "A")));
    worst
        .flatMap(l -> Optional.ofNullable(design.lines().get(l.getKey())))
        .ifPresent(l -> steps.addAll(ampacity(finding, l.ampacityA().value(), l.ampacityBasis())));
    return steps;
  }

  /** What it may carry: as installed, and what the harmonic factor leaves. */
  private List<String> ampacity(Finding finding, OptionalDouble asInstalled, String basis) {
    List<String> steps = new ArrayList<>();
    double limit = finding.limit().value().orElse(0);
    asInstalled.ifPresent(
        a -> {
          steps.add(
              words.of(
                  "steps.ampacity",
                  Numbers.plain(a, "A"),
                  FindingText.set(node.names().in(basis))));
          if (limit > 0 && limit < a * 0.999) {
            steps.add(
                words.of("steps.factor", Numbers.of(a, "A"), Numbers.of(limit / a), amps(limit)));
          }
        });
    finding
        .figure()
        .value()
        .ifPresent(
            i ->
                steps.add(
                    words.of(
                        "steps.ratio",
                        amps(i),
                        amps(limit),
                        Numbers.of(PERCENT * i / limit, "%"))));
    return steps;
  }

  private List<String> tdd(Finding finding) {
    List<String> steps = new ArrayList<>(row());
    worstLine(Spectrum::distortionRms)
        .ifPresent(
            l -> {
              steps.add(
                  words.of(
                      "steps.distortion",
                      name(l.getKey()),
                      squares(l.getValue(), 2),
                      amps(l.getValue().distortionRms())));
              steps.add(
                  words.of(
                      "steps.tdd",
                      amps(l.getValue().distortionRms()),
                      amps(design.demandA().value().orElse(0)),
                      percent(finding.figure().value()),
                      percent(finding.limit().value())));
            });
    return steps;
  }

  private List<String> order(Finding finding) {
    List<String> steps = new ArrayList<>(row());
    double percent = finding.figure().value().orElse(0);
    double demandA = design.demandA().value().orElse(0);
    steps.add(
        words.of(
            "steps.order",
            amps(percent / PERCENT * demandA),
            amps(demandA),
            percent(finding.figure().value()),
            percent(finding.limit().value())));
    return steps;
  }

  /** Where in the table of limits this node stands. */
  private List<String> row() {
    OptionalDouble demandA = design.demandA().value();
    OptionalDouble faultA = design.shortCircuitA().value();
    if (demandA.isEmpty() || faultA.isEmpty()) {
      return List.of();
    }
    return List.of(
        words.of(
            "steps.demand", amps(demandA.getAsDouble()), node.names().in(design.demandBasis())),
        words.of(
            "steps.fault",
            amps(faultA.getAsDouble()),
            Numbers.of(faultA.getAsDouble() / demandA.getAsDouble())));
  }

  private List<String> transformer() {
    Optional<Transformer> plate =
        node.survey().transformers().stream()
            .filter(t -> t.name().equals(node.node().node()))
            .findFirst();
    OptionalDouble derated =
        design.transformer().map(t -> t.deratedKva().value()).orElse(OptionalDouble.empty());
    OptionalDouble lossFactor = design.harmonicLossFactor().value();
    if (plate.isEmpty() || derated.isEmpty() || lossFactor.isEmpty()) {
      return List.of();
    }
    double ratedKva = plate.get().ratedKva();
    double squared = Math.pow(derated.getAsDouble() / ratedKva, 2);
    double eddy = (1 - squared) / (lossFactor.getAsDouble() * squared - 1);
    if (!Double.isFinite(eddy)) {
      return List.of(words.of("steps.loss-factor", Numbers.of(lossFactor.getAsDouble())));
    }
    return List.of(
        words.of("steps.loss-factor", Numbers.of(lossFactor.getAsDouble())),
        words.of(
            plate.get().windingEddyLossPercent().isPresent() ? "steps.eddy" : "steps.eddy.assumed",
            Numbers.of(eddy)),
        words.of(
            "steps.derated",
            Numbers.of(ratedKva, "kVA"),
            Numbers.of(eddy),
            Numbers.of(lossFactor.getAsDouble()),
            Numbers.of(derated.getAsDouble(), "kVA")));
  }

  private List<String> kFactor() {
    return design
        .transformer()
        .map(t -> List.of(words.of("steps.k-factor", number(t.kFactor()))))
        .orElse(List.of());
  }

  private List<String> voltageThd() {
    return design.voltageSpectrum().entrySet().stream()
        .filter(e -> e.getValue().magnitude(1) > 0 && !e.getKey().equals(Conductor.N.name()))
        .max(Comparator.comparingDouble(e -> thd(e.getValue())))
        .map(
            e ->
                List.of(
                    words.of(
                        "steps.voltage",
                        node.names().of(e.getKey()),
                        squares(e.getValue(), 2),
                        Numbers.of(e.getValue().distortionRms(), "V"),
                        Numbers.of(e.getValue().magnitude(1), "V"),
                        Numbers.of(PERCENT * thd(e.getValue()), "%"))))
        .orElse(List.of());
  }

  /** The one voltage and order whose share of the fundamental is the finding's figure. */
  private List<String> voltageOrder(Finding finding) {
    double percent = finding.figure().value().orElse(Double.NaN);
    for (Map.Entry<String, Spectrum> voltage : design.voltageSpectrum().entrySet()) {
      Spectrum v = voltage.getValue();
      for (int h = 2; h <= Spectrum.HIGHEST_ORDER; h++) {
        if (Math.abs(PERCENT * v.magnitude(h) - percent * v.magnitude(1)) < 1e-6 * v.magnitude(1)) {
          return List.of(
              words.of(
                  "steps.voltage-order",
                  node.names().of(voltage.getKey()),
                  Numbers.ordinal(h),
                  Numbers.of(v.magnitude(h), "V"),
                  Numbers.of(v.magnitude(1), "V"),
                  Numbers.of(percent, "%")));
        }
      }
    }
    return List.of();
  }

  private static double thd(Spectrum s) {
    return s.distortionRms() / s.magnitude(1);
  }

  private String rootOfSquares(String what, Spectrum of, String unit) {
    return words.of("steps.rms", what, squares(of, 1), Numbers.of(of.rms(), unit));
  }

  /** The largest orders from this one, "78.6² (3rd) + 14.0² (9th) + …". */
  private static String squares(Spectrum of, int from) {
    List<Integer> largest =
        IntStream.rangeClosed(from, Spectrum.HIGHEST_ORDER)
            .boxed()
            .filter(h -> of.magnitude(h) > 1e-3 * of.rms())
            .sorted(Comparator.comparingDouble(h -> -of.magnitude(h)))
            .toList();
    String sum =
        largest.stream()
            .limit(MOST_ORDERS)
            .sorted()
            .map(h -> Numbers.of(of.magnitude(h)) + "² (" + Numbers.ordinal(h) + ")")
            .collect(Collectors.joining(" + "));
    return largest.size() > MOST_ORDERS ? sum + " + …" : sum;
  }

  private Optional<Map.Entry<Conductor, Spectrum>> worstLine(ToDoubleFunction<Spectrum> by) {
    return design.currentSpectrum().entrySet().stream()
        .filter(e -> e.getKey().isLine())
        .max(Comparator.comparingDouble(e -> by.applyAsDouble(e.getValue())));
  }

  private String name(Conductor conductor) {
    return node.names().of(conductor);
  }

  private static String amps(double a) {
    return Numbers.of(a, "A");
  }

  private static String percent(OptionalDouble figure) {
    return figure.isPresent() ? Numbers.plain(figure.getAsDouble(), "%") : "–";
  }

  private static String number(Figure figure) {
    return figure.value().isPresent() ? Numbers.of(figure.value().getAsDouble()) : "–";
  }
}
