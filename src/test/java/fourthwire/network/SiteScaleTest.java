package fourthwire.network;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Laws on a generated site with thousands of circuits (Kirchhoff; conservation of power). */
class SiteScaleTest {
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3})
  @DisplayName("300 panels, 6,000 circuits: Kirchhoff's laws and power balance within 1e-8")
  void obeysLaws(long seed) {
    SiteScaleNetwork site = new SiteScaleNetwork(300, seed);
    for (int order : new int[] {1, 3, 25, 49}) {
      Excitation excitation = site.excitation(order, seed);
      FactoredOrder factored = site.network.factor(order);
      SolutionCheck check = factored.check(excitation, factored.solve(excitation));
      assertThat(check.worst()).as("order %d: %s", order, check).isLessThanOrEqualTo(1e-8);
    }
  }

  @Test
  @DisplayName(
      "Orders solved by several threads at once are what one thread finds, to the last bit")
  void threads() {
    SiteScaleNetwork site = new SiteScaleNetwork(100, 5);
    List<Double> alone = feeds(site, IntStream.range(0, 50).filter(h -> h % 2 != 0));
    List<Double> together = feeds(site, IntStream.range(0, 50).filter(h -> h % 2 != 0).parallel());
    assertThat(together).isEqualTo(alone);
  }

  private static List<Double> feeds(SiteScaleNetwork site, IntStream orders) {
    return orders
        .mapToObj(h -> site.network.factor(h).solve(site.excitation(h, 9)).current(0, 3).re())
        .toList();
  }
}
