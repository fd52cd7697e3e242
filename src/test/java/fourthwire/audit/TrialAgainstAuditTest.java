package fourthwire.audit;

import static fourthwire.audit.SurveyBuilder.ohms;
import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.audit.run.HarmonicAudit;
import fourthwire.load.LoadRequest;
import fourthwire.load.trial.LoadTrial;
import fourthwire.load.trial.TrialResult;
import fourthwire.load.trial.TrialSource;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.site.PhaseSystem;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * The load model page's solution beside the audit's, which finds the same state by Newton's method
 * on a network: equipment at the end of a feeder, on a distorted supply. An audit's own tolerance
 * is 1e-4 of the current; angles are each against the equipment's own voltage.
 */
class TrialAgainstAuditTest {
  private static final double STIFF_MVA = 1e9;

  @ParameterizedTest
  @CsvSource({
    "capacitor-input,      150,   5, 0.3, 0.2",
    "capacitor-input-choke,150,   5, 0.3, 0.2",
    "pfc-critical,         60,   60, 0.1, 0.3",
    "pfc-continuous,       2000,  2, 0.3, 0.2",
    "phase-dimmer,         500,   3, 0.4, 0.25",
    "magnetic-ballast,     44,   20, 0.4, 0.25",
    "linear,               2000,  1, 0.5, 0.5",
    "six-pulse,            7500,  2, 0.05, 0.08",
    "twelve-pulse,         45000, 1, 0.02, 0.05",
    "motor,                5500,  2, 0.05, 0.08",
    "active-front-end,     15000, 1, 0.05, 0.08",
  })
  void anAuditFindsTheSame(String word, double watts, int units, double ohm, double reactance) {
    LoadKind kind = LoadKind.find(word).orElseThrow();
    boolean three = kind.family() == LoadKind.Family.THREE_PHASE;
    DesignState audited = audited(kind, watts, units, ohm, reactance);
    TrialResult tried = tried(kind, watts, units, ohm, reactance);
    Spectrum current = audited.currentSpectrum().get(Conductor.L1);
    double degrees = voltageDegrees(audited, three);
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      Phasor own = current.at(h).turned(-h * degrees);
      assertThat(own.minus(tried.first().at(h)).magnitude())
          .as("order %d", h)
          .isLessThan(2e-4 * current.magnitude(1));
    }
  }

  /** Of the terminal: line to neutral, or 30° behind the line-to-line voltage of three wires. */
  private static double voltageDegrees(DesignState audited, boolean three) {
    return three
        ? audited.voltageSpectrum().get("L1-L2").at(1).degrees() - 30
        : audited.voltageSpectrum().get("L1").at(1).degrees();
  }

  private static DesignState audited(
      LoadKind kind, double watts, int units, double ohm, double reactance) {
    boolean three = kind.family() == LoadKind.Family.THREE_PHASE;
    var survey =
        new SurveyBuilder(50)
            .supply(
                "S",
                three ? 400 : 230,
                STIFF_MVA,
                10,
                Optional.of(three ? PhaseSystem.THREE_PHASE_4_WIRE : PhaseSystem.SINGLE_PHASE))
            .background("S", 5, 3, 170)
            .background("S", 7, 1.5, 20)
            .panel("P", "S", ohms(0, 0, 0, 0))
            .circuit("c", "P", three ? "L1-L2-L3" : "L1", ohms(ohm, reactance, 0, 0))
            .load("P", "c", kind, watts, units)
            .build();
    return new HarmonicAudit()
        .run(new AuditRequest(survey, Optional.empty(), Map.of()), Progress.SILENT).nodes().stream()
            .filter(n -> n.node().equals("P:c"))
            .findFirst()
            .orElseThrow()
            .design()
            .orElseThrow();
  }

  private static TrialResult tried(
      LoadKind kind, double watts, int units, double ohm, double reactance) {
    boolean three = kind.family() == LoadKind.Family.THREE_PHASE;
    Spectrum background =
        Spectrum.of(
            h -> h == 5 ? Phasor.polar(0.03, 170) : h == 7 ? Phasor.polar(0.015, 20) : Phasor.ZERO);
    return LoadTrial.solve(
        new LoadRequest(
            kind,
            three ? 3 : 1,
            50,
            three ? 400 : 230,
            new LoadRequest.Rating.Watts(watts),
            units,
            1,
            kind.runsAtLowerPower(),
            kind == LoadKind.LINEAR ? OptionalDouble.of(0.8) : OptionalDouble.empty(),
            ModelColumns.NONE,
            Optional.empty()),
        new TrialSource(three ? 400 : 230, ohm, reactance / (100 * Math.PI), background));
  }
}
