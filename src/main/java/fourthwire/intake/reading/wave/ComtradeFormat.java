package fourthwire.intake.reading.wave;

import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.channel.ChannelNames;
import fourthwire.intake.reading.comtrade.AnalogChannel;
import fourthwire.intake.reading.comtrade.Comtrade;
import fourthwire.intake.reading.comtrade.ComtradeException;
import fourthwire.intake.reading.format.ChannelMapping;
import fourthwire.intake.reading.format.Format;
import fourthwire.intake.reading.format.Layout;
import fourthwire.intake.reading.format.Mappings;
import fourthwire.intake.reading.format.Part;
import fourthwire.intake.reading.format.Progress;
import fourthwire.intake.reading.heading.Heading;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Column;
import fourthwire.metering.capture.Capture;
import fourthwire.metering.capture.wave.Samples;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.BiPredicate;
import java.util.function.Function;
import java.util.function.Supplier;

/** A COMTRADE record: its channels proposed as quantities, its samples as a capture. */
public final class ComtradeFormat implements Format {
  private static final int MOST_BYTES = 200_000_000;
  private static final String EXAMPLES =
      "a capture holds L1.v, L1-L2.v, N.v … in volts and L1.i, N.i … in amps";

  private final Supplier<byte[]> configuration;
  private final Function<OptionalDouble, Comtrade> record;

  private ComtradeFormat(
      Supplier<byte[]> configuration, Function<OptionalDouble, Comtrade> record) {
    this.configuration = configuration;
    this.record = record;
  }

  public static ComtradeFormat of(Part configuration, Part data) {
    return new ComtradeFormat(
        () -> configuration.bytes(MOST_BYTES),
        rate -> Comtrade.of(configuration.bytes(MOST_BYTES), data.bytes(MOST_BYTES), rate));
  }

  public static ComtradeFormat ofCombined(Part file) {
    return new ComtradeFormat(
        () -> Comtrade.configurationOf(file.bytes(MOST_BYTES)),
        rate -> Comtrade.ofCombined(file.bytes(MOST_BYTES), rate));
  }

  @Override
  public ReadingPlan plan(ReadingSetting setting) {
    Map<String, AnalogChannel> channels =
        named(guarded(() -> Comtrade.channels(configuration.get())));
    List<String> names = List.copyOf(channels.keySet());
    String layout = Layout.of("comtrade", names);
    Mappings known = Mappings.of(setting, layout);
    ChannelMapping mapping =
        ChannelMapping.settle(names, known.mapping(), known.whence(), words(channels));
    List<String> notes = new ArrayList<>();
    OptionalDouble rate =
        known.mapping().map(ReadingMapping::sampleRateHz).orElse(OptionalDouble.empty());
    if (rate.isEmpty() && guarded(() -> Comtrade.statesNoRate(configuration.get()))) {
      askWhereUntimed(names, notes);
    }
    if (!mapping.unmapped().isEmpty()) {
      notes.add("Channels not read: " + String.join(", ", mapping.unmapped()) + ".");
    }
    return new ReadingPlan(
        ReadingKind.CAPTURE,
        layout,
        new ReadingMapping(
            Optional.of(ReadingKind.CAPTURE),
            known.mapping().map(ReadingMapping::time).orElse(ReadingMapping.Time.FROM_FILE),
            rate,
            mapping.columns()),
        names,
        mapping.confidence(),
        notes);
  }

  private void askWhereUntimed(List<String> names, List<String> notes) {
    try {
      Comtrade timed = record.apply(OptionalDouble.empty());
      notes.add(
          String.format(
              Locale.ROOT,
              "The record states no sample rate; its samples' own times were used%s.",
              timed.time().isEven() ? ", which are even" : ""));
    } catch (ComtradeException.NoRate e) {
      throw new ReadingRefusedException(
          String.valueOf(e.getMessage()),
          names,
          List.of(
              new ReadingRefusedException.Question("sample_rate_hz", "give the samples a second")));
    } catch (ComtradeException e) {
      throw new ReadingRefusedException(String.valueOf(e.getMessage()));
    }
  }

  private static ChannelMapping.Words words(Map<String, AnalogChannel> channels) {
    List<Heading> headings =
        ChannelNames.read(
            channels.values().stream()
                .map(c -> new ChannelNames.Channel(c.name(), c.phase(), c.unit()))
                .toList());
    List<String> names = List.copyOf(channels.keySet());
    return new ChannelMapping.Words(
        name -> headings.get(names.indexOf(name)), MeasuredQuantity::ofCapture, EXAMPLES);
  }

  /** Channels by name; a name that stands there twice gets its number. */
  private static Map<String, AnalogChannel> named(List<AnalogChannel> channels) {
    Map<String, AnalogChannel> named = new LinkedHashMap<>();
    for (int k = 0; k < channels.size(); k++) {
      String name =
          channels.get(k).name().isEmpty() ? "channel " + (k + 1) : channels.get(k).name();
      named.put(named.containsKey(name) ? name + " #" + (k + 1) : name, channels.get(k));
    }
    return named;
  }

  @Override
  public Reading read(
      ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress) {
    Progress.go(progress, 0, "reading the record");
    Comtrade comtrade = guarded(() -> record.apply(plan.mapping().sampleRateHz()));
    List<String> notes = new ArrayList<>(plan.notes());
    notes.addAll(comtrade.notes());
    List<Capture.Channel> channels = new ArrayList<>();
    List<Samples> samples = new ArrayList<>();
    int k = 0;
    for (Map.Entry<String, AnalogChannel> e : named(comtrade.channels()).entrySet()) {
      Column column = plan.mapping().columns().get(e.getKey());
      if (column != null) {
        double ratio = ratio(e.getKey(), e.getValue(), column, setting, notes);
        channels.add(new Capture.Channel(e.getKey(), column.quantity(), e.getValue().skewS()));
        samples.add(comtrade.samples(k).times(column.factor() * ratio));
      }
      k++;
    }
    Capture capture =
        new Capture(start(comtrade, plan, setting, notes), comtrade.time(), channels, samples);
    return CaptureReading.of(capture, setting, notes, progress);
  }

  /** Secondary values by the record's own ratio, else for currents by the meter's. */
  private static double ratio(
      String name,
      AnalogChannel channel,
      Column column,
      ReadingSetting setting,
      List<String> notes) {
    if (!channel.secondaryValues()) {
      return 1;
    }
    boolean bare = channel.toPrimary() == 1;
    boolean current = column.quantity().endsWith(".i");
    double ratio =
        bare && current && setting.ctRatio().isPresent()
            ? setting.ctRatio().getAsDouble()
            : channel.toPrimary();
    notes.add(
        String.format(
            Locale.ROOT,
            "Channel %s holds secondary values; multiplied by %s, the ratio of %s.",
            name,
            Double.toString(ratio),
            ratio == channel.toPrimary() ? "the record" : "the meter"));
    return ratio;
  }

  private static Optional<Instant> start(
      Comtrade comtrade, ReadingPlan plan, ReadingSetting setting, List<String> notes) {
    Optional<ZoneId> zone = plan.mapping().time().zone().map(ZoneId::of).or(setting::siteZone);
    if (comtrade.start().isEmpty()) {
      notes.add("The record states no readable start time.");
      return Optional.empty();
    }
    if (comtrade.utcOffset().isPresent()) {
      // Revision 2013: the written time is the time code's; its offset from UTC stands beside it.
      ZoneOffset offset = ZoneOffset.of(comtrade.utcOffset().get());
      return comtrade.start().map(t -> t.toInstant(offset));
    }
    if (zone.isEmpty()) {
      notes.add("No time zone is known for the record's start time; it was taken as UTC.");
    }
    return comtrade.start().map(t -> t.atZone(zone.orElse(ZoneOffset.UTC)).toInstant());
  }

  private static <T> T guarded(Supplier<T> reading) {
    try {
      return reading.get();
    } catch (ComtradeException e) {
      throw new ReadingRefusedException(String.valueOf(e.getMessage()));
    }
  }
}
