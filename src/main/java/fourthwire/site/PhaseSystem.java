package fourthwire.site;

import fourthwire.quantity.Conductor;
import java.util.List;

/** The conductors a supply or panel has. */
public enum PhaseSystem {
  THREE_PHASE_4_WIRE(
      "three-phase-4-wire", List.of(Conductor.L1, Conductor.L2, Conductor.L3, Conductor.N)),
  THREE_PHASE_3_WIRE("three-phase-3-wire", List.of(Conductor.L1, Conductor.L2, Conductor.L3)),
  SPLIT_PHASE("split-phase", List.of(Conductor.L1, Conductor.L2, Conductor.N)),
  SINGLE_PHASE("single-phase", List.of(Conductor.L1, Conductor.N));

  private final String word;
  private final List<Conductor> conductors;

  PhaseSystem(String word, List<Conductor> conductors) {
    this.word = word;
    this.conductors = conductors;
  }

  /** The word used in survey tables. */
  public String word() {
    return word;
  }

  /** Its conductors at a supply, in order. */
  public List<Conductor> conductors() {
    return conductors;
  }

  /** Whether it has a neutral. */
  public boolean hasNeutral() {
    return conductors.contains(Conductor.N);
  }

  /** Whether it has all three lines. */
  public boolean isThreePhase() {
    return this == THREE_PHASE_4_WIRE || this == THREE_PHASE_3_WIRE;
  }
}
