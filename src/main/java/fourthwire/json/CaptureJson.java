package fourthwire.json;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.CaptureResult.CurrentFigures;
import fourthwire.metering.CaptureResult.VoltageFigures;
import fourthwire.quantity.Conductor;
import java.util.EnumMap;
import java.util.Map;
import java.util.function.Function;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** The figures of a waveform capture, named as a node's. */
final class CaptureJson {
  private static final String NEUTRAL_BASIS = "neutral_basis";
  private static final String PERCENT_OF_MEAN = "neutral_percent_of_mean_line";
  private static final String CHANNEL_RMS = "neutral_channel_rms_a";

  private CaptureJson() {}

  static void write(ObjectNode o, CaptureResult c) {
    o.put("frequency_hz", c.frequencyHz()).put("cycles", c.cycles()).put("basis", c.basis());
    o.set("current", Json.map(inOrder(c.current()), CaptureJson::write));
    Json.put(o, PERCENT_OF_MEAN, c.neutralPercentOfMeanLine());
    o.put(NEUTRAL_BASIS, c.neutralBasis());
    Json.put(o, CHANNEL_RMS, c.neutralChannelRmsA());
    o.set("voltage", Json.map(c.voltage(), CaptureJson::write));
    o.set("spectrum", SpectrumJson.write(inOrder(c.spectrum()), SpectrumJson.AMPS));
    o.set("voltage_spectrum", SpectrumJson.write(c.voltageSpectrum(), SpectrumJson.VOLTS));
    o.set("power", PowerJson.write(c.power()).put("basis", c.powerBasis()));
    o.set("power_by_line", Json.map(inOrder(c.powerByLine()), PowerJson::write));
    WaveformJson.write(o, c);
  }

  private static <V> Map<Conductor, V> inOrder(Map<Conductor, V> map) {
    Map<Conductor, V> sorted = new EnumMap<>(Conductor.class);
    sorted.putAll(map);
    return sorted;
  }

  private static ObjectNode write(CurrentFigures c) {
    ObjectNode o = Json.object();
    Json.put(o, "rms_a", c.rmsA());
    Json.put(o, "fundamental_a", c.fundamentalA());
    Json.put(o, "thd_percent", c.thdPercent());
    Json.put(o, "crest_factor", c.crestFactor());
    return o;
  }

  private static ObjectNode write(VoltageFigures v) {
    ObjectNode o = Json.object();
    Json.put(o, "rms_v", v.rmsV());
    Json.put(o, "fundamental_v", v.fundamentalV());
    Json.put(o, "thd_percent", v.thdPercent());
    Json.put(o, "crest_factor", v.crestFactor());
    return o;
  }

  static CaptureResult read(JsonNode o) {
    return new CaptureResult(
        o.path("frequency_hz").doubleValue(),
        o.path("cycles").intValue(),
        o.path("basis").asString(""),
        Json.map(o, "current", Conductor.class, CaptureJson::current),
        Json.figure(o, PERCENT_OF_MEAN),
        o.path(NEUTRAL_BASIS).asString(""),
        Json.figure(o, CHANNEL_RMS),
        Json.map(o, "voltage", CaptureJson::voltage),
        DesignJson.currentSpectrum(o),
        SpectrumJson.read(o.path("voltage_spectrum"), SpectrumJson.VOLTS, Function.identity()),
        PowerJson.read(o.path("power")),
        o.path("power").path("basis").asString(""),
        DesignJson.powerByLine(o),
        WaveformJson.unbalance(o),
        WaveformJson.windows(o),
        WaveformJson.events(o),
        WaveformJson.picture(o),
        WaveformJson.closeUp(o));
  }

  private static CurrentFigures current(JsonNode o) {
    return new CurrentFigures(
        Json.figure(o, "rms_a"),
        Json.figure(o, "fundamental_a"),
        Json.figure(o, "thd_percent"),
        Json.figure(o, "crest_factor"));
  }

  private static VoltageFigures voltage(JsonNode o) {
    return new VoltageFigures(
        Json.figure(o, "rms_v"),
        Json.figure(o, "fundamental_v"),
        Json.figure(o, "thd_percent"),
        Json.figure(o, "crest_factor"));
  }
}
