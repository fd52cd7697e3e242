package fourthwire.jobs.measured;

import fourthwire.audit.DesignState.LineCurrent;
import fourthwire.audit.DesignState.LineVoltage;
import fourthwire.audit.MeasuredState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import fourthwire.site.Instrument;
import fourthwire.site.SpotReading;
import java.time.ZoneId;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/** A clamp reading of the survey beside an audit's figures. */
final class ClampStates {
  private static final double WATTS_PER_KILOWATT = 1000;

  private ClampStates() {}

  static MeasuredState of(SpotReading r, ZoneId zone) {
    Map<Conductor, LineCurrent> lines = new EnumMap<>(Conductor.class);
    putLine(lines, Conductor.L1, r.l1A(), r.thdPercent());
    putLine(lines, Conductor.L2, r.l2A(), r.thdPercent());
    putLine(lines, Conductor.L3, r.l3A(), r.thdPercent());
    Map<String, LineVoltage> voltage = new LinkedHashMap<>();
    putVoltage(voltage, "L1", r.l1V());
    putVoltage(voltage, "L2", r.l2V());
    putVoltage(voltage, "L3", r.l3V());
    return new MeasuredState(
        "clamp reading",
        OptionalLong.empty(),
        Measured.span(r.time(), zone),
        "one moment, read by hand"
            + r.instrument().map(Instrument::word).map(w -> " (" + w + " instrument)").orElse(""),
        lines,
        Measured.neutral(Measured.figure(r.nA()), lines.values()),
        voltage,
        power(r),
        Map.of());
  }

  private static void putLine(
      Map<Conductor, LineCurrent> into,
      Conductor line,
      OptionalDouble amps,
      OptionalDouble thdPercent) {
    if (amps.isPresent()) {
      into.put(
          line,
          Measured.line(
              Measured.figure(amps),
              Figure.unknown("a clamp reading tells the total only"),
              Measured.figure(thdPercent)));
    }
  }

  private static void putVoltage(Map<String, LineVoltage> into, String line, OptionalDouble volts) {
    if (volts.isPresent()) {
      into.put(
          line,
          Measured.voltage(
              Measured.figure(volts),
              Figure.unknown("a clamp reading tells the total only"),
              Figure.unknown("not measured")));
    }
  }

  private static PowerFigures power(SpotReading r) {
    Figure unknown = Figure.unknown("not measured");
    return new PowerFigures(
        Measured.figure(r.kw()).map(kw -> kw * WATTS_PER_KILOWATT),
        unknown,
        unknown,
        unknown,
        Measured.figure(r.powerFactor()),
        unknown);
  }
}
