package fourthwire.limits.distortion;

import fourthwire.limits.Judgement;
import fourthwire.limits.Severity;
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

  /** Over the limit inside the site is watched; near it is nothing. */
  Optional<Severity> judge(double figure, double limit) {
    return switch (this) {
      case COMMON_COUPLING -> Judgement.of(figure, limit);
      case INSIDE -> figure > limit ? Optional.of(Severity.WATCH) : Optional.empty();
      case GENERATOR -> Optional.empty();
    };
  }
}
