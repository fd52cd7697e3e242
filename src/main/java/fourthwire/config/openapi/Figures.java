package fourthwire.config.openapi;

import io.swagger.v3.oas.models.media.Schema;
import java.util.LinkedHashSet;
import java.util.List;

/** Shapes that computed and measured results share: section 6 of the public contract. */
final class Figures {
  private static final List<String> LINES = List.of("L1", "L2", "L3");
  private static final List<String> PAIRS = List.of("L1-L2", "L2-L3", "L3-L1");

  private Figures() {}

  /** Currents of a node's lines, and its neutral. */
  static Schema<?> current() {
    Shape current = Shape.of("Currents by conductor; only the conductors the node has, and N");
    LINES.forEach(line -> current.optional(line, lineCurrent()));
    return current.part("N", neutralCurrent()).schema();
  }

  private static Schema<?> lineCurrent() {
    return Shape.of("A line's current; positive from source to load")
        .figure("rms_a", "Amps rms, orders 1 to 50 together")
        .figure("fundamental_a", "Amps rms of order 1")
        .figure("thd_percent", "Orders 2 to 50 on the fundamental")
        .figure("tdd_percent", "Orders 2 to 50 on the demand current I_L")
        .figure("loading_percent", "rms_a on ampacity_a")
        .figure("ampacity_a", "Amps the conductor, breaker or bus may carry, the smallest")
        .text("ampacity_basis", "What ampacity_a is taken from; empty where it is not known")
        .schema();
  }

  private static Schema<?> neutralCurrent() {
    return Shape.of("The neutral's current; positive from load to source")
        .figure("rms_a", "Amps rms, orders 1 to 50 together")
        .figure("percent_of_mean_line", "rms_a on the mean of the lines' rms_a")
        .figure("loading_percent", "rms_a on ampacity_a")
        .figure("ampacity_a", "Amps the neutral may carry: the smaller of feeder and neutral bus")
        .text("ampacity_basis", "What ampacity_a is taken from; empty where it is not known")
        .schema();
  }

  /** Voltages to the node's own neutral, or line to line where it has none. */
  static Schema<?> voltage(boolean withNeutral) {
    Shape voltage = Shape.of("Voltages by line; \"L1-L2\" and so on where there is no neutral");
    LINES.forEach(line -> voltage.optional(line, lineVoltage()));
    PAIRS.forEach(pair -> voltage.optional(pair, lineVoltage()));
    if (withNeutral) {
      voltage.part(
          "N", Shape.of("The neutral's voltage to earth").figure("rms_v", "Volts rms").schema());
    }
    return voltage.schema();
  }

  private static Schema<?> lineVoltage() {
    return Shape.of("A voltage")
        .figure("rms_v", "Volts rms, orders 1 to 50 together")
        .figure("fundamental_v", "Volts rms of order 1")
        .figure("thd_percent", "Orders 2 to 50 on the fundamental")
        .figure("drop_percent", "By how much the fundamental is below nominal")
        .schema();
  }

  /** Currents order by order. */
  static Schema<?> spectrum() {
    Shape row = Shape.of("One order").whole("order", "1 to 50");
    LINES.forEach(line -> row.optional(line, phasor("a", "Amps rms")));
    row.optional("N", phasor("a", "Amps rms"));
    return Shape.listOf("Currents order by order; empty where none is known", row.schema());
  }

  /** Voltages order by order. */
  static Schema<?> voltageSpectrum() {
    Shape row = Shape.of("One order").whole("order", "1 to 50");
    LINES.forEach(line -> row.optional(line, phasor("v", "Volts rms")));
    PAIRS.forEach(pair -> row.optional(pair, phasor("v", "Volts rms")));
    return Shape.listOf("Voltages order by order; empty where none is known", row.schema());
  }

  private static Schema<?> phasor(String magnitude, String meaning) {
    return Shape.of("A phasor: sqrt(2)*X*sin(h*w*t + deg)")
        .number(magnitude, meaning)
        .number("deg", "Degrees in (-180, 180]")
        .schema();
  }

  /** Power figures after IEEE 1459. */
  static Shape power() {
    return Shape.of("Power after IEEE 1459")
        .figure("active_w", "Watts, all orders")
        .figure("fundamental_reactive_var", "Q1+: vars of the positive-sequence fundamental")
        .figure("apparent_va", "Effective apparent power S_e")
        .figure("nonfundamental_va", "sqrt(S_e^2 - S_e1^2)")
        .figure("power_factor", "active_w on apparent_va")
        .figure("displacement_factor", "P1+ on S1+");
  }

  /** Power figures of each line. */
  static Schema<?> powerByLine() {
    Shape lines = Shape.of("Power of each line, from its own voltage to neutral and its current");
    LINES.forEach(line -> lines.optional(line, power().schema()));
    return lines.schema();
  }

  /** From when to when. */
  static Schema<?> period(String meaning) {
    Shape period =
        Shape.of(meaning)
            .part("from", instant("Its first instant"))
            .part("to", instant("The instant after its last"));
    Schema<?> schema = period.schema();
    schema.setTypes(new LinkedHashSet<>(List.of("object", "null")));
    return schema;
  }

  /** A point in time. */
  static Schema<?> instant(String meaning) {
    Schema<Object> instant =
        Shape.text(meaning + "; ISO 8601 with the offset of the site's time zone");
    instant.setFormat("date-time");
    return instant;
  }
}
