package fourthwire.load.control;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import java.util.Random;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The phase dimmer against the closed form of its Fourier integrals on a resistance, and against an
 * independent step-by-step integration (Runge-Kutta, fourth order) on R-L, powers and energy
 * included.
 */
class PhaseDimmerTest {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;
  private static final double HERTZ = 50;
  private static final double OMEGA = 2 * Math.PI * HERTZ;

  @ParameterizedTest
  @ValueSource(doubles = {0, 1, 17, 30, 45, 60, 89, 90, 91, 120, 135, 150, 165, 175, 179})
  void onResistanceAndASineItEqualsTheTextbookForm(double degrees) {
    // I1 and the power factor of the leading-edge dimmer on a resistance:
    // b1 = (π - a + sin(2a)/2)/π, a1 = (cos(2a) - 1)/2π of the full current; PF = √b1.
    double a = Math.toRadians(degrees);
    PortSpectra emf = new PortSpectra(1);
    emf.re[0][1] = 230;
    PortSpectra current = solve(100, 0, degrees, emf, 0, 0);
    double full = 2.3;
    double b1 = (Math.PI - a + Math.sin(2 * a) / 2) / Math.PI;
    double a1 = (Math.cos(2 * a) - 1) / (2 * Math.PI);
    assertThat(current.re[0][1]).isCloseTo(full * b1, within(1e-6 * full * b1));
    assertThat(current.im[0][1]).isCloseTo(full * a1, within(1e-6 * full * b1));
    for (int h = 3; h <= ORDERS; h += 2) {
      double b = (Math.sin((h + 1) * a) / (h + 1) - Math.sin((h - 1) * a) / (h - 1)) / Math.PI;
      double c =
          ((Math.cos((h + 1) * a) - 1) / (h + 1) - (Math.cos((h - 1) * a) - 1) / (h - 1)) / Math.PI;
      assertThat(current.re[0][h]).as("order %d", h).isCloseTo(full * b, within(1e-6 * full * b1));
      assertThat(current.im[0][h]).as("order %d", h).isCloseTo(full * c, within(1e-6 * full * b1));
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {21, 22, 23, 24})
  void onResistanceItEqualsItsClosedFormAtADistortedVoltage(long seed) {
    Random r = new Random(seed);
    for (int n = 0; n < 100; n++) {
      PortSpectra emf = emf(r);
      double degrees = 178 * r.nextDouble();
      double series = r.nextBoolean() ? 0 : 5 * r.nextDouble();
      PortSpectra current = solve(100, 0, degrees, emf, series, 0);
      PortSpectra expected = closedForm(emf, 100 + series, Math.toRadians(degrees));
      double scale = rms(expected);
      for (int h = 1; h <= ORDERS; h++) {
        assertThat(distance(current, expected, h))
            .as("seed %d, set %d, %.2f°, order %d", seed, n, degrees, h)
            .isLessThan(1e-6 * scale);
      }
    }
  }

  @ParameterizedTest(name = "{0} degrees, displacement factor {1}, distorted: {2}")
  @CsvSource({
    "60, 0.95, false",
    "75, 0.7, false",
    "90, 0.85, true",
    "110, 0.5, true",
    "130, 0.9, true",
    "45, 0.9, true",
    "150, 0.3, false",
    "100, 0.1, true"
  })
  void onResistanceAndInductanceItEqualsStepwiseIntegration(
      double degrees, double factor, boolean distorted) {
    PortSpectra emf = distorted ? emf(new Random(31)) : emf(null);
    double ohm = 20 * factor;
    double henry = 20 * Math.sqrt(1 - factor * factor) / OMEGA;
    PortSpectra current = solve(ohm, henry, degrees, emf, 0.4, 0.25 / OMEGA);
    Stepwise expected = new Stepwise(emf, ohm + 0.4, OMEGA * henry + 0.25, Math.toRadians(degrees));
    double fundamental = Math.hypot(expected.re[1], expected.im[1]);
    for (int h = 1; h <= ORDERS; h++) {
      assertThat(Math.hypot(current.re[0][h] - expected.re[h], current.im[0][h] - expected.im[h]))
          .as("order %d", h)
          .isLessThan(0.001 * fundamental);
    }
    double watts = 0;
    for (int h = 1; h <= ORDERS; h++) {
      watts += emf.re[0][h] * current.re[0][h] + emf.im[0][h] * current.im[0][h];
    }
    assertThat(watts).as("Fourier and time domain").isCloseTo(expected.watts, within(1e-6 * watts));
    assertThat((ohm + 0.4) * expected.meanSquareAmps)
        .as("all of it heats the resistances")
        .isCloseTo(watts, within(1e-6 * watts));
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 10, 30, 44})
  void firedBeforeItsCurrentWouldEndItIsALinearLoad(double degrees) {
    // An R-L of 45° conducts all the time when fired before 45° (textbook).
    PortSpectra emf = emf(null);
    PortSpectra current = solve(10, 10 / OMEGA, degrees, emf, 0, 0);
    assertThat(current.re[0][1]).isCloseTo(11.5, within(1e-9));
    assertThat(current.im[0][1]).isCloseTo(-11.5, within(1e-9));
    assertThat(current.spectrum(0).distortionRms()).isCloseTo(0, within(1e-9));
  }

  private static PortSpectra solve(
      double ohm, double henry, double degrees, PortSpectra emf, double seriesOhm, double series) {
    PortSpectra current = new PortSpectra(1);
    new PhaseDimmer(ohm, henry, HERTZ, Math.toRadians(degrees))
        .newSolver()
        .solve(emf, seriesOhm, series, current);
    return current;
  }

  /** 230 V with up to 5 % at orders to 13, even ones now and then; a pure sine without a Random. */
  private static PortSpectra emf(@Nullable Random r) {
    PortSpectra emf = new PortSpectra(1);
    emf.re[0][1] = 230;
    if (r == null) {
      return emf;
    }
    double start = 2 * Math.PI * r.nextDouble();
    int step = r.nextBoolean() ? 1 : 2;
    emf.re[0][1] = 230 * Math.cos(start);
    emf.im[0][1] = 230 * Math.sin(start);
    for (int h = 1 + step; h <= 13; h += step) {
      double volts = 230 * 0.1 / h * r.nextDouble();
      double angle = 2 * Math.PI * r.nextDouble();
      emf.re[0][h] = volts * Math.cos(angle);
      emf.im[0][h] = volts * Math.sin(angle);
    }
    return emf;
  }

  /** ∫ of sines times sines, order by order, from each firing to the crossing that follows. */
  private static PortSpectra closedForm(PortSpectra emf, double ohm, double firing) {
    PortSpectra i = new PortSpectra(1);
    double theta = Math.atan2(emf.im[0][1], emf.re[0][1]);
    for (int half = 0; half < 2; half++) {
      double from = crossing(emf, half * Math.PI - theta) + firing;
      double to = crossing(emf, (half + 1) * Math.PI - theta);
      if (from >= to) {
        continue;
      }
      for (int n = 1; n <= ORDERS; n++) {
        for (int h = 1; h <= ORDERS; h++) {
          double v = Math.hypot(emf.re[0][h], emf.im[0][h]);
          if (v > 0) {
            double phi = Math.atan2(emf.im[0][h], emf.re[0][h]);
            i.re[0][n] += v / ohm / Math.PI * sineSine(h, phi, n, from, to);
            i.im[0][n] += v / ohm / Math.PI * sineCosine(h, phi, n, from, to);
          }
        }
      }
    }
    return i;
  }

  /** ∫ sin(hx + φ)·sin(nx) dx. */
  private static double sineSine(int h, double phi, int n, double from, double to) {
    return (cosine(h - n, phi, from, to) - cosine(h + n, phi, from, to)) / 2;
  }

  /** ∫ sin(hx + φ)·cos(nx) dx. */
  private static double sineCosine(int h, double phi, int n, double from, double to) {
    double turned = phi - Math.PI / 2;
    return (cosine(h - n, turned, from, to) + cosine(h + n, turned, from, to)) / 2;
  }

  /** ∫ cos(kx + φ) dx. */
  private static double cosine(int k, double phi, double from, double to) {
    return k == 0
        ? Math.cos(phi) * (to - from)
        : (Math.sin(k * to + phi) - Math.sin(k * from + phi)) / k;
  }

  private static double crossing(PortSpectra v, double guess) {
    double low = guess - 0.5;
    double high = guess + 0.5;
    boolean rising = value(v, high) > 0;
    for (int n = 0; n < 60; n++) {
      double middle = (low + high) / 2;
      if (value(v, middle) > 0 == rising) {
        high = middle;
      } else {
        low = middle;
      }
    }
    return (low + high) / 2;
  }

  private static double value(PortSpectra v, double x) {
    double sum = 0;
    for (int h = 1; h <= ORDERS; h++) {
      if (v.re[0][h] != 0 || v.im[0][h] != 0) {
        sum += v.re[0][h] * Math.sin(h * x) + v.im[0][h] * Math.cos(h * x);
      }
    }
    return Math.sqrt(2) * sum;
  }

  private static double distance(PortSpectra a, PortSpectra b, int h) {
    return Math.hypot(a.re[0][h] - b.re[0][h], a.im[0][h] - b.im[0][h]);
  }

  private static double rms(PortSpectra s) {
    return s.spectrum(0).rms();
  }

  /** X·di/dx = v - R·i from each firing until the current is back at zero, in small steps. */
  private static final class Stepwise {
    private static final double STEP = 5e-4;
    private final PortSpectra emf;
    private final double ohm;
    private final double reactance;
    private final double[] re = new double[ORDERS + 1];
    private final double[] im = new double[ORDERS + 1];
    private double watts;
    private double meanSquareAmps;

    Stepwise(PortSpectra emf, double ohm, double reactance, double firing) {
      this.emf = emf;
      this.ohm = ohm;
      this.reactance = reactance;
      double theta = Math.atan2(emf.im[0][1], emf.re[0][1]);
      pulse(crossing(emf, -theta) + firing, 1);
      pulse(crossing(emf, Math.PI - theta) + firing, -1);
    }

    private void pulse(double from, int sign) {
      double x = from;
      double i = 0;
      double width = STEP;
      while (x < from + 2 * Math.PI) {
        double next = stepped(x, i, width);
        if (sign * next <= 0) {
          if (width < 1e-12) {
            return;
          }
          width /= 2;
          continue;
        }
        double middle = stepped(x, i, width / 2);
        add(x, i, width / 6);
        add(x + width / 2, middle, 4 * width / 6);
        add(x + width, next, width / 6);
        x += width;
        i = next;
      }
      throw new AssertionError("the pulse does not end");
    }

    private double stepped(double x, double i, double width) {
      double k1 = slope(x, i);
      double k2 = slope(x + width / 2, i + width / 2 * k1);
      double k3 = slope(x + width / 2, i + width / 2 * k2);
      double k4 = slope(x + width, i + width * k3);
      return i + width / 6 * (k1 + 2 * k2 + 2 * k3 + k4);
    }

    private double slope(double x, double i) {
      return (value(emf, x) - ohm * i) / reactance;
    }

    private void add(double x, double i, double weight) {
      for (int h = 1; h <= ORDERS; h++) {
        re[h] += weight * i * Math.sin(h * x) * Math.sqrt(2) / (2 * Math.PI);
        im[h] += weight * i * Math.cos(h * x) * Math.sqrt(2) / (2 * Math.PI);
      }
      watts += weight * i * value(emf, x) / (2 * Math.PI);
      meanSquareAmps += weight * i * i / (2 * Math.PI);
    }
  }
}
