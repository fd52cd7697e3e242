package fourthwire.intake.reading.table;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;

/**
 * How numbers are written, found from the cells.
 *
 * @param decimalComma whether they have a comma for their decimal mark
 * @param openColumns columns in which every number has one mark with three digits behind it, so
 *     that it may be the decimal mark or set thousands apart, and nothing else in the file tells
 */
record NumberStyle(boolean decimalComma, List<Integer> openColumns) {
  private static final String SIGN = "[-+\u2212]?\\s?";
  private static final String END = "([eE][+-]?\\d+)?\\s*" + Numbers.UNIT + "?";

  /** Three digits behind the only mark, or marks all alike: thousands, or three decimals. */
  private static final Pattern THREE_BY_COMMA = Pattern.compile(SIGN + "[1-9]\\d{0,2}(,\\d{3})+");

  private static final Pattern THREE_BY_POINT = Pattern.compile(SIGN + "[1-9]\\d{0,2}(\\.\\d{3})+");

  private static final Pattern COMMA =
      Pattern.compile(SIGN + "(\\d+|\\d{1,3}([.\\s\\h'’]\\d{3})+),\\d+" + END);
  private static final Pattern POINT =
      Pattern.compile(SIGN + "(\\d*|\\d{1,3}([,\\s\\h'’]\\d{3})+)\\.\\d+" + END);
  private static final Pattern TWO_GROUPS = Pattern.compile(".*([.,])\\d{3}\\1\\d{3}.*");
  private static final Pattern SMALL = Pattern.compile(SIGN + "\\d{1,3}");

  /** How many cells of a column are written in each way. */
  private static final class Count {
    private int comma;
    private int point;
    private int threeByComma;
    private int threeByPoint;
    private int small;

    void take(String cell) {
      if (Numbers.isPlain(cell)) {
        takePlain(cell, Math.max(cell.indexOf(','), cell.indexOf('.')));
      } else {
        takeOther(cell);
      }
    }

    /** Digits with at most one mark between them. */
    private void takePlain(String cell, int mark) {
      int behind = cell.length() - 1 - mark;
      boolean isComma = mark >= 0 && cell.charAt(mark) == ',';
      if (mark < 0) {
        small += cell.length() <= 3 ? 1 : 0;
      } else if (mark >= 1 && mark <= 3 && behind == 3 && cell.charAt(0) != '0') {
        threeByComma += isComma ? 1 : 0;
        threeByPoint += isComma ? 0 : 1;
      } else if (behind > 0) {
        comma += isComma && mark > 0 ? 1 : 0;
        point += isComma ? 0 : 1;
      }
    }

    private void takeOther(String cell) {
      boolean twoGroups = TWO_GROUPS.matcher(cell).matches();
      if (THREE_BY_COMMA.matcher(cell).matches()) {
        threeByComma++;
        point += twoGroups ? 1 : 0;
      } else if (THREE_BY_POINT.matcher(cell).matches()) {
        threeByPoint++;
        comma += twoGroups ? 1 : 0;
      } else if (COMMA.matcher(cell).matches()) {
        comma++;
      } else if (POINT.matcher(cell).matches()) {
        point++;
      } else if (SMALL.matcher(cell).matches()) {
        small++;
      }
    }
  }

  /** Of rows of values; cells that are times are left out. */
  static NumberStyle of(List<List<String>> rows, char separator) {
    List<Count> columns = new ArrayList<>();
    for (List<String> row : rows) {
      for (int k = 0; k < row.size(); k++) {
        if (columns.size() <= k) {
          columns.add(new Count());
        }
        if (!CellTime.isTime(row.get(k))) {
          columns.get(k).take(Numbers.negative(row.get(k)));
        }
      }
    }
    return settled(columns, separator);
  }

  private static NumberStyle settled(List<Count> columns, char separator) {
    int comma = columns.stream().mapToInt(c -> c.comma).sum();
    int point = columns.stream().mapToInt(c -> c.point).sum();
    if (comma != point) {
      return new NumberStyle(comma > point, List.of());
    }
    // Small numbers without a mark beside larger ones with it: the mark sets thousands apart.
    boolean commaGroups = columns.stream().anyMatch(c -> c.threeByComma > 0 && c.small > 0);
    boolean pointGroups = columns.stream().anyMatch(c -> c.threeByPoint > 0 && c.small > 0);
    if (commaGroups != pointGroups) {
      return new NumberStyle(pointGroups, List.of());
    }
    boolean byComma = columns.stream().anyMatch(c -> c.threeByComma > 0);
    if (byComma && columns.stream().anyMatch(c -> c.threeByPoint > 0)) {
      return new NumberStyle(false, open(columns));
    }
    return new NumberStyle(
        byComma && separator != ',', byComma ? open(columns) : pointed(columns, separator));
  }

  /** A point with three digits behind it is a decimal point where commas separate cells. */
  private static List<Integer> pointed(List<Count> columns, char separator) {
    return separator == ',' ? List.of() : open(columns);
  }

  private static List<Integer> open(List<Count> columns) {
    List<Integer> open = new ArrayList<>();
    for (int k = 0; k < columns.size(); k++) {
      if (columns.get(k).threeByComma + columns.get(k).threeByPoint > 0) {
        open.add(k);
      }
    }
    return open;
  }
}
