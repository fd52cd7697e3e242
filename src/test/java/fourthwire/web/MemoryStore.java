package fourthwire.web;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.AuditResult;
import fourthwire.audit.NodeResult;
import fourthwire.audit.NodeSummary;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;

/** Sites and audits in memory, for tests of the pages. */
public final class MemoryStore {
  private static final Instant ASKED = Instant.parse("2026-01-27T09:30:00Z");
  private final Map<Long, List<Survey>> surveys = new LinkedHashMap<>();
  private final Map<Long, AuditRepository.Entry> entries = new LinkedHashMap<>();
  private final Map<Long, List<NodeResult>> results = new LinkedHashMap<>();

  /** The sites. */
  public SiteRepository sites() {
    return new Sites();
  }

  /** The audits. */
  public AuditRepository audits() {
    return new Audits();
  }

  private final class Sites implements SiteRepository {
    @Override
    public long create(Survey survey, List<String> warnings) {
      long id = surveys.keySet().stream().mapToLong(Long::longValue).max().orElse(0) + 1;
      surveys.put(id, new ArrayList<>(List.of(survey)));
      return id;
    }

    @Override
    public OptionalInt revise(long siteId, Survey survey, List<String> warnings) {
      if (!surveys.containsKey(siteId)) {
        return OptionalInt.empty();
      }
      surveys.get(siteId).add(survey);
      return OptionalInt.of(surveys.get(siteId).size());
    }

    @Override
    public List<Revision> revisions(long siteId) {
      List<Revision> list = new ArrayList<>();
      for (int n = surveys.get(siteId).size(); n > 0; n--) {
        list.add(new Revision(n, ASKED, "0".repeat(64), List.of("Column colour is not known.")));
      }
      return list;
    }

    @Override
    public List<Entry> list() {
      return surveys.keySet().stream().flatMap(id -> find(id).stream()).toList();
    }

    @Override
    public Optional<Entry> find(long siteId) {
      return Optional.ofNullable(surveys.get(siteId))
          .map(r -> new Entry(siteId, r.get(r.size() - 1).settings().name(), r.size()));
    }

    @Override
    public Survey survey(long siteId, int revision) {
      return surveys.get(siteId).get(revision - 1);
    }

    @Override
    public boolean delete(long siteId) {
      return surveys.remove(siteId) != null;
    }
  }

  private final class Audits implements AuditRepository {
    @Override
    public long create(long siteId, int surveyRevision, Optional<String> supply) {
      long id = entries.size() + 1L;
      entries.put(
          id,
          new Entry(
              id,
              siteId,
              surveyRevision,
              supply,
              State.QUEUED,
              0,
              "",
              ASKED,
              Optional.empty(),
              List.of(),
              List.of()));
      return id;
    }

    @Override
    public List<Long> recover() {
      return List.of();
    }

    @Override
    public List<NodeSummary> summaries(long auditId) {
      return nodes(auditId).stream().map(NodeSummary::of).sorted(NodeSummary.WORST_FIRST).toList();
    }

    @Override
    public Optional<Entry> find(long auditId) {
      return Optional.ofNullable(entries.get(auditId));
    }

    @Override
    public List<Entry> ofSite(long siteId) {
      List<Entry> list =
          new ArrayList<>(entries.values().stream().filter(e -> e.siteId() == siteId).toList());
      java.util.Collections.reverse(list);
      return list;
    }

    @Override
    public boolean start(long auditId) {
      move(auditId, State.RUNNING, 0, "", Optional.empty());
      return true;
    }

    @Override
    public boolean progress(long auditId, double share, String message) {
      move(auditId, State.RUNNING, share, message, Optional.empty());
      return true;
    }

    @Override
    public boolean cancel(long auditId) {
      State state = entries.get(auditId).state();
      if (state != State.QUEUED && state != State.RUNNING) {
        return false;
      }
      move(auditId, State.CANCELLED, 0, "", Optional.empty());
      return true;
    }

    @Override
    public void finish(long auditId, AuditResult result) {
      results.put(auditId, result.nodes());
      move(auditId, State.DONE, 1, "", Optional.of(result));
    }

    @Override
    public void end(long auditId, State state, String message) {
      move(auditId, state, entries.get(auditId).progress(), message, Optional.empty());
    }

    @Override
    public List<NodeResult> nodes(long auditId) {
      return results.getOrDefault(auditId, List.of());
    }

    @Override
    public Optional<NodeResult> node(long auditId, String node) {
      return nodes(auditId).stream().filter(n -> n.node().equals(node)).findFirst();
    }

    private void move(
        long id, State state, double progress, String message, Optional<AuditResult> result) {
      Entry e = entries.get(id);
      entries.put(
          id,
          new Entry(
              id,
              e.siteId(),
              e.surveyRevision(),
              e.supply(),
              state,
              progress,
              message,
              e.asked(),
              result.map(AuditResult::engineVersion),
              result.map(AuditResult::editions).orElse(List.of()),
              result.map(AuditResult::notes).orElse(List.of())));
    }
  }
}
