package fourthwire.audit.week;

import fourthwire.audit.AuditFailedException;
import fourthwire.audit.Progress;
import fourthwire.audit.WeekState;
import fourthwire.audit.judge.AuditContext;
import fourthwire.audit.judge.NodeFigures;
import fourthwire.audit.judge.SiteState;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.Place;
import fourthwire.load.DesignPowers;
import fourthwire.site.Load;
import fourthwire.site.Schedule;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * Solves the week of a site on its normal supply: hours at which every schedule asks for the same
 * share are one state, solved once, with the loads at {@code demand_factor} times that share.
 *
 * <p>The demand currents that TDD stands on, fault levels and resonances stay the design state's.
 */
public final class Week {
  private final SiteState.Source states;
  private final AuditContext design;
  private final List<WeekHours.Alike> groups;
  private final ScheduledLoads loads;
  private final List<Place> places;

  /**
   * The week around a design state.
   *
   * @param states solves the hours
   * @param design the design state as it is judged
   * @param devices its loads
   * @param known powers of the loads found for it
   */
  public Week(
      SiteState.Source states, AuditContext design, List<Device> devices, DesignPowers known) {
    this.states = states;
    this.design = design;
    this.groups = WeekHours.of(schedulesInUse(states.survey()));
    this.loads = new ScheduledLoads(devices, known);
    this.places = design.plan().places();
  }

  private static List<Schedule> schedulesInUse(Survey survey) {
    Set<String> used =
        survey.loads().stream()
            .map(Load::schedule)
            .flatMap(Optional::stream)
            .collect(Collectors.toSet());
    return survey.schedules().stream().filter(s -> used.contains(s.name())).toList();
  }

  /**
   * Every node's week, by name.
   *
   * @throws AuditFailedException where an hour can't be solved, naming it
   */
  public Map<String, WeekState> solve(Progress progress) {
    List<NodeTally> tallies = new ArrayList<>();
    places.forEach(place -> tallies.add(new NodeTally(groups.size())));
    for (int g = 0; g < groups.size(); g++) {
      fill(g, tallies, progress);
    }
    Map<String, WeekState> weeks = new HashMap<>();
    for (int p = 0; p < places.size(); p++) {
      WeekState week = tallies.get(p).week(groups, basis(), states.survey().settings());
      weeks.put(places.get(p).name(), week);
    }
    return weeks;
  }

  private void fill(int group, List<NodeTally> tallies, Progress progress) {
    AuditContext hour = solve(group, progress);
    states
        .workers()
        .each(
            places.size(),
            p -> {
              Place place = hour.plan().get(places.get(p).name());
              tallies.get(p).put(group, new NodeFigures(hour, place));
            });
  }

  private AuditContext solve(int group, Progress progress) {
    WeekHours.Alike hours = groups.get(group);
    if (hours.shares().values().stream().allMatch(share -> share == 1)) {
      return design;
    }
    String message = "Solving the week, %d of %d different hours".formatted(group, groups.size());
    progress.at((double) group / groups.size(), message);
    try {
      SiteState state =
          states.solve(
              loads.at(hours.shares()),
              (share, pass) -> progress.at((group + share) / groups.size(), message));
      return design.hour(state.plan(), state.solution());
    } catch (AuditFailedException e) {
      throw new AuditFailedException(hours.name() + ": " + e.getMessage(), e);
    }
  }

  private String basis() {
    if (groups.size() == 1) {
      return "No schedule changes through the week: every hour is alike.";
    }
    return "Each load at its schedule's share of its demand; %d different hours solved."
        .formatted(groups.size());
  }
}
