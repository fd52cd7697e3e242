package fourthwire.jobs.measured;

import fourthwire.audit.DesignState.LineCurrent;
import fourthwire.audit.DesignState.LineVoltage;
import fourthwire.audit.MeasuredState;
import fourthwire.metering.CaptureResult;
import fourthwire.metering.ReadingRepository;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.site.Survey;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalLong;

/** A waveform capture beside an audit's figures. */
final class CaptureStates {
  private CaptureStates() {}

  static MeasuredState of(ReadingRepository.Entry entry, Survey survey) {
    CaptureResult c = entry.reading().capture().orElseThrow();
    CaptureResult.CurrentFigures neutral = c.current().get(Conductor.N);
    return new MeasuredState(
        entry.meter().name(),
        OptionalLong.of(entry.id()),
        Measured.span(entry.reading().period(), survey),
        c.basis() + " " + c.neutralBasis(),
        lines(c),
        Measured.neutral(
            neutral == null ? Figure.unknown("not measured") : neutral.rmsA(),
            c.neutralPercentOfMeanLine()),
        voltage(c),
        c.power(),
        c.spectrum());
  }

  private static Map<Conductor, LineCurrent> lines(CaptureResult c) {
    Map<Conductor, LineCurrent> lines = new EnumMap<>(Conductor.class);
    c.current()
        .forEach(
            (conductor, f) -> {
              if (conductor.isLine()) {
                lines.put(conductor, Measured.line(f.rmsA(), f.fundamentalA(), f.thdPercent()));
              }
            });
    return lines;
  }

  private static Map<String, LineVoltage> voltage(CaptureResult c) {
    Map<String, LineVoltage> voltage = new LinkedHashMap<>();
    c.voltage()
        .forEach(
            (key, f) ->
                voltage.put(key, Measured.voltage(f.rmsV(), f.fundamentalV(), f.thdPercent())));
    return voltage;
  }
}
