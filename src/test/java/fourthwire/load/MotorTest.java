package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/** A motor of 10 kW at cos φ 0.8 on 400 V, 50 Hz, against algebra by hand. */
class MotorTest {
  private static final double OMEGA = 2 * Math.PI * 50;

  private static LoadModel motor(double demand) {
    return LoadModels.of(
        new LoadRequest(
            LoadKind.MOTOR,
            3,
            50,
            400,
            new LoadRequest.Rating.Watts(10000),
            1,
            demand,
            true,
            OptionalDouble.of(0.8),
            ModelColumns.NONE,
            Optional.empty()));
  }

  private static Phasor line(LoadModel motor, double ohm, double reactance, int k) {
    PortSpectra current = new PortSpectra(3);
    motor.newSolver().solve(LoadCases.emf(3, 400, 0), ohm, reactance / OMEGA, current);
    return new Phasor(current.re[k][1], current.im[k][1]);
  }

  @Test
  void onAStiffSupply() {
    // I = 10 000/(√3·400·0.8) = 18.0422 A at -acos 0.8 = -36.8699°; L2 a third of a cycle later.
    Phasor first = line(motor(1), 0, 0, 0);
    assertThat(first.magnitude()).isCloseTo(18.0422, within(1e-4));
    assertThat(first.degrees()).isCloseTo(-36.8699, within(1e-4));
    assertThat(line(motor(1), 0, 0, 1).degrees()).isCloseTo(-156.8699, within(1e-4));
  }

  @Test
  void behindAnImpedance() {
    // A line: P = 3333.33 W, Q = 2500 var behind 0.5 + j0.5 ohm at E = 230.940 V.
    // a = RP + XQ = 2916.67, b = XP - RQ = 416.67; V² = E²/2 - a + √((E²/2 - a)² - a² - b²)
    //   = 23 750 + √(564 062 500 - 8 680 556) = 47 316.54, V = 217.523 V;
    // I = 4166.67/217.523 = 19.1551 A; V lags E by atan(b/(V² + a)) = 0.4752°.
    Phasor current = line(motor(1), 0.5, 0.5, 0);
    assertThat(current.magnitude()).isCloseTo(19.1551, within(1e-4));
    assertThat(current.degrees()).isCloseTo(-36.8699 - 0.4752, within(1e-4));
  }

  @Test
  void atPartLoadItKeepsItsDisplacementFactorAndItsLockedRotor() {
    Phasor half = line(motor(0.5), 0, 0, 0);
    assertThat(half.magnitude()).isCloseTo(9.0211, within(1e-4));
    assertThat(half.degrees()).isCloseTo(-36.8699, within(1e-4));
    double[] full = new double[6];
    double[] part = new double[6];
    motor(1).linearSiemens(5, full);
    motor(0.5).linearSiemens(5, part);
    assertThat(part).containsExactly(full);
  }

  @Test
  void harmonicsAndNegativeSequenceSeeTheLockedRotor() {
    // X = 0.17·400²/12 500 = 2.176 ohm, R = X/3·√h: at order 5 1.62189 + j10.88 ohm, order 1
    // 0.725333 + j2.176 ohm (negative sequence only).
    LoadModel motor = motor(1);
    double[] y = new double[6];
    motor.linearSiemens(5, y);
    Phasor fifth = new Phasor(1, 0).over(new Phasor(1.62189, 10.88));
    assertThat(y[0]).isCloseTo(fifth.re(), within(1e-7));
    assertThat(y[1]).isCloseTo(fifth.im(), within(1e-7));
    assertThat(y[2]).isEqualTo(y[0]);
    assertThat(y[3]).isEqualTo(y[1]);
    assertThat(y[4]).isZero();
    assertThat(y[5]).isZero();
    motor.linearSiemens(1, y);
    Phasor negative = new Phasor(1, 0).over(new Phasor(0.7253333, 2.176));
    assertThat(y[0]).isZero();
    assertThat(y[1]).isZero();
    assertThat(y[2]).isCloseTo(negative.re(), within(1e-7));
    assertThat(y[3]).isCloseTo(negative.im(), within(1e-7));
  }

  @Test
  void beyondTheMostALineCanCarryTheReasonIsSaid() {
    // With cos φ 0.8 and Z at the same angle the most is S = E²/4Z: 3.2 ohm for 4166.67 VA.
    assertThat(line(motor(1), 3.19 * 0.8, 3.19 * 0.6, 0).magnitude()).isFinite();
    assertThatThrownBy(() -> line(motor(1), 3.21 * 0.8, 3.21 * 0.6, 0))
        .isInstanceOf(NoSteadyStateException.class)
        .hasMessageContaining("more power than its source impedance lets through");
  }
}
