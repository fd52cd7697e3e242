package fourthwire.config.openapi;

import io.swagger.v3.oas.models.media.Schema;
import java.util.LinkedHashSet;
import java.util.List;

/** What a node's result holds besides its design state: doubt, week, impedance. */
final class StateShapes {
  private StateShapes() {}

  /** Percentiles over the draws by figure. */
  static Schema<?> range() {
    return Shape.of("Percentiles over the draws, by the name of the figure (as in the list)")
        .others(
            Shape.of("A figure's percentiles over the draws")
                .number("p5", "One draw in twenty is lower")
                .number("p50", "Half of the draws are lower")
                .number("p95", "One draw in twenty is higher")
                .schema())
        .schema();
  }

  /** Where the doubt comes from. */
  static Schema<?> doubt() {
    return Shape.of("Where the doubt comes from")
        .whole("draws", "How many sites were drawn and solved")
        .whole("seed", "What the draws start from; the same seed gives the same figures")
        .text("ranked", "The figure whose doubt the inputs explain")
        .list(
            "inputs",
            "What the doubt comes from, largest first",
            Shape.of("A group of inputs")
                .text("input", "In words")
                .number("share", "Of the variance, 0 to 1")
                .schema())
        .list(
            "clamp_next",
            "At the supply: measuring points that would settle most of the verdicts, best first",
            Shape.of("A measuring point")
                .text("node", "Where to clamp")
                .number("share", "Of the doubt in the site's verdicts, 0 to 1")
                .schema())
        .schema();
  }

  /** The week. */
  static Schema<?> week() {
    Schema<?> value = Shape.number("Of one hour");
    value.setTypes(new LinkedHashSet<>(List.of("number", "null")));
    return Shape.of(
            "The week: hour by hour under the figures' names (as in the list), Monday 00 h first")
        .text("basis", "How the week was made")
        .whole("solved_hours", "How many different hours were solved")
        .part(
            "hours_over_limit",
            Shape.of("Hours over the limit, by the code of the check")
                .others(Shape.whole("Hours of 168"))
                .schema())
        .part("percentiles", percentiles())
        .number("energy_kwh", "Active energy through the node")
        .number("losses_kwh", "Lost in its feeder and a transformer's windings")
        .number("feeder_losses_kwh", "Lost in its feeder; of a transformer: its primary's")
        .number("feeder_harmonic_losses_kwh", "Of that, what orders above 1 make")
        .number("transformer_losses_kwh", "Lost in a transformer's windings")
        .number("transformer_harmonic_losses_kwh", "Of that, what orders above 1 make")
        .figure("energy_cost", "Price of the energy")
        .figure("losses_cost", "Price of the losses")
        .figure("energy_price_per_kwh", "As surveyed")
        .text("currency", "Of the price; empty where not surveyed")
        .others(Shape.listOf("168 values; null where a figure is not known", value))
        .schema();
  }

  private static Schema<?> percentiles() {
    return Shape.of("Over the hours, by the name of the figure")
        .others(
            Shape.of("A figure over the hours")
                .number("p5", "5th percentile")
                .number("p50", "50th percentile")
                .number("p95", "95th percentile")
                .number("p99", "99th percentile")
                .number("mean", "Mean")
                .number("max", "Largest hour")
                .schema())
        .schema();
  }

  /** Impedance against the order. */
  static Schema<?> impedance() {
    return Shape.of("Impedance seen from a supply, transformer or panel against the order")
        .number("first_order", "Order of the first value")
        .number("step", "From one value's order to the next")
        .list("ohm", "Magnitudes", Shape.number("Ohms"))
        .schema();
  }

  /** One step of a switched bank. */
  static Schema<?> bankStep() {
    return Shape.of("The resonance at one step of a switched bank")
        .text("bank", "Its name")
        .whole("step", "How many steps are in")
        .whole("steps", "How many it has")
        .number("kvar", "What is in")
        .number("order", "Where the impedance at its panel peaks")
        .number("ohm", "How high")
        .schema();
  }
}
