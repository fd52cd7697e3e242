package fourthwire.audit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.quantity.Conductor;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.testsupport.SmallSite;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;

/**
 * A bridge with a small capacitor behind a soft source whose half-waves differ although no even
 * order is on the supply: its audit carries the even orders. Reference: the same circuit marched in
 * time with 32,768 equal steps a cycle until it repeats, from several starts, with the diodes of
 * the public contract; own computation that shares no code with the engine.
 */
class EvenOrdersTest {
  private static final Map<String, String> TABLES =
      Map.of(
          "site.csv",
          "key,value\nname,soft\nfrequency_hz,60\npractice,iec\n",
          "supplies.csv",
          "supply,line_voltage_v,fault_level_mva,x_over_r,role,system\n"
              + "G,120,0.00191347,48.0786,normal,single-phase\n",
          "background.csv",
          "supply,order,percent,degrees\nG,3,3.64,10\nG,5,2.29,180\nG,7,0.78,162\nG,9,0.35,180\n",
          "panels.csv",
          "panel,fed_from\nP,G\n",
          "circuits.csv",
          "circuit,panel,lines\nc,P,L1\n",
          "loads.csv",
          "load,circuit,kind,quantity,rated_w,capacitance_uf_per_w,source_resistance_ohm,"
              + "source_inductance_uh,efficiency\n"
              + "x,c,capacitor-input,3,19.5,0.82,0.5941,1270.97,0.85\n");

  @Test
  @DisplayName("Three small supplies on 7.5 Ω: second harmonic, rms and power factor as marched")
  void halfWavesDiffer() {
    Survey survey = SmallSite.survey(TABLES);
    List<NodeResult> nodes =
        new HarmonicAudit(1)
            .run(new AuditRequest(survey, Optional.empty(), Map.of()), Progress.SILENT)
            .nodes();
    DesignState circuit =
        nodes.stream()
            .filter(n -> n.kind() == SiteTree.Kind.CIRCUIT)
            .findFirst()
            .flatMap(NodeResult::design)
            .orElseThrow();

    assertThat(circuit.currentSpectrum().get(Conductor.L1).magnitude(2))
        .isCloseTo(0.387, within(0.001));
    assertThat(circuit.lines().get(Conductor.L1).rmsA().value().orElseThrow())
        .isCloseTo(0.7258, within(0.002 * 0.7258));
    assertThat(circuit.power().powerFactor().value().orElseThrow()).isCloseTo(0.572, within(0.002));
  }
}
