package fourthwire.audit;

import fourthwire.site.Survey;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What an audit is run on, and how far it goes.
 *
 * @param survey the checked survey
 * @param supply the supply to run on; empty: the normal one
 * @param measured what readings say, by node
 * @param week whether the week is solved; it is on the normal supply only
 * @param draws how many draws of what the survey does not know exactly; 0: none
 * @param seed what the draws start from
 */
public record AuditRequest(
    Survey survey,
    Optional<String> supply,
    Map<String, List<MeasuredState>> measured,
    boolean week,
    int draws,
    long seed) {
  /** What draws start from where nothing else is asked for. */
  public static final long SEED = 1;

  /** The design state alone. */
  public AuditRequest(
      Survey survey, Optional<String> supply, Map<String, List<MeasuredState>> measured) {
    this(survey, supply, measured, false, 0, SEED);
  }
}
