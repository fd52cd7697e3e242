package fourthwire.audit;

import fourthwire.site.Survey;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What an audit is run on.
 *
 * @param survey the checked survey
 * @param supply the supply to run on; empty: the normal one
 * @param measured what readings say, by node
 */
public record AuditRequest(
    Survey survey, Optional<String> supply, Map<String, List<MeasuredState>> measured) {}
