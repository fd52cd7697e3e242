package fourthwire.intake.survey;

import java.util.List;

/**
 * One table of a survey as text, wherever it stood: a CSV file, a sheet, a form on a page.
 *
 * @param name its name in the contract
 * @param header the columns' names, which stand in row 1
 * @param rows the rows below it; blank ones are left out and keep their numbers
 * @param decimalComma whether a comma may be a decimal sign here
 */
public record SurveyTable(String name, List<String> header, List<Row> rows, boolean decimalComma) {
  /**
   * A row.
   *
   * @param number as a spreadsheet shows it, the header being row 1
   * @param cells as many as the row has; an empty text is "not known"
   */
  public record Row(int number, List<String> cells) {
    /** Copies the list. */
    public Row {
      cells = List.copyOf(cells);
    }

    boolean isBlank() {
      return cells.stream().allMatch(String::isBlank);
    }
  }

  /** Copies the lists. */
  public SurveyTable {
    header = List.copyOf(header);
    rows = List.copyOf(rows);
  }
}
