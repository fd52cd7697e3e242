package fourthwire.intake.reading.log;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingPlan.Confidence;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.format.ChannelMapping;
import fourthwire.intake.reading.format.DateQuestion;
import fourthwire.intake.reading.format.Mappings;
import fourthwire.intake.reading.format.Progress;
import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.RowTime;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import fourthwire.intake.reading.table.ZoneNamed;
import fourthwire.intake.reading.unit.OpenUnits;
import fourthwire.intake.reading.unit.SampledColumns;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Stamp;
import fourthwire.metering.log.LogAnalysis;
import fourthwire.metering.series.LogSeries;
import java.time.DateTimeException;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.function.BiPredicate;
import java.util.regex.Pattern;

/** An interval log as a text table. */
public final class LogFormat {
  private static final String EXAMPLES =
      "a log holds L1.rms_a, N.rms_a, L1.rms_v, total.active_w, L1.current_thd_percent,"
          + " L1.current_h3_a … (contract, section 4)";

  private final TextTable table;
  private static final int WORKERS = 2;
  private static final int LOOK_ROWS = 300;
  private static final int LOOK_FOR_DAY_END = 2000;
  private static final Pattern DAY_END = Pattern.compile("(?<![\\d:.])24[:.]00");

  private final TimeColumns time;
  private final long bytes;

  /**
   * @param bytes length of the file
   */
  public LogFormat(TextTable table, TimeColumns time, long bytes) {
    this.table = table;
    this.time = time;
    this.bytes = bytes;
  }

  public ReadingPlan plan(ReadingSetting setting, String layout, Mappings known) {
    List<ReadingRefusedException.Question> questions = new ArrayList<>();
    List<String> notes = new ArrayList<>(List.of(table.note()));
    ReadingMapping.Time given =
        known.mapping().map(ReadingMapping::time).orElse(ReadingMapping.Time.FROM_FILE);
    ChannelMapping mapping = columns(known, questions, notes);
    if (time.columns().isEmpty() || time.elapsed()) {
      questions.add(
          question(
              "time.columns",
              "no column holds dates: say which one, or which two; of a capture of samples give"
                  + " sample_rate_hz instead"));
    }
    Optional<DateOrder> order = order(given, questions, notes);
    Optional<String> told = given.zone().or(() -> written(notes));
    Optional<String> unclear =
        told.isPresent() ? Optional.empty() : ZoneNamed.abbreviation(table, names());
    Optional<String> zone =
        unclear.isPresent() ? told : told.or(() -> setting.siteZone().map(ZoneId::getId));
    zone(zone, unclear, order, questions);
    boolean remembered = given.zone().isPresent() && known.whence() == Confidence.REMEMBERED;
    if ((told.isEmpty() || remembered) && order.isPresent() && questions.isEmpty()) {
      zone = zone.map(z -> kept(z, order.get(), notes));
    }
    if (order.isPresent() && standsStill(order.get())) {
      questions.add(
          question(
              "time.columns",
              "most rows stand at the same time as the row before: name the column of the time of"
                  + " day too"));
    }
    if (order.filter(o -> NewestFirst.is(table, time, o)).isPresent()) {
      notes.add("The newest row stands first: rows were read from the last to the first.");
    }
    if (!questions.isEmpty()) {
      throw new ReadingRefusedException(
          "The file can't be read without being told more.", table.headings(), questions);
    }
    if (!mapping.unmapped().isEmpty()) {
      notes.add("Columns not read: " + String.join(", ", unmapped(mapping)) + ".");
    }
    ReadingMapping.Time settled =
        new ReadingMapping.Time(
            names(),
            order.map(DateOrder::pattern),
            zone,
            Optional.of(stamp(given, notes)),
            given.intervalS());
    ReadingMapping whole =
        new ReadingMapping(
            Optional.of(ReadingKind.LOG), settled, OptionalDouble.empty(), mapping.columns());
    LogRows.checkFirst(table, new LogColumns(table, time, whole));
    return new ReadingPlan(
        ReadingKind.LOG, layout, whole, table.headings(), mapping.confidence(), notes);
  }

  /** How it would be read, what is open included. */
  public LogProposal propose(ReadingSetting setting, String layout, Mappings known) {
    List<ReadingRefusedException.Question> questions = new ArrayList<>();
    Optional<ReadingMapping.Time> planned = Optional.empty();
    try {
      planned = Optional.of(plan(setting, layout, known).mapping().time());
    } catch (ReadingRefusedException e) {
      questions.addAll(e.questions());
    }
    ReadingMapping.Time given =
        known.mapping().map(ReadingMapping::time).orElse(ReadingMapping.Time.FROM_FILE);
    List<String> notes = new ArrayList<>();
    Optional<DateOrder> order = order(given, new ArrayList<>(), notes);
    ReadingMapping.Time time =
        new ReadingMapping.Time(
            names(),
            order.map(DateOrder::pattern),
            planned
                .flatMap(ReadingMapping.Time::zone)
                .or(given::zone)
                .or(() -> setting.siteZone().map(ZoneId::getId)),
            Optional.of(stamp(given, new ArrayList<>())),
            given.intervalS());
    List<String> names = names();
    List<String> others = table.headings().stream().filter(h -> !names.contains(h)).toList();
    return new ProposalMaker(table, this.time, order)
        .make(
            others,
            known,
            new LogProposal.Time(time, this.time.isCalendar(), String.join(" ", notes)),
            questions);
  }

  private static ReadingRefusedException.Question question(String part, String message) {
    return new ReadingRefusedException.Question(part, message);
  }

  /** What is open about the columns is asked together with what is open about the time. */
  private ChannelMapping columns(
      Mappings known, List<ReadingRefusedException.Question> questions, List<String> notes) {
    List<String> names = names();
    List<String> others = table.headings().stream().filter(h -> !names.contains(h)).toList();
    try {
      return ChannelMapping.settle(
          others, known.mapping(), known.whence(), words(known, others, notes));
    } catch (ReadingRefusedException e) {
      questions.addAll(e.questions());
      return new ChannelMapping(java.util.Map.of(), java.util.Map.of(), List.of());
    }
  }

  private ChannelMapping.Words words(Mappings known, List<String> others, List<String> notes) {
    if (known.mapping().filter(m -> !m.columns().isEmpty()).isPresent()) {
      return new ChannelMapping.Words(h -> Heading.none(), MeasuredQuantity::ofLog, EXAMPLES);
    }
    OpenUnits.Settled read = OpenUnits.settle(Heading.ofLog(others), new SampledColumns(table));
    notes.addAll(read.notes());
    read.headings()
        .forEach(
            (column, h) -> {
              if (h.meaning() == Heading.Meaning.NONE && !h.question().isEmpty()) {
                notes.add("\"" + column + "\" is left out: " + h.question() + ".");
              }
            });
    return new ChannelMapping.Words(
        h -> read.headings().getOrDefault(h, Heading.none()), MeasuredQuantity::ofLog, EXAMPLES);
  }

  /** The zone that the file names. */
  private Optional<String> written(List<String> notes) {
    Optional<String> zone = ZoneNamed.of(table, names()).map(ZoneId::getId);
    zone.ifPresent(z -> notes.add("Times are in the zone " + z + ", as the file says."));
    return zone;
  }

  private List<String> names() {
    return time.columns().stream().map(table.headings()::get).toList();
  }

  private List<String> unmapped(ChannelMapping mapping) {
    return mapping.unmapped().stream().filter(h -> !names().contains(h)).toList();
  }

  private Optional<DateOrder> order(
      ReadingMapping.Time given,
      List<ReadingRefusedException.Question> questions,
      List<String> notes) {
    if (time.columns().isEmpty()) {
      return Optional.empty();
    }
    if (given.format().isPresent()) {
      DateOrder told = DateOrder.of(given.format().get());
      DateQuestion.of(table, time, told).ifPresent(questions::add);
      return Optional.of(told);
    }
    Optional<TimeColumns.Order> order = time.order(table);
    order.map(TimeColumns.Order::reason).filter(r -> !r.isEmpty()).ifPresent(notes::add);
    if (order.isEmpty()) {
      questions.add(
          question(
              "time.format",
              "the file does not settle whether day or month comes first: dd/MM/yyyy or"
                  + " MM/dd/yyyy"));
    }
    return order.map(TimeColumns.Order::order);
  }

  private void zone(
      Optional<String> zone,
      Optional<String> unclear,
      Optional<DateOrder> order,
      List<ReadingRefusedException.Question> questions) {
    if (zone.isPresent()) {
      try {
        ZoneId.of(zone.get());
      } catch (DateTimeException e) {
        questions.add(
            question(
                "time.zone", "\"" + zone.get() + "\" is no time zone, as Europe/Amsterdam is"));
      }
    } else if (!time.columns().isEmpty() && !offsetsWritten(order)) {
      questions.add(
          question(
              "time.zone",
              unclear
                  .map(
                      z ->
                          "the file's times are in "
                              + z
                              + ", which leaves summer time open: give the zone, as"
                              + " Europe/Amsterdam, or an offset, as -05:00")
                  .orElse(
                      "neither the file nor the site has a time zone: give one, as"
                          + " Europe/Amsterdam")));
    }
  }

  /** The zone, or the offset that the meter's clock keeps all year. */
  private String kept(String zone, DateOrder order, List<String> notes) {
    Optional<ZoneOffset> kept = StandardTime.kept(table, time, order, ZoneId.of(zone));
    kept.ifPresent(
        offset ->
            notes.add(
                "Rows run on through the hour in which the clocks of "
                    + zone
                    + " change: the meter keeps standard time all year, and times are read at "
                    + offset
                    + ". If it does not, give time.zone."));
    return kept.map(ZoneOffset::getId).orElse(zone);
  }

  private boolean offsetsWritten(Optional<DateOrder> order) {
    boolean[] written = {false};
    table.forEach(
        row -> {
          written[0] =
              time.at(row, order.orElse(DateOrder.YEAR_MONTH_DAY))
                  .flatMap(TimeColumns.At::offset)
                  .isPresent();
          return false;
        });
    return written[0];
  }

  /** Whether the first rows' times tell few of them apart. */
  private boolean standsStill(DateOrder order) {
    RowTime at = new RowTime(time, order);
    long[] before = {Long.MIN_VALUE};
    int[] rows = {0, 0};
    table.forEach(
        time.cells(),
        row -> {
          if (at.read(row)) {
            rows[1] += at.localMillis() == before[0] ? 1 : 0;
            before[0] = at.localMillis();
            rows[0]++;
          }
          return rows[0] < LOOK_ROWS;
        });
    return 2 * rows[1] > rows[0];
  }

  private Stamp stamp(ReadingMapping.Time given, List<String> notes) {
    if (given.stamp().isPresent()) {
      return given.stamp().get();
    }
    boolean named = names().stream().anyMatch(TimeColumns::isEnd);
    boolean end = named || dayEnds();
    notes.add(
        named
            ? "Times mark the ends of the intervals, as their heading says."
            : end
                ? "Times mark the ends of the intervals: days end at 24:00."
                : "Times are taken as the starts of the intervals.");
    return end ? Stamp.END : Stamp.START;
  }

  /** Whether a time of 24:00 stands in the first rows: no interval begins then. */
  private boolean dayEnds() {
    int[] rows = {0};
    boolean[] found = {false};
    table.forEach(
        time.cells(),
        row -> {
          found[0] = time.columns().size() > 0 && DAY_END.matcher(time.text(row)).find();
          return !found[0] && ++rows[0] < LOOK_FOR_DAY_END;
        });
    return found[0];
  }

  public Reading read(
      ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress) {
    LogColumns columns = new LogColumns(table, time, plan.mapping());
    LogSeries series = new LogSeries(columns.quantities(), new SpilledParts(), mostHeldValues());
    Optional<LogSeries> newestFirst =
        NewestFirst.is(table, time, columns.order())
            ? Optional.of(
                new LogSeries(columns.quantities(), new SpilledParts(), mostHeldValues() / 2))
            : Optional.empty();
    ExecutorService workers = Executors.newFixedThreadPool(WORKERS);
    try {
      LogRows rows = new LogRows(table, columns, plan.mapping(), series, newestFirst, workers);
      rows.read(new RowProgress(progress, bytes, System::nanoTime));
      Progress.go(progress, RowProgress.SHARE, "forming the statistics");
      List<String> notes = new ArrayList<>(plan.notes());
      notes.addAll(rows.notes());
      ZoneId zone = plan.mapping().time().zone().map(ZoneId::of).orElse(ZoneOffset.UTC);
      return LogAnalysis.of(
          series, rows.intervalMillis(), zone, setting.nominalHz(), notes, rows.findings());
    } catch (RuntimeException | Error e) {
      workers.shutdown();
      series.close();
      throw e;
    } finally {
      newestFirst.ifPresent(LogSeries::close);
      workers.shutdown();
    }
  }

  /** An eighth of the memory there is may hold values as numbers. */
  private static long mostHeldValues() {
    return Runtime.getRuntime().maxMemory() / 8 / Double.BYTES;
  }
}
