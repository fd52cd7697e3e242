package fourthwire.intake.reading.wave;

import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.channel.ChannelNames;
import fourthwire.intake.reading.format.ChannelMapping;
import fourthwire.intake.reading.format.Format;
import fourthwire.intake.reading.format.Layout;
import fourthwire.intake.reading.format.Mappings;
import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.pqdif.Pqdif;
import fourthwire.intake.reading.pqdif.SeriesUnit;
import fourthwire.intake.reading.pqdif.ValueSeries;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Column;
import fourthwire.metering.capture.Capture;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.BiPredicate;

/** The longest waveforms of a PQDIF file, of all observations of their times; others are named. */
public final class PqdifCapture implements Format {
  private static final int MOST_NAMED = 8;
  private static final double EVEN_WITHIN = 0.05;

  private final Map<String, ValueSeries> channels = new LinkedHashMap<>();
  private final List<String> notes = new ArrayList<>();

  private PqdifCapture(List<ValueSeries> chosen, List<ValueSeries> all) {
    for (ValueSeries s : chosen) {
      String name = s.origin().channel().isEmpty() ? "channel" : s.origin().channel();
      channels.put(channels.containsKey(name) ? name + " #" + (channels.size() + 1) : name, s);
    }
    List<Integer> read = chosen.stream().map(s -> s.origin().observation()).toList();
    List<String> left =
        all.stream()
            .map(ValueSeries::origin)
            .filter(o -> !read.contains(o.observation()))
            .map(PqdifCapture::named)
            .distinct()
            .toList();
    if (!left.isEmpty()) {
      notes.add(
          "The file holds waveforms of several observations; the longest, "
              + named(chosen.get(0).origin())
              + ", was read. Not read: "
              + String.join("; ", left.subList(0, Math.min(MOST_NAMED, left.size())))
              + (left.size() > MOST_NAMED ? " and " + (left.size() - MOST_NAMED) + " more." : "."));
    }
  }

  private static String named(ValueSeries.Origin o) {
    return "number "
        + o.observation()
        + (o.observationName().isEmpty() ? "" : ", \"" + o.observationName() + "\"")
        + " of "
        + o.start().truncatedTo(ChronoUnit.SECONDS);
  }

  /** Of a file; empty where it holds no waveforms in volts or amps. */
  public static Optional<PqdifCapture> of(Pqdif file) {
    List<ValueSeries> waves =
        file.series().stream()
            .filter(s -> s.origin().isWaveform() && s.count() > 1)
            .filter(s -> s.origin().statistic() == ValueSeries.Statistic.INSTANT)
            .filter(
                s -> s.origin().unit() == SeriesUnit.VOLTS || s.origin().unit() == SeriesUnit.AMPS)
            .toList();
    return waves.stream()
        .max(
            Comparator.comparingInt(ValueSeries::count)
                .thenComparing(s -> -s.origin().observation()))
        .map(longest -> new PqdifCapture(waves.stream().filter(longest::isBeside).toList(), waves));
  }

  @Override
  public ReadingPlan plan(ReadingSetting setting) {
    List<String> names = List.copyOf(channels.keySet());
    String layout = Layout.of("pqdif", names);
    Mappings known = Mappings.of(setting, layout);
    List<Heading> headings =
        ChannelNames.read(
            channels.entrySet().stream()
                .map(
                    e ->
                        new ChannelNames.Channel(
                            e.getKey(),
                            e.getValue().origin().phase().letters(),
                            e.getValue().origin().unit() == SeriesUnit.VOLTS ? "V" : "A"))
                .toList());
    ChannelMapping mapping =
        ChannelMapping.settle(
            names,
            known.mapping(),
            known.whence(),
            new ChannelMapping.Words(
                name -> headings.get(names.indexOf(name)),
                MeasuredQuantity::ofCapture,
                "a capture holds L1.v, L1-L2.v, N.v … in volts and L1.i, N.i … in amps"));
    List<String> all = new ArrayList<>(notes);
    if (!mapping.unmapped().isEmpty()) {
      all.add("Channels not read: " + String.join(", ", mapping.unmapped()) + ".");
    }
    return new ReadingPlan(
        ReadingKind.CAPTURE,
        layout,
        new ReadingMapping(
            Optional.of(ReadingKind.CAPTURE),
            ReadingMapping.Time.FROM_FILE,
            OptionalDouble.empty(),
            mapping.columns()),
        names,
        mapping.confidence(),
        all);
  }

  @Override
  public Reading read(
      ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress) {
    List<Capture.Channel> mapped = new ArrayList<>();
    List<Samples> samples = new ArrayList<>();
    plan.mapping()
        .columns()
        .forEach(
            (name, column) -> {
              ValueSeries s = channels.get(name);
              if (s != null) {
                mapped.add(new Capture.Channel(name, column.quantity()));
                samples.add(samples(s, column));
              }
            });
    ValueSeries any = channels.values().iterator().next();
    Capture capture = new Capture(Optional.of(any.origin().start()), axis(any), mapped, samples);
    return CaptureReading.of(capture, setting, plan.notes(), progress);
  }

  private static Samples samples(ValueSeries s, Column column) {
    Samples.Gatherer gathered = new Samples.Gatherer(s.count());
    for (int k = 0; k < s.count(); k++) {
      gathered.add(s.at(k) * column.factor());
    }
    return gathered.done();
  }

  private static TimeAxis axis(ValueSeries s) {
    int n = s.count();
    double first = s.secondsAt(0);
    double step = (s.secondsAt(n - 1) - first) / (n - 1);
    double[] t = new double[n];
    boolean even = true;
    for (int k = 0; k < n; k++) {
      t[k] = s.secondsAt(k) - first;
      even = even && Math.abs(t[k] - k * step) < EVEN_WITHIN * step;
      if (k > 0 && !(t[k] > t[k - 1])) {
        throw new ReadingRefusedException(
            "The times of the samples of channel "
                + s.origin().channel()
                + " do not rise at sample "
                + (k + 1)
                + ".");
      }
    }
    return even ? TimeAxis.even(1 / step, n) : TimeAxis.told(t);
  }
}
