package fourthwire.web.reading.series;

import fourthwire.jobs.measured.SiteZone;
import fourthwire.jobs.series.StoredLog;
import fourthwire.jobs.series.StoredLogs;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.reduce.DayCoverage;
import fourthwire.quantity.Figure;
import fourthwire.site.Survey;
import fourthwire.web.figure.CoveragePicture;
import fourthwire.web.panel.Grids;
import fourthwire.web.panel.NodePage;
import fourthwire.web.support.Moments;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.time.LocalDate;
import java.time.YearMonth;
import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import org.springframework.stereotype.Component;

/** Makes the calendars that say which days a meter covers. */
@Component
public final class CoverageMaker {
  private static final DateTimeFormatter MONTH =
      DateTimeFormatter.ofPattern("MMM uuuu", Locale.ENGLISH);
  private static final double WHOLE = 0.9995;
  private static final int MOST_STRETCHES = 12;

  private final StoredLogs logs;
  private final Words words;

  CoverageMaker(StoredLogs logs, Words words) {
    this.logs = logs;
    this.words = words;
  }

  /**
   * A meter's calendar.
   *
   * @param svg the picture
   * @param sentence how many days are whole
   * @param missing days that are not, in words
   * @param months the same by month
   */
  public record Calendar(String svg, String sentence, List<String> missing, NodePage.Grid months) {}

  /** The share of each day that has rows, and on which a capture was made. */
  private record Days(SortedMap<LocalDate, Double> shares, Map<LocalDate, Integer> captures) {}

  /** The calendar of one meter's readings; empty where none of them has times. */
  public Optional<Calendar> of(
      ReadingRepository.MeterRef meter, List<ReadingRepository.Entry> readings, Survey survey) {
    Days days = new Days(new TreeMap<>(), new TreeMap<>());
    for (ReadingRepository.Entry entry : readings) {
      Optional<StoredLog> log = logs.of(entry, survey);
      if (log.isPresent()) {
        add(days, log.get().days());
      } else {
        ZoneId zone = SiteZone.of(survey);
        entry
            .reading()
            .period()
            .ifPresent(
                p -> days.captures().merge(LocalDate.ofInstant(p.from(), zone), 1, Integer::sum));
      }
    }
    return days.shares().isEmpty() && days.captures().isEmpty()
        ? Optional.empty()
        : Optional.of(calendar(meter, days));
  }

  /** Where two logs cover a day, the one that covers more of it. */
  private static void add(Days days, List<DayCoverage.Day> log) {
    log.forEach(d -> days.shares().merge(d.date(), d.share(), Math::max));
  }

  private Calendar calendar(ReadingRepository.MeterRef meter, Days days) {
    List<YearMonth> months =
        java.util.stream.Stream.concat(
                days.shares().keySet().stream(), days.captures().keySet().stream())
            .map(YearMonth::from)
            .distinct()
            .sorted()
            .toList();
    String sentence = sentence(days);
    return new Calendar(
        CoveragePicture.draw(
            months.stream().map(m -> month(m, days)).toList(),
            words.of("coverage.alternative", meter.name(), sentence)),
        sentence,
        missing(days.shares()),
        table(months, days));
  }

  private static CoveragePicture.Month month(YearMonth month, Days days) {
    List<Double> shares = new ArrayList<>();
    List<Integer> captures = new ArrayList<>();
    for (int day = 1; day <= month.lengthOfMonth(); day++) {
      shares.add(days.shares().getOrDefault(month.atDay(day), Double.NaN));
      if (days.captures().containsKey(month.atDay(day))) {
        captures.add(day);
      }
    }
    return new CoveragePicture.Month(MONTH.format(month), shares, captures);
  }

  private String sentence(Days days) {
    int all = days.shares().size();
    long whole = days.shares().values().stream().filter(s -> s >= WHOLE).count();
    int captures = days.captures().values().stream().mapToInt(Integer::intValue).sum();
    String log =
        all == 0 ? "" : words.of(all == whole ? "coverage.whole" : "coverage.partly", whole, all);
    String made =
        captures == 0
            ? ""
            : words.of(captures == 1 ? "coverage.capture" : "coverage.captures", captures);
    return (log + " " + made).strip();
  }

  /** Days that are not whole; those in a row that have nothing are told together. */
  private List<String> missing(SortedMap<LocalDate, Double> shares) {
    List<String> told = new ArrayList<>();
    LocalDate from = null;
    LocalDate before = null;
    for (Map.Entry<LocalDate, Double> day : shares.entrySet()) {
      if (day.getValue() > 0 && from != null && before != null) {
        told.add(empty(from, before));
        from = null;
      }
      if (day.getValue() == 0) {
        from = from == null ? day.getKey() : from;
      } else if (day.getValue() < WHOLE) {
        told.add(words.of("coverage.day", Moments.day(day.getKey()), percent(day.getValue())));
      }
      before = day.getKey();
    }
    if (told.size() > MOST_STRETCHES) {
      int more = told.size() - MOST_STRETCHES;
      told = new ArrayList<>(told.subList(0, MOST_STRETCHES));
      told.add(words.of("coverage.more", more));
    }
    return told;
  }

  private String empty(LocalDate from, LocalDate to) {
    return from.equals(to)
        ? words.of("coverage.none.day", Moments.day(from))
        : words.of("coverage.none.days", Moments.day(from), Moments.day(to));
  }

  /** Never rounded up to all, nor down to none. */
  private static String percent(double share) {
    double percent = Math.max(1, Math.min(99, Math.rint(100 * share)));
    return Numbers.withDecimals(percent, 0) + Numbers.THIN_SPACE + "%";
  }

  private NodePage.Grid table(List<YearMonth> months, Days days) {
    Grids grid =
        new Grids(
            words,
            words.of("coverage.table"),
            List.of(
                words.of("coverage.month"),
                words.of("coverage.days"),
                words.of("coverage.days.whole"),
                words.of("coverage.share"),
                words.of("coverage.made")));
    for (YearMonth month : months) {
      List<Double> there =
          days.shares().subMap(month.atDay(1), month.plusMonths(1).atDay(1)).values().stream()
              .toList();
      double sum = there.stream().mapToDouble(Double::doubleValue).sum();
      int captures =
          days.captures().entrySet().stream()
              .filter(c -> YearMonth.from(c.getKey()).equals(month))
              .mapToInt(Map.Entry::getValue)
              .sum();
      grid.row(
          MONTH.format(month),
          List.of(
              Figure.of(there.stream().filter(s -> s > 0).count()),
              Figure.of(there.stream().filter(s -> s >= WHOLE).count()),
              there.isEmpty() ? Figure.unknown("") : Figure.of(100 * sum / there.size()),
              Figure.of(captures)));
    }
    return grid.done();
  }
}
