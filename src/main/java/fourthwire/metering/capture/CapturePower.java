package fourthwire.metering.capture;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.LinePower;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.ThreePhasePower;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Powers of a capture (IEEE 1459-2010): rms totals and active power from the samples, so that what
 * lies between and above the orders counts; fundamentals from the spectra.
 *
 * @param total of all lines
 * @param basis how the total was formed, one sentence
 * @param byLine of each line from its own voltage to neutral and current
 */
record CapturePower(PowerFigures total, String basis, Map<Conductor, PowerFigures> byLine) {

  static CapturePower of(Channels channels, Neutral neutral) {
    Map<Conductor, LinePower> byLine = new LinkedHashMap<>();
    for (Conductor line : channels.linesWithPower()) {
      byLine.put(line, line(channels, line));
    }
    Map<Conductor, PowerFigures> figures = new LinkedHashMap<>();
    byLine.forEach((line, power) -> figures.put(line, power.figures()));
    List<Conductor> lines = channels.lines();
    if (byLine.size() == 3) {
      return new CapturePower(
          fourWire(channels, neutral, byLine),
          "Effective three-phase power, four wires (IEEE 1459-2010, 3.2.3), "
              + (neutral.isMeasured()
                  ? "the neutral current as measured."
                  : "without the neutral: its current was not measured, the sum of the lines is no"
                      + " measurement of it."),
          figures);
    }
    if (lines.size() == 3
        && Channels.PAIRS.stream().allMatch(p -> channels.find(p + ".v").isPresent())) {
      return new CapturePower(
          threeWire(channels),
          "Effective three-phase power, three wires (IEEE 1459-2010).",
          figures);
    }
    if (!byLine.isEmpty() && byLine.size() == lines.size()) {
      return new CapturePower(
          PowerFigures.arithmeticSum(List.copyOf(byLine.values())),
          byLine.size() == 1 ? "Of the one line recorded." : "Arithmetic sums of the two lines.",
          figures);
    }
    String reason = "a voltage is missing for one or more of the recorded currents";
    return new CapturePower(PowerFigures.unknown(reason), "Not known: " + reason + ".", figures);
  }

  private static LinePower line(Channels channels, Conductor line) {
    ChannelFigures voltage = channels.voltage(line).orElseThrow();
    ChannelFigures current = channels.current(line).orElseThrow();
    return LinePower.of(
        voltage.spectrum(),
        current.spectrum(),
        voltage.rms(),
        current.rms(),
        channels.activeW(line));
  }

  private static PowerFigures fourWire(
      Channels channels, Neutral neutral, Map<Conductor, LinePower> byLine) {
    Optional<ChannelFigures> n = neutral.fit().filter(fit -> neutral.isMeasured());
    List<ChannelFigures> v =
        Channels.LINES.stream().map(l -> channels.voltage(l).orElseThrow()).toList();
    List<ChannelFigures> i =
        Channels.LINES.stream().map(l -> channels.current(l).orElseThrow()).toList();
    List<ChannelFigures> u =
        Channels.PAIRS.stream().map(p -> channels.find(p + ".v").orElseThrow()).toList();
    ThreePhasePower orders =
        ThreePhasePower.fourWire(
            spectra(v), spectra(i), n.map(ChannelFigures::spectrum).orElse(Spectrum.ZERO));
    double p = byLine.values().stream().mapToDouble(LinePower::activeW).sum();
    double ve = Math.sqrt((3 * squares(v) + squares(u)) / 18);
    double ie = Math.sqrt((squares(i) + squares(n.stream().toList())) / 3);
    return withTotals(orders, p, ve, ie);
  }

  private static PowerFigures threeWire(Channels channels) {
    List<ChannelFigures> i =
        Channels.LINES.stream().map(l -> channels.current(l).orElseThrow()).toList();
    List<ChannelFigures> u =
        Channels.PAIRS.stream().map(p -> channels.find(p + ".v").orElseThrow()).toList();
    ThreePhasePower orders = ThreePhasePower.threeWire(spectra(u), spectra(i));
    // Two wattmeters: P = V13·I1 + V23·I2.
    double p = channels.activeW("L2-L3.v", "L2.i") - channels.activeW("L3-L1.v", "L1.i");
    return withTotals(orders, p, Math.sqrt(squares(u) / 9), Math.sqrt(squares(i) / 3));
  }

  private static PowerFigures withTotals(
      ThreePhasePower orders, double activeW, double veV, double ieA) {
    return new ThreePhasePower(
            activeW,
            veV,
            ieA,
            3 * veV * ieA,
            orders.fundamentalApparentVa(),
            orders.positiveActiveW(),
            orders.positiveReactiveVar())
        .figures();
  }

  private static List<Spectrum> spectra(List<ChannelFigures> of) {
    return of.stream().map(ChannelFigures::spectrum).toList();
  }

  private static double squares(List<ChannelFigures> of) {
    return of.stream().mapToDouble(f -> Math.pow(f.rms(), 2)).sum();
  }
}
