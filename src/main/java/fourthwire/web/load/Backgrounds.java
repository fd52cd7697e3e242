package fourthwire.web.load;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.Locale;

/** Shapes of a distorted supply to choose from (common practice, no source). */
enum Backgrounds {
  /** A sine. */
  NONE(0, 0, 0),
  /** The crest worn down by rectifiers: the usual shape in offices. */
  FLAT(1.5, 3, 1),
  /** The crest drawn up, as behind a long line with capacitors. */
  PEAKED(-1, -2, -0.8);

  private final double third;
  private final double fifth;
  private final double seventh;

  /** Percent of the fundamental: positive lowers the crest. */
  Backgrounds(double third, double fifth, double seventh) {
    this.third = third;
    this.fifth = fifth;
    this.seventh = seventh;
  }

  String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** At the crest, 90°, sin(3·90°) = sin(7·90°) = -1 and sin(5·90°) = 1. */
  Spectrum spectrum() {
    return Spectrum.of(
        h ->
            switch (h) {
              case 3 -> new Phasor(third / 100, 0);
              case 5 -> new Phasor(-fifth / 100, 0);
              case 7 -> new Phasor(seventh / 100, 0);
              default -> Phasor.ZERO;
            });
  }
}
