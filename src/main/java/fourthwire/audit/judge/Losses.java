package fourthwire.audit.judge;

import fourthwire.audit.plan.FeederPath;
import fourthwire.audit.plan.Place;
import fourthwire.audit.plan.TransformerPlate;
import fourthwire.network.element.TransformerImpedance;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.VectorGroup;
import java.util.List;
import java.util.Map;

/**
 * Heat in the conductors that feed a node, and in a transformer's windings, watts.
 *
 * @param feederW of the feeder (of a transformer: its primary's), all orders
 * @param feederHarmonicW of that, what orders above the fundamental make
 * @param windingW of a transformer's windings, all orders
 * @param windingHarmonicW of that, what orders above the fundamental make
 */
public record Losses(
    double feederW, double feederHarmonicW, double windingW, double windingHarmonicW) {

  /**
   * Of a node.
   *
   * @param fed the currents that its feeder carries
   * @param lines the node's own lines (a transformer's: its secondary's)
   */
  static Losses of(Place place, Map<Conductor, Spectrum> fed, List<Spectrum> lines) {
    double[] feeder = new double[2];
    double[] winding = new double[2];
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      add(feeder, h, feederW(place.feeder(), fed, h));
      if (place.transformer().isPresent()) {
        add(winding, h, windingW(place.transformer().get().plate(), lines, h));
      }
    }
    return new Losses(feeder[0], feeder[1], winding[0], winding[1]);
  }

  private static void add(double[] sums, int order, double watts) {
    sums[0] += watts;
    sums[1] += order > 1 ? watts : 0;
  }

  /** Feeder and windings together. */
  public double wholeW() {
    return feederW + windingW;
  }

  /**
   * Of a neutral, the node's part: its returned current in step with what the neutral carries. That
   * is all of it, except where circuits share a neutral; their parts then sum to its heat.
   */
  private static double feederW(FeederPath feeder, Map<Conductor, Spectrum> spectra, int order) {
    double lineSquare = 0;
    double re = 0;
    double im = 0;
    for (Map.Entry<Conductor, Spectrum> e : spectra.entrySet()) {
      if (e.getKey().isLine()) {
        double lineRe = e.getValue().re(order);
        double lineIm = e.getValue().im(order);
        lineSquare += lineRe * lineRe + lineIm * lineIm;
        re += lineRe;
        im += lineIm;
      }
    }
    if (lineSquare == 0) {
      return 0;
    }
    Spectrum neutral = spectra.getOrDefault(Conductor.N, Spectrum.ZERO);
    return feeder.lossW(order, lineSquare, re * neutral.re(order) + im * neutral.im(order));
  }

  /** Σ R(h)·I², the zero sequence on its own resistance; a centre-tapped half has half of it. */
  private static double windingW(TransformerPlate plate, List<Spectrum> lines, int order) {
    TransformerImpedance z = plate.impedance();
    VectorGroup group = plate.plate().connection();
    double square = 0;
    Phasor sum = Phasor.ZERO;
    for (Spectrum line : lines) {
      square += line.magnitude(order) * line.magnitude(order);
      sum = sum.plus(line.at(order));
    }
    if (group.isSinglePhase()) {
      return z.at(order).re() * square * (group.isSplitPhase() ? 0.5 : 1);
    }
    double zeroSquare = sum.magnitude() * sum.magnitude() / 3;
    return z.at(order).re() * (square - zeroSquare) + z.zeroSequenceAt(order).re() * zeroSquare;
  }
}
