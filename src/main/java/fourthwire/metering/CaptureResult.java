package fourthwire.metering;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import java.util.Map;
import java.util.Optional;

/**
 * What a waveform capture says.
 *
 * <p>Angles: t = 0 is the upward zero crossing of the fundamental of the first voltage (without
 * voltages: of the first line current).
 *
 * @param frequencyHz fundamental, found from the samples
 * @param cycles whole cycles analysed
 * @param basis over what the figures are formed, in sentences
 * @param current by conductor; N is as {@code neutralBasis} says
 * @param neutralPercentOfMeanLine against the mean of the lines' rms
 * @param neutralBasis where N comes from, one sentence
 * @param neutralChannelRmsA what the channel mapped as the neutral reads, amps
 * @param voltage by line ({@code L1}) or pair ({@code L1-L2})
 * @param spectrum of the currents
 * @param voltageSpectrum keys as {@code voltage}
 * @param power of all lines
 * @param powerBasis how it was formed, one sentence
 * @param powerByLine by line, from its own voltage to neutral and current
 * @param unbalance of the fundamentals
 * @param windows the standard windows' groups and intervals; empty where there are none
 * @param events dips, swells and interruptions
 * @param picture the waveforms of the whole record as they are drawn
 * @param closeUp those of its first two cycles
 */
public record CaptureResult(
    double frequencyHz,
    int cycles,
    String basis,
    Map<Conductor, CurrentFigures> current,
    Figure neutralPercentOfMeanLine,
    String neutralBasis,
    Figure neutralChannelRmsA,
    Map<String, VoltageFigures> voltage,
    Map<Conductor, Spectrum> spectrum,
    Map<String, Spectrum> voltageSpectrum,
    PowerFigures power,
    String powerBasis,
    Map<Conductor, PowerFigures> powerByLine,
    Unbalance unbalance,
    Optional<CaptureWindows> windows,
    VoltageEvents events,
    WaveformPicture picture,
    WaveformPicture closeUp) {

  /**
   * How unequal three lines are, percent of the positive sequence at the fundamental.
   *
   * @param voltagePercent negative-sequence voltage
   * @param currentPercent negative-sequence current
   * @param zeroSequencePercent zero-sequence current
   */
  public record Unbalance(
      Figure voltagePercent, Figure currentPercent, Figure zeroSequencePercent) {}

  /**
   * A conductor's current.
   *
   * @param rmsA true rms of the samples: all orders and interharmonics, without the direct
   *     component
   * @param fundamentalA order 1
   * @param thdPercent orders 2 to 50 on the fundamental
   * @param crestFactor largest sample on the rms
   */
  public record CurrentFigures(
      Figure rmsA, Figure fundamentalA, Figure thdPercent, Figure crestFactor) {}

  /** A voltage, likewise, volts. */
  public record VoltageFigures(
      Figure rmsV, Figure fundamentalV, Figure thdPercent, Figure crestFactor) {}
}
