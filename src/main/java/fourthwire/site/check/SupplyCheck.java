package fourthwire.site.check;

import fourthwire.site.Background;
import fourthwire.site.Supply;
import fourthwire.site.SupplyRole;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Whether the supplies are one normal and the rest standby, each fully described. */
final class SupplyCheck {
  private static final String ROLE = "role";
  private static final String FAULT_LEVEL = "fault_level_mva";
  private static final String GENERATOR = "generator_kva";
  private static final String REACTANCE = "subtransient_reactance_percent";
  private static final String CONNECTS_AT = "connects_at";
  private static final double MOST_VOLTAGE_DIFFERENCE = 0.05;

  private final SurveyDraft draft;
  private final NodeIndex nodes;
  private final Map<String, Wiring> wirings;
  private final Remarks remarks;

  SupplyCheck(SurveyDraft draft, NodeIndex nodes, Map<String, Wiring> wirings, Remarks remarks) {
    this.draft = draft;
    this.nodes = nodes;
    this.wirings = wirings;
    this.remarks = remarks;
  }

  void check() {
    checkRoles();
    draft.supplies().rows().stream()
        .filter(r -> r.sound(FAULT_LEVEL, GENERATOR, REACTANCE))
        .forEach(this::checkSource);
    draft.supplies().rows().stream().filter(r -> r.sound(ROLE)).forEach(this::checkConnection);
    checkBackground();
  }

  private void checkRoles() {
    List<DraftRow<Supply>> normal =
        draft.supplies().rows().stream()
            .filter(r -> r.sound(ROLE) && r.content().roleOrDefault() == SupplyRole.NORMAL)
            .toList();
    boolean hidden = draft.supplies().mayHide(ROLE);
    if (normal.isEmpty() && !hidden) {
      remarks.error(
          new SurveyError(
              draft.supplies().name(),
              0,
              ROLE,
              "",
              "No supply has the role normal; exactly one must have it."));
    }
    normal.stream()
        .skip(1)
        .forEach(
            r ->
                remarks.error(
                    r,
                    ROLE,
                    "Exactly one supply is the normal one, and that of %s is already (an empty role"
                            .formatted(normal.get(0).place())
                        + " means normal). Accepted here is standby."));
  }

  private void checkSource(DraftRow<Supply> row) {
    Supply s = row.content();
    boolean generator =
        s.generatorKva().isPresent() || s.subtransientReactancePercent().isPresent();
    if (generator && s.faultLevelMva().isPresent()) {
      remarks.error(
          row,
          s.generatorKva().isPresent() ? GENERATOR : REACTANCE,
          "A supply is a grid with fault_level_mva or a generator with generator_kva and"
              + " subtransient_reactance_percent, not both.");
    } else if (!generator && s.faultLevelMva().isEmpty()) {
      remarks.error(
          row,
          FAULT_LEVEL,
          "A supply needs fault_level_mva, or generator_kva with subtransient_reactance_percent.");
    } else if (generator && s.generatorKva().isEmpty()) {
      remarks.error(row, GENERATOR, "A generator needs generator_kva beside its reactance.");
    } else if (generator && s.subtransientReactancePercent().isEmpty()) {
      remarks.error(
          row, REACTANCE, "A generator needs subtransient_reactance_percent beside its rating.");
    }
  }

  private void checkConnection(DraftRow<Supply> row) {
    Supply supply = row.content();
    if (supply.roleOrDefault() == SupplyRole.NORMAL) {
      if (supply.connectsAt().isPresent()) {
        remarks.warning(row, "connects_at is of a standby supply only and was not used.");
      }
      return;
    }
    if (!row.sound(CONNECTS_AT)) {
      return;
    }
    Optional<String> node = supply.connectsAt();
    if (node.isEmpty()) {
      node = nodeBelowNormal(row);
    } else if (!isTakeable(row, node.get())) {
      return;
    }
    node.ifPresent(n -> checkTakeover(row, n));
  }

  private boolean isTakeable(DraftRow<Supply> row, String name) {
    Optional<NodeIndex.Node> node = nodes.find(name);
    if (node.isEmpty() && !nodes.mayHide()) {
      remarks.error(
          nodes.missing(name),
          row,
          CONNECTS_AT,
          "No transformer or panel is called \"%s\".".formatted(name)
              + Closest.hint(name, nodes.names()));
    } else if (node.isPresent() && node.get().kind() == NodeIndex.Kind.SUPPLY) {
      remarks.error(
          row,
          CONNECTS_AT,
          "\"%s\" is a supply; a standby takes over a transformer or a panel.".formatted(name));
      return false;
    }
    return node.isPresent() && !nodes.isDoubtful(name);
  }

  private Optional<String> nodeBelowNormal(DraftRow<Supply> row) {
    Set<String> normal = new HashSet<>();
    draft.supplies().rows().stream()
        .filter(s -> s.sound("supply", ROLE))
        .filter(s -> s.content().roleOrDefault() == SupplyRole.NORMAL)
        .forEach(s -> normal.add(s.content().name()));
    List<String> below = new ArrayList<>();
    draft.transformers().rows().stream()
        .filter(t -> t.sound("transformer") && normal.contains(t.content().fedFrom()))
        .forEach(t -> below.add(t.content().name()));
    draft.panels().rows().stream()
        .filter(p -> p.sound("panel") && normal.contains(p.content().fedFrom()))
        .forEach(p -> below.add(p.content().name()));
    if (below.size() > 1) {
      remarks.warning(
          row,
          "several nodes hang on the normal supply (%s); the standby takes over the first. Name it in"
                  .formatted(String.join(", ", below))
              + " connects_at if that is not meant.");
    }
    return below.stream().findFirst();
  }

  /** A standby takes over a transformer at its secondary terminals, or a panel at its bus. */
  private void checkTakeover(DraftRow<Supply> row, String node) {
    Wiring own = wirings.getOrDefault(row.content().name(), Wiring.OPEN);
    Wiring taken = wirings.getOrDefault(node, Wiring.OPEN);
    if (!own.isKnown() || !taken.isKnown()) {
      return;
    }
    if (!own.conductors().containsAll(taken.conductors())) {
      remarks.error(
          row,
          row.content().connectsAt().isPresent() ? CONNECTS_AT : "system",
          "The node \"%s\" that it takes over has the conductors %s, and the supply only %s."
              .formatted(node, taken.words(), own.words()));
    } else if (own.nominalV().isPresent() && taken.nominalV().isPresent()) {
      double nominal = taken.nominalV().getAsDouble();
      if (Math.abs(own.nominalV().getAsDouble() - nominal) > MOST_VOLTAGE_DIFFERENCE * nominal) {
        remarks.error(
            WiringCheck.voltageCause(taken),
            row,
            "line_voltage_v",
            "The node \"%s\" that it takes over is at %.5g V; the supply must be within 5 %% of that."
                .formatted(node, nominal));
      }
    }
  }

  private void checkBackground() {
    Map<String, DraftRow<Background>> first = new HashMap<>();
    for (DraftRow<Background> row : draft.background().rows()) {
      if (!row.sound("supply") || !isSupply(row) || !row.sound("order")) {
        continue;
      }
      Background b = row.content();
      DraftRow<Background> earlier = first.putIfAbsent(b.supply() + "/" + b.order(), row);
      if (earlier != null) {
        remarks.error(
            row,
            "order",
            "Supply \"%s\" has this order in %s already.".formatted(b.supply(), earlier.place()));
      }
    }
  }

  private boolean isSupply(DraftRow<Background> row) {
    String name = row.content().supply();
    boolean supply = nodes.supply(name).isPresent();
    if (!supply && !nodes.mayHide()) {
      remarks.error(
          nodes.missing(name), row, "supply", "No supply is called \"%s\".".formatted(name));
    }
    return supply;
  }
}
