package fourthwire.site.check;

import fourthwire.quantity.Conductor;
import fourthwire.site.Panel;
import fourthwire.site.PhaseSystem;
import fourthwire.site.SiteTree.Section;
import fourthwire.site.Supply;
import fourthwire.site.Transformer;
import fourthwire.site.VectorGroup;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;

/** Whether a node's conductors and voltage fit those of the node that feeds it. */
final class WiringCheck {
  /** Taps of a transformer, the public contract, section 2. */
  private static final double MOST_VOLTAGE_DIFFERENCE = 0.05;

  private static final double ROUNDING = 1e-9;
  private static final int THREE = 3;

  private final Remarks remarks;
  private final List<WithoutNeutral> withoutNeutral = new ArrayList<>();

  private record WithoutNeutral(DraftRow<Panel> row, Wiring parent, String parentName) {}

  WiringCheck(Remarks remarks) {
    this.remarks = remarks;
  }

  Wiring ofSupply(DraftRow<Supply> row) {
    Supply supply = row.content();
    boolean systemKnown =
        row.sound("system") && (supply.system().isPresent() || row.sound("line_voltage_v"));
    if (!systemKnown) {
      return Wiring.OPEN;
    }
    PhaseSystem system = supply.systemOrDefault();
    return new Wiring(
        system.conductors(),
        List.of(),
        known(row, "line_voltage_v", supply.lineVoltageV()),
        Section.of(system),
        supply.name(),
        supply.name());
  }

  private static OptionalDouble known(DraftRow<?> row, String column, double value) {
    return row.sound(column) ? OptionalDouble.of(value) : OptionalDouble.empty();
  }

  /** The wiring of a transformer's secondary. */
  Wiring ofTransformer(DraftRow<Transformer> row, Wiring parent, String parentName) {
    Transformer t = row.content();
    if (!row.sound("connection")) {
      return Wiring.OPEN;
    }
    if (parent.isKnown() && row.sound("primary_lines")) {
      checkPrimary(row, parent, parentName);
    }
    PhaseSystem system = t.connection().secondarySystem();
    return new Wiring(
        system.conductors(),
        List.of(),
        known(row, "secondary_v", t.secondaryV()),
        Section.of(system),
        t.name(),
        t.name());
  }

  private void checkPrimary(DraftRow<Transformer> row, Wiring parent, String parentName) {
    Transformer t = row.content();
    VectorGroup connection = t.connection();
    int available = parent.lines().size();
    List<Conductor> lines = t.primaryLines().isEmpty() ? parent.lines() : t.primaryLines();
    String of = "\"%s\" (%s)".formatted(parentName, parent.words());
    if (!parent.lines().containsAll(lines)) {
      remarks.error(row, "primary_lines", "Its parent " + of + " has no such line.");
    } else if (!connection.isSinglePhase() && available < THREE) {
      remarks.error(
          row,
          "connection",
          "A three-phase transformer needs three lines; its parent "
              + of
              + " has fewer. Single-phase"
              + " are Ii0 and Iii0.");
    } else if (!connection.isSinglePhase() && lines.size() != THREE) {
      remarks.error(
          row,
          "primary_lines",
          "A three-phase transformer is fed by three lines. Leave the cell empty or name all.");
    } else if (connection.isSinglePhase() && t.primaryLines().isEmpty() && available > 1) {
      remarks.error(
          row,
          "primary_lines",
          "A single-phase transformer needs the lines that feed it, such as L1-L2 between lines or"
              + " L1 for line to neutral; its parent is "
              + of
              + ".");
    } else if (connection.isSinglePhase() && lines.size() > 2) {
      remarks.error(
          row, "primary_lines", "A single-phase transformer is fed by one line or by two.");
    } else if (lines.size() == 1 && !parent.hasNeutral()) {
      remarks.error(
          row,
          "primary_lines",
          "One line needs a neutral to return by, and its parent "
              + of
              + " has none: no neutral"
              + " upstream. Name two lines.");
    } else {
      checkVoltage(row, parent, parentName, lines.size() == 1);
    }
  }

  private void checkVoltage(
      DraftRow<Transformer> row, Wiring parent, String parentName, boolean toNeutral) {
    if (parent.nominalV().isEmpty() || !row.sound("primary_v")) {
      return;
    }
    double share = toNeutral ? parent.section().lineToNeutralShare() : 1;
    double fed = parent.nominalV().getAsDouble() * share;
    if (Math.abs(row.content().primaryV() - fed) > (MOST_VOLTAGE_DIFFERENCE + ROUNDING) * fed) {
      remarks.error(
          voltageCause(parent),
          row,
          "primary_v",
          "It is fed from \"%s\" at %.5g V%s; primary_v must be within 5 %% of that."
              .formatted(parentName, fed, toNeutral ? " line to neutral" : ""));
    }
  }

  Wiring ofPanel(DraftRow<Panel> row, Wiring parent, String parentName) {
    Panel panel = row.content();
    if (!row.sound("system", "parent_lines")) {
      return Wiring.OPEN;
    }
    if (!parent.isKnown()) {
      return panel
          .system()
          .map(s -> panelWiring(panel, s.conductors(), parent))
          .orElse(Wiring.OPEN);
    }
    List<Conductor> conductors =
        panel.system().map(PhaseSystem::conductors).orElse(parent.conductors());
    if (!linesFit(row, conductors, parent, parentName)) {
      return Wiring.OPEN;
    }
    if (conductors.contains(Conductor.N) && !parent.hasNeutral()) {
      withoutNeutral.add(new WithoutNeutral(row, parent, parentName));
      // It may hang on the wrong node: the voltage it has is not taken from there.
      return panelWiring(panel, conductors, Wiring.OPEN);
    }
    return panelWiring(panel, conductors, parent);
  }

  private static Wiring panelWiring(Panel panel, List<Conductor> conductors, Wiring parent) {
    List<Conductor> own = conductors.stream().filter(Conductor::isLine).toList();
    return new Wiring(
        conductors,
        panel.parentLines().size() == own.size() ? panel.parentLines() : own,
        parent.nominalV(),
        parent.section(),
        panel.system().isPresent() ? panel.name() : parent.origin(),
        parent.voltageOrigin());
  }

  private boolean linesFit(
      DraftRow<Panel> row, List<Conductor> conductors, Wiring parent, String parentName) {
    Panel panel = row.content();
    long own = conductors.stream().filter(Conductor::isLine).count();
    int available = parent.lines().size();
    String of = "\"%s\" (%s)".formatted(parentName, parent.words());
    if (own > available) {
      remarks.error(
          row, "system", "The panel has %d lines and its parent %s has fewer.".formatted(own, of));
    } else if (own < available && panel.parentLines().isEmpty()) {
      remarks.error(
          row,
          "parent_lines",
          "The panel has fewer lines than its parent %s; say which feed it, such as %s."
              .formatted(of, own == 1 ? "L1" : "L1-L2"));
    } else if (!parent.lines().containsAll(panel.parentLines())) {
      remarks.error(row, "parent_lines", "Its parent " + of + " has no such line.");
    } else if (!panel.parentLines().isEmpty() && panel.parentLines().size() != own) {
      remarks.error(
          row,
          "parent_lines",
          "The panel has %d line%s and the cell names %d. Mend the cell or the system."
              .formatted(own, own == 1 ? "" : "s", panel.parentLines().size()));
    } else {
      return true;
    }
    return false;
  }

  /** Reported at the end and in the order of the rows: one error for each lost neutral. */
  void reportMissingNeutrals() {
    withoutNeutral.sort(Comparator.comparingInt(w -> w.row.row()));
    withoutNeutral.forEach(
        w ->
            remarks.error(
                neutralCause(w.parent),
                w.row,
                "system",
                ("No neutral upstream: the panel has a neutral, and its parent \"%s\" has only %s."
                        + " A transformer between them can make one.")
                    .formatted(w.parentName, w.parent.words())));
  }

  /** The cause of every voltage that does not fit in a section. */
  static String voltageCause(Wiring wiring) {
    return "voltage " + wiring.voltageOrigin();
  }

  /** The cause of every line missing at a panel. */
  static String linesCause(String panel) {
    return "lines of " + panel;
  }

  /** The cause of every neutral missing below the node where it ends. */
  static String neutralCause(Wiring wiring) {
    return "neutral " + wiring.origin();
  }
}
