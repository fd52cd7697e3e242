package fourthwire.intake.reading;

import java.math.BigDecimal;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.time.LocalDateTime;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.Function;
import java.util.function.UnaryOperator;

/** Writes the truth in one layout. */
final class LayoutWriter {
  /** A column: its cells in each header row, what it holds, how it is scaled. */
  private record Column(
      List<String> heads, String quantity, int shift, Map<Integer, String> marks) {}

  private final List<Column> columns = new ArrayList<>();
  private final List<String> timeHeads = new ArrayList<>();
  private final List<Function<LocalDateTime, String>> times = new ArrayList<>();
  private final List<String> preamble = new ArrayList<>();
  private final List<String> footer = new ArrayList<>();
  private final Map<Integer, String> marks = new LinkedHashMap<>();
  private String separator = ",";
  private char decimal = '.';
  private String grouping = "";
  private String lineEnd = "\n";
  private Charset charset = StandardCharsets.UTF_8;
  private String bom = "";
  private int repeatHeader;
  private int rows = LayoutTruth.ROWS;
  private LocalDateTime start = LayoutTruth.START;
  private boolean quoted;
  private boolean newestFirst;
  private boolean trailing;
  private boolean stripZeros;
  private boolean withUnits;
  private UnaryOperator<String> form = n -> n;

  static LayoutWriter of(String separator, char decimal) {
    LayoutWriter w = new LayoutWriter();
    w.separator = separator;
    w.decimal = decimal;
    return w;
  }

  LayoutWriter time(String head, String pattern) {
    return time(head, t -> DateTimeFormatter.ofPattern(pattern, Locale.ENGLISH).format(t));
  }

  LayoutWriter time(String head, Function<LocalDateTime, String> write) {
    timeHeads.add(head);
    times.add(write);
    return this;
  }

  /** A column with a head that stands in the only header row, or heads parted by bars. */
  LayoutWriter column(String head, String quantity, int shift) {
    columns.add(new Column(List.of(head.split("\\|", -1)), quantity, shift, new LinkedHashMap<>()));
    return this;
  }

  LayoutWriter column(String head, String quantity) {
    return column(head, quantity, 0);
  }

  /**
   * The same head for the three lines: {@code #} is the number, {@code @} A to C, {@code $} R to T.
   */
  LayoutWriter lines(String head, String quantity, int shift) {
    for (int k = 0; k < 3; k++) {
      column(
          head.replace("#", String.valueOf(k + 1))
              .replace('@', "ABC".charAt(k))
              .replace('$', "RST".charAt(k)),
          quantity.isEmpty() ? "" : "L" + (k + 1) + "." + quantity,
          shift);
    }
    return this;
  }

  LayoutWriter lines(String head, String quantity) {
    return lines(head, quantity, 0);
  }

  LayoutWriter preamble(String... lines) {
    preamble.addAll(List.of(lines));
    return this;
  }

  LayoutWriter footer(String... lines) {
    footer.addAll(List.of(lines));
    return this;
  }

  LayoutWriter mark(int row, String mark) {
    marks.put(row, mark);
    return this;
  }

  LayoutWriter grouping(String mark) {
    grouping = mark;
    return this;
  }

  LayoutWriter encoded(Charset in, String with) {
    charset = in;
    bom = with;
    return this;
  }

  LayoutWriter lineEnd(String end) {
    lineEnd = end;
    return this;
  }

  LayoutWriter headerEvery(int count) {
    repeatHeader = count;
    return this;
  }

  LayoutWriter rows(int count) {
    rows = count;
    return this;
  }

  LayoutWriter newestFirst() {
    newestFirst = true;
    return this;
  }

  LayoutWriter quoted() {
    quoted = true;
    return this;
  }

  LayoutWriter trailingSeparator() {
    trailing = true;
    return this;
  }

  LayoutWriter withoutTrailingZeros() {
    stripZeros = true;
    return this;
  }

  /** Every number above zero with its sign. */
  LayoutWriter plusSigns() {
    form = n -> n.startsWith("-") ? n : "+" + n;
    return this;
  }

  /** Numbers as multiples of a power of ten. */
  LayoutWriter exponents() {
    form =
        n -> {
          BigDecimal value = new BigDecimal(n);
          int power = value.precision() - value.scale() - 1;
          return value.movePointLeft(power).toPlainString()
              + "E"
              + (power < 0 ? "-0" : "+0")
              + Math.abs(power);
        };
    return this;
  }

  /** The unit in the heading's brackets behind every number too. */
  LayoutWriter cellUnits() {
    withUnits = true;
    return this;
  }

  LayoutWriter from(LocalDateTime first) {
    start = first;
    return this;
  }

  LocalDateTime start() {
    return start;
  }

  int rowCount() {
    return rows;
  }

  /** The quantities written, with the rows in which the first of them is marked as not measured. */
  Map<String, List<BigDecimal>> expected() {
    Map<String, BigDecimal[]> truth = LayoutTruth.columns();
    Map<String, List<BigDecimal>> expected = new LinkedHashMap<>();
    for (int k = 0; k < columns.size(); k++) {
      Column c = columns.get(k);
      if (!c.quantity().isEmpty()) {
        List<BigDecimal> values = new ArrayList<>();
        for (int row = 0; row < rows; row++) {
          if (k > 0 || !marks.containsKey(row)) {
            values.add(value(truth, c.quantity(), row));
          }
        }
        expected.put(c.quantity(), values);
      }
    }
    return expected;
  }

  private static BigDecimal value(Map<String, BigDecimal[]> truth, String quantity, int row) {
    boolean low = quantity.endsWith(".min");
    boolean high = quantity.endsWith(".max");
    BigDecimal v =
        truth.get(low || high ? quantity.substring(0, quantity.length() - 4) : quantity)[row];
    return low ? v.subtract(BigDecimal.ONE) : high ? v.add(BigDecimal.ONE) : v;
  }

  byte[] bytes() {
    StringBuilder text = new StringBuilder(bom);
    preamble.forEach(line -> text.append(line).append(lineEnd));
    header(text);
    Map<String, BigDecimal[]> truth = LayoutTruth.columns();
    for (int row = 0; row < rows; row++) {
      if (repeatHeader > 0 && row > 0 && row % repeatHeader == 0) {
        header(text);
      }
      row(text, truth, newestFirst ? rows - 1 - row : row);
    }
    footer.forEach(line -> text.append(line).append(lineEnd));
    return text.toString().getBytes(charset);
  }

  private void header(StringBuilder text) {
    int height = columns.stream().mapToInt(c -> c.heads().size()).max().orElse(1);
    for (int line = 0; line < height; line++) {
      List<String> cells = new ArrayList<>();
      for (String head : timeHeads) {
        String[] parts = head.split("\\|", -1);
        cells.add(line < parts.length ? parts[line] : "");
      }
      for (Column c : columns) {
        cells.add(line < c.heads().size() ? c.heads().get(line) : "");
      }
      append(text, cells);
    }
  }

  private void row(StringBuilder text, Map<String, BigDecimal[]> truth, int row) {
    LocalDateTime at = start.plus(LayoutTruth.STEP.multipliedBy(row));
    List<String> cells = new ArrayList<>();
    times.forEach(t -> cells.add(t.apply(at)));
    for (int k = 0; k < columns.size(); k++) {
      Column c = columns.get(k);
      boolean marked = k == 0 && marks.containsKey(row);
      cells.add(
          marked
              ? marks.get(row)
              : c.quantity().isEmpty()
                  ? "OK"
                  : form.apply(written(value(truth, c.quantity(), row), c.shift())) + unit(c));
    }
    append(text, cells);
  }

  private String unit(Column c) {
    return withUnits ? " " + c.heads().get(0).replaceAll(".*\\(|\\).*", "") : "";
  }

  private String written(BigDecimal value, int shift) {
    BigDecimal scaled = value.movePointLeft(shift);
    if (stripZeros) {
      scaled = scaled.stripTrailingZeros();
    }
    String plain = scaled.toPlainString();
    int point = plain.indexOf('.');
    String whole = point < 0 ? plain : plain.substring(0, point);
    String grouped =
        grouping.isEmpty() ? whole : whole.replaceAll("(?<=\\d)(?=(\\d{3})+$)", grouping);
    return point < 0 ? grouped : grouped + decimal + plain.substring(point + 1);
  }

  private void append(StringBuilder text, List<String> cells) {
    List<String> out =
        cells.stream()
            .map(c -> quoted || c.contains(separator) && !separator.isBlank() ? '"' + c + '"' : c)
            .toList();
    text.append(String.join(separator, out)).append(trailing ? separator : "").append(lineEnd);
  }
}
