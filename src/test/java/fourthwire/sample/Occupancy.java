package fourthwire.sample;

import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.Schedule;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.time.LocalDateTime;
import java.util.List;

/**
 * How much of its design load a node draws at an hour of the week, after the survey's schedules.
 *
 * <p>Shares are by watts, straight between the middles of the hours; how currents add by phase is
 * not looked at. That is enough to make a believable week.
 */
final class Occupancy {
  /** Under this part of a node's watts its rectifiers do not make its neutral current. */
  private static final double HARDLY_ANY = 0.05;

  private final Survey survey;
  private final SiteTree tree;

  Occupancy(Survey survey) {
    this.survey = survey;
    this.tree = SiteTree.of(survey);
  }

  /** Of all that a node feeds. */
  double all(String node, LocalDateTime time) {
    return between(below(node), time);
  }

  /**
   * Of the equipment whose third harmonic fills the neutral; of all where there is hardly any, for
   * there the neutral carries what the lines are unequal by.
   */
  double neutral(String node, LocalDateTime time) {
    List<Load> rectifiers = below(node).stream().filter(Occupancy::isRectifier).toList();
    return designW(rectifiers) > HARDLY_ANY * designW(below(node))
        ? between(rectifiers, time)
        : all(node, time);
  }

  private static boolean isRectifier(Load load) {
    return load.kind().filter(k -> k == LoadKind.CAPACITOR_INPUT).isPresent();
  }

  private double between(List<Load> loads, LocalDateTime time) {
    LocalDateTime before = time.minusMinutes(30);
    double part = before.getMinute() / 60.0;
    return (1 - part) * share(loads, before) + part * share(loads, before.plusHours(1));
  }

  private List<Load> below(String node) {
    return survey.loads().stream().filter(l -> isBelow(node, l.circuitId())).toList();
  }

  private boolean isBelow(String node, String circuit) {
    return tree.path(circuit).stream().anyMatch(n -> n.name().equals(node));
  }

  private double share(List<Load> loads, LocalDateTime time) {
    double watts =
        loads.stream()
            .mapToDouble(l -> designW(l) * l.schedule().map(s -> scheduled(s, time)).orElse(1.0))
            .sum();
    return watts / designW(loads);
  }

  private static double designW(List<Load> loads) {
    return loads.stream().mapToDouble(Occupancy::designW).sum();
  }

  private static double designW(Load load) {
    return load.quantity() * load.ratedW().orElseThrow() * load.demandFactor().orElse(1);
  }

  private double scheduled(String schedule, LocalDateTime time) {
    Schedule.Days day =
        switch (time.getDayOfWeek()) {
          case SATURDAY -> Schedule.Days.SATURDAY;
          case SUNDAY -> Schedule.Days.SUNDAY;
          default -> Schedule.Days.WEEKDAY;
        };
    return row(schedule, day).shares().get(time.getHour());
  }

  /** The day's own row, else the one for all days. */
  private Schedule row(String schedule, Schedule.Days day) {
    List<Schedule> rows =
        survey.schedules().stream().filter(s -> s.name().equals(schedule)).toList();
    return rows.stream()
        .filter(s -> s.days() == day)
        .findFirst()
        .or(() -> rows.stream().filter(s -> s.days() == Schedule.Days.ALL).findFirst())
        .orElseThrow();
  }
}
