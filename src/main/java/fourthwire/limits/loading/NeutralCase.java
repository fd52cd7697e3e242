package fourthwire.limits.loading;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A feeder's conductors, their currents and what they carry.
 *
 * @param rule which rule applies the harmonic factor
 * @param lines line currents, amps
 * @param neutral neutral current, amps; empty where there is no neutral conductor
 * @param lineRatings what a line carries: feeder, bus, breaker; empty where nothing is known
 * @param neutralRatings what the neutral carries, likewise
 * @param nonlinearShare part of the feeder's design volt-amperes that nonlinear kinds draw, 0 to 1
 * @param wye whether the neutral belongs to a four-wire wye system (not split-phase or
 *     single-phase)
 */
public record NeutralCase(
    AmpacityRule rule,
    Map<Conductor, Spectrum> lines,
    Optional<Spectrum> neutral,
    List<ConductorRating> lineRatings,
    List<ConductorRating> neutralRatings,
    double nonlinearShare,
    boolean wye) {

  /** The line of the largest rms current; a feeder has at least one line. */
  Map.Entry<Conductor, Spectrum> mostLoadedLine() {
    return lines.entrySet().stream()
        .max((a, b) -> Double.compare(a.getValue().rms(), b.getValue().rms()))
        .orElseThrow();
  }

  /** Whether it has three lines and a neutral. */
  boolean isFourWire() {
    return lines.size() == 3 && neutral.isPresent();
  }
}
