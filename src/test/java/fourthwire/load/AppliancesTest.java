package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.site.LoadKind;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

/**
 * Presets against published spectra of such appliances, order by order: measured ones where there
 * are any, ranges recalled from the trade's literature, independent computations of the same
 * circuit. The band beside each figure is the published range, or the agreement that its row
 * states.
 */
class AppliancesTest {

  @ParameterizedTest(name = "{0}, order {2}: {3} to {4} %")
  @CsvFileSource(resources = "/load/appliances.csv", numLinesToSkip = 1, delimiter = ';')
  void aPresetLooksLikeWhatIsPublished(
      String name, double supplyPercent, int order, double low, double high, String published) {
    Preset preset = Presets.find(name).orElseThrow();
    boolean three = preset.kind().family() == LoadKind.Family.THREE_PHASE;
    double volts = three ? 400 : 230;
    LoadRequest request = LoadCases.request(preset, preset.typicalW(), volts, 50, 1);
    double ohm = supplyPercent / 100 * volts * volts / preset.typicalW();
    Terminal drawn =
        Terminal.of(
            LoadModels.of(request),
            LoadCases.emf(three ? 3 : 1, volts, 0),
            50,
            ohm / 10,
            ohm / (2 * Math.PI * 50));
    assertThat(drawn.orderPercent(order)).as(published).isBetween(low - 1e-9, high + 1e-9);
  }
}
