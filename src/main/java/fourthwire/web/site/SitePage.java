package fourthwire.web.site;

import fourthwire.web.audit.AuditView;
import fourthwire.web.panel.NodeRow;
import fourthwire.web.panel.StatesView;
import fourthwire.web.support.Headline;
import java.util.List;
import java.util.Optional;

/**
 * What the page of a site shows.
 *
 * @param audit the audit shown; empty where none is finished yet
 * @param pending an audit that is not finished, newest first
 * @param headline the verdict in words
 * @param usualDraws how many draws an audit makes unless asked otherwise
 * @param supplies that an audit can run on, the normal one first
 * @param clampNext where a measurement would settle most verdicts; empty where nothing was drawn
 * @param outdated whether the survey has been revised since the audit shown
 */
record SitePage(
    long siteId,
    String siteName,
    String system,
    Optional<AuditView> audit,
    Optional<AuditView> pending,
    Headline.Text headline,
    List<String> holds,
    List<NodeRow> rows,
    List<String> supplies,
    int usualDraws,
    boolean outdated,
    Optional<List<StatesView.Share>> clampNext,
    List<String> notes,
    List<String> editions) {}
