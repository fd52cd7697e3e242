package fourthwire.site;

import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.OptionalDouble;

/**
 * A row of {@code transformers}.
 *
 * @param primaryLines which parent lines feed it; empty where all do
 */
public record Transformer(
    String name,
    String fedFrom,
    double ratedKva,
    double primaryV,
    double secondaryV,
    VectorGroup connection,
    double impedancePercent,
    OptionalDouble loadLossW,
    OptionalDouble noLoadLossW,
    OptionalDouble windingEddyLossPercent,
    OptionalDouble zeroSequenceImpedancePercent,
    OptionalDouble kRating,
    List<Conductor> primaryLines,
    OptionalDouble demandA,
    Feeder feeder) {}
