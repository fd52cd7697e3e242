package fourthwire.config.openapi;

import io.swagger.v3.oas.models.media.Schema;

/** Readings and the mapping of their columns: sections 4 and 5 of the public contract. */
final class ReadingShapes {
  private ReadingShapes() {}

  /** A reading's row in the list. */
  static Schema<?> row() {
    return heading("A reading in the list, without its figures")
        .whole("quality_findings", "How many quality findings it has")
        .schema();
  }

  private static Shape heading(String meaning) {
    return Shape.of(meaning)
        .whole("id", "Its id")
        .whole("site", "Id of its site")
        .text("meter", "The meter it is of")
        .text("at", "The node the meter is at")
        .list("files", "Names of the files it was read from", Shape.text("A file name"))
        .text("sha256", "SHA-256 of the file as sent; of several, of the first")
        .part("added", Figures.instant("When it was handed in"))
        .word("kind", "An interval log, or a waveform capture", "log", "capture")
        .part("period", Figures.period("When it was measured; null where the file does not tell"))
        .optional("rows", Shape.whole("Rows of a log"))
        .optional("samples", Shape.whole("Samples of a capture, each channel"))
        .numberOrNull("sample_rate_hz", "Of a capture; null for a log");
  }

  /** A reading. */
  static Schema<?> reading() {
    return capture(log(heading("A reading")))
        .list("notes", "How it was read", Shape.text("A sentence"))
        .list("quality", "What is wrong with it", quality())
        .list("corrections", "What was corrected, those taken back too", correction())
        .part("cleaned", cleaned())
        .part("mapping", mapping())
        .schema();
  }

  private static Schema<?> quality() {
    return Shape.of("A quality finding")
        .text("code", "What kind of finding")
        .part("period", Figures.period("When; null where it is of the whole reading"))
        .text("effect", "What it does to the figures")
        .text("sentence", "The finding in words")
        .list("corrections", "What would mend it, the likeliest first", offered().schema())
        .wholeOrNull("corrected", "Id of the correction that mends it; null while none does")
        .schema();
  }

  private static Shape offered() {
    return Shape.of("A correction")
        .text("sentence", "What it does")
        .list(
            "steps",
            "What it does, step by step",
            Shape.of("A step")
                .text("kind", "leave-out, keep-within, drop-repeats, shift-clock, turn-sign, …")
                .others(new Schema<>())
                .schema());
  }

  /** A correction that was made. */
  static Schema<?> correction() {
    return offered()
        .whole("id", "Its id")
        .whole("finding", "Position in quality of what it mends")
        .part("made", Figures.instant("When it was made"))
        .textOrNull("undone", "When it was taken back; null while it holds")
        .schema();
  }

  private static Schema<?> cleaned() {
    Schema<?> cleaned =
        log(Shape.of("A log as corrected, in the shape it has as read; null without corrections"))
            .optional("rows", Shape.whole("Rows that are left"))
            .schema();
    cleaned.setTypes(new java.util.LinkedHashSet<>(java.util.List.of("object", "null")));
    return cleaned;
  }

  private static Shape log(Shape into) {
    return into.optional("interval_s", Shape.number("Of a log: seconds from row to row"))
        .optional(
            "quantities",
            Shape.of("Of a log: each quantity over the rows as read, by its name")
                .others(summary())
                .schema())
        .optional("key_intervals", Shape.listOf("Of a log: rows worth a look", keyInterval()));
  }

  private static Schema<?> summary() {
    return Shape.of("A quantity over the rows, in the unit its name ends on")
        .whole("count", "Rows with a value")
        .number("min", "Least")
        .number("mean", "Mean")
        .number("max", "Largest")
        .number("p95", "95th percentile")
        .number("p99", "99th percentile")
        .schema();
  }

  private static Schema<?> keyInterval() {
    return Shape.of("A row worth a look")
        .text("code", "Which it is")
        .part("start", Figures.instant("When it begins"))
        .text("reason", "Why it was chosen")
        .part("values", Shape.of("Its values by quantity").others(Shape.number("Value")).schema())
        .schema();
  }

  private static Shape capture(Shape into) {
    return into.optional("frequency_hz", Shape.number("Of a capture: the fundamental"))
        .optional("cycles", Shape.whole("Of a capture: whole cycles the figures are of"))
        .optional("basis", Shape.text("Of a capture: how its figures were found"))
        .optional("current", captureCurrent())
        .figureOfSome("neutral_percent_of_mean_line", "N on the mean of the lines")
        .optional("neutral_basis", Shape.text("Whether N is a channel or the sum of the lines"))
        .figureOfSome("neutral_channel_rms_a", "Amps of the neutral's own channel")
        .optional("voltage", captureVoltage())
        .optional("spectrum", Figures.spectrum())
        .optional("voltage_spectrum", Figures.voltageSpectrum())
        .optional("power", Figures.power().text("basis", "How the sums are taken").schema())
        .optional("power_by_line", Figures.powerByLine())
        .figureOfSome("voltage_unbalance_percent", "Of a capture: negative on positive sequence")
        .figureOfSome("current_unbalance_percent", "Of a capture: likewise")
        .figureOfSome("zero_sequence_percent", "Of a capture: zero on positive sequence current")
        .optional("windows", WaveformShapes.windows())
        .optional("events", WaveformShapes.events())
        .optional("waveforms", WaveformShapes.waveforms("the whole record"))
        .optional("first_cycles", WaveformShapes.waveforms("its first two cycles"));
  }

  private static Schema<?> captureCurrent() {
    return Shape.of("Of a capture: currents by conductor L1, L2, L3, N")
        .others(
            Shape.of("A current")
                .figure("rms_a", "Amps rms")
                .figure("fundamental_a", "Amps rms of order 1")
                .figure("thd_percent", "Orders 2 to 50 on the fundamental")
                .figure("crest_factor", "Peak on rms")
                .schema())
        .schema();
  }

  private static Schema<?> captureVoltage() {
    return Shape.of("Of a capture: voltages by L1 or L1-L2")
        .others(
            Shape.of("A voltage")
                .figure("rms_v", "Volts rms")
                .figure("fundamental_v", "Volts rms of order 1")
                .figure("thd_percent", "Orders 2 to 50 on the fundamental")
                .figure("crest_factor", "Peak on rms")
                .schema())
        .schema();
  }

  /** The mapping of a file's columns. */
  static Schema<?> mapping() {
    return Shape.of("Which columns hold what; every part but columns may be left out")
        .optional("kind", Shape.text("log or capture"))
        .optional("time", time())
        .optional("sample_rate_hz", Shape.number("Of a capture whose file does not tell it"))
        .part("columns", Shape.of("By header or channel name").others(column()).schema())
        .schema();
  }

  private static Schema<?> time() {
    return Shape.of("How a row's time is written")
        .optional(
            "columns",
            Shape.listOf(
                "One, date and time, or year, month, day, hour, minute and second",
                Shape.text("A header")))
        .optional("format", Shape.text("For example yyyy-MM-dd HH:mm:ss"))
        .optional(
            "zone",
            Shape.text(
                "Time zone, or an offset as +01:00 that the clock keeps; left out: the site's"))
        .optional("stamp", Shape.text("start or end: which instant of its interval a row names"))
        .optional("interval_s", Shape.number("Seconds from row to row"))
        .schema();
  }

  private static Schema<?> column() {
    return Shape.of("A column")
        .text("quantity", "For example L1.rms_a, total.active_w, N.current_h9_a, L1.i")
        .optional("statistic", Shape.text("mean, min, max or instant"))
        .optional("factor", Shape.number("The values are multiplied by it"))
        .schema();
  }
}
