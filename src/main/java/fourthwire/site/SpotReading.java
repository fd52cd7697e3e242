package fourthwire.site;

import java.time.LocalDateTime;
import java.util.Optional;
import java.util.OptionalDouble;

/** A row of {@code spot_readings}: one clamp reading at a node, local time. */
public record SpotReading(
    String at,
    Optional<LocalDateTime> time,
    OptionalDouble l1A,
    OptionalDouble l2A,
    OptionalDouble l3A,
    OptionalDouble nA,
    OptionalDouble l1V,
    OptionalDouble l2V,
    OptionalDouble l3V,
    OptionalDouble kw,
    OptionalDouble powerFactor,
    OptionalDouble thdPercent,
    Optional<Instrument> instrument) {

  /** The same reading at another local time. */
  public SpotReading takenAt(LocalDateTime localTime) {
    return new SpotReading(
        at,
        Optional.of(localTime),
        l1A,
        l2A,
        l3A,
        nA,
        l1V,
        l2V,
        l3V,
        kw,
        powerFactor,
        thdPercent,
        instrument);
  }
}
