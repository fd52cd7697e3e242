package fourthwire.site;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A row of {@code circuits}.
 *
 * @param name unique in its panel
 * @param sharedNeutral label of the neutral it shares with other circuits of its panel
 */
public record Circuit(
    String name,
    String panel,
    Lines lines,
    OptionalDouble breakerA,
    Optional<String> sharedNeutral,
    Feeder feeder) {
  /** The name under which the whole site knows it: {@code panel:circuit}. */
  public String id() {
    return panel + ":" + name;
  }
}
