package fourthwire.web.support;

import fourthwire.quantity.Figure;
import java.util.ArrayList;
import java.util.List;

/**
 * A column of figures: padded so that, set to the right with figures of one width, the decimal
 * points stand below each other. An unknown figure is a dash with a mark to its reason.
 */
public final class Column {
  private static final String UNKNOWN = "–";

  private Column() {}

  /**
   * A cell.
   *
   * @param text the number, padded
   * @param mark points to the reason of an unknown figure, else empty
   */
  public record Cell(String text, String mark) {}

  /** The cells of a column; reasons of unknown figures go into {@code reasons}. */
  public static List<Cell> of(List<Figure> figures, Reasons reasons) {
    List<String> texts =
        figures.stream()
            .map(f -> f.value().isPresent() ? Numbers.of(f.value().getAsDouble()) : UNKNOWN)
            .toList();
    int decimals = texts.stream().mapToInt(Column::decimals).max().orElse(0);
    List<Cell> cells = new ArrayList<>();
    for (int i = 0; i < texts.size(); i++) {
      Figure figure = figures.get(i);
      boolean known = figure.value().isPresent();
      cells.add(
          new Cell(
              known ? padded(texts.get(i), decimals) : texts.get(i),
              known || figure.reason().isEmpty() ? "" : reasons.markOf(figure)));
    }
    return cells;
  }

  /** One figure on its own. */
  public static Cell of(Figure figure, Reasons reasons) {
    return of(List.of(figure), reasons).get(0);
  }

  /** Known values as padded texts. */
  public static List<String> aligned(List<Double> values) {
    return of(values.stream().map(Figure::of).toList(), new Reasons()).stream()
        .map(Cell::text)
        .toList();
  }

  private static int decimals(String text) {
    int point = text.indexOf('.');
    return point < 0 ? 0 : text.length() - point - 1;
  }

  private static String padded(String text, int decimals) {
    int missing = decimals - decimals(text);
    boolean point = text.indexOf('.') >= 0;
    return text
        + (point || missing == 0 ? "" : String.valueOf(Numbers.PUNCTUATION_SPACE))
        + String.valueOf(Numbers.FIGURE_SPACE).repeat(missing);
  }
}
