package fourthwire.audit;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.LinePower;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.ThreePhasePower;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The powers of one node, IEEE 1459-2010.
 *
 * @param whole of the node
 * @param basis how they were formed, one sentence
 * @param byLine by line, from its own voltage to neutral and current; empty without a neutral
 */
record NodePower(PowerFigures whole, String basis, Map<Conductor, PowerFigures> byLine) {

  static NodePower of(NodeVoltages voltages, Map<Conductor, Spectrum> currents) {
    List<Conductor> lines = currents.keySet().stream().filter(Conductor::isLine).toList();
    List<Spectrum> lineCurrents = lines.stream().map(currents::get).toList();
    if (!voltages.toNeutral()) {
      return withoutNeutral(voltages, lineCurrents);
    }
    Map<Conductor, LinePower> byLine = new LinkedHashMap<>();
    for (Conductor line : lines) {
      byLine.put(line, LinePower.of(voltages.spectra().get(line.name()), currents.get(line)));
    }
    Map<Conductor, PowerFigures> figures = new LinkedHashMap<>();
    byLine.forEach((line, power) -> figures.put(line, power.figures()));
    if (lines.size() == 3) {
      return new NodePower(
          ThreePhasePower.fourWire(
                  voltages.list(), lineCurrents, currents.getOrDefault(Conductor.N, Spectrum.ZERO))
              .figures(),
          "Effective powers of four wires, IEEE 1459-2010, 3.2.3, ρ = ξ = 1.",
          figures);
    }
    if (lines.size() == 1) {
      return new NodePower(
          byLine.get(lines.get(0)).figures(),
          "Powers of one line, IEEE 1459-2010, 3.1.2.",
          figures);
    }
    return new NodePower(
        sum(List.copyOf(byLine.values())),
        "Arithmetic sums of the lines' powers (two lines have no effective power in IEEE 1459).",
        figures);
  }

  private static NodePower withoutNeutral(NodeVoltages voltages, List<Spectrum> lineCurrents) {
    if (lineCurrents.size() == 3) {
      return new NodePower(
          ThreePhasePower.threeWire(voltages.list(), lineCurrents).figures(),
          "Effective powers of three wires, IEEE 1459-2010, 3.2.3.",
          Map.of());
    }
    return new NodePower(
        LinePower.of(voltages.list().get(0), lineCurrents.get(0)).figures(),
        "Powers of two lines, IEEE 1459-2010, 3.1.2.",
        Map.of());
  }

  private static PowerFigures sum(List<LinePower> powers) {
    double p = powers.stream().mapToDouble(LinePower::activeW).sum();
    double p1 = powers.stream().mapToDouble(LinePower::fundamentalActiveW).sum();
    double q1 = powers.stream().mapToDouble(LinePower::fundamentalReactiveVar).sum();
    double s = powers.stream().mapToDouble(LinePower::apparentVa).sum();
    double s1 = powers.stream().mapToDouble(LinePower::fundamentalApparentVa).sum();
    Figure none = Figure.unknown("no current flows");
    return new PowerFigures(
        Figure.of(p),
        Figure.of(q1),
        Figure.of(s),
        Figure.of(Math.sqrt(Math.max(0, s * s - s1 * s1))),
        s > 0 ? Figure.of(p / s) : none,
        s1 > 0 ? Figure.of(p1 / s1) : none);
  }
}
