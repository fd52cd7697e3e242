package fourthwire.config.openapi;

import io.swagger.v3.oas.models.media.Schema;

/** A node's result and its row in the list: section 6 of the public contract. */
final class NodeShapes {
  private static final String[] KINDS = {"supply", "transformer", "panel", "circuit"};

  private NodeShapes() {}

  /** The row of the list of nodes. */
  static Schema<?> row() {
    Shape row =
        Shape.of("A node in the list, of several lines the worst figure")
            .text("node", "Its name; a circuit as panel:circuit")
            .word("kind", "What it is", KINDS)
            .textOrNull("fed_from", "The node that feeds it; null for a supply")
            .part("findings", findingCounts())
            .figure("N.rms_a", "Amps rms in the neutral")
            .figure("N.loading_percent", "On the neutral's ampacity");
    for (String line : new String[] {"L1", "L2", "L3"}) {
      row.figureOfSome(line + ".rms_a", "Amps rms; there where the node has the line");
    }
    return row.figure("thd_percent", "Worst current THD")
        .figure("tdd_percent", "Worst TDD")
        .figure("voltage_thd_percent", "Worst voltage THD")
        .figure("transformer_loading_percent", "On the rated current")
        .figure("harmonic_loss_factor", "F_HL of the current, IEEE C57.110")
        .figure("active_w", "Watts")
        .figure("power_factor", "Active on effective apparent power")
        .figure("losses_w", "Watts lost in its feeder, or in the transformer's windings")
        .schema();
  }

  private static Schema<?> findingCounts() {
    return Shape.of("How many findings of each severity")
        .whole("act", "Over the limit")
        .whole("watch", "Over 80 % of the limit")
        .whole("note", "Information")
        .schema();
  }

  /** The result. */
  static Schema<?> node() {
    return Shape.of("The result for a node")
        .text("node", "Its name; a circuit as panel:circuit")
        .word("kind", "What it is", KINDS)
        .textOrNull("fed_from", "The node that feeds it; null for a supply")
        .text("supply", "The supply in use")
        .partOrReason("design", design())
        .partOrReason("range", StateShapes.range())
        .partOrReason("doubt", StateShapes.doubt())
        .partOrReason("week", StateShapes.week())
        .partOrReason("measured", measured(true))
        .list("findings", "What is over a limit, near it, or worth a note", finding())
        .list("assumptions", "What was assumed for this node", Shape.text("A sentence"))
        .partOrReason("impedance", StateShapes.impedance())
        .list("bank_steps", "Resonances of the switched banks here", StateShapes.bankStep())
        .schema();
  }

  private static Schema<?> design() {
    return Shape.of("The design state: every load at its demand, schedules ignored")
        .part("current", Figures.current())
        .part("voltage", Figures.voltage(true))
        .part("spectrum", Figures.spectrum())
        .part("voltage_spectrum", Figures.voltageSpectrum())
        .part("power", Figures.power().text("basis", "How the sums are taken").schema())
        .part("power_by_line", Figures.powerByLine())
        .figure("demand_a", "I_L, the demand current that TDD stands on, amps")
        .text("demand_basis", "What demand_a is taken from")
        .figure("short_circuit_a", "I_sc solved at the node, amps")
        .partOrReason("transformer", transformer())
        .partOrReason("primary", primary())
        .figure("harmonic_loss_factor", "Sum of I_h^2*h^2 on sum of I_h^2, orders 1 to 50")
        .figure("losses_w", "Watts lost in its feeder, or in the transformer's windings")
        .figure("current_unbalance_percent", "Negative on positive sequence, fundamental")
        .figure("zero_sequence_percent", "Zero on positive sequence, fundamental current")
        .figure("voltage_unbalance_percent", "Negative on positive sequence, fundamental voltage")
        .list("resonances", "Orders at which a bank and the network resonate", resonance())
        .list("neutral_adders", "What feeds the neutral, largest first", adder())
        .schema();
  }

  private static Schema<?> transformer() {
    return Shape.of("Of a transformer; its other figures are its secondary's")
        .figure("loading_percent", "Largest line's rms on the rated current")
        .figure("k_factor", "Sum of (I_h/I_rated)^2*h^2, largest line")
        .figure("derated_kva", "What it may carry with this spectrum, IEEE C57.110")
        .figure("factor_k", "Factor K, EN 50541")
        .schema();
  }

  private static Schema<?> primary() {
    return Shape.of("A transformer's primary side")
        .part("current", Figures.current())
        .part("spectrum", Figures.spectrum())
        .schema();
  }

  private static Schema<?> resonance() {
    return Shape.of("A resonance")
        .number("order", "At this order; need not be whole")
        .number("ohm", "Impedance there")
        .text("bank", "The capacitor bank or filter")
        .word("kind", "parallel: a peak of the impedance; series: a dip", "parallel", "series")
        .schema();
  }

  private static Schema<?> adder() {
    return Shape.of("A node below")
        .text("node", "Its name")
        .number("a", "Amps it adds to the neutral")
        .schema();
  }

  private static Schema<?> measured(boolean first) {
    Shape measured =
        Shape.of("What a meter or clamp reading says of the node")
            .text("meter", "The meter, or \"clamp reading\"")
            .wholeOrNull("reading", "Id of the reading; null for one in the survey")
            .figure(
                "demand_a",
                "I_L of the standard's definition, amps; null where the log is too short")
            .text("demand_basis", "From what demand_a was formed, and from which set of rows")
            .part("period", Figures.period("When it was measured; null where it is not known"))
            .optional("period_reason", Shape.text("Why period is null"))
            .text("basis", "What the figures are: one capture, the highest interval")
            .part("current", Figures.current())
            .part("voltage", Figures.voltage(false))
            .part("power", Figures.power().schema())
            .part("spectrum", Figures.spectrum());
    return first
        ? measured.list("further", "What others say of it", measured(false)).schema()
        : measured.schema();
  }

  private static Schema<?> finding() {
    return Shape.of("A finding")
        .text("code", "What kind of finding")
        .word(
            "severity",
            "act: over the limit, or so with probability 0.5; watch: over 80 % of it, or 0.1",
            "act",
            "watch",
            "note")
        .figure("figure", "What was computed or measured, in unit")
        .figure("limit", "What it is held against, in unit")
        .text("unit", "The unit of both")
        .figure("probability", "That it is over the limit, 0 to 1; by the draws")
        .text("basis", "Document, edition, clause")
        .text("sentence", "The finding in words")
        .schema();
  }
}
