package fourthwire.load.trial;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.LoadRequest;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.Waveform;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Laws of equipment behind a source: Ohm's, Kirchhoff's, and that N units are one N times as large.
 */
class LoadTrialTest {
  private static final Spectrum FLAT =
      Spectrum.of(
          h -> h == 3 ? new Phasor(0.02, 0) : h == 5 ? Phasor.polar(0.03, 170) : Phasor.ZERO);

  /** 230 V on 52.9 ohm behind 2 + 1.5j ohm, by hand: 230 / (54.9 + 1.5j) A. */
  @Test
  void aResistanceBehindAnImpedanceDividesTheVoltage() {
    TrialResult result =
        LoadTrial.solve(request(LoadKind.RESISTIVE, 1000, 1), source(230, 2, 1.5, Spectrum.ZERO));
    double amps = 230 / Math.hypot(54.9, 1.5);
    assertThat(result.first().magnitude(1)).isCloseTo(amps, within(1e-9));
    assertThat(result.voltage().get(0).magnitude(1)).isCloseTo(52.9 * amps, within(1e-9));
    assertThat(result.voltage().get(0).at(1).degrees()).isCloseTo(0, within(1e-9));
    assertThat(result.powerFactor().value().orElseThrow()).isCloseTo(1, within(1e-12));
  }

  /** Public contract: N equal units are one unit N times as large, so I(N, Z) = N·I(1, N·Z). */
  @ParameterizedTest
  @EnumSource(value = LoadKind.class, names = "MEASURED", mode = EnumSource.Mode.EXCLUDE)
  void unitsAndImpedanceScaleTogether(LoadKind kind) {
    TrialResult many =
        LoadTrial.solve(request(kind, 100, 16), source(volts(kind), 0.05, 0.08, FLAT));
    TrialResult one = LoadTrial.solve(request(kind, 100, 1), source(volts(kind), 0.8, 1.28, FLAT));
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      assertThat(many.first().at(h).minus(one.first().at(h).times(16)).magnitude())
          .as("order %d", h)
          .isLessThan(1e-5 * many.first().magnitude(1));
    }
  }

  /**
   * Active power leaves the source, or stays in its resistance: P_emf - R·I² is the equipment's.
   */
  @ParameterizedTest
  @EnumSource(value = LoadKind.class, names = "MEASURED", mode = EnumSource.Mode.EXCLUDE)
  void whatTheSourceGivesArrivesOrIsLostOnTheWay(LoadKind kind) {
    TrialSource source = source(volts(kind), 0.4, 0.25, FLAT);
    TrialResult result = LoadTrial.solve(request(kind, 200, 3), source);
    for (int line = 0; line < result.current().size(); line++) {
      Spectrum i = result.current().get(line);
      Spectrum v = result.voltage().get(line);
      Spectrum emf = Spectrum.of(h -> v.at(h).plus(i.at(h).times(source.impedance(h, 50))));
      double fundamental = kind.family() == LoadKind.Family.THREE_PHASE ? 400 / Math.sqrt(3) : 230;
      assertThat(emf.magnitude(1)).isCloseTo(fundamental, within(1e-5 * fundamental));
      assertThat(emf.magnitude(5)).isCloseTo(0.03 * fundamental, within(1e-5 * fundamental));
      assertThat(emf.magnitude(11)).isLessThan(1e-5 * fundamental);
    }
    assertThat(result.power().activeW().value().orElseThrow()).isPositive();
  }

  /** The filter's capacitor, the source's inductance and a control that follows the voltage. */
  @Test
  void aFilterThatResonatesWithTheSourceIsSolvedToo() {
    TrialResult result =
        LoadTrial.solve(request(LoadKind.PFC_CRITICAL, 60, 60), source(230, 0.1, 0.35, FLAT));
    assertThat(result.power().activeW().value().orElseThrow()).isCloseTo(3600, within(1.0));
  }

  /**
   * Supplies whose filters ring with the source between orders 22 and 35: Ohm's law over the source
   * and the power asked for hold at what is found.
   */
  @ParameterizedTest
  @CsvSource({"897, 4, 3.6, 0.087, 0.197", "716, 10, 4.7, 0.195, 0.187", "800, 10, 4, 0.05, 0.1"})
  void filtersThatRingWithTheSource(
      double watts, double units, double nanofaradPerW, double ohm, double reactance) {
    ModelColumns filter =
        ModelColumns.NONE
            .with(ModelColumns.Column.INPUT_FILTER_UF, nanofaradPerW * 1e-3 * watts)
            .with(ModelColumns.Column.RESIDUAL_PERCENT, 1.5);
    TrialSource source = source(230, ohm, reactance, FLAT);
    TrialResult result =
        LoadTrial.solve(request(LoadKind.PFC_CONTINUOUS, watts, units).withColumns(filter), source);
    assertThat(result.power().activeW().value().orElseThrow())
        .isCloseTo(watts * units, within(1e-5 * watts * units));
    Spectrum v = result.voltage().get(0);
    Spectrum emf =
        Spectrum.of(h -> v.at(h).plus(result.first().at(h).times(source.impedance(h, 50))));
    double angle = emf.at(1).degrees();
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      Phasor given = h == 1 ? new Phasor(230, 0) : FLAT.at(h).times(230);
      assertThat(emf.at(h).turned(-h * angle).minus(given).magnitude())
          .as("order %d", h)
          .isLessThan(1e-5 * 230);
    }
  }

  /**
   * Where half-waves differ a direct component belongs to the current: with it the wave rests at
   * zero while the diodes block, round the voltage's crossings.
   */
  @ParameterizedTest
  @CsvSource({
    "CAPACITOR_INPUT,100,100,0.05,0.3,0.2,0",
    "CAPACITOR_INPUT,100,50,0.05,0.5,0.2,0",
    "CAPACITOR_INPUT,100,1,0.05,0.1,1,1",
    "CAPACITOR_INPUT_CHOKE,300,1,0.05,0.05,1,1"
  })
  void betweenPulsesThereIsNoCurrent(
      LoadKind kind, double watts, int units, double ohm, double x, double uf, double second) {
    ModelColumns sized = ModelColumns.NONE.with(ModelColumns.Column.CAPACITANCE_UF_PER_W, uf);
    TrialResult result =
        LoadTrial.solve(
            request(kind, watts, units).withColumns(sized),
            source(230, ohm, x, second(second / 100)));
    double direct = result.direct().get(0);
    Waveform wave = Waveform.of(result.first(), 720).raised(direct);
    assertThat(Math.abs(direct)).isGreaterThan(0.01 * wave.peak());
    for (int start : new int[] {20, 380}) {
      double resting = 0;
      for (int k = 0; k < 40; k++) {
        resting += wave.at(start + k) / 40;
      }
      assertThat(resting).isCloseTo(0, within(2e-4 * wave.peak()));
    }
  }

  /**
   * A second order shifts the crossings: what a dimmer of a resistance (90° on) and a supply with
   * PFC (11° on both sides off) let through is integrated by the midpoint rule.
   */
  @ParameterizedTest
  @CsvSource({"PHASE_DIMMER,0,90", "PFC_CONTINUOUS,-11,11"})
  void unlikeHalvesLeaveADirectComponent(LoadKind kind, double offFrom, double offTo) {
    TrialSource source = source(230, 0, 0, second(0.05));
    double direct = LoadTrial.solve(request(kind, 300, 1), source).direct().get(0);
    double[] crossings = {crossing(-0.2), crossing(Math.PI - 0.2), crossing(2 * Math.PI - 0.2)};
    double mean = 0;
    double square = 0;
    int parts = 200_000;
    for (int k = 0; k < parts; k++) {
      double at = crossings[0] + 2 * Math.PI * (k + 0.5) / parts;
      double v = volts(at);
      boolean off = false;
      for (double c : crossings) {
        double degrees = Math.toDegrees(at - c);
        off |= degrees > offFrom && degrees < offTo;
      }
      mean += off ? 0 : v / parts;
      square += off ? 0 : v * v / parts;
    }
    double siemens = kind == LoadKind.PHASE_DIMMER ? 300 / 52_900.0 : 300 / square;
    assertThat(direct).isCloseTo(siemens * mean, within(5e-3 * Math.abs(siemens * mean)));
  }

  private static Spectrum second(double share) {
    return Spectrum.of(h -> h == 2 ? Phasor.polar(share, 40) : Phasor.ZERO);
  }

  private static double volts(double at) {
    return 230 * Math.sqrt(2) * (Math.sin(at) + 0.05 * Math.sin(2 * at + Math.toRadians(40)));
  }

  /** The first within 0.4 radians. */
  private static double crossing(double from) {
    double low = from;
    double high = from + 0.4;
    for (int n = 0; n < 60; n++) {
      double middle = (low + high) / 2;
      if (volts(low) * volts(middle) > 0) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return low;
  }

  /** What a larger load is fed, a smaller is not refused for want of power. */
  @Test
  void aRefusalBelowAStateThatIsFedIsOfTheCurrentNotOfTheSource() {
    LoadRequest small =
        request(LoadKind.CAPACITOR_INPUT, 150, 1)
            .withColumns(ModelColumns.NONE.with(ModelColumns.Column.CAPACITANCE_UF_PER_W, 0.2));
    List<Sweep.Point> points =
        Sweep.overUnits(
            small, source(230, 0.05, 2, Spectrum.ZERO), List.of(10.0, 20.0, 50.0, 100.0));
    assertThat(points.stream().map(p -> p.result().isPresent()))
        .containsExactly(true, false, true, false);
    assertThat(points.get(1).why()).contains(NoSteadyStateException.Why.NO_REPEAT);
    assertThat(points.get(3).why()).contains(NoSteadyStateException.Why.TOO_MUCH);
  }

  @Test
  void tooSoftASourceIsSaidSo() {
    assertThatThrownBy(
            () ->
                LoadTrial.solve(
                    request(LoadKind.CAPACITOR_INPUT, 3000, 10), source(230, 3, 3, Spectrum.ZERO)))
        .isInstanceOf(NoSteadyStateException.class)
        .hasMessageContaining("source");
  }

  /** Attenuation (A. Mansoor et al., IEEE Trans. Power Delivery 10, 1995): THD falls with units. */
  @Test
  void sweepsFollowTheEquipment() {
    LoadRequest computers = request(LoadKind.CAPACITOR_INPUT, 100, 1);
    TrialSource source = source(230, 0.4, 0.25, Spectrum.ZERO);
    List<Double> thd =
        Sweep.overUnits(computers, source, List.of(1.0, 2.0, 5.0, 10.0, 20.0)).stream()
            .map(p -> thd(p.result().orElseThrow()))
            .toList();
    assertThat(thd).isSortedAccordingTo((a, b) -> Double.compare(b, a));
    assertThat(
            Sweep.overUnits(computers, source, List.of(1.0, 500.0)).stream()
                .map(p -> p.result().isPresent()))
        .containsExactly(true, false);
    assertThat(
            Sweep.overLevel(
                    request(LoadKind.PFC_CONTINUOUS, 300, 1),
                    TrialSource.ideal(230),
                    List.of(0.1, 0.2, 0.5, 1.0))
                .stream()
                .map(p -> thd(p.result().orElseThrow()))
                .toList())
        .isSortedAccordingTo((a, b) -> Double.compare(b, a));
    List<Sweep.Point> firing =
        Sweep.overFiring(
            request(LoadKind.PHASE_DIMMER, 300, 1), TrialSource.ideal(230), List.of(0.0, 90.0));
    // closed form at 90 degrees, orders 2 to 50: √(rms² - I1²) on I1 is 65.1 % over all orders
    assertThat(thd(firing.get(0).result().orElseThrow())).isLessThan(0.01);
    assertThat(thd(firing.get(1).result().orElseThrow())).isBetween(63.0, 65.1);
  }

  private static double thd(TrialResult result) {
    return Distortion.thdPercent(result.first()).value().orElseThrow();
  }

  private static double volts(LoadKind kind) {
    return kind.family() == LoadKind.Family.THREE_PHASE ? 400 : 230;
  }

  private static TrialSource source(double v, double ohm, double reactance, Spectrum background) {
    return new TrialSource(v, ohm, reactance / (2 * Math.PI * 50), background);
  }

  private static LoadRequest request(LoadKind kind, double watts, double units) {
    boolean three = kind.family() == LoadKind.Family.THREE_PHASE;
    return new LoadRequest(
        kind,
        three ? 3 : 1,
        50,
        volts(kind),
        new LoadRequest.Rating.Watts(watts),
        units,
        1,
        kind.runsAtLowerPower(),
        OptionalDouble.empty(),
        ModelColumns.NONE,
        Optional.empty());
  }
}
