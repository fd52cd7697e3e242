package fourthwire.jobs.measured;

import fourthwire.audit.DesignState.LineCurrent;
import fourthwire.audit.DesignState.LineVoltage;
import fourthwire.audit.MeasuredState;
import fourthwire.metering.LogResult;
import fourthwire.metering.LogResult.KeyInterval;
import fourthwire.metering.ReadingRepository;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import fourthwire.site.Survey;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;

/** An interval log beside an audit's figures: the interval in which the current was highest. */
final class LogStates {
  private static final List<String> VOLTAGES = List.of("L1", "L2", "L3", "L1-L2", "L2-L3", "L3-L1");

  private LogStates() {}

  /**
   * Empty where the log has no current and no power to choose an interval by.
   *
   * @param set the log as read, or as corrected
   * @param demand its demand current
   */
  static Optional<MeasuredState> of(
      ReadingRepository.Entry entry, LogSet set, MeasuredState.Demand demand, Survey survey) {
    return key(set.log()).map(k -> state(entry, k, set, demand, survey));
  }

  private static Optional<KeyInterval> key(LogResult log) {
    return log.keyIntervals().stream()
        .filter(k -> k.code().equals(LogResult.PEAK_CURRENT))
        .findFirst()
        .or(() -> log.keyIntervals().stream().findFirst());
  }

  private static MeasuredState state(
      ReadingRepository.Entry entry,
      KeyInterval key,
      LogSet set,
      MeasuredState.Demand demand,
      Survey survey) {
    Map<Conductor, LineCurrent> lines = lines(key);
    return new MeasuredState(
        entry.meter().name(),
        OptionalLong.of(entry.id()),
        Measured.span(entry.reading().period(), survey),
        key.reason() + ", " + set.words(),
        lines,
        Measured.neutral(value(key, "N.rms_a"), lines.values()),
        voltage(key),
        power(key),
        Map.of(),
        demand);
  }

  private static Map<Conductor, LineCurrent> lines(KeyInterval key) {
    Map<Conductor, LineCurrent> lines = new EnumMap<>(Conductor.class);
    for (Conductor line : Measured.lineConductors()) {
      if (key.values().containsKey(line + ".rms_a")) {
        lines.put(
            line,
            Measured.line(
                value(key, line + ".rms_a"),
                value(key, line + ".current_h1_a"),
                value(key, line + ".current_thd_percent")));
      }
    }
    return lines;
  }

  private static Map<String, LineVoltage> voltage(KeyInterval key) {
    Map<String, LineVoltage> voltage = new LinkedHashMap<>();
    for (String name : VOLTAGES) {
      if (key.values().containsKey(name + ".rms_v")) {
        voltage.put(
            name,
            Measured.voltage(
                value(key, name + ".rms_v"),
                value(key, name + ".voltage_h1_v"),
                value(key, name + ".voltage_thd_percent")));
      }
    }
    return voltage;
  }

  private static PowerFigures power(KeyInterval key) {
    Figure unknown = Figure.unknown("a log does not tell it");
    return new PowerFigures(
        total(key, "active_w"),
        unknown,
        value(key, "total.apparent_va"),
        unknown,
        value(key, "total.power_factor"),
        value(key, "total.displacement_factor"));
  }

  /** As logged, or the sum where every line was. */
  private static Figure total(KeyInterval key, String quantity) {
    if (key.values().containsKey("total." + quantity)) {
      return value(key, "total." + quantity);
    }
    List<String> names =
        Measured.lineConductors().stream().map(line -> line + "." + quantity).toList();
    return key.values().keySet().containsAll(names)
        ? Figure.of(names.stream().mapToDouble(n -> key.values().getOrDefault(n, 0.0)).sum())
        : value(key, "total." + quantity);
  }

  private static Figure value(KeyInterval key, String quantity) {
    return Measured.figure(Optional.ofNullable(key.values().get(quantity)));
  }
}
