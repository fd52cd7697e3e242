package fourthwire.web.reading;

import fourthwire.metering.CaptureResult;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.web.figure.SpectrumPlot;
import fourthwire.web.panel.Grids;
import fourthwire.web.panel.NodePage;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

/** Makes the tables and the spectrum of a capture. */
final class CaptureTables {
  private static final int HIGHEST_DRAWN = 25;
  private static final double KILO = 1000;
  private static final double SMALLEST_WITH_ANGLE = 1e-4;

  private final Words words;
  private final Names names;

  CaptureTables(Words words, Names names) {
    this.words = words;
    this.names = names;
  }

  List<NodePage.Grid> of(CaptureResult capture) {
    return List.of(currents(capture), voltages(capture), powers(capture));
  }

  private NodePage.Grid currents(CaptureResult capture) {
    Grids grid =
        grid(
            "reading.currents",
            "currents.conductor",
            "currents.rms",
            "currents.fundamental",
            "currents.thd",
            "reading.crest");
    capture.current().entrySet().stream()
        .sorted(Map.Entry.comparingByKey())
        .forEach(
            e ->
                grid.row(
                    names.of(e.getKey()),
                    List.of(
                        e.getValue().rmsA(),
                        e.getValue().fundamentalA(),
                        e.getValue().thdPercent(),
                        e.getValue().crestFactor())));
    return grid.done();
  }

  private NodePage.Grid voltages(CaptureResult capture) {
    Grids grid =
        grid(
            "reading.voltages",
            "voltage.between",
            "voltage.rms",
            "voltage.fundamental",
            "voltage.thd",
            "reading.crest");
    capture.voltage().entrySet().stream()
        .sorted(Map.Entry.comparingByKey())
        .forEach(
            e ->
                grid.row(
                    names.of(e.getKey()),
                    List.of(
                        e.getValue().rmsV(),
                        e.getValue().fundamentalV(),
                        e.getValue().thdPercent(),
                        e.getValue().crestFactor())));
    return grid.done();
  }

  private NodePage.Grid powers(CaptureResult capture) {
    Grids grid =
        new Grids(
            words,
            words.of("power.title", names.in(capture.powerBasis())),
            heads(
                "reading.whole",
                "power.active",
                "power.reactive",
                "power.apparent",
                "power.nonfundamental",
                "power.factor",
                "power.displacement"));
    row(grid, words.of("power.whole"), capture.power());
    capture.powerByLine().entrySet().stream()
        .sorted(Map.Entry.comparingByKey())
        .forEach(e -> row(grid, names.of(e.getKey()), e.getValue()));
    return grid.done();
  }

  private static void row(Grids grid, String name, PowerFigures p) {
    List<Figure> figures = new ArrayList<>();
    List.of(p.activeW(), p.fundamentalReactiveVar(), p.apparentVa(), p.nonfundamentalVa())
        .forEach(f -> figures.add(f.map(v -> v / KILO)));
    figures.add(p.powerFactor());
    figures.add(p.displacementFactor());
    grid.row(name, figures);
  }

  /** Every order that carries anything, of every conductor: amps and degrees. */
  NodePage.Grid orders(CaptureResult capture) {
    List<Conductor> shown = capture.spectrum().keySet().stream().sorted().toList();
    List<String> heads = new ArrayList<>(List.of(words.of("spectrum.order")));
    shown.forEach(c -> heads.add(words.of("spectrum.amps", names.of(c))));
    shown.forEach(c -> heads.add(words.of("spectrum.degrees", names.of(c))));
    Grids grid = new Grids(words, words.of("spectrum.table"), heads);
    for (int order = 1; order <= Spectrum.HIGHEST_ORDER; order++) {
      List<Figure> row = new ArrayList<>();
      for (Conductor c : shown) {
        row.add(Figure.of(spectrum(capture, c).magnitude(order)));
      }
      for (Conductor c : shown) {
        row.add(angle(spectrum(capture, c), order));
      }
      grid.row(Numbers.ordinal(order), row);
    }
    return grid.done();
  }

  private static Spectrum spectrum(CaptureResult capture, Conductor c) {
    return java.util.Objects.requireNonNull(capture.spectrum().get(c));
  }

  /** An angle, unless there is hardly anything that could have one. */
  private static Figure angle(Spectrum spectrum, int order) {
    return spectrum.magnitude(order) > SMALLEST_WITH_ANGLE * spectrum.rms()
        ? Figure.of(Math.rint(spectrum.at(order).degrees()))
        : Figure.unknown("");
  }

  /** Every conductor's odd orders beside each other, the fundamental left out. */
  String spectrum(CaptureResult capture) {
    List<Conductor> series = capture.spectrum().keySet().stream().sorted().toList();
    if (series.isEmpty()) {
      return "";
    }
    List<SpectrumPlot.Group> groups =
        IntStream.rangeClosed(2, HIGHEST_DRAWN)
            .filter(h -> h % 2 == 1)
            .mapToObj(h -> group(capture.spectrum(), series, h))
            .toList();
    return SpectrumPlot.draw(
        series, groups, Numbers::ordinal, "A", words.of("reading.spectrum.alternative"));
  }

  private static SpectrumPlot.Group group(
      Map<Conductor, Spectrum> spectra, List<Conductor> series, int order) {
    List<Double> amps =
        series.stream()
            .map(c -> java.util.Objects.requireNonNull(spectra.get(c)).magnitude(order))
            .toList();
    return new SpectrumPlot.Group(order, amps, OptionalDouble.empty());
  }

  private Grids grid(String title, String... heads) {
    return new Grids(words, words.of(title), heads(heads));
  }

  private List<String> heads(String... keys) {
    return java.util.Arrays.stream(keys).map(k -> words.of(k)).toList();
  }
}
