package fourthwire.web.load;

import fourthwire.limits.equipment.EquipmentUse;
import fourthwire.load.LoadModels;
import fourthwire.load.LoadRequest;
import fourthwire.load.Preset;
import fourthwire.load.trial.TrialSource;
import fourthwire.site.LoadKind;
import java.util.Optional;

/**
 * What the form asks, understood.
 *
 * @param name the preset's or the kind's words
 * @param request all units at the asked level, of one part where there are several
 * @param parts 1, or 3 equal ones between a line and the neutral each
 * @param use what the equipment is for, as said or as its name says
 */
record LoadQuestion(
    String name,
    Optional<Preset> preset,
    LoadRequest request,
    int parts,
    TrialSource source,
    EquipmentUse use) {

  LoadKind kind() {
    return request.kind();
  }

  /** Of one unit, all its parts together. */
  double ratedW() {
    return parts * partW();
  }

  /** Of one unit's part on one line. */
  double partW() {
    return ((LoadRequest.Rating.Watts) request.rating()).w();
  }

  double units() {
    return request.units();
  }

  boolean threeLines() {
    return request.ports() == 3;
  }

  /** Ohms of the source at the fundamental; 0 for a stiff one. */
  double sourceOhm() {
    return Math.hypot(source.ohm(), 2 * Math.PI * request.frequencyHz() * source.henry());
  }

  /** Whether it stands as the equipment standards' tests have it. */
  boolean asTested() {
    return sourceOhm() == 0
        && source.background().distortionRms() == 0
        && (request.demand() == 1 || !request.lowerPower());
  }

  /** One unit at rated power. */
  LoadRequest tested() {
    return request.inState(1, 1);
  }

  /**
   * With the efficiency found that its rated watts come to, once for all its states.
   *
   * @throws IllegalArgumentException where no equipment has these parameters
   */
  LoadQuestion sized() {
    return new LoadQuestion(name, preset, LoadModels.sized(request), parts, source, use);
  }
}
