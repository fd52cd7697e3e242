package fourthwire.config.openapi;

import io.swagger.v3.oas.models.media.Schema;

/** What only captures have: standard windows, voltage events, the waveforms as drawn. */
final class WaveformShapes {
  private WaveformShapes() {}

  static Schema<?> windows() {
    return Shape.of("Of a capture: its gapless 10/12-cycle windows; left out where it has none")
        .whole("count", "How many")
        .whole("cycles", "Cycles in each")
        .part(
            "groups",
            Shape.of("By quantity, L1.i, L1.v …: rms over all windows").others(groups()).schema())
        .list(
            "intervals",
            "Standard intervals that lie whole in the record; over an hour without 3 s",
            interval())
        .schema();
  }

  private static Schema<?> groups() {
    return Shape.of("Groups of IEC 61000-4-7, amps or volts")
        .list("groups", "Harmonic groups, from order 1", Shape.number("Rms"))
        .list("subgroups", "Harmonic subgroups, from order 1", Shape.number("Rms"))
        .list("interharmonic_groups", "Between orders, from 0 to 1", Shape.number("Rms"))
        .list("interharmonic_subgroups", "Centred ones, from 0 to 1", Shape.number("Rms"))
        .schema();
  }

  private static Schema<?> interval() {
    return Shape.of("An aggregation interval of IEC 61000-4-30")
        .word("length", "Which", "3s", "10min", "2h")
        .number("from_s", "Seconds after the first sample")
        .number("to_s", "Likewise, its end")
        .number("frequency_hz", "Mean frequency")
        .part("rms", byQuantity("Amps or volts rms, without the direct component"))
        .part("thd_percent", byQuantity("Orders 2 to 50 on the fundamental"))
        .numberOrNull("voltage_unbalance_percent", "Negative on positive sequence")
        .schema();
  }

  private static Schema<?> byQuantity(String meaning) {
    return Shape.of("By quantity").others(Shape.number(meaning)).schema();
  }

  static Schema<?> events() {
    return Shape.of("Of a capture: dips, swells and interruptions")
        .text("basis", "Thresholds and reference, or why none were looked for")
        .part("lowest_v", volts("Lowest half-cycle rms by L1 or L1-L2"))
        .part("highest_v", volts("Highest likewise"))
        .list("list", "Events in time", event())
        .schema();
  }

  private static Schema<?> volts(String meaning) {
    return Shape.of(meaning).others(Shape.number("Volts")).schema();
  }

  private static Schema<?> event() {
    return Shape.of("An event of all lines together")
        .word("kind", "Which", "dip", "swell", "interruption")
        .number("from_s", "Seconds after the first sample")
        .number("duration_s", "How long within the record")
        .part("whole", new Schema<>().type("boolean").description("Whether all of it is in there"))
        .text("place", "The line or pair that went furthest")
        .number("extreme_v", "Its lowest or highest half-cycle rms")
        .number("percent", "Of the reference voltage")
        .schema();
  }

  static Schema<?> waveforms(String part) {
    return Shape.of(
            "Of a capture, " + part + ": of each short stretch the lowest and the highest sample")
        .number("step_s", "Length of a stretch, seconds")
        .part("channels", Shape.of("By quantity").others(trace()).schema())
        .schema();
  }

  private static Schema<?> trace() {
    return Shape.of("A channel, amps or volts")
        .list("min", "Lowest of each stretch", Shape.number("Amps or volts"))
        .list("max", "Highest of each stretch", Shape.number("Amps or volts"))
        .schema();
  }
}
