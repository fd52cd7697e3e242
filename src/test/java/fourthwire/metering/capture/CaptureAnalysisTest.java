package fourthwire.metering.capture;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.Reading;
import fourthwire.metering.capture.fit.HarmonicFit;
import fourthwire.metering.capture.fit.NoFundamentalException;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import fourthwire.testsupport.Transform;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Captures made from formulas, whose spectra are known in closed form. */
class CaptureAnalysisTest {
  private static double value(Figure figure) {
    return figure.value().orElseThrow();
  }

  private static Capture capture(
      double rateHz, double seconds, Map<String, DoubleUnaryOperator> signals) {
    int count = (int) Math.round(rateHz * seconds);
    double[] t = new double[count];
    for (int k = 0; k < count; k++) {
      t[k] = k / rateHz;
    }
    List<Capture.Channel> channels = new ArrayList<>();
    List<Samples> samples = new ArrayList<>();
    signals.forEach(
        (quantity, signal) -> {
          double[] x = new double[count];
          for (int k = 0; k < count; k++) {
            x[k] = signal.applyAsDouble(t[k]);
          }
          channels.add(new Capture.Channel(quantity, quantity));
          samples.add(Samples.of(x));
        });
    return new Capture(Optional.empty(), TimeAxis.even(rateHz, count), channels, samples);
  }

  private static DoubleUnaryOperator sine(double rms, double hz, double degrees) {
    return t -> Math.sqrt(2) * rms * Math.sin(2 * Math.PI * hz * t + Math.toRadians(degrees));
  }

  private static DoubleUnaryOperator sum(DoubleUnaryOperator... parts) {
    return t -> {
      double sum = 0;
      for (DoubleUnaryOperator part : parts) {
        sum += part.applyAsDouble(t);
      }
      return sum;
    };
  }

  private static CaptureResult result(Capture capture, double nominalHz) {
    return CaptureAnalysis.of(capture, nominalHz, List.of()).capture().orElseThrow();
  }

  private static List<String> codes(Reading reading) {
    return reading.quality().stream().map(QualityFinding::code).toList();
  }

  /** The voltage starts at 37°; a spectrum's angles are against its upward zero crossing. */
  @ParameterizedTest
  @CsvSource({
    "50, 49.87, 10000, 0.2",
    "50, 50, 12800, 0.2",
    "60, 60.3, 7680, 1",
    "50, 50.4, 5000, 0.07",
    "60, 59.96, 30707.244140625, 0.0667",
    "50, 49.5, 6400, 10"
  })
  void anySamplingGivesExactMagnitudesAnglesAndFrequency(
      double nominalHz, double hz, double rateHz, double seconds) {
    Map<String, DoubleUnaryOperator> signals = new LinkedHashMap<>();
    signals.put("L1.v", sum(sine(230, hz, 37), sine(5, 5 * hz, 80)));
    signals.put(
        "L1.i", sum(sine(10, hz, 37 - 30), sine(4, 3 * hz, 20), sine(1, 11 * hz, -75), t -> 0.3));
    CaptureResult r = result(capture(rateHz, seconds, signals), nominalHz);
    Spectrum i = r.spectrum().get(Conductor.L1);
    assertThat(r.frequencyHz()).isEqualTo(hz, within(1e-6));
    // Resampling passes within 1e-5; held samples have 24 bits.
    assertThat(i.magnitude(1)).isEqualTo(10, within(5e-5));
    assertThat(i.at(1).degrees()).isEqualTo(-30, within(1e-4));
    assertThat(i.magnitude(3)).isEqualTo(4, within(4e-5));
    assertThat(i.at(3).degrees()).isEqualTo(20 - 3 * 37, within(1e-3));
    assertThat(i.magnitude(11)).isEqualTo(1, within(1e-5));
    assertThat(i.at(11).degrees()).isEqualTo(-75 - 11 * 37 + 360, within(1e-2));
    assertThat(value(r.current().get(Conductor.L1).rmsA())).isEqualTo(Math.sqrt(117), within(1e-5));
    assertThat(value(r.current().get(Conductor.L1).thdPercent()))
        .isEqualTo(10 * Math.sqrt(17), within(1e-3));
    assertThat(value(r.voltage().get("L1").thdPercent())).isEqualTo(500 / 230.0, within(1e-4));
    assertThat(value(r.powerByLine().get(Conductor.L1).activeW()))
        .isEqualTo(2300 * Math.cos(Math.PI / 6), within(0.02));
  }

  /** Square wave, Fourier series 4/(πh): distortion to order 50 is 47.30 % (48.34 % over all). */
  @Test
  void aSquareWaveHas47point3PercentToOrder50() {
    double[] x = new double[4096 * 12];
    double[] t = new double[x.length];
    for (int k = 0; k < x.length; k++) {
      t[k] = k / (4096 * 60.0);
      x[k] = k % 4096 < 2048 ? 10 : -10;
    }
    Capture c =
        new Capture(
            Optional.empty(),
            TimeAxis.even(4096 * 60.0, x.length),
            List.of(new Capture.Channel("I", "L1.i")),
            List.of(Samples.of(x)));
    CaptureResult r = result(c, 60);
    assertThat(value(r.current().get(Conductor.L1).thdPercent())).isEqualTo(47.30, within(0.01));
    assertThat(value(r.current().get(Conductor.L1).rmsA())).isEqualTo(10, within(1e-3));
    assertThat(value(r.current().get(Conductor.L1).crestFactor())).isEqualTo(1, within(1e-3));
  }

  /** Over whole cycles of even samples the fit is the discrete Fourier transform. */
  @ParameterizedTest
  @CsvSource({"1", "2", "3"})
  void aFitOverWholeCyclesIsTheFourierTransform(long seed) {
    Random random = new Random(seed);
    double[] x = random.doubles(4 * 128, -5, 5).toArray();
    double[] t = new double[x.length];
    for (int k = 0; k < t.length; k++) {
      t[k] = k / 6400.0;
    }
    HarmonicFit fit = HarmonicFit.of(t, x, x.length, 50, 50);
    Transform dft = Transform.of(x, 4);
    for (int h = 1; h <= 50; h++) {
      assertThat(fit.at(h).re())
          .as("seed %d order %d", seed, h)
          .isEqualTo(dft.spectrum().re(h), within(1e-10));
      assertThat(fit.at(h).im())
          .as("seed %d order %d", seed, h)
          .isEqualTo(dft.spectrum().im(h), within(1e-10));
    }
    assertThat(fit.alternatingRms())
        .isEqualTo(Math.sqrt(dft.rms() * dft.rms() - dft.direct() * dft.direct()), within(1e-10));
  }

  private static Map<String, DoubleUnaryOperator> threePhase(double lagDegrees) {
    Map<String, DoubleUnaryOperator> signals = new LinkedHashMap<>();
    for (int k = 0; k < 3; k++) {
      String line = "L" + (k + 1);
      double angle = -120 * k;
      signals.put(line + ".v", sine(230, 50, angle));
      signals.put(line + ".i", sum(sine(20 + k, 50, angle - lagDegrees), sine(8, 150, 15)));
    }
    return signals;
  }

  /**
   * Triplens of three lines add up: 3 · 8 A, with the fundamentals' rest |20 + 21a² + 22a| = √3.
   */
  @Test
  void theNeutralIsTheSumOfTheLines() {
    Map<String, DoubleUnaryOperator> s = threePhase(20);
    Reading r = CaptureAnalysis.of(capture(12800, 0.4, s), 50, List.of());
    assertThat(value(r.capture().orElseThrow().current().get(Conductor.N).rmsA()))
        .isEqualTo(Math.sqrt(24 * 24 + 3), within(1e-6));
    assertThat(r.quality()).isEmpty();
    DoubleUnaryOperator n = sum(s.get("L1.i"), s.get("L2.i"), s.get("L3.i"));
    s.put("N.i", n);
    assertThat(CaptureAnalysis.of(capture(12800, 0.4, s), 50, List.of()).quality()).isEmpty();
    s.put("N.i", t -> -n.applyAsDouble(t));
    assertThat(codes(CaptureAnalysis.of(capture(12800, 0.4, s), 50, List.of())))
        .containsExactly(QualityFinding.REVERSED_CLAMP);
    s.put("N.i", sine(3, 50, 0));
    assertThat(codes(CaptureAnalysis.of(capture(12800, 0.4, s), 50, List.of())))
        .containsExactly(QualityFinding.NEUTRAL_NOT_SUM);
  }

  /** IEEE 1459-2010, 3.2.3.1: Ie² = (ΣI² + In²)/3; without a measured neutral In does not count. */
  @Test
  void onlyAMeasuredNeutralCountsInTheApparentPower() {
    Map<String, DoubleUnaryOperator> s = threePhase(20);
    double lines = 3 * 64 + 20 * 20 + 21 * 21 + 22 * 22;
    double neutral = 24 * 24 + 3;
    CaptureResult derived = result(capture(12800, 0.4, s), 50);
    assertThat(value(derived.power().apparentVa()))
        .isEqualTo(3 * 230 * Math.sqrt(lines / 3), within(1e-4));
    assertThat(derived.powerBasis()).contains("was not measured");
    s.put("N.i", sum(s.get("L1.i"), s.get("L2.i"), s.get("L3.i")));
    CaptureResult measured = result(capture(12800, 0.4, s), 50);
    assertThat(value(measured.power().apparentVa()))
        .isEqualTo(3 * 230 * Math.sqrt((lines + neutral) / 3), within(1e-4));
    assertThat(measured.powerBasis()).contains("as measured");
  }

  @Test
  void distortionOnAVanishingFundamentalIsNotGiven() {
    Map<String, DoubleUnaryOperator> s = threePhase(20);
    s.put("N.v", sum(sine(0.004, 50, 0), sine(0.012, 150, 0)));
    CaptureResult r = result(capture(12800, 0.4, s), 50);
    assertThat(r.voltage().get("N").thdPercent().value()).isEmpty();
    assertThat(r.voltage().get("N").thdPercent().reason()).contains("0.1 %");
    assertThat(r.voltage().get("L1").thdPercent().value()).isPresent();
    assertThat(value(r.current().get(Conductor.N).thdPercent()))
        .isEqualTo(2400 / Math.sqrt(3), within(0.05));
  }

  @Test
  void sentencesCarryUnitsAndAMinusSign() {
    Map<String, DoubleUnaryOperator> s = threePhase(20);
    DoubleUnaryOperator second = s.get("L2.i");
    s.put("L2.i", t -> -second.applyAsDouble(t) - 1);
    assertThat(CaptureAnalysis.of(capture(12800, 0.4, s), 50, List.of()).quality())
        .extracting(QualityFinding::sentence)
        .anySatisfy(x -> assertThat(x).contains("active power \u2212").contains(" W:"))
        .anySatisfy(x -> assertThat(x).contains("direct component of \u22121 A"));
  }

  @Test
  void reversedClampsAndExchangedLinesAreNamed() {
    Map<String, DoubleUnaryOperator> s = threePhase(20);
    DoubleUnaryOperator second = s.get("L2.i");
    s.put("L2.i", t -> -second.applyAsDouble(t));
    Reading reversed = CaptureAnalysis.of(capture(12800, 0.4, s), 50, List.of());
    assertThat(codes(reversed)).containsExactly(QualityFinding.REVERSED_CLAMP);
    assertThat(reversed.quality().get(0).sentence()).contains("L2");

    Map<String, DoubleUnaryOperator> x = threePhase(20);
    DoubleUnaryOperator third = x.get("L3.i");
    x.put("L3.i", x.get("L1.i"));
    x.put("L1.i", third);
    Reading exchanged = CaptureAnalysis.of(capture(12800, 0.4, x), 50, List.of());
    assertThat(codes(exchanged)).containsExactly(QualityFinding.SWAPPED_LINES);
    assertThat(exchanged.quality().get(0).sentence()).contains("L1").contains("L3");

    Map<String, DoubleUnaryOperator> v = threePhase(20);
    DoubleUnaryOperator vb = v.get("L2.v");
    v.put("L2.v", v.get("L3.v"));
    v.put("L3.v", vb);
    assertThat(codes(CaptureAnalysis.of(capture(12800, 0.4, v), 50, List.of())))
        .contains(QualityFinding.SWAPPED_LINES);
  }

  @Test
  void missingSamplesAreLeftOutAndClippingIsNamed() {
    Map<String, DoubleUnaryOperator> s = new LinkedHashMap<>();
    s.put("L1.v", sine(230, 50, 0));
    DoubleUnaryOperator i = sine(10, 50, -10);
    s.put("L1.i", t -> Math.round(t * 6400) % 50 == 7 ? Double.NaN : i.applyAsDouble(t));
    Reading missing = CaptureAnalysis.of(capture(6400, 0.4, s), 50, List.of());
    assertThat(codes(missing)).containsExactly(QualityFinding.MISSING_VALUES);
    assertThat(value(missing.capture().orElseThrow().current().get(Conductor.L1).rmsA()))
        .isEqualTo(10, within(1e-5));
    s.put("L1.i", t -> Math.max(-9, Math.min(9, i.applyAsDouble(t))));
    assertThat(codes(CaptureAnalysis.of(capture(6400, 0.4, s), 50, List.of())))
        .containsExactly(QualityFinding.CLIPPED);
  }

  @Test
  void noFundamentalGivesNoFigure() {
    Random random = new Random(5);
    Map<String, DoubleUnaryOperator> noise = Map.of("L1.i", t -> random.nextGaussian());
    assertThatThrownBy(() -> CaptureAnalysis.of(capture(6400, 1, noise), 50, List.of()))
        .isInstanceOf(NoFundamentalException.class);
    assertThatThrownBy(() -> CaptureAnalysis.of(capture(6400, 0.01, threePhase(0)), 50, List.of()))
        .isInstanceOf(NoFundamentalException.class)
        .hasMessageContaining("at least one cycle");
  }

  /** Three samples a cycle resolve the fundamental only, and no window of the standard. */
  @Test
  void aSparseRecordHasItsFundamentalAndNoWindows() {
    CaptureResult r = result(capture(151, 2, Map.of("L1.v", sine(230, 50, 20))), 50);
    assertThat(r.windows()).isEmpty();
    assertThat(r.basis()).contains("too sparse");
    assertThat(value(r.voltage().get("L1").fundamentalV())).isEqualTo(230, within(0.05));
  }

  /** What the basis says is resolved is what the spectrum holds. */
  @Test
  void ordersBeyondTheSamplingAreZeroAndNotClaimed() {
    Map<String, DoubleUnaryOperator> s = new LinkedHashMap<>();
    s.put("L1.v", sum(sine(230, 50, 0), sine(4, 650, 0)));
    CaptureResult r = result(capture(1600, 1, s), 50);
    assertThat(r.basis()).contains("orders 1 to 15");
    assertThat(r.voltageSpectrum().get("L1").magnitude(13)).isEqualTo(4, within(1e-3));
    assertThat(r.voltageSpectrum().get("L1").magnitude(16)).isZero();
  }
}
