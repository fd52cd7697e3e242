package fourthwire.site.check;

/**
 * One thing wrong with a survey.
 *
 * @param table the table; empty for an error of the whole file
 * @param row as a spreadsheet shows it, the header being row 1; 0 for an error of the whole table
 * @param column the column; empty where it is no single one
 * @param value the cell as read
 * @param message what is wrong and what is accepted
 */
public record SurveyError(String table, int row, String column, String value, String message) {
  /** An error of the whole file. */
  public static SurveyError ofFile(String message) {
    return new SurveyError("", 0, "", "", message);
  }

  /** An error of a whole table. */
  public static SurveyError ofTable(String table, String message) {
    return new SurveyError(table, 0, "", "", message);
  }
}
