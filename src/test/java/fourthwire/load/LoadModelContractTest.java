package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What every load model owes: laws of scaling, of shifting in time, and its rated power. */
class LoadModelContractTest {
  static Stream<LoadKind> kinds() {
    return Stream.of(LoadKind.values()).filter(k -> k != LoadKind.MEASURED);
  }

  private static double watts(LoadKind kind) {
    return kind.family() == LoadKind.Family.THREE_PHASE ? 11000 : 150;
  }

  @ParameterizedTest
  @MethodSource("kinds")
  void oneUnitDrawsItsRatedPowerAtNominalVoltage(LoadKind kind) {
    LoadRequest request = LoadCases.request(kind, watts(kind), 1, 1);
    LoadModel model = LoadModels.of(request);
    double watts = NominalDraw.of(model, request).watts();
    // A dimmer's rating is its lamps' at full conduction; at 90° they draw half.
    double expected = kind == LoadKind.PHASE_DIMMER ? watts(kind) / 2 : watts(kind);
    assertThat(watts).isCloseTo(expected, within(1e-6 * expected));
  }

  @ParameterizedTest
  @MethodSource("kinds")
  void doublingUnitsEqualsHalvingImpedance(LoadKind kind) {
    double v = LoadCases.request(kind, 1, 1, 1).nominalPortV();
    double z = 0.01 * v * v / watts(kind);
    PortSpectra one =
        LoadCases.current(
            LoadModels.of(LoadCases.request(kind, watts(kind), 1, 0.8)), v, z, z / 300);
    PortSpectra two =
        LoadCases.current(
            LoadModels.of(LoadCases.request(kind, watts(kind), 2, 0.8)), v, z / 2, z / 600);
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      assertThat(two.re[0][h]).isCloseTo(2 * one.re[0][h], within(1e-9 * one.spectrum(0).rms()));
      assertThat(two.im[0][h]).isCloseTo(2 * one.im[0][h], within(1e-9 * one.spectrum(0).rms()));
    }
  }

  @ParameterizedTest
  @MethodSource("kinds")
  void aShiftInTimeTurnsEachOrderByItsMultiple(LoadKind kind) {
    LoadModel model = LoadModels.of(LoadCases.request(kind, watts(kind), 1, 1));
    double v = LoadCases.request(kind, 1, 1, 1).nominalPortV();
    double z = 0.01 * v * v / watts(kind);
    PortSpectra still = new PortSpectra(model.ports());
    PortSpectra shifted = new PortSpectra(model.ports());
    model.newSolver().solve(LoadCases.emf(model.ports(), v, 0), z, z / 300, still);
    model.newSolver().solve(LoadCases.emf(model.ports(), v, 37.3), z, z / 300, shifted);
    Spectrum from = still.spectrum(0);
    Spectrum to = shifted.spectrum(0);
    for (int h = 1; h <= 39; h++) {
      assertThat(to.at(h).minus(from.at(h).turned(37.3 * h)).magnitude())
          .as("order %d", h)
          .isLessThanOrEqualTo(0.001 * from.magnitude(1));
    }
  }

  /** Past the crossing at high load, before it at low load: no step where the paths part. */
  @ParameterizedTest
  @ValueSource(doubles = {20, 40, 80})
  void aChokeBehindASinglePhaseBridgeIsSolvedAtEveryLevel(double percent) {
    double before = 0;
    for (int level = 10; level <= 100; level += 5) {
      LoadModel model = LoadModels.of(LoadCases.choked(150, level / 100.0, percent));
      Spectrum current = LoadCases.current(model, 230, 0.5, 1e-3).spectrum(0);
      double distortion = Distortion.thdPercent(current).value().orElseThrow();
      assertThat(current.magnitude(1)).as("at %d %%", level).isPositive();
      if (level > 10) {
        assertThat(distortion).as("at %d %%", level).isCloseTo(before, within(0.25 * before));
      }
      before = distortion;
    }
    LoadRequest rated = LoadCases.choked(150, 1, percent);
    double watts = NominalDraw.of(LoadModels.of(rated), rated).watts();
    assertThat(watts).isCloseTo(150, within(1e-6 * 150));
  }

  @Test
  void impossibleParametersAreRefusedInWords() {
    assertThatThrownBy(() -> LoadModels.of(LoadCases.request(LoadKind.CAPACITOR_INPUT, -5, 1, 1)))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("rating of capacitor-input");
  }

  @Test
  void tooWeakASourceIsSaidNotGuessed() {
    LoadModel model = LoadModels.of(LoadCases.request(LoadKind.CAPACITOR_INPUT, 1000, 1, 1));
    PortSpectra current = new PortSpectra(1);
    assertThatThrownBy(() -> model.newSolver().solve(LoadCases.emf(1, 230, 0), 60, 0, current))
        .isInstanceOf(NoSteadyStateException.class)
        .hasMessageContaining("the source cannot give what the load asks for");
  }
}
