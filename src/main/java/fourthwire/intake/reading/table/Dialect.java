package fourthwire.intake.reading.table;

import java.nio.charset.Charset;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * How a text table is written, found from its first rows.
 *
 * @param separator between cells
 * @param numbers how they are written
 * @param header of the columns
 * @param firstData row the values begin in, the first of the file being 1
 * @param preamble cells of the rows above the header
 */
record Dialect(
    char separator, NumberStyle numbers, HeaderRows header, long firstData, List<String> preamble) {
  private static final char[] SEPARATORS = {',', ';', '\t', '|', ' '};
  private static final int MOST_ROWS = 1000;
  private static final int MOST_CELLS = 8000;
  private static final Pattern NUMBER =
      Pattern.compile(
          "[-+\u2212]?\\s?(\\d+([.,'’\\h]\\d+)*|[.,]\\d+)([eE][+-]?\\d+)?\\s*"
              + Numbers.UNIT
              + "?");

  private record Line(long row, List<String> cells) {}

  /** A header and the rows below it, with how much of them is understood. */
  private record Candidate(char separator, List<Line> lines, int first, int rows, double clean) {
    List<String> above() {
      return lines.get(first - 1).cells();
    }
  }

  /** The dialect of a file that begins so. */
  static Dialect of(byte[] head, int length, Charset charset) {
    Optional<Candidate> best = Optional.empty();
    for (char separator : SEPARATORS) {
      Optional<Candidate> found = candidate(separator, lines(head, length, separator, charset));
      if (found.isPresent() && (best.isEmpty() || found.get().clean() > best.get().clean())) {
        best = found;
      }
    }
    return best.map(Dialect::of)
        .orElseThrow(
            () ->
                new TableException(
                    "No table was found: a row of headings, and below it rows of as many values,"
                        + " separated by comma, semicolon, tab or pipe, one row for each time.",
                    widest(head, length, charset)));
  }

  /** The first row of the most cells. */
  private static List<String> widest(byte[] head, int length, Charset charset) {
    List<String> widest = List.of();
    for (char separator : new char[] {',', ';', '\t', '|'}) {
      for (Line line : lines(head, length, separator, charset)) {
        widest = line.cells().size() > Math.max(1, widest.size()) ? line.cells() : widest;
      }
    }
    return widest;
  }

  private static List<Line> lines(byte[] head, int length, char separator, Charset charset) {
    List<Line> lines = new ArrayList<>();
    RowCutter cutter = new RowCutter(separator, charset, false);
    int at = 0;
    int cells = 0;
    for (long row = 1; at < length && lines.size() < MOST_ROWS && cells < MOST_CELLS; row++) {
      at = cutter.next(head, at, length);
      cells += cutter.cells();
      if (!cutter.isEmpty()) {
        lines.add(new Line(row, cutter.texts()));
      }
    }
    return lines;
  }

  /** The longest run of rows of values, as wide as the row of headings above it. */
  private static Optional<Candidate> candidate(char separator, List<Line> lines) {
    Optional<Candidate> best = Optional.empty();
    int k = 1;
    while (k < lines.size()) {
      int rows = isData(lines.get(k - 1).cells()) ? 0 : run(lines, k);
      if (rows > best.map(Candidate::rows).orElse(0)) {
        double clean = lines.subList(k, k + rows).stream().mapToInt(l -> clean(l.cells())).sum();
        best = Optional.of(new Candidate(separator, lines, k, rows, clean / rows));
      }
      k += Math.max(1, rows);
    }
    return best.filter(c -> c.clean() >= 2 && 2 * c.clean() >= c.above().size());
  }

  /** How many rows of values no wider than the row above begin here; it may end on blanks. */
  private static int run(List<Line> lines, int first) {
    int headings = filled(lines.get(first - 1).cells());
    int width = lines.get(first).cells().size();
    int k = first;
    while (k < lines.size()
        && lines.get(k).cells().size() == width
        && filled(lines.get(k).cells()) <= Math.max(headings, lines.get(first - 1).cells().size())
        && isData(lines.get(k).cells())) {
      k++;
    }
    return 2 * width > headings && headings > 1 ? k - first : 0;
  }

  /** Cells up to the last that is not blank. */
  private static int filled(List<String> cells) {
    int filled = cells.size();
    while (filled > 0 && cells.get(filled - 1).isEmpty()) {
      filled--;
    }
    return filled;
  }

  private static Dialect of(Candidate found) {
    List<Line> lines = found.lines();
    int first = firstBelow(found);
    int width = Math.max(filled(found.above()), lines.get(first).cells().size());
    List<List<String>> above = lines.subList(0, first).stream().map(Line::cells).toList();
    List<List<String>> values =
        lines.subList(found.first(), found.first() + found.rows()).stream()
            .map(Line::cells)
            .toList();
    return new Dialect(
        found.separator(),
        NumberStyle.of(values, found.separator()),
        HeaderRows.of(above, width),
        lines.get(first).row(),
        above.stream()
            .limit(Math.max(0, first - 1L))
            .flatMap(List::stream)
            .filter(c -> !c.isEmpty())
            .toList());
  }

  /** Where the same headings stand more than once, values begin below the first of them. */
  private static int firstBelow(Candidate found) {
    for (int k = 1; k < found.first(); k++) {
      if (found.lines().get(k - 1).cells().equals(found.above())
          && isData(found.lines().get(k).cells())) {
        return k;
      }
    }
    return found.first();
  }

  /** Orders of harmonics, or units, below the names: nothing stands under the time. */
  private static boolean isBelowNames(List<String> cells) {
    List<String> filled = cells.stream().filter(c -> !c.isEmpty()).toList();
    boolean orders =
        filled.stream().distinct().count() > 1
            && filled.stream().allMatch(c -> c.matches("0?[1-9]|[1-4]\\d|50"));
    boolean units = !filled.isEmpty() && filled.stream().allMatch(HeaderRows::isUnit);
    return cells.get(0).isEmpty() && (orders || units);
  }

  /** At least half of what is not blank are numbers or times. */
  private static boolean isData(List<String> cells) {
    if (isBelowNames(cells)) {
      return false;
    }
    int filled = 0;
    int values = 0;
    for (String cell : cells) {
      if (!cell.isEmpty() && !Numbers.isMark(cell)) {
        filled++;
        values += isValue(cell) ? 1 : 0;
      }
    }
    return filled > 0 && 2 * values >= filled && values > 0;
  }

  private static int clean(List<String> cells) {
    return (int) cells.stream().filter(c -> isValue(c) || Numbers.isMark(c)).count();
  }

  private static boolean isValue(String cell) {
    return Numbers.isPlain(cell) || NUMBER.matcher(cell).matches() || CellTime.isTime(cell);
  }
}
