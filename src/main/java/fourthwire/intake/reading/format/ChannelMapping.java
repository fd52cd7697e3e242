package fourthwire.intake.reading.format;

import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.heading.Heading;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Column;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;

/**
 * The columns of a mapping: what was given, else remembered, else proposed from the headings.
 *
 * @param columns by heading, in the file's order
 * @param confidence of each of them
 * @param unmapped headings that are read as nothing
 */
public record ChannelMapping(
    Map<String, Column> columns,
    Map<String, ReadingPlan.Confidence> confidence,
    List<String> unmapped) {

  /** How a heading is understood, and which quantities its file can hold. */
  public record Words(
      Function<String, Heading> heading,
      Function<String, Optional<MeasuredQuantity>> quantity,
      String examples) {}

  /**
   * Settles it.
   *
   * @param given a mapping given or remembered; its columns must be in the file
   * @throws ReadingRefusedException with every question at once
   */
  public static ChannelMapping settle(
      List<String> headings,
      Optional<ReadingMapping> given,
      ReadingPlan.Confidence whence,
      Words words) {
    return given.filter(m -> !m.columns().isEmpty()).isPresent()
        ? given(headings, given.get(), whence, words)
        : proposed(headings, words);
  }

  private static ChannelMapping given(
      List<String> headings, ReadingMapping mapping, ReadingPlan.Confidence whence, Words words) {
    List<ReadingRefusedException.Question> questions = new ArrayList<>();
    mapping
        .columns()
        .forEach(
            (name, column) -> {
              if (!headings.contains(name)) {
                questions.add(question(name, "the file has no column of this name"));
              } else if (words.quantity().apply(column.quantity()).isEmpty()) {
                questions.add(
                    question(
                        name, "\"" + column.quantity() + "\" is no quantity; " + words.examples()));
              } else if (!(column.factor() > 0) || Double.isInfinite(column.factor())) {
                questions.add(
                    question(
                        name + ".factor",
                        "it is "
                            + column.factor()
                            + " and must be above 0; a clamp that points the wrong way is the"
                            + " meter's ct_reversed"));
              }
            });
    Map<String, Column> columns = new LinkedHashMap<>();
    Map<String, ReadingPlan.Confidence> confidence = new LinkedHashMap<>();
    for (String heading : headings) {
      Column column = mapping.columns().get(heading);
      if (column != null) {
        columns.put(heading, column);
        confidence.put(heading, whence);
      }
    }
    return checked(headings, columns, confidence, questions);
  }

  private static ChannelMapping proposed(List<String> headings, Words words) {
    List<ReadingRefusedException.Question> questions = new ArrayList<>();
    Map<String, Column> columns = new LinkedHashMap<>();
    Map<String, ReadingPlan.Confidence> confidence = new LinkedHashMap<>();
    for (String name : headings) {
      Heading heading = words.heading().apply(name);
      switch (heading.meaning()) {
        case NONE -> {}
        case UNCLEAR, UNIT_OPEN, PLACELESS ->
            questions.add(question(name, "say " + heading.question()));
        default -> {
          columns.put(name, new Column(heading.quantity(), heading.statistic(), heading.factor()));
          confidence.put(name, ReadingPlan.Confidence.valueOf(heading.meaning().name()));
        }
      }
    }
    return checked(headings, columns, confidence, questions);
  }

  private static ChannelMapping checked(
      List<String> headings,
      Map<String, Column> columns,
      Map<String, ReadingPlan.Confidence> confidence,
      List<ReadingRefusedException.Question> questions) {
    twice(columns, questions);
    if (!questions.isEmpty()) {
      throw new ReadingRefusedException(
          "Some columns must be mapped before the file can be read.", headings, questions);
    }
    if (columns.isEmpty()) {
      throw new ReadingRefusedException(
          "No column's heading says what it holds: map at least one.",
          headings,
          List.of(
              new ReadingRefusedException.Question(
                  "columns",
                  "map headings to quantities, as in {\"I1\":{\"quantity\":\"L1.rms_a\"}}")));
    }
    return new ChannelMapping(
        columns, confidence, headings.stream().filter(h -> !columns.containsKey(h)).toList());
  }

  private static void twice(
      Map<String, Column> columns, List<ReadingRefusedException.Question> questions) {
    Map<String, String> seen = new LinkedHashMap<>();
    columns.forEach(
        (name, column) -> {
          String key = column.quantity() + " " + column.statistic().word();
          String before = seen.putIfAbsent(key, name);
          if (before != null) {
            questions.add(
                question(
                    name,
                    "\""
                        + before
                        + "\" is "
                        + column.quantity()
                        + " too: map one of them, or none"));
          }
        });
  }

  private static ReadingRefusedException.Question question(String column, String message) {
    return new ReadingRefusedException.Question("columns." + column, message);
  }
}
