package fourthwire.audit;

import static fourthwire.audit.SurveyBuilder.ohms;
import static fourthwire.audit.SurveyBuilder.some;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.load.RectifierReference;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.site.PhaseSystem;
import fourthwire.site.Survey;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The circuit simulator's rectifiers ({@code load/rectifiers/README.md}) entered as surveys: the
 * simulator's source impedance is the circuit's feeder, so that network and load must find each
 * other. Many of the units have no impedance of their own. Accepted as for the models alone: each
 * phasor to order 39 within 0.4 % of the fundamental, rms within 0.2 %.
 */
class RectifierSurveyTest {
  private static final double STIFF_MVA = 1e7;

  static Stream<RectifierReference> cases() {
    return RectifierReference.all().stream().filter(c -> !c.row().getField("emf").contains("a"));
  }

  @ParameterizedTest
  @MethodSource("cases")
  void aSurveyGivesTheSimulatorsCurrent(RectifierReference given) {
    AuditResult audit =
        new HarmonicAudit()
            .run(new AuditRequest(survey(given), Optional.empty(), Map.of()), Progress.SILENT);
    Spectrum computed =
        audit.nodes().stream()
            .filter(n -> n.node().equals("P:c"))
            .findFirst()
            .orElseThrow()
            .design()
            .orElseThrow()
            .currentSpectrum()
            .get(Conductor.L1);
    Spectrum simulated = given.simulated("a");
    for (int h = 1; h <= 39; h++) {
      assertThat(computed.at(h).minus(simulated.at(h)).magnitude())
          .as("order %d", h)
          .isLessThan(0.004 * simulated.magnitude(1));
    }
    assertThat(computed.rms()).isCloseTo(simulated.rms(), within(0.002 * simulated.rms()));
  }

  private static Survey survey(RectifierReference c) {
    boolean three = c.threePhase();
    double volts = c.number("V_ln_rms") * (three ? Math.sqrt(3) : 1);
    double hertz = c.number("f_Hz");
    double reactance = 2 * Math.PI * hertz * c.number("Ls_uH") * 1e-6;
    SurveyBuilder b =
        new SurveyBuilder((int) hertz)
            .supply(
                "S",
                volts,
                STIFF_MVA,
                10,
                Optional.of(three ? PhaseSystem.THREE_PHASE_4_WIRE : PhaseSystem.SINGLE_PHASE))
            .panel("P", "S", ohms(0, 0, 0, 0))
            .circuit(
                "c", "P", three ? "L1-L2-L3" : "L1", ohms(c.number("Rs_ohm"), reactance, 0, 0));
    for (String term : c.row().getField("emf").split(" ")) {
      if (!term.isEmpty()) {
        String[] part = term.split(":");
        b.background(
            "S",
            Integer.parseInt(part[0]),
            Double.parseDouble(part[1]),
            Double.parseDouble(part[2]));
      }
    }
    return b.load(
            "P",
            "c",
            kind(c),
            c.number("P_dc_W"),
            c.number("n_units"),
            Optional.empty(),
            columns(c, volts, hertz))
        .build();
  }

  private static LoadKind kind(RectifierReference c) {
    return switch (c.row().getField("kind")) {
      case "3ph_sixpulse" -> LoadKind.SIX_PULSE;
      case "3ph_twelvepulse" -> LoadKind.TWELVE_PULSE;
      default ->
          c.number("L_dc_uH") > 0 ? LoadKind.CAPACITOR_INPUT_CHOKE : LoadKind.CAPACITOR_INPUT;
    };
  }

  /** All of the rated input reaches the direct-current side: the case gives that side's watts. */
  private static ModelColumns columns(RectifierReference c, double volts, double hertz) {
    double watts = c.number("P_dc_W");
    double percentPerHenry = 100 * 2 * Math.PI * hertz * watts / (volts * volts);
    boolean three = c.threePhase();
    int bridges = kind(c) == LoadKind.TWELVE_PULSE ? 2 : 1;
    OptionalDouble none = OptionalDouble.empty();
    return new ModelColumns(
        some(1),
        some(c.number("C_uF") / watts),
        three ? some(0) : some(c.number("Rb_ohm")),
        three ? some(0) : some(c.number("Lb_uH")),
        some(3e-11),
        some(1.2),
        some(1e-3),
        three ? some(c.number("Lb_uH") * 1e-6 * percentPerHenry / bridges) : none,
        three || c.number("L_dc_uH") > 0
            ? some(c.number("L_dc_uH") * 1e-6 * percentPerHenry)
            : none,
        none,
        none,
        none,
        none,
        none);
  }
}
