package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Each preset lands in the band of distortion that its row states, with its source, and draws W.
 */
class PresetsTest {
  static Stream<Preset> presets() {
    return Presets.all().stream();
  }

  @ParameterizedTest
  @MethodSource("presets")
  void distortionLiesInTheStatedBand(Preset preset) {
    boolean three = preset.kind().family() == LoadKind.Family.THREE_PHASE;
    double v = three ? 400 : 230;
    LoadRequest request =
        new LoadRequest(
            preset.kind(),
            three ? 3 : 1,
            50,
            v,
            new LoadRequest.Rating.Watts(preset.typicalW()),
            1,
            1,
            false,
            preset.displacementFactor(),
            preset.columns(preset.typicalW(), v),
            Optional.empty());
    // A usual final circuit: 0.4 + j0.25 ohm, the reference impedance of IEC 60725 (from memory);
    // a drive's board has a tenth of it.
    double ohm = three ? 0.04 : 0.4;
    double henry = (three ? 0.025 : 0.25) / (2 * Math.PI * 50);
    Spectrum line = LoadCases.current(LoadModels.of(request), v, ohm, henry).spectrum(0);
    assertThat(100 * line.distortionRms() / line.magnitude(1))
        .as(preset.name())
        .isBetween(preset.thdLowPercent(), preset.thdHighPercent());
    assertThat(preset.source()).isNotBlank();
    assertThat(preset.lowW()).isLessThan(preset.typicalW());
    assertThat(preset.highW()).isGreaterThan(preset.typicalW());
  }

  @Test
  void aPresetIsFoundByItsNameInAnyCase() {
    assertThat(Presets.find("Desktop computer, no PFC"))
        .map(Preset::kind)
        .contains(LoadKind.CAPACITOR_INPUT);
    assertThat(Presets.find("nothing of the kind")).isEmpty();
  }
}
