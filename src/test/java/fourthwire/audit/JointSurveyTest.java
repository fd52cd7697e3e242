package fourthwire.audit;

import static fourthwire.audit.SurveyBuilder.ohms;
import static fourthwire.audit.SurveyBuilder.some;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.load.JointReference;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Feeder;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.site.PhaseSystem;
import fourthwire.site.Survey;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Rows of rectifiers that hang on one panel, a circuit each, entered as surveys: the circuit
 * simulator has them all in one circuit ({@code load/rectifiers/README.md}). Most have no impedance
 * of their own, so each shapes the others' pulses. Accepted, row by row and for the panel: each
 * phasor to order 39 within 0.2 % of the fundamental, rms within 0.1 %.
 */
class JointSurveyTest {
  private static final double STIFF_MVA = 1e7;

  /** To which part of its rms a load's current is solved ({@code CoupledSolver}). */
  private static final double SOLVED = 1e-5;

  private static final OptionalDouble NONE = OptionalDouble.empty();

  static Stream<JointReference> cases() {
    return JointReference.all().stream();
  }

  @ParameterizedTest
  @MethodSource("cases")
  void aSurveyGivesTheSimulatorsCurrents(JointReference given) {
    AuditResult audit = audit(survey(given));
    check(current(audit, "P"), given.simulated(-1));
    for (int row = 0; row < given.rows().size(); row++) {
      check(current(audit, "P:c" + row), given.simulated(row));
    }
  }

  private static void check(Spectrum computed, Spectrum simulated) {
    for (int h = 1; h <= 39; h++) {
      assertThat(computed.at(h).minus(simulated.at(h)).magnitude())
          .as("order %d", h)
          .isLessThan(0.002 * simulated.magnitude(1));
    }
    assertThat(computed.rms()).isCloseTo(simulated.rms(), within(0.001 * simulated.rms()));
  }

  /** Equal units draw the same, in whatever rows and circuits they stand: by symmetry. */
  @Test
  void aRowInTwoPartsDrawsWhatItDoesInOne() {
    Spectrum one = current(audit(lamps(List.of(25.0))), "P:c0");
    AuditResult split = audit(lamps(List.of(20.0, 5.0)));
    Spectrum large = current(split, "P:c0");
    Spectrum small = current(split, "P:c1");
    for (int h = 1; h <= 49; h++) {
      assertThat(large.at(h).minus(one.at(h).times(0.8)).magnitude())
          .as("order %d", h)
          .isLessThan(3 * SOLVED * one.rms());
      assertThat(small.at(h).minus(one.at(h).times(0.2)).magnitude())
          .as("order %d", h)
          .isLessThan(3 * SOLVED * one.rms());
    }
  }

  private static Survey lamps(List<Double> rows) {
    SurveyBuilder b = panel(50, 230, ohms(0.15, 0.09425, 0, 0));
    for (int row = 0; row < rows.size(); row++) {
      row(b, row, 60, rows.get(row), columns(1, 0, 0));
    }
    return b.build();
  }

  private static Survey survey(JointReference c) {
    double hertz = c.number(0, "f_Hz");
    double reactance = 2 * Math.PI * hertz * c.number(0, "Ls_uH") * 1e-6;
    SurveyBuilder b =
        panel((int) hertz, c.number(0, "V_rms"), ohms(c.number(0, "Rs_ohm"), reactance, 0, 0));
    for (double[] term : c.background()) {
      b.background("S", (int) term[0], term[1], term[2]);
    }
    for (int row = 0; row < c.rows().size(); row++) {
      double watts = c.number(row, "P_dc_W");
      ModelColumns columns =
          columns(c.number(row, "C_uF") / watts, c.number(row, "Rb_ohm"), c.number(row, "Lb_uH"));
      row(b, row, watts, c.number(row, "n_units"), columns);
    }
    return b.build();
  }

  private static SurveyBuilder panel(int hertz, double volts, Feeder feeder) {
    return new SurveyBuilder(hertz)
        .supply("S", volts, STIFF_MVA, 10, Optional.of(PhaseSystem.SINGLE_PHASE))
        .panel("P", "S", feeder);
  }

  private static void row(
      SurveyBuilder b, int row, double watts, double units, ModelColumns columns) {
    b.circuit("c" + row, "P", "L1", ohms(0, 0, 0, 0))
        .load("P", "c" + row, LoadKind.CAPACITOR_INPUT, watts, units, Optional.empty(), columns);
  }

  /** All of the rated input reaches the direct-current side: the case gives that side's watts. */
  private static ModelColumns columns(double microfaradPerW, double ohm, double microhenry) {
    return new ModelColumns(
        some(1),
        some(microfaradPerW),
        some(ohm),
        some(microhenry),
        some(3e-11),
        some(1.2),
        some(1e-3),
        NONE,
        NONE,
        NONE,
        NONE,
        NONE,
        NONE,
        NONE);
  }

  private static AuditResult audit(Survey survey) {
    return new HarmonicAudit()
        .run(new AuditRequest(survey, Optional.empty(), Map.of()), Progress.SILENT);
  }

  private static Spectrum current(AuditResult audit, String node) {
    return audit.nodes().stream()
        .filter(n -> n.node().equals(node))
        .findFirst()
        .orElseThrow()
        .design()
        .orElseThrow()
        .currentSpectrum()
        .get(Conductor.L1);
  }
}
