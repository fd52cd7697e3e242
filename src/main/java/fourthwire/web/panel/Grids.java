package fourthwire.web.panel;

import fourthwire.quantity.Figure;
import fourthwire.web.support.Column;
import fourthwire.web.support.Reasons;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;

/** Puts figures together as a table, row by row, and aligns its columns at the end. */
public final class Grids {
  private final Words words;
  private final String title;
  private final List<String> heads;
  private final List<String> names = new ArrayList<>();
  private final List<List<Figure>> rows = new ArrayList<>();
  private final List<List<OptionalInt>> decimals = new ArrayList<>();

  /** An empty table with this caption and these column heads, the first over the names. */
  public Grids(Words words, String title, List<String> heads) {
    this.words = words;
    this.title = title;
    this.heads = heads;
  }

  /** Adds a row; an unknown figure without a reason leaves its cell empty. */
  public Grids row(String name, List<Figure> figures) {
    return row(name, figures, figures.stream().map(f -> OptionalInt.empty()).toList());
  }

  /** Adds a row of figures with so many decimals, or as many as always. */
  public Grids row(String name, List<Figure> figures, List<OptionalInt> fixed) {
    names.add(name);
    rows.add(figures);
    decimals.add(fixed);
    return this;
  }

  /** The table. */
  public NodePage.Grid done() {
    return done(new Working[0]);
  }

  /** The table with these workings beside it. */
  NodePage.Grid done(Working... workings) {
    Reasons reasons = new Reasons();
    List<List<Column.Cell>> columns = new ArrayList<>();
    for (int c = 0; c < heads.size() - 1; c++) {
      int column = c;
      columns.add(
          Column.of(
              rows.stream().map(r -> r.get(column)).toList(),
              decimals.stream().map(d -> d.get(column)).toList(),
              reasons));
    }
    List<NodePage.GridRow> out = new ArrayList<>();
    for (int r = 0; r < names.size(); r++) {
      int row = r;
      out.add(new NodePage.GridRow(names.get(r), columns.stream().map(c -> c.get(row)).toList()));
    }
    return new NodePage.Grid(title, heads, out, reasons.list(), Working.lines(words, workings));
  }
}
