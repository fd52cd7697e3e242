package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.LoadRequest.Rating;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Every power supply draws its rating at nominal voltage: exact by definition (contract, 3). */
class DesignPowerTest {
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2})
  void twoThousandSuppliesDrawTheirRating(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (int n = 0; n < 2000; n++) {
      LoadRequest request = supply(random);
      double watts = NominalDraw.of(LoadModels.of(request), request).watts();
      double rated = ((Rating.Watts) request.rating()).w();
      assertThat(watts)
          .as("seed %d, number %d: %s", seed, n, request)
          .isCloseTo(rated, within(1e-4 * rated));
    }
  }

  private static LoadRequest supply(SplittableRandom random) {
    double watts = random.nextDouble(25, 120);
    double ohm = random.nextDouble(.01, .03) * 230 * 230 / watts;
    ModelColumns columns =
        ModelColumns.NONE
            .with(ModelColumns.Column.CAPACITANCE_UF_PER_W, random.nextDouble(.7, 1.6))
            .with(ModelColumns.Column.SOURCE_RESISTANCE_OHM, ohm);
    return new LoadRequest(
        LoadKind.CAPACITOR_INPUT,
        1,
        50,
        400 / Math.sqrt(3),
        new Rating.Watts(watts),
        1,
        1,
        true,
        OptionalDouble.empty(),
        columns,
        Optional.empty());
  }
}
