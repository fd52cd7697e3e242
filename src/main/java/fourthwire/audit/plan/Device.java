package fourthwire.audit.plan;

import fourthwire.audit.AuditFailedException;
import fourthwire.load.DesignPowers;
import fourthwire.load.LoadModels;
import fourthwire.load.LoadRequest.Rating;
import fourthwire.load.model.LoadModel;
import fourthwire.load.model.NoSteadyStateException;

/**
 * A placed load with its model.
 *
 * @param placement where it stands
 * @param model what it draws
 */
public record Device(LoadPlacement placement, LoadModel model) {
  /**
   * Makes the model; says which load it is if that can't be done.
   *
   * @param known powers found for loads before
   */
  public static Device of(LoadPlacement placement, DesignPowers known) {
    try {
      return new Device(placement, LoadModels.of(placement.request(), known));
    } catch (IllegalArgumentException | NoSteadyStateException e) {
      throw new AuditFailedException(
          "Load \"%s\" on %s: %s"
              .formatted(placement.load().name(), placement.circuit(), e.getMessage()),
          e);
    }
  }

  /** Whether the model puts anything into the network's matrix. */
  public boolean hasLinearPart() {
    double[] y = new double[6];
    for (int order = 1; order <= 7; order += 2) {
      model.linearSiemens(order, y);
      for (double part : y) {
        if (part != 0) {
          return true;
        }
      }
    }
    return false;
  }

  /** About how many amps it draws, to weigh loads against each other; never 0. */
  public double roughA() {
    Rating rating = placement.request().rating();
    double volts = placement.request().nominalPortV();
    double lines = placement.request().ports() == 3 ? Math.sqrt(3) : 1;
    double unitA;
    if (rating instanceof Rating.Watts w) {
      unitA = w.w() / (lines * volts);
    } else if (rating instanceof Rating.VoltAmperes va) {
      unitA = va.va() / (lines * volts);
    } else {
      unitA = ((Rating.Amps) rating).a();
    }
    return unitA * placement.request().units() * placement.request().demand();
  }
}
