package fourthwire.network;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.Shunt;
import fourthwire.network.element.SourceImpedance;
import fourthwire.network.element.Transformer;
import fourthwire.network.element.TransformerImpedance;
import fourthwire.quantity.Phasor;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * What three-phase connections pass, trap and shift: textbook behaviour (project reference table
 * vector_group_behaviour: standard machine theory, from memory, unless a line says otherwise).
 */
class VectorGroupBehaviourTest {
  private static final Transformer.Connection DYN11 = new Transformer.Connection(11, true, false);
  private static final Transformer.Connection YNYN0 = new Transformer.Connection(0, true, true);

  private final NetworkBuilder net = new NetworkBuilder();

  private int stiffSupply() {
    return net.source(SourceImpedance.fourWire(SeriesImpedance.NONE, SeriesImpedance.NONE));
  }

  private static TransformerImpedance rated() {
    return TransformerImpedance.ofRating(1000, 400, 6, 10_000, 0.01);
  }

  private static Phasor secondaryOpen(Transformer.Connection clock, double firstLine, double turn) {
    NetworkBuilder net = new NetworkBuilder();
    int supply = net.source(SourceImpedance.fourWire(SeriesImpedance.NONE, SeriesImpedance.NONE));
    int secondary = net.transformer(supply, Transformer.threePhase(clock, 2, rated()));
    TreeNetwork network = net.build();
    Excitation emf = network.excitation();
    for (int line = 0; line < 3; line++) {
      emf.emf(line, Phasor.polar(firstLine, turn * line));
    }
    return network.factor(1).solve(emf).potential(secondary, 0);
  }

  @ParameterizedTest
  @ValueSource(ints = {0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11})
  @DisplayName("Clock n: positive sequence lags by n·30°, negative leads by it, zero is trapped")
  void shiftsByTheClock(int hour) {
    Transformer.Connection clock = new Transformer.Connection(hour, true, false);
    Phasor expected = Phasor.polar(115, -30 * hour);
    assertThat(secondaryOpen(clock, 230, -120).minus(expected).magnitude()).isLessThan(1e-12 * 230);
    assertThat(secondaryOpen(clock, 230, 120).minus(expected.conjugate()).magnitude())
        .isLessThan(1e-12 * 230);
    assertThat(secondaryOpen(clock, 230, 0).magnitude()).isLessThan(1e-12 * 230);
  }

  @Test
  @DisplayName("Dyn11 as its windings are joined: the low side's L1 hangs across L1 and L2")
  void dyn11FromItsWindings() {
    // Winding a of Dyn11 lies on the limb of the delta winding from L1 to L2 (IEC 60076-1, figure
    // of connection symbols, from memory); turns ratio √3 times the voltage ratio.
    double[] a = Transformer.threePhase(DYN11, 50, rated()).turns(3);
    double k = 1 / (50 * Math.sqrt(3));
    double[] byWindings = {k, -k, 0, 0, k, -k, -k, 0, k, 0, 0, 0};
    assertThat(a).hasSameSizeAs(byWindings);
    for (int i = 0; i < a.length; i++) {
      assertThat(a[i]).isCloseTo(byWindings[i], within(1e-15));
    }
  }

  @ParameterizedTest
  @CsvSource({"0,1", "2,-1", "4,1", "6,-1", "8,1", "10,-1"})
  @DisplayName("YNyn passes zero sequence, reversed in the hours whose windings are reversed")
  void starToStarPassesZeroSequence(int hour, double sign) {
    Phasor zero = secondaryOpen(new Transformer.Connection(hour, true, true), 230, 0);
    assertThat(zero.minus(new Phasor(sign * 115, 0)).magnitude()).isLessThan(1e-12 * 230);
  }

  private OrderSolution triplens(Transformer.Connection clock, double[] amps) {
    int supply = stiffSupply();
    int board = net.transformer(supply, Transformer.threePhase(clock, 1, rated()));
    TreeNetwork network = net.build();
    Excitation load = network.excitation();
    for (int line = 0; line < 3; line++) {
      load.draw(board, line, 3, new Phasor(amps[line], 0));
    }
    return network.factor(3).solve(load);
  }

  @Test
  @DisplayName("Dyn traps balanced triplens: three times in the neutral, none on the primary")
  void deltaTrapsBalancedTriplens() {
    // Provenance of the primary's zero: published (a delta-wye transformer does not pass secondary
    // neutral current to the primary).
    OrderSolution s = triplens(DYN11, new double[] {10, 10, 10});
    assertThat(s.current(1, 3).magnitude()).isCloseTo(30, within(1e-12));
    for (int line = 0; line < 4; line++) {
      assertThat(s.current(0, line).magnitude()).isLessThan(1e-12);
    }
  }

  @Test
  @DisplayName("Dyn lets the unbalanced part of triplens through")
  void deltaPassesUnbalancedTriplens() {
    // By the windings of Dyn11: one secondary line's current, over √3, in two primary lines.
    OrderSolution s = triplens(DYN11, new double[] {9, 0, 0});
    assertThat(s.current(0, 0).magnitude()).isCloseTo(9 / Math.sqrt(3), within(1e-12));
    assertThat(s.current(0, 1).magnitude()).isCloseTo(9 / Math.sqrt(3), within(1e-12));
    assertThat(s.current(0, 2).magnitude()).isLessThan(1e-12);
    assertThat(s.current(0, 3).magnitude()).isLessThan(1e-12);
  }

  @Test
  @DisplayName("YNyn passes balanced triplens into the primary's neutral")
  void starToStarPassesTriplens() {
    OrderSolution s = triplens(YNYN0, new double[] {10, 10, 10});
    assertThat(s.current(0, 0).re()).isCloseTo(10, within(1e-12));
    assertThat(s.current(0, 3).re()).isCloseTo(-30, within(1e-12));
  }

  @ParameterizedTest
  @CsvSource({"Dyn11,6", "Yyn0,50", "Dzn0,0.6"})
  @DisplayName("Zero-sequence impedance seen from the secondary, in per cent of the rating")
  void zeroSequenceImpedance(String symbol, double percent) {
    // Values by connection: stated defaults (common practice, no source); Dyn as positive sequence.
    int hour = Integer.parseInt(symbol.substring(3));
    int supply = stiffSupply();
    int board =
        net.transformer(
            supply,
            Transformer.threePhase(
                new Transformer.Connection(hour, true, false),
                50,
                rated().withZeroSequenceRatio(percent / 6)));
    DrivingPoint at = net.build().factor(1).drivingPoint(board);
    // Zero-sequence impedance: Σ z[0][k] of a symmetrical node.
    Phasor z0 = at.at(0, 0).plus(at.at(0, 1)).plus(at.at(0, 2));
    assertThat(z0.magnitude()).isCloseTo(percent / 100 * 0.16, within(1e-12));
    assertThat(at.positiveSequence().magnitude()).isCloseTo(0.06 * 0.16, within(1e-12));
    assertThat(at.negativeSequence().magnitude()).isCloseTo(0.06 * 0.16, within(1e-12));
  }

  @Test
  @DisplayName("An earthed star with a delta secondary is a zero-sequence path for its supply")
  void earthedStarOnDelta() {
    SeriesImpedance z1 = SeriesImpedance.of(0, 0.01);
    int supply = net.source(SourceImpedance.threeWire(z1, SeriesImpedance.of(0, 100)));
    TransformerImpedance impedance = new TransformerImpedance(0, 0.02, 0, 1);
    net.shunt(supply, impedance.primaryZeroSequencePath(10, Shunt.EARTH));
    DrivingPoint at = net.build().factor(1).drivingPoint(supply);
    Phasor z0 = at.at(0, 0).plus(at.at(0, 1)).plus(at.at(0, 2));
    // 100 ohm beside 0.02·10² = 2 ohm.
    assertThat(z0.im()).isCloseTo(100 * 2 / 102.0, within(1e-9));
    assertThat(at.positiveSequence().im()).isCloseTo(0.01, within(1e-12));
  }

  @Test
  @DisplayName("Winding eddy loss: R(1) is the tested loss, R(h) = R·(1 + p·h²)/(1 + p)")
  void eddyLossRaisesResistance() {
    // IEEE C57.110-2018 (from memory): winding eddy loss goes with the square of the order.
    TransformerImpedance z = TransformerImpedance.ofRating(1000, 400, 6, 10_000, 0.1);
    double rated = 10_000 / 1e6 * 0.16;
    assertThat(z.at(1).re()).isCloseTo(rated, within(1e-15));
    assertThat(z.at(1).magnitude()).isCloseTo(0.06 * 0.16, within(1e-15));
    assertThat(z.at(5).re()).isCloseTo(rated * 3.5 / 1.1, within(1e-15));
    assertThat(z.at(5).im()).isCloseTo(5 * z.at(1).im(), within(1e-15));
  }

  @Test
  @DisplayName("A load loss from X/R, and one that the impedance can't hold")
  void loadLoss() {
    double loss = TransformerImpedance.loadLossW(1000, 6, 5);
    Phasor z = TransformerImpedance.ofRating(1000, 400, 6, loss, 0).at(1);
    assertThat(z.im() / z.re()).isCloseTo(5, within(1e-12));
    assertThatThrownBy(() -> TransformerImpedance.ofRating(100, 400, 4, 5_000, 0))
        .hasMessageContaining("more than an impedance of 4.0 % on 100.0 kVA allows");
  }

  @Test
  @DisplayName("A centre-tapped secondary: two halves in opposition, each with half the impedance")
  void centreTapped() {
    int supply = stiffSupply();
    int panel =
        net.transformer(
            supply,
            Transformer.centreTapped(
                0, 1, 400.0 / 240, TransformerImpedance.ofRating(50, 240, 4, 0, 0)));
    TreeNetwork network = net.build();
    OrderSolution s =
        network.factor(1).solve(network.excitation().threePhaseEmf(1, new Phasor(230.94, 0)));
    assertThat(s.voltage(panel, 0, 1).magnitude()).isCloseTo(240, within(0.01));
    assertThat(s.voltage(panel, 0, 2).magnitude()).isCloseTo(120, within(0.005));
    // Line to line sees 4 % of 240²/50,000 ohm.
    assertThat(network.factor(1).drivingPoint(panel).between(0, 1).im())
        .isCloseTo(0.04 * 240 * 240 / 50_000, within(1e-12));
  }
}
