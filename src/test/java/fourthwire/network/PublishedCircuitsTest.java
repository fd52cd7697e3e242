package fourthwire.network;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.network.element.CapacitorBank;
import fourthwire.network.element.FeederConductor;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.SourceImpedance;
import fourthwire.network.element.Transformer;
import fourthwire.network.element.TransformerImpedance;
import fourthwire.quantity.Phasor;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Worked examples solved as circuits. Ids are those of the project's list of check values; P is a
 * published figure, X an exact one.
 */
class PublishedCircuitsTest {
  private static final SourceImpedance STIFF =
      SourceImpedance.fourWire(SeriesImpedance.NONE, SeriesImpedance.NONE);
  private static final Transformer.Connection DYN11 = new Transformer.Connection(11, true, false);

  @Test
  @DisplayName("T9 (P): short-circuit current of 400 kVA, 420 V, 4 %")
  void shortCircuitCurrent() {
    // Installation guide (public wiki handbook), worked example: 13.7 kA.
    NetworkBuilder net = new NetworkBuilder();
    int supply = net.source(STIFF);
    int board =
        net.transformer(
            supply,
            Transformer.threePhase(
                DYN11, 20_000 / 420.0, TransformerImpedance.ofRating(400, 420, 4, 0, 0)));
    double ohm = net.build().factor(1).drivingPoint(board).positiveSequence().magnitude();
    assertThat(420 / Math.sqrt(3) / ohm / 1000).isCloseTo(13.7, within(0.1));
  }

  @Test
  @DisplayName("C1, C2 (P): 1500 kVA 5.5 % on 48 MVA with 350 kvar resonates at order 7.05")
  void resonanceExample() {
    // Published resonance example (WE4 of the worked examples): 17,391 kVA, order 7.05.
    NetworkBuilder net = new NetworkBuilder();
    SeriesImpedance grid = SeriesImpedance.of(0, 20_000.0 * 20_000 / 48e6);
    int supply = net.source(SourceImpedance.threeWire(grid, grid));
    int board =
        net.transformer(
            supply,
            Transformer.threePhase(
                DYN11, 20_000 / 480.0, TransformerImpedance.ofRating(1500, 480, 5.5, 0, 0)));
    double ohm = net.build().factor(1).drivingPoint(board).positiveSequence().magnitude();
    assertThat(480 * 480 / ohm / 1000).isCloseTo(17_391, within(1.0));

    // The smallest resistance that keeps the peak finite.
    net.shunt(board, new CapacitorBank(480 * 480 / 350e3, 0, 1e-5).shunt());
    TreeNetwork network = net.build();
    double peakOrder = 0;
    double peak = 0;
    for (int k = 1000; k <= 50_000; k++) {
      double z = network.factor(k / 1000.0).drivingPoint(board).positiveSequence().magnitude();
      if (z > peak) {
        peak = z;
        peakOrder = k / 1000.0;
      }
    }
    assertThat(peakOrder).isCloseTo(7.05, within(0.005));
  }

  @Test
  @DisplayName("V1, V2, V3 (X): harmonic volt drop of a 1000 kVA 6 % transformer, 400 V")
  void harmonicVoltDrop() {
    // WE10 of the worked examples: I5 = 200 A, I7 = 100 A, resistance neglected.
    NetworkBuilder net = new NetworkBuilder();
    int supply = net.source(STIFF);
    int board =
        net.transformer(
            supply,
            Transformer.threePhase(DYN11, 50, TransformerImpedance.ofRating(1000, 400, 6, 0, 0)));
    TreeNetwork network = net.build();
    double v5 = dropOf(network, board, 5, 200);
    double v7 = dropOf(network, board, 7, 100);
    assertThat(v5).isCloseTo(9.6, within(0.01));
    assertThat(v7).isCloseTo(6.72, within(0.01));
    double thdPercent = 100 * Math.hypot(v5, v7) / (400 / Math.sqrt(3));
    assertThat(thdPercent).isCloseTo(5.074, within(0.01));
  }

  private static double dropOf(TreeNetwork network, int board, int order, double amps) {
    Excitation load = network.excitation();
    drawBalanced(load, board, order, new Phasor(amps, 0));
    return network.factor(order).solve(load).voltage(board, 1, 3).magnitude();
  }

  /** Three equal line-to-neutral loads: line k carries order h at -h·120°·k. */
  private static void drawBalanced(Excitation into, int node, int order, Phasor amps) {
    for (int line = 0; line < 3; line++) {
      into.draw(node, line, 3, amps.turned(-120.0 * order * line));
    }
  }

  @ParameterizedTest
  @CsvSource({"5,0", "7,0", "11,2", "13,2", "17,0", "19,0", "23,2", "25,2"})
  @DisplayName("T10 (X): two equal six-pulse groups, one behind Dd0 and one behind Dyn11")
  void twoGroupsThirtyDegreesApart(int order, double perUnit) {
    // 5, 7, 11 and 13 are T10; the rest are the rule of vector_group_behaviour: unequal groups
    // leave |IA - IB| at 5, 7, 17, 19 and IA + IB at 11, 13, 23, 25.
    assertThat(primaryOfGroups(order, 1, 1)).isCloseTo(perUnit, within(1e-9));
    assertThat(primaryOfGroups(order, 1, 0.6)).isCloseTo(perUnit == 0 ? 0.4 : 1.6, within(1e-9));
  }

  private static double primaryOfGroups(int order, double amps, double otherAmps) {
    NetworkBuilder net = new NetworkBuilder();
    int supply = net.source(STIFF);
    TransformerImpedance z = TransformerImpedance.ofRating(1000, 400, 6, 10_000, 0.01);
    int delta =
        net.transformer(
            supply, Transformer.threePhase(new Transformer.Connection(0, false, false), 1, z));
    int star = net.transformer(supply, Transformer.threePhase(DYN11, 1, z));
    TreeNetwork network = net.build();
    // Each rectifier follows its own terminals' fundamental, which at the star stands 30° ahead.
    OrderSolution fundamental =
        network.factor(1).solve(network.excitation().threePhaseEmf(1, new Phasor(230, 0)));
    double ahead = fundamental.voltage(star, 0, 3).degrees();
    assertThat(ahead).isCloseTo(30, within(1e-9));
    Excitation load = network.excitation();
    for (int line = 0; line < 3; line++) {
      Phasor i = new Phasor(-amps, 0).turned(-120.0 * order * line);
      load.inject(delta, line, i);
      load.inject(star, line, i.times(otherAmps / amps).turned(order * ahead));
    }
    return network.factor(order).solve(load).current(supply, 0).magnitude();
  }

  @Test
  @DisplayName("N1, N2, N3 (P): the neutral carries the triplens of three equal loads")
  void neutralOfEqualLoads() {
    // A. Masters, example 2.13: rms amps 100, 50, 20, 10, 8, 4, 2 at orders 1, 3, 5, 7, 9, 11, 13.
    int[] orders = {1, 3, 5, 7, 9, 11, 13};
    double[] masters = {100, 50, 20, 10, 8, 4, 2};
    assertThat(rmsOf(orders, masters, 3)).isCloseTo(151.91, within(0.01));
    assertThat(rmsOf(orders, masters, 0)).isCloseTo(114.39, within(0.01));
    // Published planning figure: a third harmonic of 70 % puts 172 % of the line current in it.
    double[] planning = {1, 0.7, 0, 0, 0, 0, 0};
    assertThat(rmsOf(orders, planning, 3) / rmsOf(orders, planning, 1))
        .isCloseTo(1.72, within(0.001));
  }

  private static double rmsOf(int[] orders, double[] amps, int conductor) {
    NetworkBuilder net = new NetworkBuilder();
    int supply = net.source(STIFF);
    SeriesImpedance wire = SeriesImpedance.of(0.02, 0.005);
    int panel =
        net.feeder(
            supply,
            FeederConductor.from(0, wire),
            FeederConductor.from(1, wire),
            FeederConductor.from(2, wire),
            FeederConductor.from(3, wire));
    TreeNetwork network = net.build();
    double square = 0;
    for (int k = 0; k < orders.length; k++) {
      Excitation load = network.excitation();
      drawBalanced(load, panel, orders[k], new Phasor(amps[k], 0));
      double i = network.factor(orders[k]).solve(load).current(panel, conductor).magnitude();
      square += i * i;
    }
    return Math.sqrt(square);
  }
}
