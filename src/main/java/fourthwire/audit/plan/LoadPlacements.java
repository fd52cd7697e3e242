package fourthwire.audit.plan;

import static fourthwire.quantity.Conductor.N;

import fourthwire.load.LoadModels;
import fourthwire.load.LoadRequest;
import fourthwire.load.LoadRequest.Rating;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.LoadKind.Family;
import fourthwire.site.SiteTree;
import fourthwire.site.SpectrumTable;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * Puts load rows on the conductors of their circuits, in parts where a row spreads over several
 * lines. Source: the public contract, sections 2 (lines) and 3 (kinds, a state's power).
 */
public final class LoadPlacements {
  private final int frequencyHz;
  private final Map<String, SpectrumTable> spectra;
  private final SiteTree tree;

  private LoadPlacements(Survey survey, SiteTree tree) {
    this.frequencyHz = survey.settings().frequencyHz();
    this.spectra =
        survey.spectra().stream()
            .collect(Collectors.toMap(SpectrumTable::name, Function.identity()));
    this.tree = tree;
  }

  /** The parts of every load that is supplied and asks for power in the design state. */
  public static List<LoadPlacement> of(Survey survey, SiteTree tree) {
    LoadPlacements placements = new LoadPlacements(survey, tree);
    List<LoadPlacement> parts = new ArrayList<>();
    for (Load load : survey.loads()) {
      tree.find(load.circuitId()).ifPresent(node -> parts.addAll(placements.parts(load, node)));
    }
    return parts;
  }

  private List<LoadPlacement> parts(Load load, SiteTree.Node circuit) {
    double demand = load.demandFactor().orElse(1);
    if (demand == 0 || load.quantity() == 0) {
      return List.of();
    }
    Equipment equipment = Equipment.of(load);
    List<Conductor> lines = circuit.lines();
    List<Conductor> neutral = circuit.hasNeutral() ? List.of(N) : List.of();
    if (onThreeLines(equipment.kind(), lines.size())) {
      return List.of(part(load, equipment, circuit, lines, neutral, 1));
    }
    if (lines.size() == 1 || (lines.size() == 2 && neutral.isEmpty())) {
      List<Conductor> to = lines.size() == 1 ? neutral : lines.subList(1, 2);
      return List.of(part(load, equipment, circuit, lines.subList(0, 1), to, 1));
    }
    List<LoadPlacement> parts = new ArrayList<>();
    for (int k = 0; k < lines.size(); k++) {
      Conductor next = lines.get((k + 1) % lines.size());
      List<Conductor> to = neutral.isEmpty() ? List.of(next) : neutral;
      parts.add(part(load, equipment, circuit, List.of(lines.get(k)), to, lines.size()));
    }
    return parts;
  }

  private static boolean onThreeLines(LoadKind kind, int lines) {
    return lines == 3 && (kind.family() == Family.THREE_PHASE || kind.family() == Family.ANY);
  }

  private LoadPlacement part(
      Load load,
      Equipment equipment,
      SiteTree.Node circuit,
      List<Conductor> from,
      List<Conductor> to,
      int shares) {
    boolean lineToNeutral = from.size() == 1 && to.equals(List.of(N));
    double portV = lineToNeutral ? circuit.lineToNeutralV() : circuit.nominalV();
    LoadRequest request =
        new LoadRequest(
            equipment.kind(),
            from.size(),
            frequencyHz,
            portV,
            share(equipment.rating(), shares),
            load.quantity(),
            load.demandFactor().orElse(1),
            lowerPower(load, equipment.kind()),
            equipment.displacementFactor(),
            equipment.columns(portV, shares),
            load.spectrum().map(name -> spectrum(load, name)));
    return new LoadPlacement(load, circuit.name(), from, to, request);
  }

  /** Watts and volt-amperes are of the whole unit, amps those of each line. */
  private static Rating share(Rating rating, int shares) {
    if (rating instanceof Rating.Watts watts) {
      return new Rating.Watts(watts.w() / shares);
    }
    if (rating instanceof Rating.VoltAmperes va) {
      return new Rating.VoltAmperes(va.va() / shares);
    }
    return rating;
  }

  private static boolean lowerPower(Load load, LoadKind kind) {
    return load.partLoad().map(p -> p == Load.PartLoad.LOWER_POWER).orElse(kind.runsAtLowerPower());
  }

  /**
   * A table's spectrum on a fundamental of 1: degrees as given, else the contract's pulse at the
   * crest; the fundamental's from the displacement factor where the table has none.
   */
  private Spectrum spectrum(Load load, String name) {
    SpectrumTable table =
        Optional.ofNullable(spectra.get(name))
            .orElseThrow(() -> new IllegalArgumentException("no spectrum is called " + name));
    Phasor[] byOrder = new Phasor[Spectrum.HIGHEST_ORDER + 1];
    for (SpectrumTable.Row row : table.rows()) {
      double assumed =
          row.order() == 1
              ? LoadModels.fundamentalDegrees(OptionalDouble.empty(), load.displacementFactor())
              : LoadModels.assumedHarmonicDegrees(row.order());
      byOrder[row.order()] = Phasor.polar(row.percent() / 100, row.degrees().orElse(assumed));
    }
    return Spectrum.of(h -> Optional.ofNullable(byOrder[h]).orElse(Phasor.ZERO));
  }
}
