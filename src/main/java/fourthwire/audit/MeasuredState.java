package fourthwire.audit;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import java.util.Map;
import java.util.OptionalLong;

/**
 * What one meter or clamp reading says of a node, beside the computed figures.
 *
 * @param meter the meter's name, or "clamp reading"
 * @param reading id of the stored reading; empty for a clamp reading in the survey
 * @param period from when to when, as text in the site's time
 * @param basis what the figures are: means, highest interval, one capture …, one sentence
 * @param neutral the measured neutral current, unknown where none was measured
 * @param currentSpectrum from a capture; empty for a log
 */
public record MeasuredState(
    String meter,
    OptionalLong reading,
    String period,
    String basis,
    Map<Conductor, DesignState.LineCurrent> lines,
    DesignState.NeutralCurrent neutral,
    Map<String, DesignState.LineVoltage> voltage,
    PowerFigures power,
    Map<Conductor, Spectrum> currentSpectrum) {}
