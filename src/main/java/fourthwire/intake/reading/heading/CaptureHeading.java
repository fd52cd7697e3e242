package fourthwire.intake.reading.heading;

import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.Optional;

/** Reads the heading of a channel of instantaneous values. */
final class CaptureHeading {
  private final Words words;
  private final String phase;

  CaptureHeading(Words words, String phase) {
    this.words = words;
    this.phase = phase;
  }

  Heading read() {
    Optional<String> letter = letter();
    if (letter.isEmpty()) {
      return Heading.none();
    }
    Optional<String> named = residual() ? Optional.of("N") : Place.of(words);
    Optional<String> place = named.or(() -> Place.phase(phase));
    if (place.isEmpty()) {
      return Heading.unclear(
          "which conductor this is: L1, L2, L3, N" + (letter.get().equals("v") ? ", L1-L2 …" : ""));
    }
    String quantity = place.get() + "." + letter.get();
    if (MeasuredQuantity.ofCapture(quantity).isEmpty()) {
      return turned(place.get(), letter.get());
    }
    return settled(quantity, 1);
  }

  /** The residual current of three lines, 3·I0, is their sum: what a neutral carries. */
  private boolean residual() {
    return words.together().matches("3?i0|ir|ires|ig|ie");
  }

  /** A pair named against the contract's order: its voltage with the sign turned. */
  private Heading turned(String place, String letter) {
    String other = place.length() == 5 ? place.substring(3) + "-" + place.substring(0, 2) : place;
    return MeasuredQuantity.ofCapture(other + "." + letter).isPresent()
        ? settled(other + "." + letter, -1)
        : Heading.unclear("which conductor this is");
  }

  private Heading settled(String quantity, double sign) {
    double factor = sign * words.unit().map(Unit::factor).orElse(1.0);
    // A numbered fourth input is the neutral by habit only.
    boolean byHabit = words.unit().isEmpty() || words.has(w -> w.matches("[iuv]4"));
    return new Heading(
        byHabit ? Heading.Meaning.LIKELY : Heading.Meaning.CLEAR,
        quantity,
        Statistic.INSTANT,
        factor,
        "");
  }

  /** {@code i} or {@code v}, by the unit, else by the words. */
  private Optional<String> letter() {
    if (words.unit().isPresent()) {
      return switch (words.unit().get().kind()) {
        case CURRENT -> Optional.of("i");
        case VOLTAGE -> Optional.of("v");
        default -> Optional.empty();
      };
    }
    if (words.has(w -> w.matches("current|amps?|i|i(l?[1-4]|[abcrstn])"))) {
      return Optional.of("i");
    }
    if (words.has(w -> w.matches("voltage|volts?|[uv]|[uv](l?[1-4]|[abcrstn]){1,2}"))) {
      return Optional.of("v");
    }
    return Optional.empty();
  }
}
