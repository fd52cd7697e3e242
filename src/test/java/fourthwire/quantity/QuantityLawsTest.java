package fourthwire.quantity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.testsupport.Transform;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.assertj.core.data.Offset;
import org.hipparchus.complex.Complex;
import org.hipparchus.transform.DftNormalization;
import org.hipparchus.transform.FastFourierTransformer;
import org.hipparchus.transform.TransformType;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Laws that hold for every current and voltage, tried on seeded random spectra. */
class QuantityLawsTest {
  private static final Offset<Double> TINY = within(1e-9);

  private static Spectrum random(Random random, double scale) {
    return Spectrum.of(
        h -> Phasor.polar(scale * random.nextDouble() / h, 360 * random.nextDouble()));
  }

  private static List<Spectrum> three(Random random, double scale) {
    return Stream.generate(() -> random(random, scale)).limit(3).toList();
  }

  /** Parseval: the rms of a cycle is the rms of its orders; and the transform undoes synthesis. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(ints = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10})
  void synthesisAndTransformAreInverse(int seed) {
    Random random = new Random(seed);
    Spectrum spectrum = random(random, 100);
    int count = 102 + 2 * random.nextInt(250);
    Waveform cycle = Waveform.of(spectrum, count);
    assertThat(cycle.rms()).isCloseTo(spectrum.rms(), TINY);
    Transform back = Transform.of(cycle.toArray(), 1);
    assertThat(back.spectrum().minus(spectrum).rms()).isLessThan(1e-9);
    assertThat(back.rms()).isCloseTo(spectrum.rms(), TINY);
    assertThat(back.direct()).isCloseTo(0, TINY);
  }

  /** An independent FFT library (Hipparchus) gives the same orders over ten cycles. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(ints = {11, 12, 13})
  void transformAgreesWithAnotherLibrary(int seed) {
    Random random = new Random(seed);
    double[] samples = random.doubles(4096, -1, 1).toArray();
    int cycles = 8;
    Transform ours = Transform.of(samples, cycles);
    Complex[] bins =
        new FastFourierTransformer(DftNormalization.STANDARD)
            .transform(samples, TransformType.FORWARD);
    for (int h = 1; h <= 50; h++) {
      Complex bin = bins[h * cycles].multiply(Math.sqrt(2) / samples.length);
      // √2·X·sin(ωt + φ) stands in its bin as X·(sin φ - j·cos φ).
      assertThat(ours.spectrum().re(h)).isCloseTo(-bin.getImaginary(), TINY);
      assertThat(ours.spectrum().im(h)).isCloseTo(bin.getReal(), TINY);
    }
  }

  /**
   * The sine reference of the contract, by hand: 10 A rms at 30°, order 3, on top of 5 A direct.
   */
  @Test
  void transformUsesTheSineReference() {
    double[] samples = new double[600];
    for (int k = 0; k < samples.length; k++) {
      samples[k] = 5 + 10 * Math.sqrt(2) * Math.sin(3 * 2 * Math.PI * k / 200 + Math.toRadians(30));
    }
    Transform dft = Transform.of(samples, 3);
    assertThat(dft.direct()).isCloseTo(5, TINY);
    assertThat(dft.spectrum().magnitude(3)).isCloseTo(10, TINY);
    assertThat(dft.spectrum().at(3).degrees()).isCloseTo(30, TINY);
    assertThat(dft.rms()).isCloseTo(Math.sqrt(125), TINY);
  }

  @Test
  void transformRefusesWhatItCannotHold() {
    double[] bins = new double[11];
    assertThatThrownBy(() -> new Dft(21)).hasMessageContaining("even");
    assertThatThrownBy(() -> new Dft(20).transform(new double[20], bins, bins))
        .hasMessageContaining("20 points");
  }

  /** IEEE 1459-2010, 3.1.2: S² = S1² + SN², SN² = DI² + DV² + SH², S² = P² + N², P from v·i. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(ints = {21, 22, 23, 24, 25})
  void linePowersResolve(int seed) {
    Random random = new Random(seed);
    Spectrum v = random(random, 230);
    Spectrum i = random(random, 20);
    LinePower p = LinePower.of(v, i);
    double s2 = p.apparentVa() * p.apparentVa();
    Offset<Double> rounding = within(1e-9 * s2);
    double s12 = p.fundamentalApparentVa() * p.fundamentalApparentVa();
    double sn2 = p.nonfundamentalVa() * p.nonfundamentalVa();
    assertThat(s12 + sn2).isCloseTo(s2, rounding);
    assertThat(
            Math.pow(p.currentDistortionVar(), 2)
                + Math.pow(p.voltageDistortionVar(), 2)
                + Math.pow(p.harmonicApparentVa(), 2))
        .isCloseTo(sn2, rounding);
    assertThat(Math.pow(p.activeW(), 2) + Math.pow(p.nonactiveVar(), 2)).isCloseTo(s2, rounding);
    Waveform vt = Waveform.of(v, 256);
    Waveform it = Waveform.of(i, 256);
    double mean = 0;
    for (int k = 0; k < 256; k++) {
      mean += vt.at(k) * it.at(k) / 256;
    }
    assertThat(p.activeW()).isCloseTo(mean, within(1e-9 * p.apparentVa()));
  }

  /** Fortescue: the lines come back, and turning the lines moves no sequence's magnitude. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(ints = {31, 32, 33, 34, 35})
  void sequencesRoundTripAndRotate(int seed) {
    List<Spectrum> lines = three(new Random(seed), 50);
    SymmetricalComponents s = SymmetricalComponents.of(lines);
    for (int k = 0; k < 3; k++) {
      assertThat(s.lines().get(k).minus(lines.get(k)).rms()).isLessThan(1e-9);
    }
    SymmetricalComponents turned =
        SymmetricalComponents.of(List.of(lines.get(1), lines.get(2), lines.get(0)));
    for (int h = 1; h <= 50; h++) {
      assertThat(turned.positive().magnitude(h)).isCloseTo(s.positive().magnitude(h), TINY);
      assertThat(turned.negative().magnitude(h)).isCloseTo(s.negative().magnitude(h), TINY);
      assertThat(turned.zero().magnitude(h)).isCloseTo(s.zero().magnitude(h), TINY);
    }
  }

  /** A balanced load's orders: 3, 6, 9 … zero, 2, 5, 8 … negative, the rest positive sequence. */
  @Test
  void balancedOrdersHaveTheirSequence() {
    Spectrum l1 = Spectrum.of(h -> new Phasor(1, 0));
    List<Spectrum> lines =
        Stream.of(0, 1, 2).map(k -> Spectrum.of(h -> l1.at(h).turned(-120.0 * h * k))).toList();
    SymmetricalComponents s = SymmetricalComponents.of(lines);
    for (int h = 1; h <= 50; h++) {
      assertThat(s.zero().magnitude(h)).isCloseTo(h % 3 == 0 ? 1 : 0, TINY);
      assertThat(s.positive().magnitude(h)).isCloseTo(h % 3 == 1 ? 1 : 0, TINY);
      assertThat(s.negative().magnitude(h)).isCloseTo(h % 3 == 2 ? 1 : 0, TINY);
    }
  }

  /** Without a neutral current, the two-wattmeter power is that of the four-wire form. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(ints = {41, 42, 43, 44, 45})
  void threeWireFormsAgreeWithFourWireOnes(int seed) {
    Random random = new Random(seed);
    List<Spectrum> v = zeroSumOf(three(random, 230));
    List<Spectrum> i = zeroSumOf(three(random, 30));
    ThreePhasePower four = ThreePhasePower.fourWire(v, i, Spectrum.ZERO);
    ThreePhasePower three = ThreePhasePower.threeWire(SymmetricalComponents.differences(v), i);
    Offset<Double> rounding = within(1e-9 * four.apparentVa());
    assertThat(three.activeW()).isCloseTo(four.activeW(), rounding);
    assertThat(three.apparentVa()).isCloseTo(four.apparentVa(), rounding);
    assertThat(three.fundamentalApparentVa()).isCloseTo(four.fundamentalApparentVa(), rounding);
    assertThat(three.positiveActiveW()).isCloseTo(four.positiveActiveW(), rounding);
    assertThat(three.positiveReactiveVar()).isCloseTo(four.positiveReactiveVar(), rounding);
  }

  private static List<Spectrum> zeroSumOf(List<Spectrum> lines) {
    Spectrum zero = SymmetricalComponents.of(lines).zero();
    return lines.stream().map(l -> l.minus(zero)).toList();
  }

  /** Balanced sines: Se is 3·V·I, nothing is unbalanced or distorted. */
  @Test
  void balancedSinesLeaveNothingOver() {
    List<Spectrum> v = balanced(230, 0);
    List<Spectrum> i = balanced(10, -30);
    ThreePhasePower p = ThreePhasePower.fourWire(v, i, Spectrum.ZERO);
    assertThat(p.apparentVa()).isCloseTo(6900, within(1e-6));
    assertThat(p.unbalancedVa()).isCloseTo(0, within(1e-3));
    assertThat(p.nonfundamentalVa()).isCloseTo(0, within(1e-3));
    assertThat(p.figures().powerFactor().value().orElseThrow())
        .isCloseTo(Math.cos(Math.toRadians(30)), TINY);
    assertThat(p.figures().fundamentalReactiveVar().value().orElseThrow())
        .isCloseTo(3450, within(1e-6));
  }

  private static List<Spectrum> balanced(double magnitude, double degrees) {
    return Stream.of(0, 1, 2)
        .map(
            k ->
                Spectrum.of(
                    h -> h == 1 ? Phasor.polar(magnitude, degrees - 120.0 * k) : Phasor.ZERO))
        .toList();
  }

  /** Split-phase: both legs alike, so the arithmetic sums are twice one leg's figures. */
  @Test
  void splitPhaseAddsItsLegs() {
    LinePower leg = LinePower.of(random(new Random(51), 120), random(new Random(52), 20));
    PowerFigures both = PowerFigures.arithmeticSum(List.of(leg, leg));
    assertThat(both.apparentVa().value().orElseThrow()).isCloseTo(2 * leg.apparentVa(), TINY);
    assertThat(both.nonfundamentalVa().value().orElseThrow())
        .isCloseTo(2 * leg.nonfundamentalVa(), within(1e-6));
    assertThat(both.activeW().value().orElseThrow()).isCloseTo(2 * leg.activeW(), TINY);
  }

  /** What can't be computed says why, and is never 0. */
  @Test
  void undefinedFiguresGiveAReason() {
    LinePower idle = LinePower.of(balanced(230, 0).get(0), Spectrum.ZERO);
    assertThat(idle.figures().powerFactor().value()).isEmpty();
    assertThat(idle.figures().powerFactor().reason()).isNotBlank();
    assertThat(Distortion.thdPercent(Spectrum.ZERO).value()).isEmpty();
    assertThat(Distortion.tddPercent(Spectrum.ZERO, 0).value()).isEmpty();
    assertThat(HarmonicLoss.harmonicLossFactor(Spectrum.ZERO).value()).isEmpty();
    assertThat(Waveform.of(Spectrum.ZERO, 64).crestFactor().value()).isEmpty();
  }

  /** Crest factor of a sine is √2. */
  @Test
  void crestFactorOfASine() {
    Waveform sine = Waveform.of(balanced(10, 0).get(0), 400);
    assertThat(sine.crestFactor().value().orElseThrow()).isCloseTo(Math.sqrt(2), TINY);
  }
}
