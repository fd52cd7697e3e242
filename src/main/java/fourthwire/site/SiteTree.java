package fourthwire.site;

import fourthwire.quantity.Conductor;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The tree a site hangs in, rooted at the supply in use: which node feeds which, with which
 * conductors, at which nominal voltage.
 *
 * <p>A standby supply takes over at one node (its {@code connects_at}, by default the node below
 * the normal supply): what hangs there is the tree, the rest is not supplied. Source: the public
 * contract, section 2.
 */
public final class SiteTree {
  private final Map<String, Node> byName;
  private final Map<String, List<Node>> children = new HashMap<>();

  private SiteTree(Map<String, Node> byName) {
    this.byName = byName;
    for (Node node : byName.values()) {
      node.parent()
          .ifPresent(p -> children.computeIfAbsent(p, name -> new ArrayList<>()).add(node));
    }
  }

  /** The tree on the normal supply. */
  public static SiteTree of(Survey survey) {
    return of(survey, survey.normalSupply());
  }

  /** The tree on this supply of the survey, which must have been checked. */
  public static SiteTree of(Survey survey, Supply supply) {
    return new SiteTree(new Growth(survey).from(supply));
  }

  /** All nodes, each after its parent; the first is the supply. */
  public List<Node> nodes() {
    return List.copyOf(byName.values());
  }

  /** The node of this name, a circuit's being {@code panel:circuit}. */
  public Optional<Node> find(String name) {
    return Optional.ofNullable(byName.get(name));
  }

  /** The node of this name, which must be there. */
  public Node get(String name) {
    return find(name)
        .orElseThrow(() -> new IllegalArgumentException("no node is called \"" + name + "\""));
  }

  /** The nodes fed directly from this one. */
  public List<Node> children(String name) {
    return List.copyOf(children.getOrDefault(name, List.of()));
  }

  /** The nodes from the supply down to this one, it included. */
  public List<Node> path(String name) {
    Deque<Node> path = new ArrayDeque<>();
    for (Optional<Node> n = find(name); n.isPresent(); n = n.get().parent().flatMap(this::find)) {
      path.addFirst(n.get());
    }
    return List.copyOf(path);
  }

  /** What a node is. */
  public enum Kind {
    SUPPLY,
    TRANSFORMER,
    PANEL,
    CIRCUIT;

    /** The word used in results. */
    public String word() {
      return name().toLowerCase(java.util.Locale.ROOT);
    }
  }

  /** How the lines of a section stand to each other: set by its supply or transformer. */
  public enum Section {
    /** Three lines a third of a cycle apart: line to neutral is 1/√3 of line to line. */
    THREE_PHASE(1 / Math.sqrt(3)),
    /** Two lines in opposition: line to neutral is half of line to line. */
    SPLIT_PHASE(0.5),
    /** One line: the nominal voltage is line to neutral. */
    SINGLE_PHASE(1);

    private final double lineToNeutral;

    Section(double lineToNeutral) {
      this.lineToNeutral = lineToNeutral;
    }

    /** Line-to-neutral voltage as a share of the nominal voltage. */
    public double lineToNeutralShare() {
      return lineToNeutral;
    }

    /** The section that a supply of this system, or a transformer with it, makes. */
    public static Section of(PhaseSystem system) {
      return switch (system) {
        case THREE_PHASE_4_WIRE, THREE_PHASE_3_WIRE -> THREE_PHASE;
        case SPLIT_PHASE -> SPLIT_PHASE;
        case SINGLE_PHASE -> SINGLE_PHASE;
      };
    }
  }

  /**
   * One node.
   *
   * @param name unique on the site
   * @param kind what it is
   * @param parent the node that feeds it; empty for the supply
   * @param conductors its own conductors, lines first, N last where it has one
   * @param parentLines the parent's line that feeds each of its own lines, in the same order; for a
   *     transformer the primary's lines
   * @param nominalV nominal voltage of its section: line to line, on single-phase line to neutral
   * @param section how its lines stand to each other
   * @param feeder what feeds it
   */
  public record Node(
      String name,
      Kind kind,
      Optional<String> parent,
      List<Conductor> conductors,
      List<Conductor> parentLines,
      double nominalV,
      Section section,
      Feeder feeder) {
    /** Nominal line-to-neutral voltage, volts. */
    public double lineToNeutralV() {
      return nominalV * section.lineToNeutralShare();
    }

    /** Whether it has a neutral conductor. */
    public boolean hasNeutral() {
      return conductors.contains(Conductor.N);
    }

    /** Its line conductors. */
    public List<Conductor> lines() {
      return conductors.stream().filter(Conductor::isLine).toList();
    }
  }

  /** Grows the tree from its root by the fed-from relation. */
  private static final class Growth {
    private final Survey survey;
    private final Map<String, List<Transformer>> transformers = new LinkedHashMap<>();
    private final Map<String, List<Panel>> panels = new LinkedHashMap<>();
    private final Map<String, List<Circuit>> circuits = new LinkedHashMap<>();
    private final Map<String, Node> nodes = new LinkedHashMap<>();

    Growth(Survey survey) {
      this.survey = survey;
      survey.transformers().forEach(t -> add(transformers, t.fedFrom(), t));
      survey.panels().forEach(p -> add(panels, p.fedFrom(), p));
      survey.circuits().forEach(c -> add(circuits, c.panel(), c));
    }

    private static <T> void add(Map<String, List<T>> map, String key, T value) {
      map.computeIfAbsent(key, k -> new ArrayList<>()).add(value);
    }

    Map<String, Node> from(Supply supply) {
      Node root = root(supply);
      nodes.put(root.name(), root);
      Deque<Node> open = new ArrayDeque<>(List.of(root));
      if (supply.roleOrDefault() == SupplyRole.STANDBY) {
        open = new ArrayDeque<>(takenOver(supply, root));
      }
      while (!open.isEmpty()) {
        for (Node child : below(open.removeFirst())) {
          nodes.put(child.name(), child);
          open.addLast(child);
        }
      }
      return nodes;
    }

    private static Node root(Supply supply) {
      PhaseSystem system = supply.systemOrDefault();
      return new Node(
          supply.name(),
          Kind.SUPPLY,
          Optional.empty(),
          system.conductors(),
          List.of(),
          supply.lineVoltageV(),
          Section.of(system),
          Feeder.UNKNOWN);
    }

    /** The node a standby takes over, fed from its terminals with nothing between. */
    private List<Node> takenOver(Supply standby, Node root) {
      SiteTree normal = of(survey);
      Optional<Node> node =
          standby
              .connectsAt()
              .flatMap(normal::find)
              .or(() -> normal.children(survey.normalSupply().name()).stream().findFirst());
      return node.map(
              n -> {
                Node taken =
                    new Node(
                        n.name(),
                        n.kind(),
                        Optional.of(root.name()),
                        n.conductors(),
                        n.lines(),
                        root.nominalV(),
                        root.section(),
                        Feeder.UNKNOWN);
                nodes.put(taken.name(), taken);
                return List.of(taken);
              })
          .orElse(List.of());
    }

    private List<Node> below(Node parent) {
      List<Node> children = new ArrayList<>();
      transformers
          .getOrDefault(parent.name(), List.of())
          .forEach(t -> children.add(node(t, parent)));
      panels.getOrDefault(parent.name(), List.of()).forEach(p -> children.add(node(p, parent)));
      circuits.getOrDefault(parent.name(), List.of()).forEach(c -> children.add(node(c, parent)));
      return children;
    }

    private static Node node(Transformer t, Node parent) {
      PhaseSystem system = t.connection().secondarySystem();
      return new Node(
          t.name(),
          Kind.TRANSFORMER,
          Optional.of(parent.name()),
          system.conductors(),
          t.primaryLines().isEmpty() ? parent.lines() : t.primaryLines(),
          t.secondaryV(),
          Section.of(system),
          t.feeder());
    }

    private static Node node(Panel p, Node parent) {
      List<Conductor> conductors =
          p.system().map(PhaseSystem::conductors).orElse(parent.conductors());
      List<Conductor> own = conductors.stream().filter(Conductor::isLine).toList();
      return new Node(
          p.name(),
          Kind.PANEL,
          Optional.of(parent.name()),
          conductors,
          p.parentLines().isEmpty() ? own : p.parentLines(),
          parent.nominalV(),
          parent.section(),
          p.feeder());
    }

    private static Node node(Circuit c, Node parent) {
      return new Node(
          c.id(),
          Kind.CIRCUIT,
          Optional.of(parent.name()),
          c.lines().conductors(),
          c.lines().lines(),
          parent.nominalV(),
          parent.section(),
          c.feeder());
    }
  }
}
