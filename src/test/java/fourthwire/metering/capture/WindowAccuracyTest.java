package fourthwire.metering.capture;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.CaptureWindows;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * The accuracy that the help page states, on signals made from formulas: a voltage and a distorted
 * current of known orders, two interharmonics and white noise, sampled without regard to the
 * fundamental. Bounds: 0.02 % of nominal for magnitudes, 0.05° times the order for angles of orders
 * over 1 %, 1 mHz for the frequency.
 */
class WindowAccuracyTest {
  private static final double VOLTS = 230;
  private static final double AMPS = 40;

  @ParameterizedTest(name = "{0} Hz at {1} Hz, {2} cycles, seed {3}")
  @CsvSource({
    "49.87, 1600, 10.3, 1",
    "50, 1600, 600, 2",
    "60.03, 1920, 12.2, 3",
    "49.87, 3200, 25, 4",
    "50.4, 5000, 10, 5",
    "49.87, 6400, 10, 6",
    "60.2, 7680, 47.6, 7",
    "50, 10000, 500, 8",
    "49.87, 12800, 498.7, 9",
    "59.7, 15360, 12, 10",
    "49.87, 20000, 11.9, 11",
    "50.13, 25600, 100.4, 12",
    "49.87, 50000, 10.01, 13",
    "60.03, 50000, 70, 14",
    "47.6, 10240, 33, 15",
    "57.5, 10240, 120, 16"
  })
  void withinWhatTheHelpPageStates(double hz, double rateHz, double cycles, long seed) {
    Truth truth = new Truth(hz, rateHz, seed);
    CaptureResult r = truth.analysed(cycles);
    assertThat(r.frequencyHz()).isEqualTo(hz, within(1e-3));
    check(truth.voltage, r.voltageSpectrum().get("L1"), VOLTS, truth.voltage);
    check(truth.current, r.spectrum().get(Conductor.L1), AMPS, truth.voltage);
    assertThat(r.current().get(Conductor.L1).rmsA().value().orElseThrow())
        .isEqualTo(truth.currentRms(), within(2e-4 * AMPS));
    assertThat(r.voltage().get("L1").rmsV().value().orElseThrow())
        .isEqualTo(truth.voltage.rms(), within(2e-4 * VOLTS));
  }

  private static void check(Spectrum truth, Spectrum found, double nominal, Spectrum reference) {
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      assertThat(found.magnitude(h))
          .as("order %d", h)
          .isEqualTo(truth.magnitude(h), within(2e-4 * nominal));
      if (truth.magnitude(h) > 0.01 * truth.magnitude(1)) {
        double turned = truth.at(h).turned(-h * reference.at(1).degrees()).degrees();
        double error = Math.IEEEremainder(found.at(h).degrees() - turned, 360);
        assertThat(error).as("angle of order %d", h).isEqualTo(0, within(0.05 * h));
      }
    }
  }

  /**
   * IEC 61000-4-7, groups: an order with side lines 5 and 25 Hz away, all on lines of the window.
   * By hand: subgroup √(4² + 1²), group √(4² + 1² + 2²/2), the next order's too by its half.
   */
  @ParameterizedTest(name = "{0} Hz")
  @CsvSource({"50", "49.87"})
  void groupsAddTheLinesThatTheStandardNames(double hz) {
    double step = hz / 10;
    double[] x = new double[100_000];
    for (int k = 0; k < x.length; k++) {
      double w = 2 * Math.PI * k / 10_000;
      x[k] =
          Math.sqrt(2)
              * (100 * Math.sin(hz * w)
                  + 4 * Math.sin(5 * hz * w + 1)
                  + 1 * Math.sin((5 * hz + step) * w + 2)
                  + 2 * Math.sin((5 * hz + 5 * step) * w + 3)
                  + 0.5 * Math.sin((5 * hz + 7 * step) * w + 4));
    }
    CaptureWindows.HarmonicGroups g =
        analysed(x, 10_000).windows().orElseThrow().groups().get("L1.v");
    assertThat(g.subgroups().get(4)).isEqualTo(Math.sqrt(17), within(1e-4));
    assertThat(g.groups().get(4)).isEqualTo(Math.sqrt(19), within(1e-4));
    assertThat(g.groups().get(5)).isEqualTo(Math.sqrt(2 + 0.25), within(1e-4));
    assertThat(g.interharmonicGroups().get(5)).isEqualTo(Math.sqrt(1 + 4 + 0.25), within(1e-4));
    assertThat(g.interharmonicSubgroups().get(5)).isEqualTo(Math.sqrt(4 + 0.25), within(1e-4));
    assertThat(g.interharmonicGroups().get(4)).isEqualTo(0, within(1e-4));
  }

  /** 150 and 180 cycles are 3 s; ten minutes are those of the clock (IEC 61000-4-30, 4.5). */
  @ParameterizedTest(name = "{0} Hz for {1} s")
  @CsvSource({"50, 31, 10, 0", "60, 31, 10, 0", "50, 1300, 433, 1", "60, 601, 200, 0"})
  void intervalsAreThoseOfTheStandard(double hz, double seconds, int threes, int tens) {
    int n = (int) (seconds * 1600);
    double[] x = new double[n];
    for (int k = 0; k < n; k++) {
      x[k] = Math.sqrt(2) * (k < n / 2 ? 200 : 240) * Math.sin(2 * Math.PI * hz * k / 1600);
    }
    // The first full ten minutes of the clock stand five minutes after the first sample.
    java.time.Instant start = java.time.Instant.parse("2026-03-02T08:05:00Z");
    CaptureWindows w = analysed(x, 1600, Optional.of(start)).windows().orElseThrow();
    assertThat(w.intervals()).filteredOn(i -> i.length().equals("3s")).hasSize(threes);
    assertThat(w.intervals())
        .filteredOn(i -> i.length().equals("10min"))
        .hasSize(tens)
        .allSatisfy(
            i -> {
              assertThat(i.fromS()).isEqualTo(300, within(0.11));
              assertThat(i.toS()).isEqualTo(900, within(0.3));
              // 350 s of 200 V and 250 s of 240 V.
              assertThat(i.rms().get("L1.v"))
                  .isEqualTo(
                      Math.sqrt((350 * 200.0 * 200 + 250 * 240.0 * 240) / 600), within(0.05));
            });
    assertThat(w.intervals())
        .allSatisfy(i -> assertThat(i.frequencyHz()).isEqualTo(hz, within(1e-3)));
  }

  /** Two hours begin at even hours of the clock (IEC 61000-4-30:2015, 4.5), here at 10:00 UTC. */
  @Test
  void twoHoursBeginAtAnEvenHour() {
    int rate = 400;
    double[] x = new double[rate * 11_460];
    for (int k = 0; k < x.length; k++) {
      x[k] = 325 * Math.sin(2 * Math.PI * 50 * k / rate);
    }
    Optional<java.time.Instant> start =
        Optional.of(java.time.Instant.parse("2026-03-02T08:50:00Z"));
    CaptureWindows w = analysed(x, rate, start).windows().orElseThrow();
    assertThat(w.intervals()).filteredOn(i -> i.length().equals("10min")).hasSize(19);
    assertThat(w.intervals())
        .filteredOn(i -> i.length().equals("2h"))
        .singleElement()
        .satisfies(
            i -> {
              assertThat(i.fromS()).isEqualTo(4200, within(0.2));
              assertThat(i.toS()).isEqualTo(11_400, within(0.4));
            });
  }

  private static CaptureResult analysed(double[] x, double rateHz) {
    return analysed(x, rateHz, Optional.empty());
  }

  private static CaptureResult analysed(
      double[] x, double rateHz, Optional<java.time.Instant> start) {
    Capture capture =
        new Capture(
            start,
            TimeAxis.even(rateHz, x.length),
            List.of(new Capture.Channel("U", "L1.v")),
            List.of(Samples.of(x)));
    return CaptureAnalysis.of(capture, 50, List.of()).capture().orElseThrow();
  }

  /** A signal of known orders, drawn from a seed. */
  private static final class Truth {
    private final double hz;
    private final double rateHz;
    private final Random random;
    private final Spectrum voltage;
    private final Spectrum current;

    Truth(double hz, double rateHz, long seed) {
      this.hz = hz;
      this.rateHz = rateHz;
      this.random = new Random(seed);
      int resolved = (int) Math.min(50, Math.floor(0.48 * rateHz / hz - 0.5));
      this.voltage = drawn(VOLTS, 0.03, resolved);
      this.current = drawn(AMPS, 0.6, resolved);
    }

    /** Odd orders falling with the order, even ones small. */
    private Spectrum drawn(double fundamental, double share, int resolved) {
      return Spectrum.of(
          h -> {
            double degrees = 360 * random.nextDouble() - 180;
            double size = random.nextDouble() * share * (h % 2 == 0 ? 0.02 : 1) / h;
            double rms = h == 1 ? fundamental : h <= resolved ? fundamental * size : 0;
            return fourthwire.quantity.Phasor.polar(rms, degrees);
          });
    }

    double currentRms() {
      // Interharmonics of 0.4 % and 0.03 % of the fundamental.
      return Math.sqrt(
          Math.pow(current.rms(), 2) + Math.pow(0.004 * AMPS, 2) + Math.pow(0.0003 * AMPS, 2));
    }

    CaptureResult analysed(double cycles) {
      int n = (int) Math.round(cycles * rateHz / hz);
      double[] v = samples(voltage, n, 1e-4 * VOLTS);
      double[] i = samples(current, n, 1e-4 * AMPS);
      for (int k = 0; k < n; k++) {
        double w = 2 * Math.PI * hz * k / rateHz;
        i[k] += Math.sqrt(2) * AMPS * (0.004 * Math.sin(2.5 * w) + 0.0003 * Math.sin(6.53 * w + 1));
      }
      Capture capture =
          new Capture(
              Optional.empty(),
              TimeAxis.even(rateHz, n),
              List.of(new Capture.Channel("U", "L1.v"), new Capture.Channel("I", "L1.i")),
              List.of(Samples.of(v), Samples.of(i)));
      return CaptureAnalysis.of(capture, hz > 55 ? 60 : 50, List.of()).capture().orElseThrow();
    }

    private double[] samples(Spectrum spectrum, int n, double noise) {
      double[] x = new double[n];
      for (int k = 0; k < n; k++) {
        double w = 2 * Math.PI * hz * k / rateHz;
        for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
          x[k] += spectrum.re(h) * Math.sin(h * w) + spectrum.im(h) * Math.cos(h * w);
        }
        x[k] = Math.sqrt(2) * x[k] + noise * random.nextGaussian();
      }
      return x;
    }
  }
}
