package fourthwire.load.rectifier.path;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Against the library's logarithm, which is within one unit in the last place. */
class QuickLogTest {
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2})
  void isTheLibrarysLogarithm(long seed) {
    Random r = new Random(seed);
    for (int n = 0; n < 200_000; n++) {
      check(Math.exp(r.nextDouble(-700, 700)));
      check(1 + r.nextDouble());
    }
  }

  @Test
  void isSoAtTheEdgesOfItsParts() {
    for (int k = 0; k <= 128; k++) {
      double edge = 1 + k / 128.0;
      check(edge);
      check(Math.nextUp(edge));
      check(Math.nextDown(edge));
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {Double.NaN, -1, 0, Double.MIN_VALUE, Double.POSITIVE_INFINITY})
  void leavesWhatIsNoOrdinaryNumberToTheLibrary(double x) {
    assertThat(Double.valueOf(QuickLog.of(x))).isEqualTo(Double.valueOf(Math.log(x)));
  }

  private static void check(double x) {
    double log = Math.log(x);
    assertThat(QuickLog.of(x))
        .as("ln %s", x)
        .isCloseTo(log, within(2e-15 * Math.max(1, Math.abs(log))));
  }
}
