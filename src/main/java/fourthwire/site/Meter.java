package fourthwire.site;

import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A row of {@code meters}: a measuring point.
 *
 * @param at a supply, transformer, panel or circuit (as {@code panel:circuit})
 */
public record Meter(
    String name,
    String at,
    OptionalDouble ctRatio,
    List<Conductor> ctReversed,
    Optional<Instrument> instrument) {}
