package fourthwire.intake.reading.table;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.regex.Pattern;

/**
 * The rows above the values: names, units below them, groups above them whose name stands once over
 * several columns.
 *
 * @param headings of the columns, each once, a unit or group joined to them
 * @param written the same as the row of names alone writes them
 */
record HeaderRows(List<String> headings, List<String> written) {
  private static final int MOST_ROWS = 4;
  private static final Pattern UNIT =
      Pattern.compile(
          "[\\[(]?\\s*((k|m|M|G)?(A|V|W|VA|var|VAr|VAR|Var|Wh|VAh|varh|Hz)(rms)?|%[a-z]?|°|º|deg|-|s|ms|min|p\\.?u\\.?"
              + "|Volts?|Amps?|Watts?|percent|yyyy.*|dd.*|MM.*|hh.*|HH.*)?\\s*[\\])]?");

  /** A unit with its multiple: {@code x10 A}, {@code 0.1 A}, {@code A/10}, {@code dA}. */
  private static final Pattern MULTIPLE =
      Pattern.compile(
          "[\\[(]?\\s*(?:[x×*]?\\s*\\d[\\d.,^-]*\\s*[x×*]?\\s*)?(?:da|[dcuµμkMmG])?(?:A|V|W|VA|var|VAr|Wh)"
              + "(?:\\s*[x×*/]\\s*\\d+)?\\s*[\\])]?");

  /** What a row of statistics says: it completes the names above it. */
  private static final Set<String> STATISTICS =
      Set.of(
          "min",
          "max",
          "avg",
          "mean",
          "average",
          "minimum",
          "maximum",
          "average value",
          "inst",
          "mittel",
          "mittelwert",
          "moy",
          "moyenne",
          "med",
          "ave",
          "min.",
          "max.",
          "avg.",
          "");

  /**
   * Of the rows that end above the first row of values.
   *
   * @param above rows above it, nearest last
   * @param width cells of a row of values
   */
  static HeaderRows of(List<List<String>> above, int width) {
    int last = above.size() - 1;
    List<String> names = padded(above.get(last), width);
    List<List<String>> below = new ArrayList<>();
    while (last > 0
        && isHeader(above.get(last - 1), width, 2)
        && (completes(names) || standsBelow(names, padded(above.get(last - 1), width)))) {
      below.add(0, names);
      names = padded(above.get(--last), width);
    }
    List<List<String>> groups = new ArrayList<>();
    while (last > 0
        && groups.size() + below.size() < MOST_ROWS
        && isHeader(above.get(last - 1), width, 2)
        && standsBeyond(above.get(last - 1))
        && !above.get(last - 1).equals(above.get(last))) {
      groups.add(0, spread(padded(above.get(--last), width)));
    }
    return new HeaderRows(distinct(joined(groups, names, below)), distinct(names));
  }

  /** A row that only says units or statistics. */
  private static boolean completes(List<String> row) {
    return row.stream().allMatch(c -> isUnit(c) || STATISTICS.contains(c.toLowerCase(Locale.ROOT)));
  }

  /** A row with nothing under the time, each cell of which stands below a name of its own. */
  private static boolean standsBelow(List<String> row, List<String> names) {
    List<String> named = new ArrayList<>();
    for (int k = 0; k < row.size(); k++) {
      if (!row.get(k).isEmpty()) {
        named.add(names.get(k));
      }
    }
    return row.get(0).isEmpty()
        && !names.get(0).isEmpty()
        && named.size() > 1
        && !named.contains("")
        && named.size() == new HashSet<>(named).size();
  }

  static boolean isUnit(String cell) {
    return UNIT.matcher(cell).matches() || MULTIPLE.matcher(cell).matches();
  }

  /** Filled in several places, in words that are neither times nor a label with its value. */
  private static boolean isHeader(List<String> row, int width, int least) {
    long filled = row.stream().filter(c -> !c.isEmpty()).count();
    boolean values =
        row.stream()
            .anyMatch(c -> CellTime.isTime(c) || c.matches("[-+]?\\d+[.,]\\d+") || c.endsWith(":"));
    return filled >= least && row.size() <= width + 1 && 2 * row.size() > width && !values;
  }

  /** A label and its value stand in the first two cells; a group's name farther right too. */
  private static boolean standsBeyond(List<String> row) {
    return row.stream().skip(2).anyMatch(c -> !c.isEmpty());
  }

  private static List<String> padded(List<String> row, int width) {
    List<String> padded = new ArrayList<>(row.subList(0, Math.min(width, row.size())));
    while (padded.size() < width) {
      padded.add("");
    }
    return padded;
  }

  /** A group's name stands above its first column; the blanks beside it are of the same group. */
  private static List<String> spread(List<String> row) {
    List<String> spread = new ArrayList<>();
    String name = "";
    for (String cell : row) {
      name = cell.isEmpty() ? name : cell;
      spread.add(name);
    }
    return spread;
  }

  private static List<String> joined(
      List<List<String>> groups, List<String> names, List<List<String>> below) {
    List<String> joined = new ArrayList<>();
    for (int k = 0; k < names.size(); k++) {
      StringBuilder heading = new StringBuilder();
      for (List<String> group : groups) {
        append(heading, group.get(k));
      }
      append(heading, names.get(k));
      for (List<String> row : below) {
        String cell = row.get(k).replaceAll("[\\[\\]()]", "").trim();
        append(heading, cell.isEmpty() || cell.equals("-") ? "" : "[" + cell + "]");
      }
      joined.add(heading.toString());
    }
    return joined;
  }

  private static void append(StringBuilder heading, String text) {
    heading.append(heading.isEmpty() || text.isEmpty() ? "" : " ").append(text);
  }

  private static List<String> distinct(List<String> headings) {
    Set<String> seen = new HashSet<>();
    List<String> distinct = new ArrayList<>();
    for (int k = 0; k < headings.size(); k++) {
      String name = headings.get(k).isEmpty() ? "column " + (k + 1) : headings.get(k);
      distinct.add(seen.add(name) ? name : name + " #" + (k + 1));
    }
    return List.copyOf(distinct);
  }
}
