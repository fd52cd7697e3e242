package fourthwire.load.control;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The law of the power-factor-corrected supply, i = G·v outside the dead angle, worked out instant
 * by instant (bisection for the crossings, Simpson's rule for the integrals) at the terminal
 * voltage that the solver ends with: the same current at every order, and the same power.
 */
class PfcTimeDomainTest {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;
  private static final int SENSED = 13;
  private static final int SETS = 30;
  private static final int PANELS = 1000;

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {11, 12, 13})
  void theSpectrumIsThatOfTheInstantaneousCurrent(long seed) {
    Random r = new Random(seed);
    for (int n = 0; n < SETS; n++) {
      double watts = 5 * Math.pow(1000, r.nextDouble());
      double dead = Math.toRadians(3 + 30 * r.nextDouble());
      double residual = r.nextBoolean() ? 0 : 0.05 * r.nextDouble();
      double base = 230 * 230 / watts;
      double ohm = 0.02 * base * r.nextDouble();
      double henry = 0.02 * base * r.nextDouble() / 314.16;
      PortSpectra emf = emf(r);
      PortSpectra current = new PortSpectra(1);
      new PowerFactorCorrected(watts, 50, 0, Math.toDegrees(dead), residual)
          .newSolver()
          .solve(emf, ohm, henry, current);
      PortSpectra v = terminal(emf, current, ohm, 2 * Math.PI * 50 * henry);
      check("seed " + seed + ", set " + n, v, current, watts, dead, residual);
    }
  }

  private static void check(
      String given, PortSpectra v, PortSpectra current, double watts, double dead, double part) {
    double theta = Math.atan2(v.im[0][1], v.re[0][1]);
    double third = part * Math.hypot(v.re[0][1], v.im[0][1]);
    double up = crossing(v, -theta);
    double down = crossing(v, Math.PI - theta);
    double next = crossing(v, 2 * Math.PI - theta);
    Wave positive = new Wave(v, up + dead, down - dead);
    Wave negative = new Wave(v, down + dead, next - dead);
    // Per siemens: ∫v² of the conducting pieces, and what the third harmonic does against v3.
    double g =
        watts
            / (positive.meanSquare()
                + negative.meanSquare()
                - third * (v.re[0][3] * Math.cos(3 * theta) + v.im[0][3] * Math.sin(3 * theta)));
    double scale = Math.hypot(current.re[0][1], current.im[0][1]);
    double fourier = 0;
    for (int h = 1; h <= ORDERS; h++) {
      double re = g * (positive.sine(h) + negative.sine(h));
      double im = g * (positive.cosine(h) + negative.cosine(h));
      if (h == 3) {
        re -= g * third * Math.cos(3 * theta);
        im -= g * third * Math.sin(3 * theta);
      }
      assertThat(Math.hypot(current.re[0][h] - re, current.im[0][h] - im))
          .as("%s, order %d", given, h)
          .isLessThan(1e-6 * scale);
      fourier += v.re[0][h] * current.re[0][h] + v.im[0][h] * current.im[0][h];
    }
    assertThat(fourier).as(given).isCloseTo(watts, within(1e-6 * watts));
  }

  /** A stretch of the voltage by its instantaneous values, zero outside. */
  private static final class Wave {
    private final double[] at = new double[PANELS + 1];
    private final double[] volts = new double[PANELS + 1];
    private final double[] weight = new double[PANELS + 1];

    Wave(PortSpectra v, double from, double to) {
      double width = (to - from) / PANELS;
      for (int n = 0; n <= PANELS; n++) {
        at[n] = from + n * width;
        volts[n] = value(v, at[n], ORDERS);
        int simpson = n == 0 || n == PANELS ? 1 : n % 2 == 1 ? 4 : 2;
        weight[n] = simpson * width / 3 / (2 * Math.PI);
      }
    }

    /** Mean over the whole cycle. */
    double meanSquare() {
      double sum = 0;
      for (int n = 0; n <= PANELS; n++) {
        sum += weight[n] * volts[n] * volts[n];
      }
      return sum;
    }

    /** Real part of the rms phasor of an order. */
    double sine(int order) {
      double sum = 0;
      for (int n = 0; n <= PANELS; n++) {
        sum += weight[n] * volts[n] * Math.sin(order * at[n]);
      }
      return Math.sqrt(2) * sum;
    }

    /** Its imaginary part. */
    double cosine(int order) {
      double sum = 0;
      for (int n = 0; n <= PANELS; n++) {
        sum += weight[n] * volts[n] * Math.cos(order * at[n]);
      }
      return Math.sqrt(2) * sum;
    }
  }

  private static double crossing(PortSpectra v, double guess) {
    double low = guess - 0.4;
    double high = guess + 0.4;
    boolean rising = value(v, high, SENSED) > 0;
    for (int n = 0; n < 60; n++) {
      double middle = (low + high) / 2;
      if (value(v, middle, SENSED) > 0 == rising) {
        high = middle;
      } else {
        low = middle;
      }
    }
    return (low + high) / 2;
  }

  private static double value(PortSpectra v, double x, int highest) {
    double sum = 0;
    for (int h = 1; h <= highest; h++) {
      if (v.re[0][h] != 0 || v.im[0][h] != 0) {
        sum += v.re[0][h] * Math.sin(h * x) + v.im[0][h] * Math.cos(h * x);
      }
    }
    return Math.sqrt(2) * sum;
  }

  private static PortSpectra terminal(PortSpectra emf, PortSpectra i, double ohm, double x) {
    PortSpectra v = new PortSpectra(1);
    for (int h = 1; h <= ORDERS; h++) {
      v.re[0][h] = emf.re[0][h] - ohm * i.re[0][h] + h * x * i.im[0][h];
      v.im[0][h] = emf.im[0][h] - ohm * i.im[0][h] - h * x * i.re[0][h];
    }
    return v;
  }

  /** Up to 5 % at single orders, even ones in every other set. */
  private static PortSpectra emf(Random r) {
    PortSpectra emf = new PortSpectra(1);
    int step = r.nextBoolean() ? 1 : 2;
    for (int h = 1; h <= 13; h += step) {
      double volts = h == 1 ? 230 * (0.9 + 0.2 * r.nextDouble()) : 230 * 0.1 / h * r.nextDouble();
      double angle = 2 * Math.PI * r.nextDouble();
      emf.re[0][h] = volts * Math.cos(angle);
      emf.im[0][h] = volts * Math.sin(angle);
    }
    return emf;
  }
}
