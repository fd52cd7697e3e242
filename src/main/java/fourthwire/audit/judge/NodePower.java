package fourthwire.audit.judge;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.LinePower;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.ThreePhasePower;
import java.util.ArrayList;
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
    List<Spectrum> lineCurrents =
        currents.entrySet().stream()
            .filter(e -> e.getKey().isLine())
            .map(Map.Entry::getValue)
            .toList();
    if (!voltages.toNeutral()) {
      return withoutNeutral(voltages, lineCurrents);
    }
    List<LinePower> powers = new ArrayList<>();
    Map<Conductor, PowerFigures> byLine = new LinkedHashMap<>();
    for (int k = 0; k < lines.size(); k++) {
      LinePower power = LinePower.of(voltages.list().get(k), lineCurrents.get(k));
      powers.add(power);
      byLine.put(lines.get(k), power.figures());
    }
    if (lines.size() == 3) {
      Spectrum neutral = currents.getOrDefault(Conductor.N, Spectrum.ZERO);
      return new NodePower(
          ThreePhasePower.fourWire(voltages.list(), lineCurrents, neutral).figures(),
          "Effective powers of four wires, IEEE 1459-2010, 3.2.3, ρ = ξ = 1.",
          byLine);
    }
    if (lines.size() == 1) {
      return new NodePower(
          powers.get(0).figures(), "Powers of one line, IEEE 1459-2010, 3.1.2.", byLine);
    }
    return new NodePower(
        PowerFigures.arithmeticSum(powers),
        "Arithmetic sums of the lines' powers (two lines have no effective power in IEEE 1459).",
        byLine);
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
}
