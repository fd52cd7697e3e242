package fourthwire.limits.distortion;

import fourthwire.limits.Check;
import java.util.Optional;

/**
 * Where a distortion is held against limits that bind at the point of common coupling: there they
 * are limits, elsewhere a guide, on a generator nothing.
 */
public enum AssessmentPoint {
  /** The point of common coupling with other users of the supply. */
  COMMON_COUPLING,
  /** Any other node: over the figure is worth watching, never more. */
  INSIDE,
  /** A site running on its own generator has no common coupling. */
  GENERATOR;

  /** What a sentence adds where the limit is only a guide. */
  String remark() {
    return this == INSIDE ? " Guidance only, away from the point of common coupling." : "";
  }

  /** What being over the limit means here; empty where nothing is checked. */
  Optional<Check.Rule> rule() {
    return switch (this) {
      case COMMON_COUPLING -> Optional.of(Check.Rule.BINDING);
      case INSIDE -> Optional.of(Check.Rule.GUIDE);
      case GENERATOR -> Optional.empty();
    };
  }
}
