package fourthwire.site.check;

import fourthwire.quantity.Conductor;
import fourthwire.site.SiteTree.Section;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.Collectors;

/**
 * The conductors at a node as far as they are known while its survey is checked.
 *
 * @param conductors its own; empty where an error reported already leaves them open
 * @param parentLines the parent's line that each of its own lines is fed from, in the same order
 * @param nominalV nominal voltage of its section; empty where it is open
 * @param section how its lines stand to each other
 * @param origin the supply, transformer or panel that settled the conductors
 * @param voltageOrigin the supply or transformer that settled the voltage
 */
record Wiring(
    List<Conductor> conductors,
    List<Conductor> parentLines,
    OptionalDouble nominalV,
    Section section,
    String origin,
    String voltageOrigin) {
  /** Nothing is known. */
  static final Wiring OPEN =
      new Wiring(List.of(), List.of(), OptionalDouble.empty(), Section.THREE_PHASE, "", "");

  boolean isKnown() {
    return !conductors.isEmpty();
  }

  boolean hasNeutral() {
    return conductors.contains(Conductor.N);
  }

  List<Conductor> lines() {
    return conductors.stream().filter(Conductor::isLine).toList();
  }

  /** The conductors in words. */
  String words() {
    return words(conductors);
  }

  static String words(List<Conductor> conductors) {
    return conductors.stream().map(Conductor::name).collect(Collectors.joining(", "));
  }
}
