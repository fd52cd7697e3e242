package fourthwire.intake.reading.wave;

import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.channel.ChannelNames;
import fourthwire.intake.reading.format.ChannelMapping;
import fourthwire.intake.reading.format.DateQuestion;
import fourthwire.intake.reading.format.Mappings;
import fourthwire.intake.reading.format.Progress;
import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Column;
import fourthwire.metering.capture.Capture;
import fourthwire.metering.capture.wave.TimeAxis;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.BiPredicate;

/** A capture of instantaneous values as a text table. */
public final class TextCapture {
  private static final String EXAMPLES =
      "a capture holds L1.v, L1-L2.v, N.v … in volts and L1.i, N.i … in amps";

  private final TextTable table;
  private final TimeColumns time;

  public TextCapture(TextTable table, TimeColumns time) {
    this.table = table;
    this.time = time;
  }

  public ReadingPlan plan(ReadingSetting setting, String layout, Mappings known) {
    List<String> timeNames = time.columns().stream().map(table.headings()::get).toList();
    List<String> others = table.headings().stream().filter(h -> !timeNames.contains(h)).toList();
    ChannelMapping mapping =
        ChannelMapping.settle(others, known.mapping(), known.whence(), words(others));
    OptionalDouble told =
        known.mapping().map(ReadingMapping::sampleRateHz).orElse(OptionalDouble.empty());
    boolean written = told.isEmpty() && time.columns().isEmpty();
    OptionalDouble rate = written ? WrittenRate.of(table) : told;
    if (time.columns().isEmpty() && rate.isEmpty()) {
      throw new ReadingRefusedException(
          "The capture has no time column.",
          table.headings(),
          List.of(
              new ReadingRefusedException.Question(
                  "sample_rate_hz", "give the samples a second, or name the time column")));
    }
    ReadingMapping.Time given =
        known.mapping().map(ReadingMapping::time).orElse(ReadingMapping.Time.FROM_FILE);
    checkFormat(given);
    Optional<String> format = given.format().or(this::format);
    List<String> notes = new ArrayList<>(List.of(table.note()));
    if (written) {
      notes.add("Samples stand " + rate.getAsDouble() + " to the second, as the file says.");
    }
    if (!mapping.unmapped().isEmpty()) {
      notes.add("Columns not read: " + String.join(", ", mapping.unmapped()) + ".");
    }
    return new ReadingPlan(
        ReadingKind.CAPTURE,
        layout,
        new ReadingMapping(
            Optional.of(ReadingKind.CAPTURE),
            new ReadingMapping.Time(
                timeNames, format, given.zone(), given.stamp(), given.intervalS()),
            rate,
            mapping.columns()),
        table.headings(),
        mapping.confidence(),
        notes);
  }

  /** The order of clock times' dates; asked where the file does not settle it. */
  private Optional<String> format() {
    if (time.columns().isEmpty() || time.elapsed()) {
      return Optional.empty();
    }
    Optional<TimeColumns.Order> order = time.order(table);
    if (order.isEmpty()) {
      throw new ReadingRefusedException(
          "The dates of the samples can be read in two ways.",
          table.headings(),
          List.of(
              new ReadingRefusedException.Question("time.format", "say dd/MM/yyyy or MM/dd/yyyy")));
    }
    return order.map(o -> o.order().pattern());
  }

  private static ChannelMapping.Words words(List<String> names) {
    List<Heading> headings =
        ChannelNames.read(names.stream().map(n -> new ChannelNames.Channel(n, "", "")).toList());
    return new ChannelMapping.Words(
        name -> headings.get(names.indexOf(name)), MeasuredQuantity::ofCapture, EXAMPLES);
  }

  private void checkFormat(ReadingMapping.Time given) {
    if (given.format().isPresent() && !time.columns().isEmpty() && !time.elapsed()) {
      DateQuestion.of(table, time, DateOrder.of(given.format().get()))
          .ifPresent(
              question -> {
                throw new ReadingRefusedException(
                    "The times of the samples can't be read as told.",
                    table.headings(),
                    List.of(question));
              });
    }
  }

  public Reading read(
      ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress) {
    Progress.go(progress, 0, "reading the samples");
    Map<String, Column> columns = plan.mapping().columns();
    int[] at = columns.keySet().stream().mapToInt(table.headings()::indexOf).toArray();
    double[] factor = columns.values().stream().mapToDouble(Column::factor).toArray();
    Samples samples = new Samples(at.length);
    DateOrder order =
        plan.mapping().time().format().map(DateOrder::of).orElse(DateOrder.YEAR_MONTH_DAY);
    table.forEach(
        row -> {
          double[] values = new double[at.length];
          for (int k = 0; k < at.length; k++) {
            double value = row.value(at[k]);
            values[k] = value == Double.NEGATIVE_INFINITY ? Double.NaN : value * factor[k];
          }
          samples.add(seconds(row, order, samples), values);
          return true;
        });
    List<String> notes = new ArrayList<>(plan.notes());
    Capture capture = capture(plan, setting, samples, notes);
    return CaptureReading.of(capture, setting, notes, progress);
  }

  /** A row's time in seconds; NaN where the rows are counted instead. */
  private double seconds(TextTable.Row row, DateOrder order, Samples samples) {
    if (time.columns().isEmpty()) {
      return Double.NaN;
    }
    if (time.elapsed()) {
      return row.value(time.columns().get(0)) * time.unitS();
    }
    LocalDateTime local =
        time.at(row, order)
            .map(TimeColumns.At::local)
            .orElseThrow(
                () ->
                    new ReadingRefusedException(
                        "Row "
                            + row.number()
                            + ": \""
                            + time.text(row)
                            + "\" is no time in the order "
                            + order.pattern()
                            + ".",
                        table.headings(),
                        List.of(
                            new ReadingRefusedException.Question(
                                "time.format", "say how times are written, or mend the row"))));
    return samples.sinceFirst(local);
  }

  private Capture capture(
      ReadingPlan plan, ReadingSetting setting, Samples samples, List<String> notes) {
    TimeAxis axis = samples.axis(plan.mapping().sampleRateHz(), table.headings(), notes);
    List<Capture.Channel> channels = new ArrayList<>();
    plan.mapping()
        .columns()
        .forEach((name, column) -> channels.add(new Capture.Channel(name, column.quantity())));
    Optional<ZoneId> zone = plan.mapping().time().zone().map(ZoneId::of).or(setting::siteZone);
    Optional<Instant> start =
        samples.first().flatMap(local -> zone.map(z -> local.atZone(z).toInstant()));
    return new Capture(start, axis, channels, samples.columns());
  }

  /** Rows gathered. */
  private static final class Samples {
    private final List<fourthwire.metering.capture.wave.Samples.Gatherer> columns =
        new ArrayList<>();
    private double[] times = new double[4096];
    private int rows;
    private Optional<LocalDateTime> first = Optional.empty();

    Samples(int channels) {
      for (int k = 0; k < channels; k++) {
        columns.add(new fourthwire.metering.capture.wave.Samples.Gatherer(4096));
      }
    }

    void add(double seconds, double[] values) {
      if ((long) (rows + 1) * values.length > Capture.MOST_SAMPLES) {
        throw new ReadingRefusedException(
            "The capture has more than "
                + Capture.MOST_SAMPLES
                + " samples of all channels: cut it into shorter files.");
      }
      if (rows == times.length) {
        times = Arrays.copyOf(times, 2 * rows);
      }
      times[rows] = seconds;
      for (int k = 0; k < values.length; k++) {
        columns.get(k).add(values[k]);
      }
      rows++;
    }

    double sinceFirst(LocalDateTime local) {
      first = first.or(() -> Optional.of(local));
      return Duration.between(first.orElse(local), local).toNanos() * 1e-9;
    }

    Optional<LocalDateTime> first() {
      return first;
    }

    List<fourthwire.metering.capture.wave.Samples> columns() {
      return columns.stream().map(fourthwire.metering.capture.wave.Samples.Gatherer::done).toList();
    }

    /** Times after the first; printed to few digits they are put on an even grid. */
    TimeAxis axis(OptionalDouble rateHz, List<String> headings, List<String> notes) {
      if (rateHz.isPresent() && rows >= 2) {
        return TimeAxis.even(rateHz.getAsDouble(), rows);
      }
      EvenTimes even = EvenTimes.of(times, rows);
      if (even.stepS() <= 0) {
        throw new ReadingRefusedException(
            "The times of the samples do not rise: check the time column.",
            headings,
            List.of(
                new ReadingRefusedException.Question(
                    "sample_rate_hz", "or give the samples a second")));
      }
      if (even.offGrid() > 0) {
        throw new ReadingRefusedException(
            "Sample "
                + even.offGrid()
                + " stands off the even grid of times: samples are missing or the time column is"
                + " not the time.",
            headings,
            List.of(
                new ReadingRefusedException.Question(
                    "sample_rate_hz", "give the samples a second if they are even after all")));
      }
      if (!even.note().isEmpty()) {
        notes.add(even.note());
      }
      return TimeAxis.even(1 / even.stepS(), rows);
    }
  }
}
