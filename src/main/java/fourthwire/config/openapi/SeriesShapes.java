package fourthwire.config.openapi;

import io.swagger.v3.oas.models.media.Schema;

/** A log's rows reduced to steps, days and weeks. */
final class SeriesShapes {
  private static final String COUNT = "Rows with a value";

  private SeriesShapes() {}

  /** A quantity over time. */
  static Schema<?> series() {
    return Shape.of("A quantity of a log over time, in the unit its name ends on")
        .text("quantity", "Its name")
        .part("from", Figures.instant("Where the first step begins"))
        .part("to", Figures.instant("Where the last step ends"))
        .text("step", "Length of a step, ISO 8601: PT10M, P1D, P1M")
        .list(
            "steps",
            "In order",
            Shape.of("A step; min, mean and max are null where it has no value")
                .part("start", Figures.instant("Where it begins"))
                .whole("count", COUNT)
                .numberOrNull("min", "Least")
                .numberOrNull("mean", "Mean")
                .numberOrNull("max", "Largest")
                .schema())
        .schema();
  }

  /** A quantity by week, day and hour of the week. */
  static Schema<?> weeks() {
    return Shape.of("A quantity of a log by week, day and hour of the week")
        .text("quantity", "Its name")
        .list(
            "weeks",
            "Local weeks from Monday",
            percentiles("A week").text("start", "Its Monday").schema())
        .list(
            "days",
            "Local days",
            percentiles("A day")
                .text("date", "The day")
                .numberOrNull("p50", "Median; null without any value")
                .schema())
        .list(
            "hour_of_week",
            "168 means by local hour, Monday 00 h first; null without any value",
            hour())
        .schema();
  }

  private static Shape percentiles(String meaning) {
    return Shape.of(meaning)
        .whole("count", COUNT)
        .numberOrNull("p95", "95th percentile; null without any value")
        .numberOrNull("p99", "99th percentile; null without any value");
  }

  private static Schema<?> hour() {
    Schema<Object> hour = Shape.number("Mean of an hour");
    hour.setTypes(new java.util.LinkedHashSet<>(java.util.List.of("number", "null")));
    return hour;
  }

  /** Which days a log covers. */
  static Schema<?> coverage() {
    return Shape.of("Which days a log covers")
        .list(
            "days",
            "Every local day from the first to the last",
            Shape.of("A day")
                .text("date", "The day")
                .whole("rows", "Rows of different times")
                .number("share", "Of the rows the day can have, 0 to 1")
                .schema())
        .schema();
  }
}
