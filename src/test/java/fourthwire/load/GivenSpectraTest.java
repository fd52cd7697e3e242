package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Kinds whose spectrum is given: the published rows, and what the public contract, sections 1 and
 * 3, says of size and angles.
 */
class GivenSpectraTest {
  private static final Spectrum THIRD_AND_FIFTH =
      Spectrum.of(
          h ->
              switch (h) {
                case 1 -> Phasor.polar(1, -20);
                case 3 -> Phasor.polar(0.5, 170);
                case 5 -> Phasor.polar(0.2, -15);
                default -> Phasor.ZERO;
              });

  private static LoadRequest request(
      LoadKind kind, int ports, double volts, LoadRequest.Rating rating, double factor) {
    return new LoadRequest(
        kind,
        ports,
        50,
        volts,
        rating,
        1,
        1,
        false,
        factor == 0 ? OptionalDouble.empty() : OptionalDouble.of(factor),
        ModelColumns.NONE,
        kind == LoadKind.MEASURED ? Optional.of(THIRD_AND_FIFTH) : Optional.empty());
  }

  private static PortSpectra drawn(LoadRequest request, double degrees) {
    PortSpectra current = new PortSpectra(request.ports());
    PortSpectra emf = LoadCases.emf(request.ports(), request.nominalPortV(), degrees);
    LoadModels.of(request).newSolver().solve(emf, 0, 0, current);
    return current;
  }

  @Test
  void theMagneticBallastDrawsItsRow() {
    // 15, 3, 2, 1 % at orders 3, 5, 7, 9, displacement factor 0.5: common practice, no source.
    LoadRequest.Rating watts = new LoadRequest.Rating.Watts(46);
    Spectrum i = drawn(request(LoadKind.MAGNETIC_BALLAST, 1, 230, watts, 0), 0).spectrum(0);
    assertThat(i.at(1).magnitude()).isCloseTo(46 / (230 * 0.5), within(1e-12));
    assertThat(i.at(1).degrees()).isCloseTo(-60, within(1e-9));
    percent(i, 3, 15, 180);
    percent(i, 5, 3, 0);
    percent(i, 7, 2, 180);
    percent(i, 9, 1, 0);
    assertThat(i.distortionRms() / i.magnitude(1)).isCloseTo(Math.sqrt(0.0239), within(1e-12));
  }

  @Test
  void theActiveFrontEndDrawsItsRow() {
    // Published row, recalled, low confidence: 2.5, 2, 1, 0.8 % at orders 5, 7, 11, 13.
    LoadRequest.Rating watts = new LoadRequest.Rating.Watts(30000);
    PortSpectra all = drawn(request(LoadKind.ACTIVE_FRONT_END, 3, 400, watts, 0), 0);
    Spectrum i = all.spectrum(0);
    assertThat(i.re(1)).isCloseTo(30000 / (Math.sqrt(3) * 400), within(1e-9));
    percent(i, 5, 2.5, 0);
    percent(i, 7, 2, 180);
    percent(i, 11, 1, 180);
    percent(i, 13, 0.8, 0);
    // Order 5 turns backwards: L2 at 5·(-120°) = +120°. Nothing of order 3 in a three-line load.
    assertThat(all.spectrum(1).at(5).degrees()).isCloseTo(120, within(1e-9));
    assertThat(i.magnitude(3)).isZero();
  }

  private static void percent(Spectrum i, int order, double percent, double degrees) {
    assertThat(100 * i.magnitude(order) / i.magnitude(1)).isCloseTo(percent, within(1e-9));
    assertThat(Math.abs(i.at(order).degrees())).isCloseTo(degrees, within(1e-9));
  }

  @ParameterizedTest
  @CsvSource({"1, 230, 10.6418", "1, 400, 6.1190", "3, 400, 3.5328"})
  void ratedWattsAreSizedAtNominalVoltage(int ports, double volts, double amps) {
    // I1 = W/(V·cos φ1), V line to neutral, line to line, or √3·line to line: 2300 W at 20°.
    LoadRequest.Rating watts = new LoadRequest.Rating.Watts(2300);
    PortSpectra i = drawn(request(LoadKind.MEASURED, ports, volts, watts, 0), 0);
    assertThat(i.spectrum(0).magnitude(1)).isCloseTo(amps, within(1e-4));
    assertThat(i.spectrum(0).magnitude(3)).isCloseTo(amps / 2, within(1e-4));
  }

  @Test
  void ratedAmpsAndVoltAmperesAreOfTheWholeCurrent() {
    // rms = I1·√(1 + 0.25 + 0.04) = 1.135782·I1.
    LoadRequest.Rating amps = new LoadRequest.Rating.Amps(10);
    LoadRequest.Rating va = new LoadRequest.Rating.VoltAmperes(2300);
    for (LoadRequest.Rating rating : new LoadRequest.Rating[] {amps, va}) {
      Spectrum i = drawn(request(LoadKind.MEASURED, 1, 230, rating, 0), 0).spectrum(0);
      assertThat(i.rms()).isCloseTo(10, within(1e-9));
      assertThat(i.magnitude(1)).isCloseTo(10 / 1.135782, within(1e-5));
    }
  }

  @Test
  void anglesFollowTheTerminalsFundamentalAndMagnitudesNothing() {
    // Order h at φ_h + h·θ: θ = 40° gives -20 + 40, 170 + 120 = -70, -15 + 200 = -175°.
    LoadRequest.Rating watts = new LoadRequest.Rating.Watts(2300);
    LoadRequest request = request(LoadKind.MEASURED, 1, 230, watts, 0);
    Spectrum i = drawn(request, 40).spectrum(0);
    assertThat(i.at(1).degrees()).isCloseTo(20, within(1e-9));
    assertThat(i.at(3).degrees()).isCloseTo(-70, within(1e-9));
    assertThat(i.at(5).degrees()).isCloseTo(-175, within(1e-9));
    PortSpectra low = new PortSpectra(1);
    LoadModels.of(request).newSolver().solve(LoadCases.emf(1, 180, 40), 0, 0, low);
    assertThat(low.spectrum(0).magnitude(3)).isCloseTo(i.magnitude(3), within(1e-12));
  }

  @Test
  void onThreeLinesLineKTakesTheAngleOfItsTurn() {
    // Line k: φ_h + h·(θ - 120°·k). Order 5, L2: -15 + 5·(10 - 120) = -565 = 155°.
    LoadRequest.Rating watts = new LoadRequest.Rating.Watts(2300);
    PortSpectra i = drawn(request(LoadKind.MEASURED, 3, 400, watts, 0), 10);
    assertThat(i.spectrum(1).at(1).degrees()).isCloseTo(-130, within(1e-9));
    assertThat(i.spectrum(1).at(5).degrees()).isCloseTo(155, within(1e-9));
    assertThat(i.spectrum(2).at(5).degrees()).isCloseTo(-85, within(1e-9));
  }

  @Test
  void behindAnImpedanceTheAngleIsTheTerminalsNotTheSources() {
    // 10 A rms on 230 V behind 2 ohm: V∠θ + Z·I∠(θ + φ1) = E. The terminal voltage e - Z·i must
    // stand at the angle that the injected fundamental was turned by.
    LoadRequest.Rating amps = new LoadRequest.Rating.Amps(10);
    PortSpectra current = new PortSpectra(1);
    LoadModels.of(request(LoadKind.MEASURED, 1, 230, amps, 0))
        .newSolver()
        .solve(LoadCases.emf(1, 230, 0), 2, 0, current);
    Phasor i = current.spectrum(0).at(1);
    Phasor v = new Phasor(230, 0).minus(i.times(2));
    assertThat(i.degrees() - v.degrees()).isCloseTo(-20, within(1e-9));
  }

  @ParameterizedTest
  @CsvSource({
    "3, 180", "5, 0", "7, 180", "9, 0", "11, 180", "13, 0", "15, 180", "49, 0", "2, 0", "4, 0"
  })
  void anEmptyHarmonicAngleMeansAPulseAtTheCrest(int order, double degrees) {
    assertThat(LoadModels.assumedHarmonicDegrees(order)).isEqualTo(degrees);
    if (order % 2 == 1) {
      // All odd orders stand at their own crest where the fundamental does.
      assertThat(Math.sin(Math.toRadians(90 * order + degrees))).isCloseTo(1, within(1e-9));
    }
  }

  @Test
  void theOrderOneAngleWinsOverTheDisplacementFactor() {
    OptionalDouble none = OptionalDouble.empty();
    assertThat(LoadModels.fundamentalDegrees(OptionalDouble.of(-12), OptionalDouble.of(0.5)))
        .isEqualTo(-12);
    assertThat(LoadModels.fundamentalDegrees(none, OptionalDouble.of(0.5)))
        .isCloseTo(-60, within(1e-9));
    assertThat(LoadModels.fundamentalDegrees(none, OptionalDouble.of(-0.8)))
        .isCloseTo(36.8699, within(1e-4));
    assertThat(LoadModels.fundamentalDegrees(none, none)).isZero();
  }
}
