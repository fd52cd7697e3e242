package fourthwire.intake.reading.log;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan.Confidence;
import fourthwire.intake.reading.ReadingRefusedException.Question;
import fourthwire.intake.reading.format.Mappings;
import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import fourthwire.intake.reading.unit.OpenUnits;
import fourthwire.intake.reading.unit.SampledColumns;
import fourthwire.metering.ReadingMapping;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Sets out how a log would be read: column by column, with its first rows. */
final class ProposalMaker {
  private static final int ROWS = 4;
  private static final String COLUMNS = "columns.";

  private final TextTable table;
  private final TimeColumns time;
  private final Optional<DateOrder> order;

  ProposalMaker(TextTable table, TimeColumns time, Optional<DateOrder> order) {
    this.table = table;
    this.time = time;
    this.order = order;
  }

  /**
   * The proposal.
   *
   * @param others headings that are not of the time
   * @param questions what a plan refuses for
   */
  LogProposal make(
      List<String> others, Mappings known, LogProposal.Time times, List<Question> questions) {
    boolean given = known.mapping().filter(m -> !m.columns().isEmpty()).isPresent();
    Map<String, Heading> read =
        given
            ? Map.of()
            : OpenUnits.settle(Heading.ofLog(others), new SampledColumns(table)).headings();
    List<LogProposal.Column> columns = new ArrayList<>();
    for (String heading : others) {
      String asked = asked(heading, questions);
      columns.add(
          given
              ? given(heading, known, asked)
              : read(heading, read.getOrDefault(heading, Heading.none()), asked));
    }
    return new LogProposal(table.headings(), columns, times, questions, given, rows(columns));
  }

  /** What is asked about a column or its factor. */
  private static String asked(String heading, List<Question> questions) {
    return questions.stream()
        .filter(
            q ->
                q.part().equals(COLUMNS + heading)
                    || q.part().equals(COLUMNS + heading + ".factor"))
        .map(Question::message)
        .findFirst()
        .orElse("");
  }

  private static LogProposal.Column given(String heading, Mappings known, String asked) {
    Optional<ReadingMapping.Column> mapped =
        known.mapping().flatMap(m -> Optional.ofNullable(m.columns().get(heading)));
    return new LogProposal.Column(heading, mapped, mapped.map(m -> known.whence()), asked);
  }

  private static LogProposal.Column read(String heading, Heading h, String asked) {
    Optional<ReadingMapping.Column> mapped =
        h.quantity().isEmpty()
            ? Optional.empty()
            : Optional.of(new ReadingMapping.Column(h.quantity(), h.statistic(), h.factor()));
    Optional<Confidence> confidence =
        switch (h.meaning()) {
          case EXACT -> Optional.of(Confidence.EXACT);
          case CLEAR -> Optional.of(Confidence.CLEAR);
          case LIKELY -> Optional.of(Confidence.LIKELY);
          default -> Optional.empty();
        };
    boolean beside = h.meaning() == Heading.Meaning.NONE;
    return new LogProposal.Column(
        heading, beside ? Optional.empty() : mapped, beside ? Optional.empty() : confidence, asked);
  }

  private List<LogProposal.Row> rows(List<LogProposal.Column> columns) {
    List<LogProposal.Row> rows = new ArrayList<>();
    table.forEach(
        row -> {
          rows.add(row(row, columns));
          return rows.size() < ROWS;
        });
    return rows;
  }

  private LogProposal.Row row(TextTable.Row row, List<LogProposal.Column> columns) {
    Map<String, String> cells = new LinkedHashMap<>();
    for (int k = 0; k < table.headings().size(); k++) {
      cells.put(table.headings().get(k), row.text(k));
    }
    Map<String, Double> values = new LinkedHashMap<>();
    for (LogProposal.Column c : columns) {
      c.mapped()
          .filter(m -> m.factor() > 0)
          .ifPresent(
              m -> {
                Factor factor = Factor.of(m.factor());
                int at = table.headings().indexOf(c.heading());
                double value = row.value(at, factor.shift()) * factor.rest();
                if (Double.isFinite(value)) {
                  values.put(c.heading(), value);
                }
              });
    }
    return new LogProposal.Row(row.number(), cells, when(row), values);
  }

  private Optional<LocalDateTime> when(TextTable.Row row) {
    return time.columns().isEmpty()
        ? Optional.empty()
        : order.flatMap(o -> time.at(row, o)).map(TimeColumns.At::local);
  }
}
