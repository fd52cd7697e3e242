package fourthwire.site;

import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A row of {@code panels}: a switchboard or panel.
 *
 * @param parentLines which parent lines feed it, in the order of its own lines; empty where its
 *     system has all the parent's
 */
public record Panel(
    String name,
    String fedFrom,
    Optional<PhaseSystem> system,
    List<Conductor> parentLines,
    OptionalDouble busRatingA,
    OptionalDouble neutralBusRatingA,
    OptionalDouble demandA,
    Feeder feeder) {}
