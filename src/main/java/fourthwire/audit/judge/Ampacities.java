package fourthwire.audit.judge;

import fourthwire.audit.plan.Place;
import fourthwire.audit.plan.SharedNeutral;
import fourthwire.limits.loading.ConductorRating;
import fourthwire.quantity.Figure;
import fourthwire.site.Circuit;
import fourthwire.site.Feeder;
import fourthwire.site.Panel;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.site.conductor.Ampacity;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * What the conductors at each node carry: the feeder's ampacity, the bus's rating, the breaker's,
 * and of a transformer its rated current.
 */
final class Ampacities {
  private final Map<String, Panel> panels;
  private final Map<String, Circuit> circuits;
  private final Map<String, List<Circuit>> sharing;

  Ampacities(Survey survey) {
    panels = survey.panels().stream().collect(Collectors.toMap(Panel::name, Function.identity()));
    circuits =
        survey.circuits().stream().collect(Collectors.toMap(Circuit::id, Function.identity()));
    sharing =
        survey.circuits().stream()
            .filter(c -> c.sharedNeutral().isPresent())
            .collect(Collectors.groupingBy(Ampacities::sharedKey));
  }

  private static String sharedKey(Circuit circuit) {
    return circuit.panel() + "/" + circuit.sharedNeutral().orElseThrow();
  }

  /**
   * What a current's path carries.
   *
   * @param ratings each part of it that is known
   * @param reason why none is, where none is
   */
  record Path(List<ConductorRating> ratings, String reason) {
    static final Path NONE = new Path(List.of(), "no ampacity or bus rating is known");

    /** The smallest rating, amps. */
    Figure ampacityA() {
      return smallest().map(r -> Figure.of(r.ampacityA())).orElse(Figure.unknown(reason));
    }

    /** What has the smallest rating. */
    String name() {
      return smallest().map(ConductorRating::name).orElse("");
    }

    private Optional<ConductorRating> smallest() {
      return ratings.stream().min(Comparator.comparingDouble(ConductorRating::ampacityA));
    }
  }

  /** Of a node's lines. */
  Path lines(Place place) {
    if (place.transformer().isPresent()) {
      double ratedA = place.transformer().get().plate().ratedSecondaryA();
      return new Path(
          List.of(new ConductorRating("rated current of the transformer", ratedA, false)), "");
    }
    Ratings ratings = new Ratings();
    Optional.ofNullable(panels.get(place.name()))
        .ifPresent(panel -> ratings.bus("bus of the panel", panel.busRatingA()));
    Optional.ofNullable(circuits.get(place.name()))
        .ifPresent(circuit -> ratings.bus("breaker", circuit.breakerA()));
    ratings.cable("feeder", Ampacity.ofLine(place.node().feeder()));
    return ratings.path();
  }

  /** Of a node's neutral. */
  Path neutral(Place place) {
    if (place.transformer().isPresent() || place.node().kind() == SiteTree.Kind.SUPPLY) {
      return new Path(List.of(), "no rating of the neutral terminal is surveyed");
    }
    Ratings ratings = new Ratings();
    Optional.ofNullable(panels.get(place.name()))
        .ifPresent(panel -> ratings.bus("neutral bus of the panel", panel.neutralBusRatingA()));
    ratings.cable("neutral conductor", Ampacity.ofNeutral(neutralFeeder(place)));
    return ratings.path();
  }

  private Feeder neutralFeeder(Place place) {
    Circuit circuit = circuits.get(place.name());
    if (circuit != null && circuit.sharedNeutral().isPresent()) {
      return SharedNeutral.feeder(sharing.getOrDefault(sharedKey(circuit), List.of(circuit)));
    }
    return place.node().feeder();
  }

  /** Of the lines of a transformer's primary feeder. */
  Path primaryLines(Place place) {
    Ratings ratings = new Ratings();
    ratings.cable("primary feeder", Ampacity.ofLine(place.node().feeder()));
    return ratings.path();
  }

  /** Gathers what is known. */
  private static final class Ratings {
    private final List<ConductorRating> known = new ArrayList<>();
    private String reason = Path.NONE.reason();

    void bus(String name, OptionalDouble amps) {
      if (amps.isPresent() && amps.getAsDouble() > 0) {
        known.add(new ConductorRating(name, amps.getAsDouble(), false));
      }
    }

    void cable(String name, Ampacity ampacity) {
      ampacity
          .amps()
          .value()
          .ifPresentOrElse(
              amps -> known.add(new ConductorRating(name + ", " + ampacity.basis(), amps, true)),
              () -> reason = ampacity.amps().reason());
    }

    Path path() {
      return new Path(List.copyOf(known), known.isEmpty() ? reason : "");
    }
  }
}
