package fourthwire.site.conductor;

import fourthwire.quantity.Figure;
import fourthwire.site.Feeder;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What a feeder carries as installed, before any harmonic factor, and where that is known from.
 *
 * @param amps of all parallel conductors together, A; unknown with the reason
 * @param basis one sentence: the survey's own figure, or the table it was looked up in
 */
public record Ampacity(Figure amps, String basis) {
  private static final String SURVEYED = "ampacity as surveyed";

  /** Ampacity of a line: ampacity_a, else the table's for conductor_size. */
  public static Ampacity ofLine(Feeder feeder) {
    if (feeder.ampacityA().isPresent()) {
      return new Ampacity(Figure.of(feeder.ampacityA().getAsDouble()), SURVEYED);
    }
    return feeder
        .conductorSize()
        .map(size -> tabulated(feeder, size, feeder.conductorsPerLine().orElse(1)))
        .orElse(new Ampacity(Figure.unknown("neither ampacity_a nor conductor_size is given"), ""));
  }

  /**
   * Ampacity of the neutral: neutral_ampacity_a, else by neutral_size, else the line's. A neutral
   * of another size beside a surveyed line ampacity takes that ampacity in the proportion of the
   * table's, so that what the surveyor knew of the installation counts for both; several neutral
   * conductors carry as many times as much.
   */
  public static Ampacity ofNeutral(Feeder feeder) {
    if (feeder.neutralAmpacityA().isPresent()) {
      return new Ampacity(
          Figure.of(feeder.neutralAmpacityA().getAsDouble()), "ampacity as surveyed");
    }
    int count = feeder.neutralConductors().orElse(1);
    Optional<String> size = feeder.neutralSize();
    if (size.isEmpty() || size.equals(feeder.conductorSize())) {
      Ampacity line = ofLine(feeder);
      return new Ampacity(line.amps().map(a -> a * count), times(line.basis(), count));
    }
    int parallel = feeder.conductorsPerLine().orElse(1) * count;
    Ampacity own = tabulated(feeder, size.get(), parallel);
    Ampacity line = feeder.conductorSize().map(s -> tabulated(feeder, s, 1)).orElse(UNKNOWN_LINE);
    OptionalDouble surveyed = feeder.ampacityA();
    if (surveyed.isEmpty() || own.amps().value().isEmpty() || line.amps().value().isEmpty()) {
      return own;
    }
    double perLine = line.amps().value().getAsDouble() * feeder.conductorsPerLine().orElse(1);
    return new Ampacity(
        own.amps().map(a -> surveyed.getAsDouble() * a / perLine),
        SURVEYED + ", in the proportion of the neutral's size by " + own.basis());
  }

  private static final Ampacity UNKNOWN_LINE =
      new Ampacity(Figure.unknown("no conductor size"), "");

  private static String times(String basis, int count) {
    return count == 1 || basis.isEmpty() ? basis : basis + ", times " + count + " neutrals";
  }

  private static Ampacity tabulated(Feeder feeder, String sizeText, int parallel) {
    Optional<ConductorSize> size = ConductorSize.find(sizeText);
    if (size.isEmpty()) {
      return new Ampacity(Figure.unknown("no such conductor size: " + sizeText), "");
    }
    return AmpacityTables.lookUp(feeder, size.get()).times(parallel, feeder.groupingFactor());
  }

  private Ampacity times(int parallel, OptionalDouble groupingFactor) {
    double factor = parallel * groupingFactor.orElse(1);
    String text = parallel > 1 ? basis + ", " + parallel + " in parallel" : basis;
    return new Ampacity(amps.map(a -> a * factor), text);
  }
}
