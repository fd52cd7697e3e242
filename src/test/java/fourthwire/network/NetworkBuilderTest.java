package fourthwire.network;

import static fourthwire.network.element.FeederConductor.from;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.network.element.OrderAdmittance;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.Shunt;
import fourthwire.network.element.SourceImpedance;
import fourthwire.network.element.Transformer;
import fourthwire.network.element.TransformerImpedance;
import fourthwire.quantity.Phasor;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;

/** Circuits small enough for pencil and paper, and what the builder refuses. */
class NetworkBuilderTest {
  private static final SeriesImpedance OHM = SeriesImpedance.of(1, 0);
  private static final SourceImpedance STIFF =
      SourceImpedance.fourWire(SeriesImpedance.NONE, SeriesImpedance.NONE);

  private final NetworkBuilder net = new NetworkBuilder();

  @Test
  @DisplayName("One lamp behind a feeder: a voltage divider")
  void voltageDivider() {
    int supply = net.source(STIFF);
    int lamp = net.feeder(supply, from(0, OHM), from(3, OHM));
    net.shunt(lamp, Shunt.between(0, 1, OrderAdmittance.ofSeries(SeriesImpedance.of(21, 0))));
    TreeNetwork network = net.build();

    Excitation emf = network.excitation().emf(0, new Phasor(230, 0));
    OrderSolution solution = network.factor(1).solve(emf);

    assertThat(solution.current(lamp, 0).re()).isCloseTo(10, within(1e-12));
    assertThat(solution.current(lamp, 1).re()).isCloseTo(-10, within(1e-12));
    assertThat(solution.voltage(lamp, 0, 1).re()).isCloseTo(210, within(1e-12));
    assertThat(solution.potential(lamp, 1).re()).isCloseTo(10, within(1e-12));
  }

  @Test
  @DisplayName("Two circuits on one line share a neutral: it carries the sum")
  void sharedNeutral() {
    int supply = net.source(STIFF);
    int common = net.feeder(supply, from(0, OHM), from(0, OHM), from(3, OHM));
    TreeNetwork network = net.build();
    Excitation load = network.excitation();
    load.draw(common, 0, 2, new Phasor(3, 0)).draw(common, 1, 2, new Phasor(4, 0));
    OrderSolution solution = network.factor(3).solve(load);
    assertThat(solution.current(common, 2).re()).isCloseTo(-7, within(1e-12));
    assertThat(solution.potential(common, 2).re()).isCloseTo(7, within(1e-12));
    assertThat(solution.current(supply, 0).re()).isCloseTo(7, within(1e-12));
  }

  @Test
  @DisplayName("Losses are R·I² of every conductor, windings included; primary currents by turns")
  void lossesAndPrimaryCurrents() {
    int supply = net.source(STIFF);
    TransformerImpedance z = TransformerImpedance.ofRating(100, 400, 4, 1000, 0.1);
    Transformer.Connection dyn11 = new Transformer.Connection(11, true, false);
    int board = net.transformer(supply, Transformer.threePhase(dyn11, 25, z));
    int lamp = net.feeder(board, from(0, OHM), from(3, OHM.times(3)));
    TreeNetwork network = net.build();
    Excitation load = network.excitation().draw(lamp, 0, 1, new Phasor(0, 5));
    OrderSolution solution = network.factor(5).solve(load);
    assertThat(solution.lossW(lamp)).isCloseTo(25 * (1 + 3), within(1e-9));
    assertThat(solution.lossW(board)).isCloseTo(25 * z.at(5).re(), within(1e-9));
    double byTurns = 5 / (25 * Math.sqrt(3));
    assertThat(solution.primaryCurrent(board, 0).im()).isCloseTo(byTurns, within(1e-12));
    assertThat(solution.primaryCurrent(board, 1).im()).isCloseTo(-byTurns, within(1e-12));
    assertThat(solution.primaryCurrent(lamp, 3).im()).isCloseTo(-5, within(1e-12));
  }

  @Test
  @DisplayName("A feeder without impedance: one node, and its current is still known")
  void feederWithoutImpedance() {
    int supply = net.source(STIFF);
    int board = net.feeder(supply, from(0, SeriesImpedance.NONE), from(3, SeriesImpedance.NONE));
    net.shunt(board, Shunt.between(0, 1, OrderAdmittance.ofSeries(OHM)));
    TreeNetwork network = net.build();
    Excitation emf = network.excitation().emf(0, new Phasor(5, 0));
    emf.draw(board, 0, 1, new Phasor(2, 0));
    OrderSolution solution = network.factor(1).solve(emf);
    assertThat(solution.potential(board, 0)).isEqualTo(new Phasor(5, 0));
    assertThat(solution.current(board, 0).re()).isCloseTo(7, within(1e-12));
  }

  @Test
  @DisplayName("A regulated source holds its fundamental against positive sequence only")
  void regulatedSource() {
    SeriesImpedance z = SeriesImpedance.of(0.1, 1);
    int terminals = net.source(SourceImpedance.fourWire(z, z.times(0.5)).regulated());
    TreeNetwork network = net.build();
    DrivingPoint at = network.factor(1).drivingPoint(terminals);
    assertThat(at.positiveSequence().magnitude()).isLessThan(1e-15);
    assertThat(at.negativeSequence().im()).isCloseTo(1, within(1e-15));
    DrivingPoint fifth = network.factor(5).drivingPoint(terminals);
    assertThat(fifth.positiveSequence().im()).isCloseTo(5, within(1e-15));
  }

  @Test
  @DisplayName("A line without a return, and a section without any reference, are no trouble")
  void sectionsWithoutReference() {
    int supply = net.source(STIFF);
    TransformerImpedance z = TransformerImpedance.ofRating(100, 400, 4, 1000, 0);
    Transformer.Connection dd0 = new Transformer.Connection(0, false, false);
    int delta = net.transformer(supply, Transformer.threePhase(dd0, 1, z));
    net.shunt(delta, Shunt.between(0, 1, OrderAdmittance.ofSeries(OHM)));
    TreeNetwork network = net.build();
    OrderSolution solution =
        network.factor(1).solve(network.excitation().threePhaseEmf(1, new Phasor(230, 0)));
    Phasor sum = solution.current(delta, 0).plus(solution.current(delta, 1));
    assertThat(sum.magnitude()).isLessThan(1e-10);
    assertThat(solution.current(delta, 0).magnitude()).isGreaterThan(100);
  }

  @Test
  @DisplayName("A resonance without any loss has no solution, and says where")
  void losslessResonance() {
    int supply = net.source(STIFF);
    int board =
        net.feeder(supply, from(0, SeriesImpedance.of(0, 1)), from(3, SeriesImpedance.NONE));
    net.shunt(board, Shunt.between(0, 1, OrderAdmittance.ofSeriesCapacitor(0, 0, 4)));
    TreeNetwork network = net.build();
    assertThat(network.factor(1).order()).isEqualTo(1);
    assertThatThrownBy(() -> network.factor(2))
        .isInstanceOf(UnsolvableOrderException.class)
        .hasMessageContaining("order 2.0")
        .hasMessageContaining("node 1");
  }

  @Test
  @DisplayName("A load without any impedance is refused, with or without a feeder's before it")
  void loadWithoutImpedance() {
    int supply = net.source(STIFF);
    int near = net.feeder(supply, from(0, SeriesImpedance.NONE), from(3, SeriesImpedance.NONE));
    net.shunt(near, Shunt.between(0, 1, OrderAdmittance.ofSeries(SeriesImpedance.NONE)));
    assertThatThrownBy(() -> net.build().factor(1)).isInstanceOf(UnsolvableOrderException.class);
    net.feeder(near, from(0, SeriesImpedance.NONE), from(1, OHM));
    assertThatThrownBy(() -> net.build().factor(1))
        .isInstanceOf(UnsolvableOrderException.class)
        .hasMessageContaining("node 1");
  }

  @Test
  @DisplayName("Solutions and excitations are used again without a trace of the last")
  void reuse() {
    int supply = net.source(STIFF);
    int board = net.feeder(supply, from(0, OHM), from(3, OHM));
    TreeNetwork network = net.build();
    FactoredOrder factored = network.factor(7);
    Excitation load = network.excitation().draw(board, 0, 1, new Phasor(1, 1));
    OrderSolution solution = factored.solve(load);
    factored.solve(load.clear().draw(board, 0, 1, new Phasor(0, 2)), solution);
    assertThat(solution.current(board, 0).minus(new Phasor(0, 2)).magnitude()).isZero();
    assertThat(factored.check(load, solution).worst()).isLessThan(1e-15);
  }

  @Test
  @DisplayName("The self-check notices a solution that is not one")
  void selfCheckNotices() {
    int supply = net.source(STIFF);
    int board = net.feeder(supply, from(0, OHM), from(3, OHM));
    TreeNetwork network = net.build();
    FactoredOrder factored = network.factor(7);
    Excitation load = network.excitation().draw(board, 0, 1, new Phasor(1, 0));
    OrderSolution solution = factored.solve(load);
    load.draw(board, 0, 1, new Phasor(0.001, 0));
    assertThat(factored.check(load, solution).currentLaw()).isCloseTo(1e-3, within(1e-5));
    solution.potential[2 * network.index(board, 0)] += 0.01;
    assertThat(factored.check(load, solution).voltageLaw()).isGreaterThan(5e-3);
    assertThat(factored.check(load, solution).power()).isGreaterThan(1e-3);
  }

  @Test
  @DisplayName("Misuse is refused in words")
  void refusesMisuse() {
    assertThatThrownBy(net::build).hasMessageContaining("needs a source");
    int supply = net.source(STIFF);
    assertThatThrownBy(() -> net.source(STIFF)).hasMessageContaining("one source");
    assertThatThrownBy(() -> net.feeder(9, from(0, OHM))).hasMessageContaining("no node 9");
    assertThatThrownBy(() -> net.feeder(supply)).hasMessageContaining("one conductor or more");
    assertThatThrownBy(() -> net.feeder(supply, from(4, OHM)))
        .hasMessageContaining("node 0 has no conductor 4");
    assertThatThrownBy(() -> net.shunt(supply, Shunt.between(0, 7, OrderAdmittance.OPEN)))
        .hasMessageContaining("no conductor 7");
    assertThatThrownBy(() -> Shunt.between(1, 1, OrderAdmittance.OPEN))
        .hasMessageContaining("conductors 1 and 1");
    assertThatThrownBy(() -> SeriesImpedance.of(-1, 0)).hasMessageContaining("0 or more");
    assertThatThrownBy(() -> net.build().factor(0)).hasMessageContaining("above 0");
    assertThatThrownBy(() -> new Transformer.Connection(11, true, true))
        .hasMessageContaining("passes zero sequence");
    int lamp = net.feeder(supply, from(0, OHM), from(3, OHM));
    TransformerImpedance z = TransformerImpedance.ofRating(1, 100, 4, 0, 0);
    assertThatThrownBy(
            () ->
                net.transformer(
                    lamp, Transformer.threePhase(new Transformer.Connection(0, true, false), 1, z)))
        .hasMessageContaining("not from 2 conductors");
    assertThatThrownBy(() -> net.transformer(lamp, Transformer.singlePhase(0, 2, 1, z)))
        .hasMessageContaining("a node that has 2");
    TreeNetwork one = net.build();
    TreeNetwork other = net.build();
    assertThatThrownBy(() -> one.factor(1).solve(other.excitation()))
        .hasMessageContaining("another network's");
  }
}
