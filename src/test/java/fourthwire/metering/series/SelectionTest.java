package fourthwire.metering.series;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Percentiles are those of the sorted values (Hyndman and Fan, 1996, definition 7). */
class SelectionTest {
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void percentilesOfValuesInAnyOrder(long seed) {
    Random random = new Random(seed);
    for (int turn = 0; turn < 300; turn++) {
      int n = 1 + (turn % 3 == 0 ? random.nextInt(6000) : random.nextInt(300));
      double[] x = values(random, n);
      int before = random.nextInt(5);
      double[] among = new double[n + before + 3];
      System.arraycopy(x, 0, among, before, n);
      Arrays.sort(x);
      double[] found = Selection.percentiles(among, before, before + n, 95, 99);
      assertThat(found[0]).isEqualTo(percentile(x, 95));
      assertThat(found[1]).isEqualTo(percentile(x, 99));
    }
  }

  /** Any, few different, rising, falling, and periodic as days are. */
  private static double[] values(Random random, int n) {
    int kind = random.nextInt(5);
    double[] x = new double[n];
    for (int k = 0; k < n; k++) {
      x[k] =
          switch (kind) {
            case 0 -> random.nextGaussian();
            case 1 -> random.nextInt(4);
            case 2 -> k;
            case 3 -> -k;
            default -> k % 20 == 0 ? 100 + random.nextDouble() : random.nextDouble();
          };
    }
    return x;
  }

  private static double percentile(double[] sorted, double percent) {
    double position = (sorted.length - 1) * percent / 100;
    int below = (int) position;
    double next = sorted[Math.min(below + 1, sorted.length - 1)];
    return sorted[below] + (position - below) * (next - sorted[below]);
  }
}
