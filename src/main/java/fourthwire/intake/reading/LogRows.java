package fourthwire.intake.reading;

import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Column;
import fourthwire.metering.ReadingMapping.Stamp;
import fourthwire.metering.ReadingMapping.Statistic;
import fourthwire.metering.log.IntervalLog;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.BiPredicate;
import java.util.regex.Pattern;

/** Reads the rows of a log as planned. */
final class LogRows {
  private static final int TOLD = 3;
  private static final Pattern SUMMARY =
      Pattern.compile(
          "(?i)\\W*(min|max|avg|average|mean|total|sum|summe|std|stdev|p\\d\\d|median|mittel|moy|count|peak|end|statisti|summary|note|comment|remark|#|//|\\*).*");

  private final TextTable table;
  private final TimeColumns time;
  private final ReadingPlan plan;
  private final DateOrder order;
  private final LocalClock clock;
  private final int[] at;
  private final Factor[] factor;
  private final double[] values;
  private final IntervalLog.Builder log;
  private final List<String> leftOut = new ArrayList<>();
  private final List<String> unreadable = new ArrayList<>();
  private long leftOutRows;
  private long unreadableCells;

  LogRows(TextTable table, TimeColumns time, ReadingPlan plan) {
    this.table = table;
    this.time = time;
    this.plan = plan;
    ReadingMapping mapping = plan.mapping();
    this.order = mapping.time().format().map(DateOrder::of).orElse(DateOrder.YEAR_MONTH_DAY);
    this.clock = new LocalClock(mapping.time().zone().map(ZoneId::of).orElse(ZoneOffset.UTC));
    List<Column> columns = List.copyOf(mapping.columns().values());
    this.at = mapping.columns().keySet().stream().mapToInt(table.headings()::indexOf).toArray();
    this.factor = columns.stream().map(c -> Factor.of(c.factor())).toArray(Factor[]::new);
    this.values = new double[at.length];
    this.log = new IntervalLog.Builder(columns.stream().map(LogRows::key).toList());
  }

  /** Lowest and highest values stand beside the mean under their own names. */
  private static String key(Column column) {
    Statistic s = column.statistic();
    return s == Statistic.MIN || s == Statistic.MAX
        ? column.quantity() + "." + s.word()
        : column.quantity();
  }

  IntervalLog read(BiPredicate<Double, String> progress) {
    table.forEach(
        row -> {
          if (log.rows() % 5000 == 0) {
            CaptureReading.go(progress, 0.1, "reading rows, " + log.rows() + " so far");
          }
          row(row);
          return true;
        });
    if (log.rows() == 0) {
      throw new ReadingRefusedException(
          "No row has a time that can be read.", table.headings(), List.of());
    }
    ReadingMapping.Time told = plan.mapping().time();
    long interval =
        told.intervalS().isPresent()
            ? Math.round(1000 * told.intervalS().getAsDouble())
            : log.usualStepMillis().orElse(0);
    if (interval <= 0) {
      throw new ReadingRefusedException(
          "The interval can't be told from the rows.",
          table.headings(),
          List.of(
              new ReadingRefusedException.Question(
                  "time.interval_s", "give the length of a row in seconds")));
    }
    return log.build(interval, told.stamp().orElse(Stamp.START) == Stamp.END);
  }

  private void row(TextTable.Row row) {
    Optional<Instant> when = time.at(row, order).map(this::instant);
    boolean any = false;
    for (int k = 0; k < at.length; k++) {
      double value = row.value(at[k], factor[k].shift());
      if (value == Double.NEGATIVE_INFINITY) {
        value = Double.NaN;
        if (when.isPresent()) {
          unreadable(row, at[k]);
        }
      }
      any = any || !Double.isNaN(value);
      values[k] = value * factor[k].rest();
    }
    if (when.isEmpty() && isNote(row)) {
      any = false;
    }
    if (when.isPresent()) {
      log.add(when.get().toEpochMilli(), values);
    } else if (any) {
      throw new ReadingRefusedException(
          "Row "
              + row.number()
              + ": \""
              + time.text(row)
              + "\" is no time in the order "
              + order.pattern()
              + ", but the row holds values.",
          table.headings(),
          List.of(
              new ReadingRefusedException.Question(
                  "time.format", "say how times are written, or mend the row")));
    } else {
      leftOutRows++;
      if (leftOut.size() < TOLD) {
        leftOut.add("row " + row.number());
      }
    }
  }

  /** A line below or between the values: a sum, a remark, a header that comes again. */
  private boolean isNote(TextTable.Row row) {
    String first = row.text(time.columns().get(0));
    return first.isEmpty()
        ? 2 * row.cells() < table.headings().size()
        : SUMMARY.matcher(first).matches() || table.headings().contains(first) || row.cells() < 3;
  }

  private Instant instant(TimeColumns.At when) {
    return when.offset()
        .map(offset -> when.local().toInstant(offset))
        .orElseGet(() -> clock.at(when.local()));
  }

  private void unreadable(TextTable.Row row, int column) {
    unreadableCells++;
    if (unreadable.size() < TOLD) {
      unreadable.add(
          "row "
              + row.number()
              + ", "
              + table.headings().get(column)
              + ": \""
              + row.text(column)
              + "\"");
    }
  }

  /** What was passed over. */
  List<String> notes() {
    return leftOutRows == 0
        ? List.of()
        : List.of(
            leftOutRows
                + " rows without a time were passed over: "
                + String.join(", ", leftOut)
                + (leftOutRows > leftOut.size() ? " …" : "")
                + ".");
  }

  /** What was wrong with cells and times. */
  List<QualityFinding> findings() {
    List<QualityFinding> findings = new ArrayList<>();
    if (unreadableCells > 0) {
      findings.add(
          finding(
              QualityFinding.IMPOSSIBLE_VALUE,
              "They are left out as if blank.",
              unreadableCells + " cells are no numbers: " + String.join("; ", unreadable) + "."));
    }
    if (clock.skipped() > 0) {
      findings.add(
          finding(
              QualityFinding.CLOCK_JUMP,
              "From then on times may be an hour off.",
              String.format(
                  Locale.ROOT,
                  "%d rows stand at a local time that the change to summer time skips: the meter's"
                      + " clock may keep winter time all year.",
                  clock.skipped())));
    }
    return findings;
  }

  private static QualityFinding finding(String code, String effect, String sentence) {
    return new QualityFinding(code, Optional.empty(), effect, sentence);
  }
}
