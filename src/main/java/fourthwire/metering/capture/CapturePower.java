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

  static CapturePower of(Fits fits, Neutral neutral) {
    Map<Conductor, LinePower> byLine = new LinkedHashMap<>();
    for (Conductor line : fits.linesWithPower()) {
      byLine.put(
          line, line(fits, fits.voltage(line).orElseThrow(), fits.current(line).orElseThrow()));
    }
    Map<Conductor, PowerFigures> figures = new LinkedHashMap<>();
    byLine.forEach((line, power) -> figures.put(line, power.figures()));
    List<Conductor> lines = fits.lines();
    if (byLine.size() == 3) {
      return new CapturePower(
          fourWire(fits, neutral, byLine),
          "Effective three-phase power, four wires (IEEE 1459-2010, 3.2.3), "
              + (neutral.isMeasured()
                  ? "the neutral current as measured."
                  : "without the neutral: its current was not measured, the sum of the lines is no"
                      + " measurement of it."),
          figures);
    }
    if (lines.size() == 3 && Fits.PAIRS.stream().allMatch(p -> fits.find(p + ".v").isPresent())) {
      return new CapturePower(
          threeWire(fits), "Effective three-phase power, three wires (IEEE 1459-2010).", figures);
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

  private static LinePower line(Fits fits, HarmonicFit voltage, HarmonicFit current) {
    return LinePower.of(
        fits.spectrum(voltage),
        fits.spectrum(current),
        voltage.alternatingRms(),
        current.alternatingRms(),
        voltage.activePower(current));
  }

  private static PowerFigures fourWire(
      Fits fits, Neutral neutral, Map<Conductor, LinePower> byLine) {
    Optional<HarmonicFit> n = neutral.fit().filter(fit -> neutral.isMeasured());
    List<HarmonicFit> v = Fits.LINES.stream().map(l -> fits.voltage(l).orElseThrow()).toList();
    List<HarmonicFit> i = Fits.LINES.stream().map(l -> fits.current(l).orElseThrow()).toList();
    List<HarmonicFit> u = Fits.PAIRS.stream().map(p -> fits.find(p + ".v").orElseThrow()).toList();
    ThreePhasePower orders =
        ThreePhasePower.fourWire(
            spectra(fits, v), spectra(fits, i), n.map(fits::spectrum).orElse(Spectrum.ZERO));
    double p = byLine.values().stream().mapToDouble(LinePower::activeW).sum();
    double ve = Math.sqrt((3 * squares(v) + squares(u)) / 18);
    double ie = Math.sqrt((squares(i) + squares(n.stream().toList())) / 3);
    return withTotals(orders, p, ve, ie);
  }

  private static PowerFigures threeWire(Fits fits) {
    List<HarmonicFit> i = Fits.LINES.stream().map(l -> fits.current(l).orElseThrow()).toList();
    List<HarmonicFit> u = Fits.PAIRS.stream().map(p -> fits.find(p + ".v").orElseThrow()).toList();
    ThreePhasePower orders = ThreePhasePower.threeWire(spectra(fits, u), spectra(fits, i));
    // Two wattmeters: P = V13·I1 + V23·I2.
    double p = u.get(1).activePower(i.get(1)) - u.get(2).activePower(i.get(0));
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

  private static List<Spectrum> spectra(Fits fits, List<HarmonicFit> of) {
    return of.stream().map(fits::spectrum).toList();
  }

  private static double squares(List<HarmonicFit> of) {
    return of.stream().mapToDouble(f -> Math.pow(f.alternatingRms(), 2)).sum();
  }
}
