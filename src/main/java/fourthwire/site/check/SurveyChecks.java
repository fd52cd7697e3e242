package fourthwire.site.check;

import fourthwire.site.Survey;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Checks a survey as a whole, the public contract, section 2: names, the tree and its conductors
 * and voltages, loads on their circuits, spectra and schedules, banks, filters, feeders, shared
 * neutrals.
 *
 * <p>One mistake gives one error. What depends on a damaged cell is not looked at, what depends on
 * a reported error is not reported again, and rows that all suffer from one cause are named
 * together in one error.
 */
public final class SurveyChecks {
  private SurveyChecks() {}

  /**
   * What the checks found.
   *
   * @param survey the survey with every reference resolved; empty where there is an error, here or
   *     in the draft
   */
  public record Result(List<SurveyError> errors, List<String> warnings, Optional<Survey> survey) {}

  /** Checks a draft. */
  public static Result check(SurveyDraft draft, PresetKinds presets) {
    Remarks remarks = new Remarks();
    NodeIndex nodes = new NodeIndex(draft, remarks);
    CircuitIndex circuits = new CircuitIndex(draft.circuits(), remarks);
    Map<String, Wiring> wirings = new TreeCheck(draft, nodes, circuits, remarks).check();
    References references = new References(draft, nodes, circuits, remarks);
    new SupplyCheck(draft, nodes, wirings, remarks).check();
    CircuitCheck circuitCheck = new CircuitCheck(draft, nodes, wirings, remarks);
    circuitCheck.check();
    SpectrumCheck spectra = new SpectrumCheck(draft.spectra(), remarks);
    spectra.check();
    ScheduleCheck schedules = new ScheduleCheck(draft.schedules(), remarks);
    schedules.check();
    new LoadCheck(draft, presets, spectra, schedules, references, circuitCheck, remarks).check();
    new EquipmentCheck(draft, nodes, wirings, references, remarks).check();
    new FeederCheck(draft, remarks).check();
    new SharedNeutralCheck(draft.circuits(), circuitCheck.ownLines(), remarks).check();
    List<SurveyError> errors = remarks.errors();
    boolean sound = errors.isEmpty() && draft.isSound();
    return new Result(
        errors,
        remarks.warnings(),
        sound
            ? Optional.of(new Assembly(draft, nodes, circuits, circuitCheck.ownLines()).survey())
            : Optional.empty());
  }
}
