package fourthwire.web.support;

import fourthwire.quantity.Figure;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalInt;

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
    return of(figures, "", reasons);
  }

  /** The cells of a column, each with so many decimals or, where none are given, as always. */
  public static List<Cell> of(List<Figure> figures, List<OptionalInt> decimals, Reasons reasons) {
    List<String> texts = new ArrayList<>();
    for (int i = 0; i < figures.size(); i++) {
      OptionalDouble value = figures.get(i).value();
      texts.add(
          value.isPresent() && decimals.get(i).isPresent()
              ? Numbers.withDecimals(value.getAsDouble(), decimals.get(i).getAsInt())
              : text(figures.get(i)));
    }
    return of(figures, texts, "", reasons);
  }

  /** The cells of a column with their unit beside each number. */
  public static List<Cell> of(List<Figure> figures, String unit, Reasons reasons) {
    String tail = unit.isEmpty() ? "" : Numbers.THIN_SPACE + unit;
    return of(figures, figures.stream().map(Column::text).toList(), tail, reasons);
  }

  private static List<Cell> of(
      List<Figure> figures, List<String> texts, String tail, Reasons reasons) {
    int decimals = texts.stream().mapToInt(Column::decimals).max().orElse(0);
    List<Cell> cells = new ArrayList<>();
    for (int i = 0; i < texts.size(); i++) {
      Figure figure = figures.get(i);
      boolean known = figure.value().isPresent();
      cells.add(
          new Cell(
              known ? texts.get(i) + tail + padding(texts.get(i), decimals) : texts.get(i),
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

  /** A figure that does not apply, unknown without a reason, is left out. */
  private static String text(Figure figure) {
    if (figure.value().isPresent()) {
      return Numbers.of(figure.value().getAsDouble());
    }
    return figure.reason().isEmpty() ? "" : UNKNOWN;
  }

  private static int decimals(String text) {
    int point = text.indexOf('.');
    return point < 0 ? 0 : text.length() - point - 1;
  }

  private static String padding(String text, int decimals) {
    int missing = decimals - decimals(text);
    boolean point = text.indexOf('.') >= 0;
    return (point || missing == 0 ? "" : String.valueOf(Numbers.PUNCTUATION_SPACE))
        + String.valueOf(Numbers.FIGURE_SPACE).repeat(missing);
  }
}
