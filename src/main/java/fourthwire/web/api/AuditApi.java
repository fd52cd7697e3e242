package fourthwire.web.api;

import com.fasterxml.jackson.annotation.JsonProperty;
import fourthwire.audit.AuditRepository;
import fourthwire.jobs.AuditService;
import fourthwire.jobs.RefusedException;
import fourthwire.json.NodeJson;
import fourthwire.json.SummaryJson;
import fourthwire.site.SiteRepository;
import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.Parameter;
import io.swagger.v3.oas.annotations.media.ArraySchema;
import io.swagger.v3.oas.annotations.media.Content;
import io.swagger.v3.oas.annotations.media.Schema;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import io.swagger.v3.oas.annotations.tags.Tag;
import java.math.BigDecimal;
import java.net.URI;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.jspecify.annotations.Nullable;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RestController;
import tools.jackson.databind.node.ObjectNode;

/** Audits and the results of their nodes. */
@RestController
@RequestMapping(path = "/api/v1", produces = MediaType.APPLICATION_JSON_VALUE)
@Tag(name = "Audits", description = "Audits of a site's survey, and their results node by node")
class AuditApi {
  private static final BigDecimal MOST_DRAWS = BigDecimal.valueOf(10_000);

  private final AuditService service;
  private final AuditRepository audits;
  private final SiteRepository sites;

  AuditApi(AuditService service, AuditRepository audits, SiteRepository sites) {
    this.service = service;
    this.audits = audits;
    this.sites = sites;
  }

  /** What is asked for. */
  @Schema(name = "AuditOrder", description = "What is asked for; every part may be left out")
  record Order(
      @Schema(description = "The supply to run on; left out: the normal one")
          @Nullable String supply,
      @Schema(
              description =
                  "How many sites to draw from what the survey leaves open; left out: 100 on a site"
                      + " of up to 100 load rows, none on a larger one",
              type = "integer",
              minimum = "0",
              maximum = "10000")
          @Nullable BigDecimal draws) {}

  /** The audit that was queued. */
  @Schema(name = "QueuedAudit", description = "The audit that was queued")
  record Queued(@Schema(description = "Id of the audit") long id) {}

  /** An audit. */
  @Schema(name = "Audit", description = "An audit and how far it is")
  record State(
      @Schema(description = "Id of the audit") long id,
      @Schema(description = "Id of its site") long site,
      @Schema(description = "Revision of the survey it is of") int revision,
      @Schema(
              description = "The supply asked for; null: the normal one",
              types = {"string", "null"})
          Optional<String> supply,
      @Schema(description = "How many sites are drawn from what the survey leaves open") int draws,
      @Schema(allowableValues = {"queued", "running", "done", "failed", "cancelled"}) String state,
      @Schema(description = "0 to 1") double progress,
      @Schema(description = "What is being done, or why it failed") String message,
      @Schema(description = "When it was asked for, UTC") Instant asked,
      @Schema(
              description = "Version of the engine that computed it; null until it is done",
              types = {"string", "null"})
          @JsonProperty("engine_version")
          Optional<String> engineVersion,
      @Schema(description = "Documents and editions of the limits used") List<String> editions,
      @Schema(description = "What holds for the whole site") List<String> notes) {}

  @PostMapping("/sites/{site}/audits")
  @Operation(
      summary = "Audit a site's latest survey",
      description = "The audit runs in the background; watch it at its Location.")
  @ApiResponse(responseCode = "202", description = "It is queued")
  ResponseEntity<Queued> ask(
      @PathVariable long site, @RequestBody(required = false) @Nullable Order order) {
    Optional<String> supply = Optional.ofNullable(order).map(Order::supply);
    OptionalInt draws =
        Optional.ofNullable(order)
            .map(Order::draws)
            .map(d -> OptionalInt.of(draws(d)))
            .orElse(OptionalInt.empty());
    long id = service.ask(site, supply, draws).orElseThrow(() -> MissingException.site(site));
    return ResponseEntity.accepted()
        .location(URI.create("/api/v1/audits/" + id))
        .body(new Queued(id));
  }

  private static int draws(BigDecimal draws) {
    boolean whole = draws.signum() == 0 || draws.stripTrailingZeros().scale() <= 0;
    if (!whole || draws.signum() < 0 || draws.compareTo(MOST_DRAWS) > 0) {
      throw new RefusedException(
          "draws is " + draws + "; it must be a whole number from 0 to " + MOST_DRAWS);
    }
    return draws.intValueExact();
  }

  @GetMapping("/sites/{site}/audits")
  @Operation(summary = "List a site's audits, newest first")
  @ApiResponse(responseCode = "200", description = "All its audits")
  List<State> list(@PathVariable long site) {
    if (sites.find(site).isEmpty()) {
      throw MissingException.site(site);
    }
    return audits.ofSite(site).stream().map(AuditApi::state).toList();
  }

  @GetMapping("/audits/{audit}")
  @Operation(summary = "How far an audit is")
  @ApiResponse(responseCode = "200", description = "Its state")
  State get(@PathVariable long audit) {
    return state(existing(audit));
  }

  @PostMapping("/audits/{audit}/cancel")
  @Operation(
      summary = "Ask an audit to stop",
      description = "It stops within two seconds; one that has ended stays as it is.")
  @ApiResponse(responseCode = "200", description = "Its state after asking")
  State cancel(@PathVariable long audit) {
    service.cancel(audit);
    return state(existing(audit));
  }

  @GetMapping("/audits/{audit}/nodes")
  @Operation(
      summary = "List the nodes of a finished audit, worst first",
      description = "Of several lines the worst figure; unknown figures are null with a reason.")
  @ApiResponse(
      responseCode = "200",
      description = "One row a node",
      content =
          @Content(array = @ArraySchema(schema = @Schema(ref = "#/components/schemas/NodeRow"))))
  List<ObjectNode> nodes(@PathVariable long audit) {
    finished(audit);
    return audits.summaries(audit).stream().map(SummaryJson::write).toList();
  }

  @GetMapping("/audits/{audit}/nodes/{node}")
  @Operation(summary = "The result for a supply, transformer, panel or circuit")
  @ApiResponse(
      responseCode = "200",
      description = "Everything computed and measured at the node",
      content = @Content(schema = @Schema(ref = "#/components/schemas/Node")))
  ObjectNode node(
      @PathVariable long audit,
      @Parameter(description = "Its name, URL-encoded; a circuit as panel:circuit") @PathVariable
          String node) {
    finished(audit);
    return audits
        .node(audit, node)
        .map(NodeJson::write)
        .orElseThrow(
            () -> new MissingException("audit " + audit + " has no node \"" + node + "\""));
  }

  private AuditRepository.Entry existing(long audit) {
    return audits.find(audit).orElseThrow(() -> MissingException.audit(audit));
  }

  private void finished(long audit) {
    AuditRepository.Entry entry = existing(audit);
    if (entry.state() != AuditRepository.State.DONE) {
      throw new NotFinishedException(
          "audit " + audit + " has no results: it is " + entry.state().word());
    }
  }

  private static State state(AuditRepository.Entry e) {
    return new State(
        e.id(),
        e.siteId(),
        e.surveyRevision(),
        e.supply(),
        e.draws(),
        e.state().word(),
        e.progress(),
        e.message(),
        e.asked(),
        e.engineVersion(),
        e.editions(),
        e.notes());
  }
}
