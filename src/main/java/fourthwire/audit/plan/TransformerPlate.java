package fourthwire.audit.plan;

import fourthwire.network.element.Shunt;
import fourthwire.network.element.Transformer;
import fourthwire.network.element.TransformerImpedance;
import fourthwire.site.Supply;
import fourthwire.site.VectorGroup;
import java.util.ArrayList;
import java.util.List;

/**
 * A surveyed transformer as the network's: what the rating plate says, and what is assumed where it
 * is silent.
 */
public final class TransformerPlate {
  /** X/R where the load loss is not known; common practice, no source. */
  private static final double DEFAULT_X_OVER_R = 5;

  private final fourthwire.site.Transformer plate;
  private final List<String> assumptions = new ArrayList<>();
  private final TransformerImpedance impedance;

  public TransformerPlate(fourthwire.site.Transformer plate) {
    this.plate = plate;
    double ratio =
        plate
                .zeroSequenceImpedancePercent()
                .orElse(plate.connection().assumedZeroSequencePercent(plate.impedancePercent()))
            / plate.impedancePercent();
    this.impedance =
        TransformerImpedance.ofRating(
                plate.ratedKva(),
                plate.secondaryV(),
                plate.impedancePercent(),
                loadLossW(),
                eddyFraction())
            .withZeroSequenceRatio(ratio);
    if (plate.zeroSequenceImpedancePercent().isEmpty()
        && plate.connection().hasSecondaryNeutral()
        && !plate.connection().isSinglePhase()) {
      assumptions.add(
          "Zero-sequence impedance assumed as %.3g × the short-circuit impedance for %s."
              .formatted(ratio, plate.connection()));
    }
  }

  private double loadLossW() {
    if (plate.loadLossW().isEmpty()) {
      assumptions.add("Load loss assumed from X/R = 5 (common practice, no source).");
    }
    return plate
        .loadLossW()
        .orElse(
            TransformerImpedance.loadLossW(
                plate.ratedKva(), plate.impedancePercent(), DEFAULT_X_OVER_R));
  }

  /**
   * Winding eddy loss per unit of rated I²R: as surveyed, else mid-range planning figures of IEEE
   * C57.110-era tutorials (from memory). A survey does not say dry or oil: low-voltage primaries
   * and K-rated transformers are taken as dry.
   */
  private double eddyFraction() {
    if (plate.windingEddyLossPercent().isPresent()) {
      return plate.windingEddyLossPercent().getAsDouble() / 100;
    }
    boolean dry = plate.primaryV() <= Supply.LOW_VOLTAGE_V || plate.kRating().isPresent();
    double fraction = dry ? dryEddyFraction() : oilEddyFraction();
    assumptions.add(
        "Winding eddy loss assumed as %.3g %% of the rated I²R loss (taken as %s; typical planning figure)."
            .formatted(100 * fraction, dry ? "dry-type" : "oil-filled"));
    return fraction;
  }

  private double dryEddyFraction() {
    if (plate.ratedKva() <= 1000) {
      return 0.08;
    }
    return plate.primaryV() > 5000 ? 0.12 : 0.16;
  }

  private double oilEddyFraction() {
    if (plate.ratedKva() <= 2500) {
      return 0.01;
    }
    return plate.ratedKva() <= 5000 ? 0.03 : 0.12;
  }

  /** The network's transformer on a primary node that holds the primary lines, then N if any. */
  public Transformer transformer() {
    VectorGroup group = plate.connection();
    double ratio = plate.primaryV() / plate.secondaryV();
    if (group.isSplitPhase()) {
      return Transformer.centreTapped(0, 1, ratio, impedance);
    }
    if (group.isSinglePhase()) {
      return Transformer.singlePhase(0, 1, ratio, impedance);
    }
    return Transformer.threePhase(
        new Transformer.Connection(
            group.clock(), group.hasSecondaryNeutral(), group.passesZeroSequence()),
        ratio,
        impedance);
  }

  /** Whether the primary node needs the parent's neutral, where it has one. */
  public boolean wantsPrimaryNeutral(int primaryLines) {
    return plate.connection().primary() == VectorGroup.Primary.YN
        || (plate.connection().isSinglePhase() && primaryLines == 1);
  }

  /** The primary's own zero-sequence path (YNd), on its primary node. */
  public List<Shunt> primaryShunts(boolean primaryNeutral) {
    if (!plate.connection().shuntsPrimaryZeroSequence()) {
      return List.of();
    }
    double ratio = plate.primaryV() / plate.secondaryV();
    return List.of(impedance.primaryZeroSequencePath(ratio, primaryNeutral ? 3 : Shunt.EARTH));
  }

  /** Rated secondary line current, amps. */
  public double ratedSecondaryA() {
    double perVolt = 1000 * plate.ratedKva() / plate.secondaryV();
    return plate.connection().isSinglePhase() ? perVolt : perVolt / Math.sqrt(3);
  }

  /** Rated primary line current, amps. */
  public double ratedPrimaryA() {
    return ratedSecondaryA() * plate.secondaryV() / plate.primaryV();
  }

  public TransformerImpedance impedance() {
    return impedance;
  }

  public fourthwire.site.Transformer plate() {
    return plate;
  }

  /** Winding eddy loss per unit of rated I²R, P_EC-R. */
  public double eddyLossPu() {
    return impedance.eddyFraction();
  }

  public List<String> assumptions() {
    return List.copyOf(assumptions);
  }
}
