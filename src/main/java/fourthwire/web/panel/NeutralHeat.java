package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import fourthwire.web.figure.Rail;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;

/**
 * What heats a neutral: the share of each order in the square of its current. The fundamental is
 * what the lines' unbalance leaves; orders 3, 9 and 15 add up in N even on balanced lines.
 */
final class NeutralHeat {
  private static final int[] TRIPLENS = {3, 9, 15};
  private static final double WORTH_SAYING = 0.005;

  private NeutralHeat() {}

  static List<Rail.Part> parts(Words words, DesignState design) {
    Spectrum neutral = design.currentSpectrum().get(Conductor.N);
    double whole = neutral == null ? 0 : neutral.rms() * neutral.rms();
    if (neutral == null || whole == 0) {
      return List.of();
    }
    List<Rail.Part> parts = new ArrayList<>();
    double rest = 1;
    rest -= add(parts, "unbalance", square(neutral, 1) / whole, words);
    for (int order : TRIPLENS) {
      rest -= add(parts, String.valueOf(order), square(neutral, order) / whole, words);
    }
    add(parts, "other", Math.max(0, rest), words);
    return parts;
  }

  private static double add(List<Rail.Part> parts, String key, double share, Words words) {
    if (share < WORTH_SAYING) {
      return 0;
    }
    parts.add(new Rail.Part(key, share, words.of("heat." + key)));
    return share;
  }

  private static double square(Spectrum spectrum, int order) {
    return spectrum.magnitude(order) * spectrum.magnitude(order);
  }
}
