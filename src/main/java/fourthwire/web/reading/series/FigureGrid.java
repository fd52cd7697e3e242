package fourthwire.web.reading.series;

import fourthwire.quantity.Figure;
import fourthwire.web.panel.NodePage;
import fourthwire.web.support.Column;
import fourthwire.web.support.Reasons;
import java.util.ArrayList;
import java.util.List;
import java.util.function.IntFunction;

/**
 * Puts a table of figures together whose columns each have their digits; NaN leaves a cell empty.
 */
final class FigureGrid {
  private final String title;
  private final List<String> heads;
  private final IntFunction<Digits> digits;
  private final List<String> names = new ArrayList<>();
  private final List<double[]> rows = new ArrayList<>();

  /**
   * An empty table.
   *
   * @param heads of the names, then of the columns
   * @param digits of each column, counted from 0
   */
  FigureGrid(String title, List<String> heads, IntFunction<Digits> digits) {
    this.title = title;
    this.heads = heads;
    this.digits = digits;
  }

  void row(String name, double... values) {
    names.add(name);
    rows.add(values);
  }

  NodePage.Grid done() {
    List<List<Column.Cell>> columns = new ArrayList<>();
    for (int c = 0; c < heads.size() - 1; c++) {
      columns.add(column(c));
    }
    List<NodePage.GridRow> out = new ArrayList<>();
    for (int r = 0; r < names.size(); r++) {
      int row = r;
      out.add(new NodePage.GridRow(names.get(r), columns.stream().map(c -> c.get(row)).toList()));
    }
    return new NodePage.Grid(title, heads, out, List.of(), List.of());
  }

  private List<Column.Cell> column(int c) {
    Digits written = digits.apply(c);
    if (written.decimals().isEmpty()) {
      return Column.of(rows.stream().map(r -> figure(r[c])).toList(), new Reasons());
    }
    return rows.stream()
        .map(r -> new Column.Cell(Double.isNaN(r[c]) ? "" : written.text(r[c]), ""))
        .toList();
  }

  private static Figure figure(double value) {
    return Double.isNaN(value) ? Figure.unknown("") : Figure.of(value);
  }
}
