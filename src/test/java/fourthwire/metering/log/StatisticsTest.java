package fourthwire.metering.log;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.metering.QuantitySummary;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Statistics against numpy 1.24.2: percentile(x, q) with its linear method, and mean. */
class StatisticsTest {
  @ParameterizedTest
  @CsvSource({
    "21, 315.6666666666667, 323.4, 162.66666666666669",
    "100, 322.73333333333335, 333.68, 169.52999999999997",
    "757, 319.06666666666666, 332.47999999999996, 168.0202553940995"
  })
  void percentilesAreLinear(int count, double p95, double p99, double mean) {
    double[] x = new double[count];
    for (int k = 0; k < count; k++) {
      x[k] = (k * 7919 % 1009) / 3.0;
    }
    QuantitySummary s = Statistics.summary(x).orElseThrow();
    assertThat(s.p95()).isEqualTo(p95, within(1e-9));
    assertThat(s.p99()).isEqualTo(p99, within(1e-9));
    assertThat(s.mean()).isEqualTo(mean, within(1e-9));
  }

  /** numpy.percentile([1, 2, 3, 4], 95) is 3.85. */
  @Test
  void blanksAreLeftOut() {
    QuantitySummary s = Statistics.summary(new double[] {4, Double.NaN, 1, 3, 2}).orElseThrow();
    assertThat(s.count()).isEqualTo(4);
    assertThat(s.p95()).isEqualTo(3.85, within(1e-12));
    assertThat(Statistics.summary(new double[] {Double.NaN})).isEmpty();
  }
}
