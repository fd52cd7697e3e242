package fourthwire.json;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.metering.CaptureResult;
import fourthwire.testsupport.SmallCapture;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.node.ObjectNode;

/** What a capture says is read back as it was written, by a later edition too. */
class CaptureJsonTest {
  private final CaptureResult capture = SmallCapture.reading().capture().orElseThrow();

  @Test
  void theWaveformsComeBack() {
    ObjectNode written = Json.object();
    WaveformJson.write(written, capture);
    assertThat(WaveformJson.picture(written)).isEqualTo(capture.picture());
    assertThat(WaveformJson.closeUp(written)).isEqualTo(capture.closeUp());
    assertThat(capture.closeUp().lengthS()).isBetween(0.04, 0.041);
  }

  /** One stored before the first cycles were kept has none. */
  @Test
  void anEarlierDocumentHasNoFirstCycles() {
    ObjectNode written = Json.object();
    WaveformJson.write(written, capture);
    written.remove("first_cycles");
    assertThat(WaveformJson.closeUp(written).channels()).isEmpty();
  }
}
