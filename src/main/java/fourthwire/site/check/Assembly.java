package fourthwire.site.check;

import fourthwire.site.Circuit;
import fourthwire.site.Lines;
import fourthwire.site.Load;
import fourthwire.site.Meter;
import fourthwire.site.SiteSettings;
import fourthwire.site.SpectrumTable;
import fourthwire.site.SpotReading;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Makes the survey of a draft without errors: references to circuits become {@code panel:circuit},
 * circuits name their panel's own lines, the orders of a spectrum are put together.
 */
final class Assembly {
  private final SurveyDraft draft;
  private final NodeIndex nodes;
  private final CircuitIndex circuits;
  private final Map<Integer, Lines> ownLines;

  /**
   * @param ownLines by row, the lines of circuits that were named as the panel's parent names them
   */
  Assembly(
      SurveyDraft draft, NodeIndex nodes, CircuitIndex circuits, Map<Integer, Lines> ownLines) {
    this.draft = draft;
    this.nodes = nodes;
    this.circuits = circuits;
    this.ownLines = ownLines;
  }

  Survey survey() {
    return new Survey(
        settings(draft.settings().rows().get(0).content()),
        draft.supplies().contents(),
        draft.background().contents(),
        draft.transformers().contents(),
        draft.panels().contents(),
        draft.circuits().rows().stream().map(this::circuit).toList(),
        draft.loads().contents().stream().map(this::load).toList(),
        spectra(),
        draft.schedules().contents(),
        draft.capacitors().contents(),
        draft.filters().contents(),
        draft.meters().contents().stream().map(this::meter).toList(),
        draft.spotReadings().contents().stream().map(this::spotReading).toList());
  }

  private SiteSettings settings(SiteSettings s) {
    return new SiteSettings(
        s.name(),
        s.frequencyHz(),
        s.practice(),
        s.timezone(),
        s.currency(),
        s.energyPricePerKwh(),
        s.demandPricePerKvaMonth(),
        s.powerFactorTarget(),
        s.discountRatePercent(),
        s.pcc().map(this::node));
  }

  private Circuit circuit(DraftRow<Circuit> row) {
    Circuit c = row.content();
    Lines lines = ownLines.getOrDefault(row.row(), c.lines());
    return new Circuit(c.name(), c.panel(), lines, c.breakerA(), c.sharedNeutral(), c.feeder());
  }

  private Load load(Load l) {
    Circuit circuit = circuits.matching(l.circuit(), l.panel()).get(0).content();
    return new Load(
        l.name(),
        circuit.name(),
        circuit.panel(),
        l.kind(),
        l.preset(),
        l.spectrum(),
        l.quantity(),
        l.ratedW(),
        l.ratedVa(),
        l.ratedA(),
        l.demandFactor(),
        l.schedule(),
        l.partLoad(),
        l.displacementFactor(),
        l.lowW(),
        l.highW(),
        l.confidence(),
        l.columns());
  }

  private Meter meter(Meter m) {
    return new Meter(m.name(), node(m.at()), m.ctRatio(), m.ctReversed(), m.instrument());
  }

  private SpotReading spotReading(SpotReading r) {
    return new SpotReading(
        node(r.at()),
        r.time(),
        r.l1A(),
        r.l2A(),
        r.l3A(),
        r.nA(),
        r.l1V(),
        r.l2V(),
        r.l3V(),
        r.kw(),
        r.powerFactor(),
        r.thdPercent(),
        r.instrument());
  }

  /** A node's name in full: a circuit's is {@code panel:circuit}, all others stand as they are. */
  private String node(String text) {
    return nodes.find(text).isPresent()
        ? text
        : circuits.matching(text).stream().findFirst().map(r -> r.content().id()).orElse(text);
  }

  private List<SpectrumTable> spectra() {
    Map<String, List<SpectrumTable.Row>> byName = new LinkedHashMap<>();
    draft
        .spectra()
        .contents()
        .forEach(r -> byName.computeIfAbsent(r.spectrum(), n -> new ArrayList<>()).add(r.order()));
    return byName.entrySet().stream()
        .map(e -> new SpectrumTable(e.getKey(), List.copyOf(e.getValue())))
        .toList();
  }
}
