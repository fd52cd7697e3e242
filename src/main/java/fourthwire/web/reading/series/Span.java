package fourthwire.web.reading.series;

import fourthwire.jobs.series.SpanText;
import fourthwire.jobs.series.StoredLog;
import fourthwire.metering.Period;
import fourthwire.metering.reduce.TimeSteps;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The part of a log that a page shows, and the ways from it to others. */
final class Span {
  private static final int FEWEST_ROWS = 4;

  private final StoredLog log;
  private final Period shown;
  private final boolean understood;

  /** A way to another part: the key of its name, and the part. */
  record Way(String key, String from, String to) {}

  private Span(StoredLog log, Period shown, boolean understood) {
    this.log = log;
    this.shown = shown;
    this.understood = understood;
  }

  /** As asked for, cut to the log; all of it where what was asked for can't be read or is empty. */
  static Span of(StoredLog log, String from, String to) {
    Period whole = log.period();
    Optional<Instant> first = read(from, whole.from(), log.zone());
    Optional<Instant> last = read(to, whole.to(), log.zone());
    if (first.isEmpty() || last.isEmpty()) {
      return new Span(log, whole, false);
    }
    Instant begin = first.get().isBefore(whole.from()) ? whole.from() : first.get();
    Instant end = last.get().isAfter(whole.to()) ? whole.to() : last.get();
    return end.isAfter(begin)
        ? new Span(log, new Period(begin, end), true)
        : new Span(log, whole, false);
  }

  private static Optional<Instant> read(String text, Instant otherwise, ZoneId zone) {
    return text.isBlank() ? Optional.of(otherwise) : SpanText.instant(text, zone);
  }

  /** The part that is shown. */
  Period shown() {
    return shown;
  }

  /** Whether what was asked for could be read and lies in the log. */
  boolean isUnderstood() {
    return understood;
  }

  boolean isWhole() {
    return shown.equals(log.period());
  }

  /** Its first instant as a form's field takes it. */
  String from() {
    return field(shown.from());
  }

  /** The instant after its last, likewise. */
  String to() {
    return field(shown.to());
  }

  private String field(Instant at) {
    return LocalDateTime.ofInstant(at, log.zone()).withNano(0).withSecond(0).toString();
  }

  /** Steps for a picture or table with room for so many. */
  TimeSteps steps(int most) {
    return log.steps(shown, most);
  }

  /** Earlier, later, closer, wider, the whole: those of them that lead anywhere. */
  List<Way> ways() {
    Duration length = shown.length();
    Duration half = length.dividedBy(2);
    List<Way> ways = new ArrayList<>();
    if (shown.from().isAfter(log.period().from())) {
      Instant from = later(shown.from().minus(half), log.period().from());
      ways.add(way("series.way.earlier", from, from.plus(length)));
    }
    if (shown.to().isBefore(log.period().to())) {
      Instant to = earlier(shown.to().plus(half), log.period().to());
      ways.add(way("series.way.later", to.minus(length), to));
    }
    if (length.toMillis() > 2 * FEWEST_ROWS * log.intervalMillis()) {
      Duration quarter = length.dividedBy(4);
      ways.add(way("series.way.closer", shown.from().plus(quarter), shown.to().minus(quarter)));
    }
    if (!isWhole()) {
      ways.add(
          way(
              "series.way.wider",
              later(shown.from().minus(half), log.period().from()),
              earlier(shown.to().plus(half), log.period().to())));
      ways.add(new Way("series.way.whole", "", ""));
    }
    return ways;
  }

  private Way way(String key, Instant from, Instant to) {
    return new Way(key, field(from), field(to));
  }

  private static Instant later(Instant a, Instant b) {
    return a.isAfter(b) ? a : b;
  }

  private static Instant earlier(Instant a, Instant b) {
    return a.isBefore(b) ? a : b;
  }
}
