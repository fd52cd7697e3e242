package fourthwire.intake.reading;

import java.util.List;

/** A meter's file can't be read, or not without being told how. Nothing was stored. */
public final class ReadingRefusedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final transient List<String> columns;
  private final transient List<Question> questions;

  /**
   * What is to be answered before the file can be read.
   *
   * @param part part of the mapping, as in {@code time.format} or {@code columns.I1}
   * @param message what is wrong with it, and what is accepted
   */
  public record Question(String part, String message) {}

  /** With one sentence that says it all. */
  public ReadingRefusedException(String message) {
    this(message, List.of(), List.of());
  }

  /** With one sentence, the columns found in order, and every question at once. */
  public ReadingRefusedException(String message, List<String> columns, List<Question> questions) {
    super(message);
    this.columns = List.copyOf(columns);
    this.questions = List.copyOf(questions);
  }

  /** Headers or channel names found in the file; empty where it has none. */
  public List<String> columns() {
    return columns;
  }

  /** What must be mapped or said. */
  public List<Question> questions() {
    return questions;
  }
}
