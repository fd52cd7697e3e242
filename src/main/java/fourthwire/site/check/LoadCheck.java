package fourthwire.site.check;

import fourthwire.site.Circuit;
import fourthwire.site.Lines;
import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.Schedule;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.regex.Pattern;

/** Whether each load says what it is and how large, and fits its circuit. */
final class LoadCheck {
  private static final String KIND = "kind";
  private static final String PRESET = "preset";
  private static final String SPECTRUM = "spectrum";
  private static final String SCHEDULE = "schedule";
  private static final List<String> RATINGS = List.of("rated_w", "rated_va", "rated_a");
  private static final int THREE_LINES = 3;
  private static final Pattern UPS =
      Pattern.compile("\\bups\\b|uninterruptible", Pattern.CASE_INSENSITIVE);

  private final DraftTable<Load> table;
  private final PresetKinds presets;
  private final SpectrumCheck spectra;
  private final DraftTable<SpectrumRow> spectraTable;
  private final ScheduleCheck schedules;
  private final DraftTable<Schedule> scheduleTable;
  private final References references;
  private final CircuitCheck circuits;
  private final Remarks remarks;

  LoadCheck(
      SurveyDraft draft,
      PresetKinds presets,
      SpectrumCheck spectra,
      ScheduleCheck schedules,
      References references,
      CircuitCheck circuits,
      Remarks remarks) {
    this.table = draft.loads();
    this.presets = presets;
    this.spectra = spectra;
    this.spectraTable = draft.spectra();
    this.schedules = schedules;
    this.scheduleTable = draft.schedules();
    this.references = references;
    this.circuits = circuits;
    this.remarks = remarks;
  }

  void check() {
    table.rows().forEach(this::check);
    if (table.rows().isEmpty() && table.state() != DraftTable.State.UNREADABLE) {
      remarks.warning("no loads: nothing will flow.");
    }
  }

  private void check(DraftRow<Load> row) {
    Load load = row.content();
    Optional<DraftRow<Circuit>> circuit =
        row.sound("circuit", "panel")
            ? references.circuit(row, load.circuit(), load.panel())
            : Optional.empty();
    if (row.sound(KIND, PRESET, SPECTRUM)) {
      Optional<LoadKind> kind = kind(row);
      circuit
          .filter(circuits::hasGoodLines)
          .ifPresent(c -> kind.ifPresent(k -> checkFit(row, k, c.content().lines())));
    }
    checkRating(row);
    checkSchedule(row);
    checkValues(row);
    warnOfUps(row);
  }

  /** The kind the row settles on, reported where it settles on none or on several. */
  private Optional<LoadKind> kind(DraftRow<Load> row) {
    Load load = row.content();
    boolean measured = load.kind().filter(k -> k == LoadKind.MEASURED).isPresent();
    List<String> given = new ArrayList<>();
    load.kind().filter(k -> k != LoadKind.MEASURED).ifPresent(k -> given.add(KIND));
    load.preset().ifPresent(p -> given.add(PRESET));
    load.spectrum().ifPresent(s -> given.add(SPECTRUM));
    if (given.size() > 1 || (measured && load.preset().isPresent())) {
      remarks.error(
          row,
          given.get(given.size() - 1),
          "Only one of kind, preset and spectrum says what a load is; leave the others empty. (The"
              + " kind measured may stand beside a spectrum.)");
      return Optional.empty();
    }
    if (given.isEmpty()) {
      remarks.error(
          row,
          measured ? SPECTRUM : KIND,
          measured
              ? "A measured load needs the name of its spectrum."
              : "One of kind, preset and spectrum must say what the load is.");
      return Optional.empty();
    }
    return switch (given.get(0)) {
      case PRESET -> preset(row, load.preset().orElseThrow());
      case SPECTRUM -> measured(row, load.spectrum().orElseThrow());
      default -> load.kind();
    };
  }

  private Optional<LoadKind> preset(DraftRow<Load> row, String preset) {
    Optional<LoadKind> kind = presets.kindOf(preset);
    if (kind.isEmpty()) {
      String hint = Closest.hint(preset, presets.names());
      remarks.error(
          "preset " + preset,
          row,
          PRESET,
          "No preset is called \"%s\".".formatted(preset)
              + (hint.isEmpty()
                  ? " Known are: " + String.join("; ", presets.names()) + "."
                  : hint));
    }
    return kind;
  }

  private Optional<LoadKind> measured(DraftRow<Load> row, String spectrum) {
    if (spectra.has(spectrum)) {
      return Optional.of(LoadKind.MEASURED);
    }
    if (spectraTable.state() == DraftTable.State.ABSENT) {
      remarks.missingTable("spectra", row, SPECTRUM, "");
    } else if (!spectraTable.mayHide(SPECTRUM)) {
      remarks.error(
          "spectrum " + spectrum,
          row,
          SPECTRUM,
          "No spectrum is called \"%s\".".formatted(spectrum)
              + Closest.hint(spectrum, spectra.names()));
    }
    return Optional.empty();
  }

  private void checkFit(DraftRow<Load> row, LoadKind kind, Lines lines) {
    String column = row.content().preset().isPresent() ? PRESET : KIND;
    boolean threeLines = lines.lines().size() == THREE_LINES;
    boolean delta = threeLines && !lines.hasNeutral();
    if (kind.family() == LoadKind.Family.THREE_PHASE && !threeLines) {
      remarks.error(
          row,
          column,
          "The kind %s is a three-phase one and needs L1-L2-L3 or L1-L2-L3-N; its circuit has %s."
              .formatted(kind.word(), lines.word()));
    } else if (kind.family() == LoadKind.Family.SINGLE_PHASE && delta) {
      remarks.error(
          row,
          column,
          ("The kind %s is a single-phase one and can't stand on L1-L2-L3; only resistive and linear"
                  + " can, in delta. Accepted are one or two lines, or L1-L2-L3-N.")
              .formatted(kind.word()));
    } else if (kind == LoadKind.MEASURED && delta) {
      OptionalInt order = spectra.zeroSequenceOrder(row.content().spectrum().orElse(""));
      if (order.isPresent()) {
        remarks.error(
            row,
            SPECTRUM,
            ("The spectrum has order %d, which is of zero sequence and needs a neutral; its circuit"
                    + " %s has none.")
                .formatted(order.getAsInt(), lines.word()));
      }
    }
  }

  private void checkRating(DraftRow<Load> row) {
    if (!row.sound(RATINGS.toArray(String[]::new))) {
      return;
    }
    List<String> given = RATINGS.stream().filter(c -> !row.cell(c).isEmpty()).toList();
    if (given.isEmpty()) {
      remarks.error(row, RATINGS.get(0), "One of rated_w, rated_va and rated_a must be given.");
    } else if (given.size() > 1) {
      remarks.error(
          row,
          given.get(1),
          "Only one of rated_w, rated_va and rated_a can be given; %s is already."
              .formatted(given.get(0)));
    }
  }

  private void checkSchedule(DraftRow<Load> row) {
    Optional<String> schedule = row.content().schedule();
    if (schedule.isEmpty()
        || schedules.names().contains(schedule.get())
        || scheduleTable.mayHide(SCHEDULE)) {
      return;
    }
    if (scheduleTable.state() == DraftTable.State.ABSENT) {
      remarks.missingTable("schedules", row, SCHEDULE, "");
      return;
    }
    remarks.error(
        "schedule " + schedule.get(),
        row,
        SCHEDULE,
        "No schedule is called \"%s\".".formatted(schedule.get())
            + Closest.hint(schedule.get(), schedules.names()));
  }

  private void checkValues(DraftRow<Load> row) {
    Load load = row.content();
    if (load.displacementFactor().isPresent() && load.displacementFactor().getAsDouble() == 0) {
      remarks.error(
          row,
          "displacement_factor",
          "0 is no displacement factor. Accepted are above 0 to 1 lagging, -1 to below 0 leading.");
    }
    if (load.lowW().isEmpty() || load.highW().isEmpty()) {
      return;
    }
    double low = load.lowW().getAsDouble();
    double high = load.highW().getAsDouble();
    if (low > high) {
      remarks.error(
          row,
          "high_w",
          "high_w must be at least low_w, which is %s.".formatted(row.cell("low_w")));
    } else if (load.ratedW().isPresent()
        && (load.ratedW().getAsDouble() < low || load.ratedW().getAsDouble() > high)) {
      remarks.warning(row, "rated_w is not between low_w and high_w.");
    }
  }

  private void warnOfUps(DraftRow<Load> row) {
    Load load = row.content();
    boolean ups =
        UPS.matcher(load.name()).find()
            || load.preset().filter(p -> UPS.matcher(p).find()).isPresent();
    if (ups) {
      remarks.warning(
          row,
          "\"%s\" is taken as the load that its input is; what it feeds is not modelled, so leave"
                  .formatted(load.name())
              + " out the panels downstream of it.");
    }
  }
}
