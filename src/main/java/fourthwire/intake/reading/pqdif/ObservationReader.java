package fourthwire.intake.reading.pqdif;

import fourthwire.intake.reading.pqdif.ValueSeries.Statistic;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;

/** Takes the series out of an observation, by the definitions of its data source. */
final class ObservationReader {
  private static final UUID NONE = new UUID(0, 0);
  private static final Map<UUID, Statistic> STATISTICS =
      Map.of(
          Tags.TYPE_VALUE, Statistic.INSTANT,
          Tags.TYPE_INSTANT, Statistic.INSTANT,
          Tags.TYPE_MIN, Statistic.MIN,
          Tags.TYPE_MAX, Statistic.MAX,
          Tags.TYPE_MEAN, Statistic.MEAN);

  private static final Map<UUID, ValueSeries.Kind> KINDS =
      Map.ofEntries(
          Map.entry(Tags.IS_INSTANTANEOUS, ValueSeries.Kind.INSTANTANEOUS),
          Map.entry(Tags.IS_RMS, ValueSeries.Kind.RMS),
          Map.entry(Tags.IS_TOTAL_DISTORTION, ValueSeries.Kind.DISTORTION),
          Map.entry(Tags.IS_ACTIVE_POWER, ValueSeries.Kind.ACTIVE_POWER),
          Map.entry(Tags.IS_REACTIVE_POWER, ValueSeries.Kind.REACTIVE_POWER),
          Map.entry(Tags.IS_APPARENT_POWER, ValueSeries.Kind.APPARENT_POWER),
          Map.entry(Tags.IS_POWER_FACTOR, ValueSeries.Kind.POWER_FACTOR),
          Map.entry(Tags.IS_DISPLACEMENT_FACTOR, ValueSeries.Kind.DISPLACEMENT_FACTOR),
          Map.entry(Tags.IS_FREQUENCY, ValueSeries.Kind.FREQUENCY),
          Map.entry(Tags.IS_ENERGY, ValueSeries.Kind.ENERGY),
          Map.entry(Tags.IS_ENERGY_TAKEN, ValueSeries.Kind.ENERGY));

  private final List<Element.Collection> definitions;
  private final Element.Collection observation;
  private final int number;
  private final List<Element.Collection> instances;

  ObservationReader(Element.Collection source, Element.Collection observation, int number) {
    this.definitions =
        source
            .collection(Tags.CHANNEL_DEFINITIONS)
            .map(c -> c.collections(Tags.CHANNEL_DEFINITION))
            .orElse(List.of());
    this.observation = observation;
    this.number = number;
    this.instances =
        observation
            .collection(Tags.CHANNEL_INSTANCES)
            .map(c -> c.collections(Tags.CHANNEL_INSTANCE))
            .orElse(List.of());
  }

  List<ValueSeries> series(List<String> notes) {
    Optional<Instant> start =
        observation
            .values(Tags.TIME_START)
            .filter(v -> v.type() == Physical.MOMENT && v.count() > 0)
            .map(v -> v.moment(0));
    List<ValueSeries> found = new ArrayList<>();
    if (start.isEmpty()) {
      notes.add("Observation " + number + " has no start time and was left out.");
      return found;
    }
    for (Element.Collection instance : instances) {
      double index = instance.number(Tags.DEFINITION_INDEX).orElse(-1);
      if (index >= 0 && index < definitions.size()) {
        channel(definitions.get((int) index), instance, start.get(), found, notes);
      }
    }
    return found;
  }

  private void channel(
      Element.Collection definition,
      Element.Collection instance,
      Instant start,
      List<ValueSeries> found,
      List<String> notes) {
    String name = definition.text(Tags.CHANNEL_NAME);
    List<Element.Collection> defined = series(definition);
    Optional<SeriesValues> times = Optional.empty();
    for (int k = 0; k < defined.size(); k++) {
      if (isTime(defined.get(k))) {
        times = values(instance, defined.get(k), k);
      }
    }
    if (times.isEmpty()) {
      notes.add("Channel " + name + " has no times in seconds or dates and was left out.");
      return;
    }
    double[] seconds = times.get().seconds(start);
    for (int k = 0; k < defined.size(); k++) {
      Statistic statistic = STATISTICS.get(defined.get(k).identifier(Tags.VALUE_TYPE).orElse(NONE));
      if (statistic != null) {
        ValueSeries.Origin origin = origin(definition, defined.get(k), statistic, start);
        values(instance, defined.get(k), k)
            .map(SeriesValues::numbers)
            .filter(v -> v.length == seconds.length && v.length > 0)
            .ifPresent(v -> found.add(new ValueSeries(origin, seconds, v)));
      }
    }
  }

  /** Times counted in cycles tell no seconds. */
  private static boolean isTime(Element.Collection definition) {
    boolean cycles = SeriesUnit.of(definition.number(Tags.UNITS).orElse(-1)) == SeriesUnit.CYCLES;
    return !cycles
        && definition.identifier(Tags.VALUE_TYPE).filter(Tags.TYPE_TIME::equals).isPresent();
  }

  private ValueSeries.Origin origin(
      Element.Collection channel,
      Element.Collection definition,
      Statistic statistic,
      Instant start) {
    return new ValueSeries.Origin(
        number,
        observation.text(Tags.OBSERVATION_NAME),
        start,
        channel.text(Tags.CHANNEL_NAME),
        Phase.of(channel.number(Tags.PHASE).orElse(0)),
        SeriesUnit.of(definition.number(Tags.UNITS).orElse(-1)),
        measures(channel.number(Tags.QUANTITY_MEASURED).orElse(0)),
        definition
            .identifier(Tags.CHARACTERISTIC)
            .filter(c -> !c.equals(NONE))
            .map(c -> KINDS.getOrDefault(c, ValueSeries.Kind.OTHER))
            .orElse(ValueSeries.Kind.UNSAID),
        channel.identifier(Tags.QUANTITY_TYPE).filter(Tags.WAVEFORM::equals).isPresent(),
        statistic);
  }

  private static ValueSeries.Measures measures(double number) {
    return number == 1
        ? ValueSeries.Measures.VOLTAGE
        : number == 2 ? ValueSeries.Measures.CURRENT : ValueSeries.Measures.OTHER;
  }

  private static List<Element.Collection> series(Element.Collection definition) {
    return definition
        .collection(Tags.SERIES_DEFINITIONS)
        .map(c -> c.collections(Tags.SERIES_DEFINITION))
        .orElse(List.of());
  }

  private static Optional<Element.Collection> seriesInstance(Element.Collection channel, double k) {
    List<Element.Collection> all =
        channel
            .collection(Tags.SERIES_INSTANCES)
            .map(c -> c.collections(Tags.SERIES_INSTANCE))
            .orElse(List.of());
    return k >= 0 && k < all.size() ? Optional.of(all.get((int) k)) : Optional.empty();
  }

  /** A series' own values, or those of another channel's that it shares. */
  private Optional<SeriesValues> values(
      Element.Collection channel, Element.Collection definition, int k) {
    Optional<Element.Collection> own = seriesInstance(channel, k);
    double shared = own.map(s -> s.number(Tags.SHARED_CHANNEL).orElse(-1)).orElse(-1.0);
    Optional<Element.Collection> holder =
        shared >= 0 && shared < instances.size()
            ? seriesInstance(
                instances.get((int) shared),
                own.flatMap(s -> s.number(Tags.SHARED_SERIES).stream().boxed().findFirst())
                    .orElse(-1.0))
            : own;
    return holder.flatMap(h -> SeriesValues.of(h, definition));
  }
}
