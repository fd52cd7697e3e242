package fourthwire.web.reading;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.CaptureWindows;
import fourthwire.metering.CaptureWindows.HarmonicGroups;
import fourthwire.metering.CaptureWindows.Interval;
import fourthwire.metering.VoltageEvents;
import fourthwire.quantity.Figure;
import fourthwire.web.panel.Grids;
import fourthwire.web.panel.NodePage;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.DoubleStream;

/** Makes what only the page of a capture shows: waveforms, phasors, windows, events. */
final class CaptureViewMaker {
  private static final String SHORTEST = "3s";

  private final Words words;
  private final Names names;

  CaptureViewMaker(Words words, Names names) {
    this.words = words;
    this.names = names;
  }

  ReadingPage.CaptureView of(CaptureResult c) {
    CapturePictures pictures = new CapturePictures(words, names);
    List<NodePage.Grid> tables = new ArrayList<>(List.of(balance(c)));
    c.windows()
        .filter(w -> w.intervals().stream().anyMatch(i -> i.length().equals(SHORTEST)))
        .ifPresent(w -> tables.add(intervals(w)));
    return new ReadingPage.CaptureView(
        pictures.first(c.closeUp()),
        isAllShown(c) ? ReadingPage.Waves.NONE : pictures.whole(c.picture()),
        pictures.phasors(c),
        tables,
        c.windows().stream().flatMap(w -> groups(w).stream()).toList(),
        names.in(c.events().basis()),
        c.events().events().stream().map(this::row).toList());
  }

  private static boolean isAllShown(CaptureResult c) {
    return c.closeUp().lengthS() > 0.9 * c.picture().lengthS();
  }

  private NodePage.Grid balance(CaptureResult c) {
    Grids grid =
        new Grids(
            words,
            words.of("reading.balance"),
            heads("reading.balance.what", "reading.balance.percent"));
    grid.row(words.of("reading.balance.voltage"), List.of(c.unbalance().voltagePercent()));
    grid.row(words.of("reading.balance.current"), List.of(c.unbalance().currentPercent()));
    grid.row(words.of("reading.balance.zero"), List.of(c.unbalance().zeroSequencePercent()));
    grid.row(words.of("reading.balance.neutral"), List.of(c.neutralPercentOfMeanLine()));
    return grid.done();
  }

  /** The lowest and highest of the 3 s values, of each quantity. */
  private NodePage.Grid intervals(CaptureWindows w) {
    List<Interval> shortest =
        w.intervals().stream().filter(i -> i.length().equals(SHORTEST)).toList();
    Grids grid =
        new Grids(
            words,
            words.of("reading.intervals", Numbers.withDecimals(shortest.size(), 0)),
            heads(
                "reading.quantity",
                "reading.intervals.rms.low",
                "reading.intervals.rms.high",
                "reading.intervals.thd.low",
                "reading.intervals.thd.high"));
    for (String quantity : w.groups().keySet()) {
      grid.row(
          names.in(quantity),
          List.of(
              figure(values(shortest, Interval::rms, quantity).min()),
              figure(values(shortest, Interval::rms, quantity).max()),
              figure(values(shortest, Interval::thdPercent, quantity).min()),
              figure(values(shortest, Interval::thdPercent, quantity).max())));
    }
    return grid.done();
  }

  private static DoubleStream values(
      List<Interval> of, Function<Interval, Map<String, Double>> values, String quantity) {
    return of.stream()
        .flatMap(i -> Optional.ofNullable(values.apply(i).get(quantity)).stream())
        .mapToDouble(Double::doubleValue);
  }

  private static Figure figure(OptionalDouble value) {
    return value.isPresent() ? Figure.of(value.getAsDouble()) : Figure.unknown("");
  }

  /** A table for currents and one for voltages: by order, each quantity's subgroups. */
  private List<NodePage.Grid> groups(CaptureWindows w) {
    List<NodePage.Grid> grids = new ArrayList<>();
    for (String kind : List.of(".i", ".v")) {
      List<String> shown = w.groups().keySet().stream().filter(q -> q.endsWith(kind)).toList();
      if (!shown.isEmpty()) {
        grids.add(groups(w, shown, kind.equals(".i") ? "A" : "V"));
      }
    }
    return grids;
  }

  private NodePage.Grid groups(CaptureWindows w, List<String> shown, String unit) {
    List<String> heads = new ArrayList<>(List.of(words.of("spectrum.order")));
    for (String q : shown) {
      String place = names.of(q.substring(0, q.lastIndexOf('.')));
      heads.add(words.of("reading.groups.subgroup", place, unit));
      heads.add(words.of("reading.groups.between", place, unit));
    }
    Grids grid = new Grids(words, words.of("reading.groups.table"), heads);
    int orders = groups(w, shown.get(0)).subgroups().size();
    for (int order = 1; order <= orders; order++) {
      List<Figure> row = new ArrayList<>();
      for (String q : shown) {
        HarmonicGroups g = groups(w, q);
        row.add(Figure.of(g.subgroups().get(order - 1)));
        row.add(
            order < orders ? Figure.of(g.interharmonicSubgroups().get(order)) : Figure.unknown(""));
      }
      grid.row(Numbers.ordinal(order), row);
    }
    return grid.done();
  }

  private static HarmonicGroups groups(CaptureWindows w, String quantity) {
    return java.util.Objects.requireNonNull(w.groups().get(quantity));
  }

  private ReadingPage.EventRow row(VoltageEvents.Event e) {
    return new ReadingPage.EventRow(
        words.of("reading.event.kind." + e.kind().word()),
        Numbers.plain(e.fromS(), "s"),
        Numbers.plain(e.durationS(), "s") + (e.whole() ? "" : " " + words.of("reading.event.open")),
        names.of(e.place()),
        Numbers.of(e.extremeV(), "V"),
        Numbers.of(e.percent(), "%"));
  }

  private List<String> heads(String... keys) {
    return Arrays.stream(keys).map(k -> words.of(k)).toList();
  }
}
