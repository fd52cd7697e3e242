package fourthwire.json;

import fourthwire.metering.SeriesRepository;
import fourthwire.metering.reduce.DayCoverage;
import fourthwire.metering.reduce.StepPercentiles;
import fourthwire.metering.reduce.StepValues;
import fourthwire.metering.reduce.TimeSteps;
import fourthwire.metering.series.WeekClock;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.List;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** A log's rows as scripts get them: reduced to steps of time, by day and by week. */
public final class SeriesJson {
  private static final double[] PERCENTS = {50, 95, 99};

  private SeriesJson() {}

  /** A quantity over a span: each step with its least, mean and largest value. */
  public static ObjectNode series(String quantity, StepValues values, ZoneId zone) {
    TimeSteps steps = values.steps();
    ObjectNode o = Json.object().put("quantity", quantity);
    o.put("from", moment(steps.from(), zone)).put("to", moment(steps.to(), zone));
    o.put("step", steps.length().toString());
    ArrayNode list = o.putArray("steps");
    for (int k = 0; k < steps.count(); k++) {
      ObjectNode step = list.addObject().put("start", moment(steps.edge(k), zone));
      step.put("count", values.count(k));
      put(step, "min", values.min(k));
      put(step, "mean", values.mean(k));
      put(step, "max", values.max(k));
    }
    return o;
  }

  /** A quantity by week, by day and by hour of the week. */
  public static ObjectNode weeks(
      String quantity, SeriesRepository.Weeks weeks, StepPercentiles days, ZoneId zone) {
    ObjectNode o = Json.object().put("quantity", quantity);
    ArrayNode byWeek = o.putArray("weeks");
    for (int w = 0; w < weeks.weekCount().length; w++) {
      LocalDate monday = LocalDate.ofEpochDay(WeekClock.monday(weeks.firstWeek() + w));
      ObjectNode week = byWeek.addObject().put("start", monday.toString());
      week.put("count", (long) weeks.weekCount()[w]);
      put(week, "p95", weeks.weekP95()[w]);
      put(week, "p99", weeks.weekP99()[w]);
    }
    ArrayNode byDay = o.putArray("days");
    for (int d = 0; d < days.steps().count(); d++) {
      LocalDate date = LocalDate.ofInstant(Instant.ofEpochMilli(days.steps().edge(d)), zone);
      ObjectNode day = byDay.addObject().put("date", date.toString());
      double[] p = days.of(d, PERCENTS);
      day.put("count", days.count(d));
      put(day, "p50", p[0]);
      put(day, "p95", p[1]);
      put(day, "p99", p[2]);
    }
    ArrayNode hours = o.putArray("hour_of_week");
    for (double mean : weeks.hourOfWeekMean()) {
      if (Double.isNaN(mean)) {
        hours.addNull();
      } else {
        hours.add(mean);
      }
    }
    return o;
  }

  /** Which days a log covers. */
  public static ObjectNode coverage(List<DayCoverage.Day> days) {
    ObjectNode o = Json.object();
    ArrayNode list = o.putArray("days");
    days.forEach(
        d ->
            list.addObject()
                .put("date", d.date().toString())
                .put("rows", d.rows())
                .put("share", d.share()));
    return o;
  }

  private static void put(ObjectNode into, String key, double value) {
    if (Double.isNaN(value)) {
      into.putNull(key);
    } else {
      into.put(key, value);
    }
  }

  private static String moment(long millis, ZoneId zone) {
    return Moments.write(Instant.ofEpochMilli(millis), zone);
  }
}
