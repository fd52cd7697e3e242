package fourthwire.validation;

import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.HarmonicLoss;
import fourthwire.quantity.LinePower;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.ThreePhasePower;
import fourthwire.quantity.Waveform;
import fourthwire.testsupport.Transform;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.DoubleUnaryOperator;
import java.util.function.ToDoubleFunction;
import java.util.stream.IntStream;

/** The figures of package {@code quantity} that validation files ask for, by name. */
final class QuantityChecks {
  private QuantityChecks() {}

  static Map<String, ToDoubleFunction<Inputs>> all() {
    Map<String, ToDoubleFunction<Inputs>> checks = new HashMap<>();
    distortion(checks);
    neutral(checks);
    power(checks);
    loss(checks);
    return checks;
  }

  private static void distortion(Map<String, ToDoubleFunction<Inputs>> checks) {
    checks.put("thd", in -> known(Distortion.thdPercent(in.spectrum("i"))) / 100);
    checks.put("rms", in -> in.spectrum("i").rms());
    checks.put("thd of 1/h", in -> known(Distortion.thdPercent(inverse(in))) / 100);
    checks.put("thd of samples", in -> ofSamples(in).currentDistortionVar() / 100);
    checks.put("power factor of samples", in -> known(ofSamples(in).figures().powerFactor()));
    checks.put("power factor", in -> known(single(in).figures().powerFactor()));
    checks.put(
        "deviation unbalance",
        in ->
            known(
                Distortion.deviationUnbalancePercent(
                    in.number("v12"), in.number("v23"), in.number("v31"))));
    checks.put(
        "harmonic voltage factor", in -> known(Distortion.harmonicVoltageFactor(in.spectrum("v"))));
  }

  private static void neutral(Map<String, ToDoubleFunction<Inputs>> checks) {
    checks.put("balanced neutral", in -> sum(in.balanced("i")).rms());
    checks.put("neutral of samples", QuantityChecks::neutralOfSamples);
    checks.put("balanced neutral on line", in -> neutralRatio(in.spectrum("i")));
    checks.put(
        "neutral ratio of pulses", in -> ratioOfSamples(pulses(in.number("width_deg"), 3600)));
  }

  private static void power(Map<String, ToDoubleFunction<Inputs>> checks) {
    checks.put("S", in -> single(in).apparentVa());
    checks.put("P", in -> single(in).activeW());
    checks.put("PH", in -> single(in).harmonicActiveW());
    checks.put("DI", in -> single(in).currentDistortionVar());
    checks.put("DV", in -> single(in).voltageDistortionVar());
    checks.put("SH", in -> single(in).harmonicApparentVa());
    checks.put("SN", in -> single(in).nonfundamentalVa());
    checks.put("Q1", in -> single(in).fundamentalReactiveVar());
    checks.put("Se", in -> effective(in).apparentVa());
    checks.put("Se1", in -> effective(in).fundamentalApparentVa());
    checks.put("SeN", in -> effective(in).nonfundamentalVa());
    checks.put("SU1", in -> effective(in).unbalancedVa());
    checks.put("S1+", in -> effective(in).positiveApparentVa());
    checks.put("P1+", in -> effective(in).positiveActiveW());
    checks.put("Q1+", in -> effective(in).positiveReactiveVar());
    checks.put("P of three lines", in -> effective(in).activeW());
    checks.put("PF of three lines", in -> known(effective(in).figures().powerFactor()));
  }

  private static void loss(Map<String, ToDoubleFunction<Inputs>> checks) {
    checks.put("F_HL", in -> known(HarmonicLoss.harmonicLossFactor(in.spectrum("i"))));
    checks.put("F_HL of 1/h", in -> known(HarmonicLoss.harmonicLossFactor(inverse(in))));
    checks.put("F_HL-STR", in -> known(HarmonicLoss.strayLossFactor(in.spectrum("i"))));
    checks.put(
        "K-factor on its own rms",
        in -> HarmonicLoss.kFactor(in.spectrum("i"), in.spectrum("i").rms()));
    checks.put("factor K with n = 1 counted", QuantityChecks::factorKWithFundamental);
    checks.put(
        "factor K",
        in -> known(HarmonicLoss.factorK(in.spectrum("i"), in.number("e"), in.number("q"))));
  }

  /**
   * Factor K as one worked example prints it, which counts n = 1 in the sum: K² grows by
   * e/(1+e)·(I1/I)². That the difference is exactly this shows where the two part.
   */
  private static double factorKWithFundamental(Inputs in) {
    Spectrum i = in.spectrum("i");
    double e = in.number("e");
    double k = known(HarmonicLoss.factorK(i, e, in.number("q")));
    return Math.sqrt(k * k + e / (1 + e) * Math.pow(i.magnitude(1) / i.rms(), 2));
  }

  private static LinePower single(Inputs in) {
    return LinePower.of(in.spectrum("v"), in.spectrum("i"));
  }

  private static ThreePhasePower effective(Inputs in) {
    List<Spectrum> lines = in.spectra("ia", "ib", "ic");
    return ThreePhasePower.fourWire(in.spectra("va", "vb", "vc"), lines, sum(lines));
  }

  /** A sampled current of unit fundamental on a sine of 100 V, as a capture would be evaluated. */
  private static LinePower ofSamples(Inputs in) {
    double[] samples = samples(in.text("shape"), in.whole("n"));
    Transform current = Transform.of(samples, 1);
    double i1 = current.spectrum().magnitude(1);
    Spectrum voltage = current.spectrum().times(100 / i1);
    Spectrum sine = Spectrum.of(h -> h == 1 ? voltage.at(1) : Phasor.ZERO);
    return LinePower.of(sine, current.spectrum().times(1 / i1), 100, current.rms() / i1, 100);
  }

  private static double[] samples(String shape, int n) {
    return switch (shape) {
      case "square" -> sampled(n, x -> x < 180 ? 1 : -1);
      case "six-pulse" -> sampled(n, QuantityChecks::block);
      case "twelve-pulse" ->
          sampled(
              n,
              // Star winding's block plus the delta winding's two blocks seen from the primary.
              x -> block(x) + (block(x + 30) + block(x - 30)) / Math.sqrt(3));
      default -> throw new IllegalArgumentException(shape);
    };
  }

  private static double block(double degrees) {
    double x = (degrees % 360 + 360) % 360;
    if (x > 30 && x < 150) {
      return 1;
    }
    return x > 210 && x < 330 ? -1 : 0;
  }

  private static double[] pulses(double width, int n) {
    return sampled(
        n, x -> Math.abs(x - 90) < width / 2 ? 1 : Math.abs(x - 270) < width / 2 ? -1 : 0);
  }

  /** The neutral of a balanced load by its cycle: three shifted cycles added sample by sample. */
  private static double neutralOfSamples(Inputs in) {
    double[] line = Waveform.of(in.spectrum("i"), 3000).toArray();
    return ratioOfSamples(line) * in.spectrum("i").rms();
  }

  /** As from a capture: three lines a third of a cycle apart, added sample by sample. */
  private static double ratioOfSamples(double[] line) {
    int n = line.length;
    double[] sum =
        IntStream.range(0, n)
            .mapToDouble(k -> line[k] + line[(k + n / 3) % n] + line[(k + 2 * n / 3) % n])
            .toArray();
    return Transform.of(sum, 1).rms() / Transform.of(line, 1).rms();
  }

  /** Samples in the middle of n equal steps, so that no sample stands on an edge. */
  private static double[] sampled(int n, DoubleUnaryOperator atDegrees) {
    return IntStream.range(0, n)
        .mapToDouble(k -> atDegrees.applyAsDouble(360 * (k + 0.5) / n))
        .toArray();
  }

  private static Spectrum inverse(Inputs in) {
    List<Integer> orders =
        Arrays.stream(in.text("orders").split(" ")).map(Integer::valueOf).toList();
    return Spectrum.of(h -> orders.contains(h) ? Phasor.polar(1.0 / h, 0) : Phasor.ZERO);
  }

  private static double neutralRatio(Spectrum line) {
    return sum(Inputs.rotated(line)).rms() / line.rms();
  }

  private static Spectrum sum(List<Spectrum> lines) {
    return lines.stream().reduce(Spectrum.ZERO, Spectrum::plus);
  }

  static double known(Figure figure) {
    return figure.value().orElseThrow(() -> new AssertionError(figure.reason()));
  }
}
