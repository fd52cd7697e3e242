package fourthwire.intake.reading;

import fourthwire.metering.ReadingMapping;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * How a log would be read, and what of that must be asked: what a person looks at before confirming
 * it.
 *
 * @param headings all of them, in order
 * @param columns all but those of the time
 * @param questions what is open, as a refusal would ask it
 * @param known whether a mapping of these columns was given or confirmed before
 * @param rows the first ones
 */
public record LogProposal(
    List<String> headings,
    List<Column> columns,
    Time time,
    List<ReadingRefusedException.Question> questions,
    boolean known,
    List<Row> rows) {
  /** Copies the lists. */
  public LogProposal {
    headings = List.copyOf(headings);
    columns = List.copyOf(columns);
    questions = List.copyOf(questions);
    rows = List.copyOf(rows);
  }

  /** Whether it was confirmed before and nothing is open. */
  public boolean isSettled() {
    return known && questions.isEmpty();
  }

  /**
   * A column.
   *
   * @param mapped what it would be read as; its quantity may lack the conductor that is asked for.
   *     Empty where it would not be read
   * @param confidence where that comes from; empty where it is asked
   * @param question what is open about it; empty text for nothing
   */
  public record Column(
      String heading,
      Optional<ReadingMapping.Column> mapped,
      Optional<ReadingPlan.Confidence> confidence,
      String question) {}

  /**
   * How times would be read.
   *
   * @param mapped settled as far as it is
   * @param calendar whether they are dates, whose order can be told
   * @param reason why the order is what it is; empty text where it is plain or open
   */
  public record Time(ReadingMapping.Time mapped, boolean calendar, String reason) {}

  /**
   * A row.
   *
   * @param number as a spreadsheet shows it
   * @param cells as written, by heading
   * @param time as understood, local; empty where the order is open
   * @param values as understood in SI units, by heading; blanks left out
   */
  public record Row(
      long number,
      Map<String, String> cells,
      Optional<java.time.LocalDateTime> time,
      Map<String, Double> values) {}
}
