package fourthwire.site;

import java.util.List;

/**
 * A whole survey: every table of the public contract, section 2, in the order its rows stand. What
 * it holds has been checked: names resolve, the tree is one tree, values are in range.
 */
public record Survey(
    SiteSettings settings,
    List<Supply> supplies,
    List<Background> background,
    List<Transformer> transformers,
    List<Panel> panels,
    List<Circuit> circuits,
    List<Load> loads,
    List<SpectrumTable> spectra,
    List<Schedule> schedules,
    List<CapacitorBank> capacitors,
    List<Filter> filters,
    List<Meter> meters,
    List<SpotReading> spotReadings) {
  /** Copies every list. */
  public Survey {
    supplies = List.copyOf(supplies);
    background = List.copyOf(background);
    transformers = List.copyOf(transformers);
    panels = List.copyOf(panels);
    circuits = List.copyOf(circuits);
    loads = List.copyOf(loads);
    spectra = List.copyOf(spectra);
    schedules = List.copyOf(schedules);
    capacitors = List.copyOf(capacitors);
    filters = List.copyOf(filters);
    meters = List.copyOf(meters);
    spotReadings = List.copyOf(spotReadings);
  }

  /** The supply the site normally runs on. */
  public Supply normalSupply() {
    return supplies.stream()
        .filter(s -> s.roleOrDefault() == SupplyRole.NORMAL)
        .findFirst()
        .orElseThrow(() -> new IllegalStateException("a survey has a normal supply"));
  }
}
