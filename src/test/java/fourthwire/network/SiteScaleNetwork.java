package fourthwire.network;

import fourthwire.network.element.FeederConductor;
import fourthwire.network.element.OrderAdmittance;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.Shunt;
import fourthwire.network.element.SourceImpedance;
import fourthwire.quantity.Phasor;
import java.util.SplittableRandom;

/**
 * A seeded, invented site of any size for measuring: panels four levels deep with four-wire
 * feeders, 20 circuits a panel (65 % line to neutral, 13 % line to line, 22 % three-line), every
 * tenth with a linear load, four in five with a harmonic current of their own. No two impedances
 * are alike.
 */
final class SiteScaleNetwork {
  private static final double[] FEEDER_OHM = {1e-3, 4e-3, 1.5e-2, 5e-2};

  private final SplittableRandom random;
  final TreeNetwork network;
  private final int[] circuits;
  private final int[] lines;
  private final int[] firstLine;

  SiteScaleNetwork(int panels, long seed) {
    random = new SplittableRandom(seed);
    NetworkBuilder builder = new NetworkBuilder();
    int second = Math.max(1, panels / 100);
    int third = Math.max(2, panels * 9 / 100);
    int[] panel = new int[panels];
    panel[0] =
        builder.source(
            SourceImpedance.fourWire(
                SeriesImpedance.of(.002, .008), SeriesImpedance.of(.002, .008)));
    for (int k = 1; k < panels; k++) {
      int level = k <= second ? 1 : k <= second + third ? 2 : 3;
      int up =
          switch (level) {
            case 1 -> 0;
            case 2 -> 1 + random.nextInt(second);
            default -> 1 + second + random.nextInt(third);
          };
      panel[k] = builder.feeder(panel[up], panelFeeder(FEEDER_OHM[level]));
    }
    circuits = new int[20 * panels];
    lines = new int[circuits.length];
    firstLine = new int[circuits.length];
    for (int k = 0; k < circuits.length; k++) {
      int on = panel[random.nextInt(1 + second, panels)];
      addCircuit(builder, k, on);
    }
    network = builder.build();
  }

  private SeriesImpedance around(double ohm) {
    double r = ohm * random.nextDouble(.5, 1.5);
    return SeriesImpedance.of(r, r * random.nextDouble(.3, 1.2));
  }

  private FeederConductor[] panelFeeder(double ohm) {
    SeriesImpedance line = around(ohm);
    SeriesImpedance neutral = line.times(random.nextDouble(.8, 1.6));
    return new FeederConductor[] {
      FeederConductor.from(0, line),
      FeederConductor.from(1, line),
      FeederConductor.from(2, line),
      FeederConductor.from(3, neutral)
    };
  }

  private void addCircuit(NetworkBuilder builder, int k, int panel) {
    double pick = random.nextDouble();
    lines[k] = pick < .65 ? 1 : pick < .78 ? 2 : 3;
    firstLine[k] = lines[k] == 3 ? 0 : random.nextInt(3);
    FeederConductor[] wires = new FeederConductor[lines[k] == 3 ? 3 : 2];
    for (int w = 0; w < wires.length; w++) {
      boolean neutral = lines[k] == 1 && w == 1;
      wires[w] = FeederConductor.from(neutral ? 3 : (firstLine[k] + w) % 3, around(.1));
    }
    circuits[k] = builder.feeder(panel, wires);
    if (random.nextDouble() < .1) {
      addLinearLoad(builder, circuits[k], wires.length);
    }
  }

  private void addLinearLoad(NetworkBuilder builder, int node, int wires) {
    double r = random.nextDouble(15, 80);
    OrderAdmittance y =
        OrderAdmittance.ofSeries(SeriesImpedance.of(r, r * random.nextDouble(0, .5)));
    for (int w = 0; w < (wires == 3 ? 3 : 1); w++) {
      builder.shunt(node, Shunt.between(w, (w + 1) % wires, y));
    }
  }

  /** The circuits' currents at an order, drawn from the seed. */
  Excitation excitation(int order, long seed) {
    SplittableRandom draw = new SplittableRandom(seed + order);
    Excitation excitation = network.excitation();
    if (order == 1) {
      excitation.threePhaseEmf(1, new Phasor(230, 0));
    }
    for (int k = 0; k < circuits.length; k++) {
      if (draw.nextDouble() < .2 || (lines[k] == 3 && order % 3 == 0)) {
        continue;
      }
      double angle = -120.0 * order * firstLine[k] + draw.nextDouble(-30, 30);
      double share = order == 1 ? 1 : .7 / Math.pow(order, .8);
      Phasor amps = Phasor.polar(draw.nextDouble(.1, 2) * share, angle);
      if (lines[k] < 3) {
        excitation.draw(circuits[k], 0, 1, amps);
      } else {
        for (int w = 0; w < 3; w++) {
          excitation.inject(circuits[k], w, amps.turned(180 - 120.0 * order * w));
        }
      }
    }
    return excitation;
  }
}
