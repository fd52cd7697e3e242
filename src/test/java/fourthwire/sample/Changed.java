package fourthwire.sample;

import fourthwire.intake.survey.SurveyExport;
import fourthwire.intake.survey.SurveyImport;
import fourthwire.intake.survey.SurveyTable;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.List;

/** The survey with one cell changed, as a person would change it in a table. */
final class Changed {
  private Changed() {}

  static Survey neutral(Survey survey, String panel, String size) {
    return cells(survey, "panels", panel, "neutral_size", size);
  }

  static Survey eddyLoss(Survey survey, String transformer, double percent) {
    return cells(
        survey, "transformers", transformer, "winding_eddy_loss_percent", Double.toString(percent));
  }

  static Survey bank(Survey survey, String bank, double kvar) {
    return cells(survey, "capacitors", bank, "kvar", Double.toString(kvar));
  }

  static Survey size(Survey survey, String panel, String size) {
    return cells(survey, "panels", panel, "conductor_size", size);
  }

  private static Survey cells(
      Survey survey, String table, String name, String column, String value) {
    List<SurveyTable> tables = new ArrayList<>();
    for (SurveyTable t : SurveyExport.tables(survey)) {
      tables.add(t.name().equals(table) ? changed(t, name, column, value) : t);
    }
    if (SurveyImport.read(tables) instanceof SurveyImport.Read read) {
      return read.survey();
    }
    throw new IllegalStateException("the changed survey is not accepted: " + tables);
  }

  /** In the row whose first cell is {@code name}. */
  private static SurveyTable changed(SurveyTable t, String name, String column, String value) {
    List<SurveyTable.Row> rows = new ArrayList<>();
    for (SurveyTable.Row row : t.rows()) {
      List<String> cells = new ArrayList<>(row.cells());
      if (cells.get(0).equals(name)) {
        cells.set(t.header().indexOf(column), value);
      }
      rows.add(new SurveyTable.Row(row.number(), cells));
    }
    return new SurveyTable(t.name(), t.header(), rows, t.decimalComma());
  }
}
