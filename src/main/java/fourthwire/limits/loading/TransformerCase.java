package fourthwire.limits.loading;

import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.OptionalDouble;

/**
 * A transformer and the currents of its secondary.
 *
 * @param ratedKva rating, kVA
 * @param ratedA rated current of the secondary's lines, amps
 * @param lines secondary line currents, amps
 * @param eddyFraction winding eddy loss on rated I²R loss, P_EC-R of IEEE C57.110
 * @param kRating its K rating; empty for a transformer without one
 */
public record TransformerCase(
    double ratedKva,
    double ratedA,
    List<Spectrum> lines,
    double eddyFraction,
    OptionalDouble kRating) {}
