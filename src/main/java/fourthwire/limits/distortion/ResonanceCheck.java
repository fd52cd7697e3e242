package fourthwire.limits.distortion;

import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Severity;
import fourthwire.limits.Words;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Parallel resonances between a bank and the network's inductance: one within half an order of an
 * order that carries current raises that order's voltage and the bank's own current.
 *
 * <p>"Carries current": at least 1 % of the fundamental on some line (common practice, no source).
 */
public final class ResonanceCheck {
  private static final String BASIS = "common practice, no source: within half an order";
  private static final double HALF_AN_ORDER = 0.5;
  private static final double CARRIES_PERCENT = 1;

  private ResonanceCheck() {}

  /**
   * A peak of the impedance.
   *
   * @param order where it stands
   * @param ohm how high, ohms
   * @param bank the bank that makes it
   */
  public record Peak(double order, double ohm, String bank) {}

  /**
   * One finding for each peak near an order that carries current.
   *
   * @param peaks peaks of the impedance seen from the node
   * @param currents line currents there without their zero sequence, amps
   */
  public static List<Finding> judge(List<Peak> peaks, Collection<Spectrum> currents) {
    return peaks.stream().map(peak -> judge(peak, currents)).flatMap(Optional::stream).toList();
  }

  private static Optional<Finding> judge(Peak peak, Collection<Spectrum> currents) {
    return IntStream.rangeClosed(2, Spectrum.HIGHEST_ORDER)
        .filter(h -> Math.abs(h - peak.order()) <= HALF_AN_ORDER)
        .filter(h -> carriedPercent(h, currents) >= CARRIES_PERCENT)
        .boxed()
        .max((a, b) -> Double.compare(carriedPercent(a, currents), carriedPercent(b, currents)))
        .map(h -> finding(peak, h, carriedPercent(h, currents)));
  }

  private static Finding finding(Peak peak, int order, double percent) {
    String sentence =
        "Bank %s resonates with the network at order %s (%s ohm), close to the %s harmonic, which is %s %% of the line current's fundamental."
            .formatted(
                peak.bank(),
                Words.number(peak.order()),
                Words.number(peak.ohm()),
                Words.ordinal(order),
                Words.number(percent));
    return new Finding(
        FindingCode.RESONANCE.word(),
        Severity.WATCH,
        Figure.of(peak.order()),
        Figure.of(order),
        "order",
        Figure.unknown("no spread was computed"),
        BASIS,
        sentence);
  }

  private static double carriedPercent(int order, Collection<Spectrum> currents) {
    return currents.stream()
        .filter(i -> i.magnitude(1) > 0)
        .mapToDouble(i -> 100 * i.magnitude(order) / i.magnitude(1))
        .max()
        .orElse(0);
  }
}
