package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import fourthwire.web.figure.CyclePlot;
import fourthwire.web.figure.Shapes;
import fourthwire.web.figure.SpectrumPlot;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

/** Makes the pictures of a node: spectrum, one cycle, the voltage's distortion. */
final class PicturesMaker {
  private static final int MOST_ORDERS = 14;
  private static final int USUAL_HIGHEST = 15;
  private static final double WORTH_DRAWING = 0.01;

  private final Words words;
  private final NodeCase node;
  private final DesignState design;
  private final Names names;

  PicturesMaker(Words words, NodeCase node, DesignState design) {
    this.words = words;
    this.node = node;
    this.design = design;
    this.names = node.names();
  }

  Optional<NodePage.Pictures> make() {
    if (design.currentSpectrum().isEmpty()) {
      return Optional.empty();
    }
    Optional<Conductor> worst = worstLine();
    List<Conductor> series = new ArrayList<>(worst.stream().toList());
    if (design.currentSpectrum().containsKey(Conductor.N)) {
      series.add(Conductor.N);
    }
    List<Integer> orders = orders(series);
    Optional<Map.Entry<String, Spectrum>> voltage = worstVoltage();
    return Optional.of(
        new NodePage.Pictures(
            spectrum(series, orders),
            spectrumOf(series),
            CyclePlot.draw(
                design.currentSpectrum(), "A", words.of("cycle.alternative", node.node().node())),
            keys(),
            table(IntStream.rangeClosed(1, Spectrum.HIGHEST_ORDER).boxed().toList()),
            voltage.map(this::voltage).orElse(""),
            voltage.map(v -> words.of("voltage.of", names.of(v.getKey()))).orElse("")));
  }

  private Optional<Conductor> worstLine() {
    return design.currentSpectrum().entrySet().stream()
        .filter(e -> e.getKey().isLine())
        .max(Comparator.comparingDouble(e -> e.getValue().distortionRms()))
        .map(Map.Entry::getKey);
  }

  private Optional<Map.Entry<String, Spectrum>> worstVoltage() {
    return design.voltageSpectrum().entrySet().stream()
        .filter(e -> e.getValue().magnitude(1) > 0 && !e.getKey().equals(Conductor.N.name()))
        .max(
            Comparator.comparingDouble(
                e -> e.getValue().distortionRms() / e.getValue().magnitude(1)));
  }

  /** The usual odd orders, and any other that carries enough to be seen; the strongest first. */
  private List<Integer> orders(List<Conductor> series) {
    double base = series.stream().mapToDouble(c -> largest(c)).max().orElse(0);
    return IntStream.rangeClosed(1, Spectrum.HIGHEST_ORDER)
        .filter(
            h -> (h % 2 == 1 && h <= USUAL_HIGHEST) || magnitude(series, h) >= WORTH_DRAWING * base)
        .boxed()
        .sorted(
            Comparator.comparing((Integer h) -> h > 9 || h % 2 == 0)
                .thenComparing(h -> -magnitude(series, h)))
        .limit(MOST_ORDERS)
        .sorted()
        .toList();
  }

  private double largest(Conductor c) {
    return IntStream.rangeClosed(1, Spectrum.HIGHEST_ORDER)
        .mapToDouble(h -> spectrum(c).magnitude(h))
        .max()
        .orElse(0);
  }

  private double magnitude(List<Conductor> series, int order) {
    return series.stream().mapToDouble(c -> spectrum(c).magnitude(order)).max().orElse(0);
  }

  private String spectrum(List<Conductor> series, List<Integer> orders) {
    Optional<OrderLimits> limits = OrderLimits.at(node, design);
    List<SpectrumPlot.Group> groups =
        orders.stream()
            .map(
                h ->
                    new SpectrumPlot.Group(
                        h,
                        series.stream().map(c -> spectrum(c).magnitude(h)).toList(),
                        limits.map(l -> l.amps(h)).orElse(OptionalDouble.empty())))
            .toList();
    return SpectrumPlot.draw(
        series,
        groups,
        Numbers::ordinal,
        "A",
        words.of("spectrum.alternative", node.node().node()));
  }

  private String spectrumOf(List<Conductor> series) {
    String of =
        words.of(
            "spectrum.of." + series.size(), series.stream().map(names::of).toArray(Object[]::new));
    return OrderLimits.at(node, design)
        .filter(l -> series.get(0).isLine())
        .map(
            l ->
                words.of(
                    l.binding() ? "spectrum.limit" : "spectrum.guidance",
                    of,
                    l.basis(),
                    names.of(series.get(0))))
        .orElse(of);
  }

  private String voltage(Map.Entry<String, Spectrum> worst) {
    Spectrum volts = worst.getValue();
    double fundamental = volts.magnitude(1);
    List<SpectrumPlot.Group> groups =
        IntStream.rangeClosed(2, Spectrum.HIGHEST_ORDER)
            .boxed()
            .filter(
                h -> h % 2 == 1 && h <= USUAL_HIGHEST || volts.magnitude(h) > 0.002 * fundamental)
            .sorted(Comparator.comparingDouble(h -> -volts.magnitude(h)))
            .limit(MOST_ORDERS)
            .sorted()
            .map(
                h ->
                    new SpectrumPlot.Group(
                        h, List.of(100 * volts.magnitude(h) / fundamental), OptionalDouble.empty()))
            .toList();
    Conductor colour = Conductor.valueOf(worst.getKey().substring(0, 2));
    return SpectrumPlot.draw(
        List.of(colour),
        groups,
        Numbers::ordinal,
        "%",
        words.of("voltage.alternative", names.of(worst.getKey())));
  }

  private List<NodePage.Key> keys() {
    return design.currentSpectrum().keySet().stream()
        .sorted()
        .map(c -> new NodePage.Key(Shapes.sample(c), names.of(c)))
        .toList();
  }

  private NodePage.Grid table(List<Integer> orders) {
    List<Conductor> shown = design.currentSpectrum().keySet().stream().sorted().toList();
    List<String> heads = new ArrayList<>(List.of(words.of("spectrum.order")));
    shown.forEach(c -> heads.add(words.of("spectrum.amps", names.of(c))));
    shown.forEach(c -> heads.add(words.of("spectrum.degrees", names.of(c))));
    Grids grid = new Grids(words, words.of("spectrum.table"), heads);
    for (int order : orders) {
      List<Figure> row = new ArrayList<>();
      shown.forEach(c -> row.add(Figure.of(spectrum(c).magnitude(order))));
      shown.forEach(c -> row.add(angle(spectrum(c), order)));
      grid.row(Numbers.ordinal(order), row);
    }
    return grid.done(Working.RMS);
  }

  /** An angle, unless there is hardly anything that could have one. */
  private static Figure angle(Spectrum spectrum, int order) {
    return spectrum.magnitude(order) > 1e-4 * spectrum.rms()
        ? Figure.of(Math.rint(spectrum.at(order).degrees()))
        : Figure.unknown("");
  }

  private Spectrum spectrum(Conductor c) {
    return java.util.Objects.requireNonNull(design.currentSpectrum().get(c));
  }
}
