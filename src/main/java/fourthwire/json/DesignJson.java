package fourthwire.json;

import fourthwire.audit.DesignState;
import fourthwire.audit.DesignState.NeutralAdder;
import fourthwire.audit.DesignState.PrimaryState;
import fourthwire.audit.DesignState.Resonance;
import fourthwire.audit.DesignState.TransformerState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** The design state of a node. */
final class DesignJson {
  private static final String SERIES = "series";
  private static final String NOT_A_TRANSFORMER = "not a transformer";

  private DesignJson() {}

  static ObjectNode write(DesignState d) {
    ObjectNode o = Json.object();
    o.set("current", ConductorJson.write(d.lines(), d.neutral()));
    o.set("voltage", voltage(d));
    o.set("spectrum", SpectrumJson.write(inOrder(d.currentSpectrum()), SpectrumJson.AMPS));
    o.set("voltage_spectrum", SpectrumJson.write(d.voltageSpectrum(), SpectrumJson.VOLTS));
    o.set("power", PowerJson.write(d.power()).put("basis", d.powerBasis()));
    o.set("power_by_line", Json.map(inOrder(d.powerByLine()), PowerJson::write));
    Json.put(o, "demand_a", d.demandA());
    o.put("demand_basis", d.demandBasis());
    Json.put(o, "short_circuit_a", d.shortCircuitA());
    writeTransformer(o, d);
    Json.put(o, "harmonic_loss_factor", d.harmonicLossFactor());
    Json.put(o, "losses_w", d.lossesW());
    Json.put(o, "current_unbalance_percent", d.currentUnbalancePercent());
    Json.put(o, "zero_sequence_percent", d.zeroSequencePercent());
    Json.put(o, "voltage_unbalance_percent", d.voltageUnbalancePercent());
    o.set("resonances", Json.list(d.resonances(), DesignJson::write));
    o.set("neutral_adders", Json.list(d.neutralAdders(), DesignJson::write));
    return o;
  }

  private static ObjectNode voltage(DesignState d) {
    ObjectNode voltage = ConductorJson.write(d.voltage());
    Json.put(voltage.putObject(ConductorJson.NEUTRAL), "rms_v", d.neutralVoltageV());
    return voltage;
  }

  private static void writeTransformer(ObjectNode into, DesignState d) {
    d.transformer()
        .ifPresentOrElse(
            t -> into.set("transformer", write(t)),
            () -> Json.putAbsent(into, "transformer", NOT_A_TRANSFORMER));
    d.primary()
        .ifPresentOrElse(
            p -> into.set("primary", write(p)),
            () -> Json.putAbsent(into, "primary", NOT_A_TRANSFORMER));
  }

  private static ObjectNode write(TransformerState t) {
    ObjectNode o = Json.object();
    Json.put(o, "loading_percent", t.loadingPercent());
    Json.put(o, "k_factor", t.kFactor());
    Json.put(o, "derated_kva", t.deratedKva());
    Json.put(o, "factor_k", t.factorK());
    return o;
  }

  private static ObjectNode write(PrimaryState p) {
    ObjectNode o = Json.object();
    o.set("current", ConductorJson.write(p.lines(), p.neutral()));
    o.set("spectrum", SpectrumJson.write(inOrder(p.currentSpectrum()), SpectrumJson.AMPS));
    return o;
  }

  private static ObjectNode write(Resonance r) {
    return Json.object()
        .put("order", r.order())
        .put("ohm", r.ohm())
        .put("bank", r.bank())
        .put("kind", r.series() ? SERIES : "parallel");
  }

  private static ObjectNode write(NeutralAdder a) {
    return Json.object().put("node", a.node()).put("a", a.amps());
  }

  private static <V> Map<Conductor, V> inOrder(Map<Conductor, V> map) {
    Map<Conductor, V> sorted = new EnumMap<>(Conductor.class);
    sorted.putAll(map);
    return sorted;
  }

  static DesignState read(JsonNode o) {
    return new DesignState(
        ConductorJson.lines(o.path("current")),
        ConductorJson.neutral(o.path("current")),
        ConductorJson.voltage(o.path("voltage")),
        Json.figure(o.path("voltage").path(ConductorJson.NEUTRAL), "rms_v"),
        currentSpectrum(o),
        SpectrumJson.read(o.path("voltage_spectrum"), SpectrumJson.VOLTS, Function.identity()),
        PowerJson.read(o.path("power")),
        o.path("power").path("basis").asString(""),
        powerByLine(o),
        Json.figure(o, "demand_a"),
        o.path("demand_basis").asString(""),
        Json.figure(o, "short_circuit_a"),
        object(o, "transformer").map(DesignJson::transformer),
        object(o, "primary").map(DesignJson::primary),
        Json.figure(o, "harmonic_loss_factor"),
        Json.figure(o, "losses_w"),
        Json.figure(o, "current_unbalance_percent"),
        Json.figure(o, "zero_sequence_percent"),
        Json.figure(o, "voltage_unbalance_percent"),
        Json.list(o, "resonances", DesignJson::resonance),
        Json.list(o, "neutral_adders", DesignJson::neutralAdder));
  }

  /** Spectra of currents under {@code spectrum}. */
  static Map<Conductor, Spectrum> currentSpectrum(JsonNode o) {
    return SpectrumJson.read(o.path("spectrum"), SpectrumJson.AMPS, Conductor::valueOf);
  }

  /** Power figures under {@code power_by_line}. */
  static Map<Conductor, PowerFigures> powerByLine(JsonNode o) {
    return Json.map(o, "power_by_line", Conductor.class, PowerJson::read);
  }

  private static Optional<JsonNode> object(JsonNode from, String key) {
    return Optional.of(from.path(key)).filter(JsonNode::isObject);
  }

  private static TransformerState transformer(JsonNode o) {
    return new TransformerState(
        Json.figure(o, "loading_percent"),
        Json.figure(o, "k_factor"),
        Json.figure(o, "derated_kva"),
        Json.figure(o, "factor_k"));
  }

  private static PrimaryState primary(JsonNode o) {
    return new PrimaryState(
        ConductorJson.lines(o.path("current")),
        ConductorJson.neutral(o.path("current")),
        currentSpectrum(o));
  }

  private static Resonance resonance(JsonNode o) {
    return new Resonance(
        o.path("order").doubleValue(),
        o.path("ohm").doubleValue(),
        o.path("bank").asString(),
        o.path("kind").asString("").equals(SERIES));
  }

  private static NeutralAdder neutralAdder(JsonNode o) {
    return new NeutralAdder(o.path("node").asString(), o.path("a").doubleValue());
  }
}
