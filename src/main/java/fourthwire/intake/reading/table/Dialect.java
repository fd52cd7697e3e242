package fourthwire.intake.reading.table;

import java.io.IOException;
import java.io.StringReader;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * How a text table is written, found from its first rows.
 *
 * @param separator between cells
 * @param decimalComma whether numbers have a comma for their decimal mark
 * @param headings of the columns, each once, a row of units joined to them
 * @param written the same as the header row alone writes them
 * @param firstData row the values begin in, the first of the file being 1
 */
record Dialect(
    char separator,
    boolean decimalComma,
    List<String> headings,
    List<String> written,
    long firstData) {
  private static final char[] SEPARATORS = {',', ';', '\t', '|'};
  private static final Pattern NUMBER =
      Pattern.compile("[+-]?(\\d+([.,]\\d+)*|[.,]\\d+)([eE][+-]?\\d+)?\\s*%?");
  private static final Pattern COMMA =
      Pattern.compile("[+-]?\\d+(\\.\\d{3})*,\\d+([eE][+-]?\\d+)?");
  private static final Pattern POINT = Pattern.compile("[+-]?\\d*\\.\\d+([eE][+-]?\\d+)?");
  private static final Pattern CLOCK = Pattern.compile("\\d{1,2}:\\d{2}.*");
  private static final Pattern UNIT =
      Pattern.compile(
          "[\\[(]?\\s*([kmM]?(A|V|W|VA|var|VAr|Wh|VAh|varh)|%|Hz|°|deg|-|s|ms)?\\s*[\\])]?");

  private record Line(long row, List<String> cells) {}

  /** The dialect of a file that begins so. */
  static Dialect of(String head) throws IOException {
    Optional<Dialect> best = Optional.empty();
    for (char separator : SEPARATORS) {
      Optional<Dialect> found = with(separator, head);
      if (found.isPresent()
          && (best.isEmpty() || found.get().headings().size() > best.get().headings().size())) {
        best = found;
      }
    }
    return best.orElseThrow(
        () ->
            new TableException(
                "No table was found: a row of headings, and below it rows of as many values,"
                    + " separated by comma, semicolon or tab."));
  }

  private static Optional<Dialect> with(char separator, String head) throws IOException {
    List<Line> lines = new ArrayList<>();
    RowScanner rows = new RowScanner(new StringReader(head), separator);
    while (rows.next() && lines.size() < 300) {
      lines.add(new Line(rows.row(), rows.texts()));
    }
    int best = -1;
    int longest = 0;
    for (int k = 1; k < lines.size(); k++) {
      int run = isData(lines.get(k - 1).cells()) ? 0 : run(lines, k);
      if (run > longest) {
        best = k;
        longest = run;
      }
    }
    return best < 0 ? Optional.empty() : Optional.of(below(separator, lines, best));
  }

  /** How many rows of values as wide as the row above begin here. */
  private static int run(List<Line> lines, int first) {
    int width = lines.get(first - 1).cells().size();
    int k = first;
    while (k < lines.size()
        && lines.get(k).cells().size() == width
        && isData(lines.get(k).cells())) {
      k++;
    }
    return k - first;
  }

  private static Dialect below(char separator, List<Line> lines, int first) {
    List<String> above = lines.get(first - 1).cells();
    boolean units =
        isUnits(above) && first > 1 && lines.get(first - 2).cells().size() == above.size();
    return new Dialect(
        separator,
        separator != ',' && decimalComma(lines.subList(first, lines.size())),
        distinct(units ? joined(lines.get(first - 2).cells(), above) : above),
        distinct(units ? lines.get(first - 2).cells() : above),
        lines.get(first).row());
  }

  /** At least half of what is not blank are numbers or times. */
  private static boolean isData(List<String> cells) {
    int filled = 0;
    int values = 0;
    for (String cell : cells) {
      if (!cell.isEmpty()) {
        filled++;
        values += isValue(cell) ? 1 : 0;
      }
    }
    return filled > 0 && 2 * values >= filled;
  }

  private static boolean isValue(String cell) {
    return NUMBER.matcher(cell).matches()
        || CLOCK.matcher(cell).matches()
        || CellTime.of(cell).isPresent();
  }

  private static boolean isUnits(List<String> cells) {
    return cells.stream().allMatch(c -> UNIT.matcher(c).matches())
        && cells.stream().anyMatch(c -> !c.isEmpty());
  }

  private static List<String> joined(List<String> headings, List<String> units) {
    List<String> joined = new ArrayList<>();
    for (int k = 0; k < headings.size(); k++) {
      String unit = units.get(k).replaceAll("[\\[\\]()\\s-]", "");
      joined.add(unit.isEmpty() ? headings.get(k) : headings.get(k) + " [" + unit + "]");
    }
    return joined;
  }

  private static boolean decimalComma(List<Line> lines) {
    int commas = 0;
    int points = 0;
    for (Line line : lines) {
      for (String cell : line.cells()) {
        commas += COMMA.matcher(cell).matches() ? 1 : 0;
        points += POINT.matcher(cell).matches() ? 1 : 0;
      }
    }
    return commas > points;
  }

  private static List<String> distinct(List<String> headings) {
    List<String> distinct = new ArrayList<>();
    for (int k = 0; k < headings.size(); k++) {
      String name = headings.get(k).isEmpty() ? "column " + (k + 1) : headings.get(k);
      distinct.add(distinct.contains(name) ? name + " #" + (k + 1) : name);
    }
    return List.copyOf(distinct);
  }
}
