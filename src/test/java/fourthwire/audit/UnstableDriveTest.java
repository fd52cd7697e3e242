package fourthwire.audit;

import static fourthwire.audit.SurveyBuilder.ohms;
import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.site.ModelColumns.Column;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/**
 * A drive whose state holds only by its control is given with that said, at its circuit and at the
 * board that feeds it.
 */
class UnstableDriveTest {
  @Test
  void whatHoldsOnlyByControlSaysSo() {
    Map<String, NodeResult> nodes = new java.util.HashMap<>();
    for (NodeResult node : audit().nodes()) {
      nodes.put(node.node(), node);
    }
    assertThat(said(nodes, "P:fan")).hasSize(1);
    assertThat(said(nodes, "P:fan").get(0)).startsWith("six-pulse 1: ");
    assertThat(said(nodes, "P")).isEqualTo(said(nodes, "P:fan"));
    assertThat(said(nodes, "P:pump")).isEmpty();
    assertThat(said(nodes, "S")).isEmpty();
  }

  private static List<String> said(Map<String, NodeResult> nodes, String node) {
    return nodes.get(node).assumptions().stream()
        .filter(a -> a.contains("would not hold by itself"))
        .toList();
  }

  private static AuditResult audit() {
    SurveyBuilder b =
        new SurveyBuilder(50).supply("S", 400, 10, 10).panel("P", "S", ohms(0.02, 0.02, 0, 0));
    drive(b, "fan", ModelColumns.NONE.with(Column.DC_CHOKE_PERCENT, 4));
    drive(b, "pump", ModelColumns.NONE);
    return new HarmonicAudit()
        .run(new AuditRequest(b.build(), Optional.empty(), Map.of()), Progress.SILENT);
  }

  private static void drive(SurveyBuilder b, String circuit, ModelColumns columns) {
    b.circuit(circuit, "P", "L1-L2-L3", ohms(0.01, 0.002, 0, 0))
        .load("P", circuit, LoadKind.SIX_PULSE, 5500, 1, Optional.empty(), columns);
  }
}
