package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.EnumSet;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.ToDoubleBiFunction;
import java.util.stream.Stream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Each preset lands in the bands of distortion and power factor that its row states with their
 * source, works over its whole spread, and is like no other.
 */
class PresetsTest {
  private static final EnumSet<LoadKind> CORRECTED =
      EnumSet.of(LoadKind.PFC_CRITICAL, LoadKind.PFC_CONTINUOUS);

  /**
   * A sinusoidal supply.
   *
   * @param portV nominal, line to line on three lines
   */
  private record Supply(double portV, double hertz, double ohm, double henry) {
    static Supply stiff(double portV, double hertz) {
      return new Supply(portV, hertz, 0, 0);
    }
  }

  static Stream<Arguments> presets() {
    return Presets.all().stream().map(p -> Arguments.of(Named.of(p.name(), p)));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("presets")
  void landsInItsStatedBands(Preset preset) {
    for (Supply supply : supplies(preset)) {
      Terminal drawn = drawn(preset, supply, perPort(preset), 1, (parameter, s) -> s.typical());
      String where = preset.name() + " on " + supply;
      assertThat(drawn.thdPercent())
          .as("distortion of " + where)
          .isBetween(preset.thdLowPercent(), preset.thdHighPercent());
      assertThat(drawn.powerFactor())
          .as("power factor of " + where)
          .isBetween(preset.powerFactorLow(), preset.powerFactorHigh() + 1e-9);
    }
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("presets")
  void worksOverItsWholeSpread(Preset preset) {
    double share = perPort(preset) / preset.typicalW();
    for (Supply supply : supplies(preset)) {
      for (double watts : new double[] {preset.lowW(), preset.typicalW(), preset.highW()}) {
        for (double demand : new double[] {1, 0.1}) {
          works(preset, supply, watts * share, demand, (parameter, s) -> s.typical());
        }
      }
    }
    Supply usual = supplies(preset).get(1);
    for (PresetParameter moved : preset.parameters().keySet()) {
      double typical = perPort(preset);
      works(preset, usual, typical, 1, (p, s) -> p == moved ? s.low() : s.typical());
      works(preset, usual, typical, 1, (p, s) -> p == moved ? s.high() : s.typical());
    }
  }

  private static void works(
      Preset preset,
      Supply supply,
      double watts,
      double demand,
      ToDoubleBiFunction<PresetParameter, Spread> choice) {
    Terminal drawn = drawn(preset, supply, watts, demand, choice);
    assertThat(drawn.current().rms()).as(preset.name()).isFinite().isPositive();
    assertThat(drawn.powerFactor()).as(preset.name()).isBetween(0.05, 1 + 1e-9);
  }

  /**
   * Nominal sinusoidal voltages the equipment is sold for, stiff; and of 230 and 400 V a usual
   * supply: 0.4 + j0.25 ohm, the reference impedance of IEC 60725 (from memory), on three lines a
   * short-circuit power a hundred times the rating.
   */
  private static List<Supply> supplies(Preset preset) {
    double omega = 2 * Math.PI * 50;
    if (preset.kind().family() == LoadKind.Family.THREE_PHASE) {
      double base = 400 * 400 / preset.typicalW();
      return List.of(
          Supply.stiff(400, 50),
          new Supply(400, 50, 0.001 * base, 0.01 * base / omega),
          Supply.stiff(208, 60),
          Supply.stiff(480, 60));
    }
    // What draws more than a 120 V socket gives stands between two lines of 120/208 V there.
    double american = preset.typicalW() > 1800 ? 208 : 120;
    return List.of(
        Supply.stiff(230, 50), new Supply(230, 50, 0.4, 0.25 / omega), Supply.stiff(american, 60));
  }

  /** Watts on one port: a single-phase kind of this size stands on three lines, a third on each. */
  private static double perPort(Preset preset) {
    boolean spread =
        preset.kind().family() == LoadKind.Family.SINGLE_PHASE && preset.typicalW() > 10000;
    return spread ? preset.typicalW() / 3 : preset.typicalW();
  }

  private static Terminal drawn(
      Preset preset,
      Supply supply,
      double watts,
      double demand,
      ToDoubleBiFunction<PresetParameter, Spread> choice) {
    int ports = preset.kind().family() == LoadKind.Family.THREE_PHASE ? 3 : 1;
    ModelColumns columns = preset.columns(watts, supply.portV(), choice);
    LoadRequest request =
        new LoadRequest(
            preset.kind(),
            ports,
            supply.hertz(),
            supply.portV(),
            new LoadRequest.Rating.Watts(watts),
            1,
            demand,
            true,
            preset.displacementFactor(),
            columns,
            Optional.empty());
    return Terminal.of(
        LoadModels.of(request),
        LoadCases.emf(ports, supply.portV(), 0),
        supply.hertz(),
        supply.ohm(),
        supply.henry());
  }

  @Test
  void noTwoAreAlike() {
    assertThat(Presets.all()).hasSizeGreaterThanOrEqualTo(42);
    Map<List<Object>, String> seen = new HashMap<>();
    for (Preset preset : Presets.all()) {
      Map<PresetParameter, Double> usual = new HashMap<>();
      preset.parameters().forEach((parameter, spread) -> usual.put(parameter, spread.typical()));
      String twin = seen.put(List.of(preset.kind(), preset.typicalW(), usual), preset.name());
      assertThat(twin).as("has the parameters of " + preset.name()).isNull();
    }
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("presets")
  void saysItsSpreadAndItsSource(Preset preset) {
    assertThat(preset.source())
        .containsPattern("no source|published|computed|closed form|measured|IEC ");
    assertThat(preset.lowW()).isLessThan(preset.typicalW());
    assertThat(preset.highW()).isGreaterThan(preset.typicalW());
    assertThat(preset.thdLowPercent()).isLessThan(preset.thdHighPercent());
    assertThat(preset.powerFactorLow()).isLessThan(preset.powerFactorHigh());
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("presets")
  void correctedSuppliesHaveThePowerStageOfTheirSize(Preset preset) {
    // Critical mode up to about 300 W, continuous above: common practice, no source.
    if (CORRECTED.contains(preset.kind())) {
      assertThat(PowerStages.corrected(preset.highW())).isEqualTo(preset.kind());
    }
  }

  @Test
  void aPresetIsFoundByItsNameInAnyCase() {
    assertThat(Presets.find("Desktop computer, no PFC"))
        .map(Preset::kind)
        .contains(LoadKind.CAPACITOR_INPUT);
    assertThat(Presets.find("nothing of the kind")).isEmpty();
  }
}
