package fourthwire.json;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.AuditRequest;
import fourthwire.audit.NodeResult;
import fourthwire.audit.NodeSummary;
import fourthwire.audit.Progress;
import fourthwire.audit.run.HarmonicAudit;
import fourthwire.testsupport.RandomResults;
import fourthwire.testsupport.SmallSite;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.math.BigDecimal;
import java.math.MathContext;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;

/** Stored results say what the public documents say, in a fraction of their size. */
class StoredNodeTest {
  private static final double NINE_DIGITS = 0.5e-8;

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {41, 42, 43, 44, 45, 46, 47, 48})
  void aStoredResultIsThePublicDocumentToNineDigits(long seed) {
    NodeResult result = new RandomResults(seed).node("LP-2:7 %;#?\"é");

    assertSame(
        NodeJson.write(StoredNode.result(StoredNode.bytes(result))), NodeJson.write(result), "");
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {51, 52, 53})
  void aStoredRowReadsBack(long seed) {
    NodeSummary row = NodeSummary.of(new RandomResults(seed).node("LP-2"));

    assertThat(StoredNode.row(StoredNode.bytes(row))).isEqualTo(row);
  }

  @Test
  void documentsOfAuditsBeforeTheDictionaryAreReadStill() throws IOException {
    NodeResult result = new RandomResults(7).node("LP-2");
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (GZIPOutputStream zip = new GZIPOutputStream(bytes)) {
      zip.write(NodeJson.write(result).toString().getBytes(StandardCharsets.UTF_8));
    }

    assertSame(NodeJson.write(StoredNode.result(bytes.toByteArray())), NodeJson.write(result), "");
  }

  /** 18,000 circuits and 1,000 panels are to stay under 60 MB: 3.1 kB each. */
  @Test
  void aCircuitWithItsWeekTakesLittle() {
    AuditRequest request =
        new AuditRequest(SmallSite.survey("Works"), Optional.empty(), Map.of(), true, 0, 1);
    List<NodeResult> nodes = new HarmonicAudit(1).run(request, Progress.SILENT).nodes();

    assertThat(nodes)
        .filteredOn(n -> n.node().contains(":"))
        .isNotEmpty()
        .allSatisfy(
            n ->
                assertThat(StoredNode.bytes(n).length + StoredNode.bytes(NodeSummary.of(n)).length)
                    .isLessThan(3_100)
                    .isLessThan(NodeJson.write(n).toString().length() / 4));
  }

  @Test
  void roundingIsThatOfDecimalArithmetic() {
    SplittableRandom random = new SplittableRandom(3);
    for (int n = 0; n < 20_000; n++) {
      double value = (random.nextDouble() - 0.5) * Math.pow(10, random.nextInt(-13, 15));
      double exact = new BigDecimal(value).round(new MathContext(9)).doubleValue();
      assertThat(Digits.rounded(value, 9)).isCloseTo(exact, within(1e-9 * Math.abs(exact)));
      BigDecimal printed = new BigDecimal(Double.toString(Digits.rounded(value, 9)));
      assertThat(printed.stripTrailingZeros().precision()).isLessThanOrEqualTo(10);
    }
    assertThat(Digits.rounded(0, 9)).isZero();
    assertThat(Digits.rounded(99_999.999_999, 9)).isEqualTo(100_000);
  }

  private static void assertSame(JsonNode is, JsonNode expected, String path) {
    if (path.endsWith("/deg")) {
      double turned = Math.IEEEremainder(is.doubleValue() - expected.doubleValue(), 360);
      assertThat(turned).as(path).isCloseTo(0, within(NINE_DIGITS * 180));
    } else if (expected.isNumber()) {
      double value = expected.doubleValue();
      assertThat(is.doubleValue()).as(path).isCloseTo(value, within(NINE_DIGITS * Math.abs(value)));
    } else if (expected.isObject()) {
      assertThat(is.propertyNames()).as(path).isEqualTo(expected.propertyNames());
      Json.entries(expected, (name, e) -> assertSame(is.path(name), e, path + "/" + name));
    } else if (expected.isArray()) {
      assertThat(is.size()).as(path).isEqualTo(expected.size());
      for (int n = 0; n < expected.size(); n++) {
        assertSame(is.get(n), expected.get(n), path + "/" + n);
      }
    } else {
      assertThat(is).as(path).isEqualTo(expected);
    }
  }
}
