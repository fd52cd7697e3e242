package fourthwire.intake.reading.format;

import fourthwire.intake.reading.ReadingRefusedException.Question;
import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import java.util.Optional;

/** Asks again where dates contradict the order that was told. */
public final class DateQuestion {
  private DateQuestion() {}

  /** The question; empty where the order fits every date. */
  public static Optional<Question> of(TextTable table, TimeColumns time, DateOrder told) {
    return time.misfit(table, told)
        .map(
            misfit ->
                new Question(
                    "time.format",
                    "the format given or remembered writes dates as "
                        + told.pattern()
                        + ", but "
                        + misfit
                        + ": say how this file writes them"));
  }
}
