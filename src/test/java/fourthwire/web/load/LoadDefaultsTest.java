package fourthwire.web.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.LoadRequest;
import fourthwire.load.trial.LoadTrial;
import fourthwire.load.trial.TrialResult;
import fourthwire.load.trial.TrialSource;
import fourthwire.quantity.Distortion;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** What the page says an empty field stands for is what the engine takes for it. */
class LoadDefaultsTest {
  static Stream<Arguments> fields() {
    return Stream.of(LoadKind.values())
        .flatMap(kind -> ModelField.of(kind).stream().map(field -> Arguments.of(kind, field)));
  }

  /** The own resistance is said in ohms of the rated input, while the engine has that of the DC. */
  @ParameterizedTest
  @MethodSource("fields")
  void typedOrLeftEmptyIsTheSame(LoadKind kind, ModelField field) {
    for (double low : new double[] {0, 1}) {
      double volts =
          LoadDefaults.volts(kind.family() == LoadKind.Family.THREE_PHASE, 50 + 10 * low);
      OptionalDouble value = LoadDefaults.of(field, kind, volts, LoadDefaults.watts(kind));
      if (value.isPresent()) {
        double empty = thd(kind, volts, ModelColumns.NONE);
        double typed = thd(kind, volts, ModelField.columns(Map.of(field, value.getAsDouble())));
        double tolerance = field == ModelField.SOURCE_RESISTANCE ? 0.02 * empty : 1e-6 * empty;
        assertThat(typed).as("%s at %s V", value, volts).isCloseTo(empty, within(tolerance));
      }
    }
  }

  private static double thd(LoadKind kind, double volts, ModelColumns columns) {
    boolean three = kind.family() == LoadKind.Family.THREE_PHASE;
    TrialResult result =
        LoadTrial.solve(
            new LoadRequest(
                kind,
                three ? 3 : 1,
                volts == 120 || volts == 480 ? 60 : 50,
                volts,
                new LoadRequest.Rating.Watts(LoadDefaults.watts(kind)),
                1,
                1,
                kind.runsAtLowerPower(),
                OptionalDouble.empty(),
                columns,
                Optional.empty()),
            TrialSource.ideal(volts));
    return Distortion.thdPercent(result.first()).value().orElseThrow();
  }
}
