package fourthwire.audit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.DesignState.Resonance;
import fourthwire.audit.run.HarmonicAudit;
import fourthwire.quantity.Phasor;
import fourthwire.site.Feeder;
import fourthwire.site.LoadKind;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Resonances on lightly loaded sites with one bank: the order is √(S_sc/Q_c) (any handbook on
 * power-factor correction; for example IEEE 18 and IEEE 1036, from memory), and the peak is that of
 * source and transformer, capacitor and load side by side, worked out here branch by branch.
 */
class ResonanceTest {
  private static final double LOW_V = 400;
  private static final double HIGH_V = 11_000;
  private static final double EDDY = 0.05;
  private static final int STEPS = 4;

  static IntStream seeds() {
    return IntStream.rangeClosed(1, 20);
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void orderAndPeakAreThoseOfTheBranches(int seed) {
    Case c = new Case(new Random(seed));
    NodeResult board = c.audit();
    Resonance found =
        board.design().orElseThrow().resonances().stream()
            .filter(r -> !r.series())
            .findFirst()
            .orElseThrow();

    assertThat(found.bank()).isEqualTo("C1");
    assertThat(found.order()).isCloseTo(c.ruleOfThumb(1), within(0.1));
    double[] peak = c.peak(1);
    assertThat(found.order()).isCloseTo(peak[0], within(0.01));
    assertThat(found.ohm()).isCloseTo(peak[1], within(0.01 * peak[1]));
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void everyStepOfABankHasItsOwn(int seed) {
    Case c = new Case(new Random(seed));
    NodeResult board = c.audit();

    assertThat(board.bankSteps()).hasSize(STEPS);
    for (BankStep step : board.bankSteps()) {
      double in = (double) step.step() / STEPS;
      double[] peak = c.peak(in);
      assertThat(step.kvar()).isCloseTo(in * c.kvar, within(1e-9));
      assertThat(step.order()).as("step %d", step.step()).isCloseTo(peak[0], within(0.01));
      assertThat(step.ohm()).isCloseTo(peak[1], within(0.01 * peak[1]));
    }
  }

  /** The curve is that of the branches at every order. */
  @ParameterizedTest(name = "seed {0}")
  @MethodSource("seeds")
  void curveIsThatOfTheBranches(int seed) {
    Case c = new Case(new Random(seed));
    ImpedanceCurve curve = c.audit().impedance().orElseThrow();

    for (int k = 0; k < ImpedanceCurve.POINTS; k += 7) {
      double expected = c.ohm(ImpedanceCurve.order(k), 1).magnitude();
      assertThat(curve.ohm(k)).isCloseTo(expected, within(1e-6 * expected));
    }
  }

  /** One transformer, one board, a resistive load of a twentieth of its rating, one bank. */
  private static final class Case {
    private final double faultMva;
    private final double kva;
    private final double percent;
    private final double lossW;
    private final double kvar;

    Case(Random random) {
      faultMva = 200 + 300 * random.nextDouble();
      kva = 250 + 1000 * random.nextDouble();
      percent = 5 + 2 * random.nextDouble();
      lossW = 1000 * kva * percent / 100 / 12;
      kvar = kva * (0.2 + 0.4 * random.nextDouble());
    }

    NodeResult audit() {
      SurveyBuilder b =
          new SurveyBuilder(50)
              .supply("GRID", HIGH_V, faultMva, 20)
              .transformer("T1", "GRID", kva, HIGH_V, LOW_V, "Dyn11", percent, lossW)
              .panel("MSB", "T1", Feeder.UNKNOWN)
              .circuit("heat", "MSB", "L1-L2-L3-N", Feeder.UNKNOWN)
              .load("MSB", "heat", LoadKind.RESISTIVE, loadW(), 1)
              .bank("C1", "MSB", kvar, 0, OptionalInt.of(STEPS));
      return new HarmonicAudit()
              .run(new AuditRequest(b.build(), Optional.empty(), Map.of()), Progress.SILENT)
              .nodes()
              .stream()
              .filter(n -> n.node().equals("MSB"))
              .findFirst()
              .orElseThrow();
    }

    private double loadW() {
      return 1000 * kva / 20;
    }

    double ruleOfThumb(double share) {
      return Math.sqrt(LOW_V * LOW_V / source(1).magnitude() / (1000 * kvar * share));
    }

    /** Supply and transformer in series, on the low side. */
    private Phasor source(double order) {
      double z = LOW_V * LOW_V / (1e6 * faultMva);
      double r = z / Math.hypot(1, 20);
      double base = LOW_V * LOW_V / (1000 * kva);
      double rPu = lossW / (1000 * kva);
      double xPu = Math.sqrt(percent * percent / 1e4 - rPu * rPu);
      double winding = base * rPu * (1 + EDDY * order * order) / (1 + EDDY);
      return new Phasor(r + winding, order * (20 * r + base * xPu));
    }

    Phasor ohm(double order, double share) {
      Phasor one = new Phasor(1, 0);
      double capacitive = LOW_V * LOW_V / (1000 * kvar * share);
      Phasor sum =
          one.over(source(order))
              .plus(one.over(new Phasor(0, -capacitive / order)))
              .plus(one.times(loadW() / (LOW_V * LOW_V)));
      return one.over(sum);
    }

    /** Order and height of the peak, by small steps. */
    double[] peak(double share) {
      double[] peak = new double[2];
      for (double order = 1; order < 50; order += 0.001) {
        double z = ohm(order, share).magnitude();
        if (z > peak[1]) {
          peak = new double[] {order, z};
        }
      }
      return peak;
    }
  }
}
