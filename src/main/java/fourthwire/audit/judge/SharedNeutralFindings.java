package fourthwire.audit.judge;

import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Severity;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.site.Circuit;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/** Finds circuits of one line that share one neutral: there their currents add. */
final class SharedNeutralFindings {
  private final Map<String, List<Finding>> byPanel = new HashMap<>();

  SharedNeutralFindings(Survey survey) {
    Map<String, List<Circuit>> groups =
        survey.circuits().stream()
            .filter(c -> c.sharedNeutral().isPresent())
            .collect(Collectors.groupingBy(c -> c.panel() + "/" + c.sharedNeutral().orElseThrow()));
    groups.values().forEach(this::look);
  }

  private void look(List<Circuit> group) {
    Map<Conductor, List<String>> byLine = new HashMap<>();
    for (Circuit circuit : group) {
      for (Conductor line : circuit.lines().lines()) {
        byLine.computeIfAbsent(line, l -> new ArrayList<>()).add(circuit.name());
      }
    }
    byLine.forEach(
        (line, names) -> {
          if (names.size() > 1) {
            byPanel
                .computeIfAbsent(group.get(0).panel(), p -> new ArrayList<>())
                .add(finding(line, names));
          }
        });
  }

  private static Finding finding(Conductor line, List<String> names) {
    Figure information = Figure.unknown("information, held against no limit");
    return new Finding(
        FindingCode.SHARED_NEUTRAL_SAME_LINE.word(),
        Severity.WATCH,
        Figure.of(names.size()),
        Figure.of(1),
        "circuits",
        information,
        "IEC 60364-5-52:2009, clause 521.8 (from memory)",
        "Circuits %s stand on %s and share one neutral: their whole currents add in it."
            .formatted(String.join(", ", names), line));
  }

  /** Those at a panel. */
  List<Finding> at(String panel) {
    return List.copyOf(byPanel.getOrDefault(panel, List.of()));
  }
}
