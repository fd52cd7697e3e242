package fourthwire.config.openapi;

import io.swagger.v3.oas.models.media.Schema;

/** What limits of measured values say of a log. */
final class LimitShapes {
  private static final String[] OUTCOMES = {"within", "over", "open"};

  private LimitShapes() {}

  static Schema<?> limits() {
    return Shape.of("A log against the limits of measured values")
        .text("set", "Which set of rows: as read, or as corrected")
        .list("notes", "What could not be held against a limit, and why", Shape.text("A sentence"))
        .list("limits", "One a document, quantity and percentile", limit())
        .schema();
  }

  private static Schema<?> limit() {
    return Shape.of("A limit")
        .text("code", "What is held against it: voltage-thd, voltage-order, rms-voltage, …")
        .text("basis", "Document, edition, clause")
        .word("period", "Over what", "day", "week", "year")
        .whole("value_s", "Length of the values that are counted, seconds")
        .number("percent_of_values", "How many of a period's values must keep the limit, percent")
        .text("unit", "Of figure and limit")
        .optional(
            "band_from", Shape.number("Of a band with two ends: its lower end, volts or hertz"))
        .optional("band_to", Shape.number("Its upper end, volts"))
        .word("outcome", "Over where any period is, within where any is and none is over", OUTCOMES)
        .part("worst", period("The period that stands for all"))
        .list("periods", "All of them in time", period("A day, week or year"))
        .schema();
  }

  private static Schema<?> period(String meaning) {
    return Shape.of(meaning)
        .part("from", Figures.instant("When it begins"))
        .text("place", "Conductor or pair nearest to the limit; empty for all lines together")
        .optional("order", Shape.whole("Of a harmonic"))
        .number("figure", "The percentile; of a band the share of values outside it, percent")
        .number("limit", "What it is held against")
        .number("share_percent", "Share of the period's values that were there")
        .word("outcome", "Open where the missing values could turn it", OUTCOMES)
        .schema();
  }
}
