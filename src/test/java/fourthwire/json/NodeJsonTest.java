package fourthwire.json;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.NodeResult;
import fourthwire.audit.NodeSummary;
import fourthwire.quantity.Spectrum;
import fourthwire.testsupport.RandomResults;
import org.assertj.core.api.recursive.comparison.RecursiveComparisonConfiguration;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.node.ObjectNode;

/** Documents of results read back as what was written. */
class NodeJsonTest {
  private static final double ANGLE_ROUNDING = 1e-12;

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12})
  void aResultReadsBackEqual(long seed) {
    NodeResult result = new RandomResults(seed).node("LP-2:7 %;#?\"é");

    NodeResult back = NodeJson.read(NodeJson.write(result).toString());

    assertThat(back)
        .usingRecursiveComparison(
            RecursiveComparisonConfiguration.builder()
                .withEqualsForType(NodeJsonTest::same, Spectrum.class)
                .withStrictTypeChecking(false)
                .build())
        .isEqualTo(result);
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {21, 22, 23, 24, 25, 26})
  void aRowOfTheListReadsBackEqual(long seed) {
    NodeSummary summary = NodeSummary.of(new RandomResults(seed).node("LP-2"));

    assertThat(SummaryJson.read(SummaryJson.write(summary).toString())).isEqualTo(summary);
  }

  /** A spectrum is written as magnitude and angle, so it comes back within their rounding. */
  private static boolean same(Spectrum a, Spectrum b) {
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      double rounding = ANGLE_ROUNDING * (1 + a.magnitude(h));
      assertThat(b.re(h)).isCloseTo(a.re(h), within(rounding));
      assertThat(b.im(h)).isCloseTo(a.im(h), within(rounding));
    }
    return true;
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {31, 32, 33})
  void theDocumentHasTheContractsKeys(long seed) {
    NodeResult result = supplied(seed);
    ObjectNode o = NodeJson.write(result);

    assertThat(o.propertyNames())
        .contains(
            "node",
            "kind",
            "fed_from",
            "supply",
            "design",
            "range",
            "week",
            "measured",
            "findings");
    assertThat(o.has("range_reason")).isEqualTo(o.get("range").isNull());
    assertThat(o.has("week_reason")).isEqualTo(o.get("week").isNull());
    assertThat(o.get("design").propertyNames())
        .contains(
            "current",
            "voltage",
            "spectrum",
            "voltage_spectrum",
            "power",
            "power_by_line",
            "transformer",
            "harmonic_loss_factor",
            "losses_w",
            "current_unbalance_percent",
            "zero_sequence_percent",
            "voltage_unbalance_percent",
            "resonances");
    assertThat(o.at("/design/current").propertyNames()).containsExactly("L1", "L2", "L3", "N");
    assertThat(o.at("/design/spectrum").size()).isEqualTo(50);
    assertThat(o.at("/design/spectrum/0").propertyNames())
        .containsExactly("order", "L1", "L2", "L3", "N");
    assertThat(o.at("/design/spectrum/49/N").propertyNames()).containsExactly("a", "deg");
    assertThat(o.at("/design/voltage/N").propertyNames()).contains("rms_v");
  }

  private static NodeResult supplied(long seed) {
    RandomResults results = new RandomResults(seed);
    NodeResult result = results.node("MSB");
    while (result.design().isEmpty()) {
      result = results.node("MSB");
    }
    return result;
  }
}
