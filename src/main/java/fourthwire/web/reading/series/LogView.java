package fourthwire.web.reading.series;

import fourthwire.jobs.measured.LogAssessments.CurrentLimits;
import fourthwire.jobs.series.StoredLog;
import fourthwire.quantity.Conductor;
import fourthwire.web.figure.Shapes;
import fourthwire.web.panel.NodePage;
import fourthwire.web.support.Moments;
import fourthwire.web.support.Names;
import fourthwire.web.support.Words;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/** What the pages of a log share: the rows and part shown, its limits, its names and words. */
final class LogView {
  /** Asks for the rows as read of a log that has corrections. */
  static final String AS_READ = "read";

  private final StoredLog log;
  private final Optional<StoredLog> asRead;
  private final Span span;
  private final Words words;
  private final Names names;
  private final Moments moments;
  private final LogLimits limits;

  /** Of a log; {@code asRead} empty where no correction holds. */
  LogView(
      StoredLog log,
      Optional<StoredLog> asRead,
      Span span,
      Optional<CurrentLimits> currents,
      Words words) {
    this.log = log;
    this.asRead = asRead;
    this.span = span;
    this.words = words;
    this.names = new Names(log.survey().settings().practice());
    this.moments = Moments.of(log.survey());
    this.limits = new LogLimits(log.survey(), log.entry().meter().node(), currents, words);
  }

  StoredLog log() {
    return log;
  }

  /** The rows as read of a quantity that is shown otherwise. */
  Optional<StoredLog> before(String quantity) {
    return asRead.filter(r -> log.changes(quantity));
  }

  /** Which rows are shown, in words. */
  String rows() {
    return words.of(log.isCorrected() ? "log.rows.corrected" : "log.rows.read");
  }

  Span span() {
    return span;
  }

  Words words() {
    return words;
  }

  Names names() {
    return names;
  }

  Moments moments() {
    return moments;
  }

  LogLimits limits() {
    return limits;
  }

  Measures measures() {
    return new Measures(log.quantities());
  }

  /** The heading; {@code verdict} empty where there is none to tell. */
  SeriesPage.Head head(String verdict, String view) {
    String meter = log.entry().meter().name();
    return new SeriesPage.Head(
        log.entry().id(),
        meter,
        log.entry().meter().node(),
        verdict.isEmpty() ? words.of("log.title", meter, words.of("log." + view)) : verdict,
        words.of(
            "reading.period",
            moments.minute(span.shown().from()),
            moments.minute(span.shown().to())),
        span.from(),
        span.to(),
        span.isUnderstood(),
        asRead.isPresent(),
        asRead.isEmpty() || log.isCorrected() ? "" : AS_READ,
        span.ways());
  }

  /** That a measure's limits always held, in words; and which of its places have none. */
  String alwaysWithin(Measure measure) {
    Map<Boolean, List<String>> places =
        measure.quantities().stream()
            .collect(
                Collectors.partitioningBy(
                    q -> limits.of(q).isEmpty(),
                    Collectors.mapping(this::place, Collectors.toList())));
    String label = measure.label(words);
    List<String> free = places.getOrDefault(true, List.of());
    return free.isEmpty()
        ? words.of("series.verdict.inside", label)
        : words.of(
            "series.verdict.inside.some",
            label,
            String.join(", ", places.getOrDefault(false, List.of())),
            String.join(", ", free));
  }

  /** Where a quantity is measured, as the site's people call it. */
  String place(String quantity) {
    String place = Measure.parsed(quantity).place();
    return place.isEmpty() || place.equals("total")
        ? words.of("series.place.whole")
        : names.of(place);
  }

  /** What the lines of a measure's places look like. */
  List<NodePage.Key> keys(Measure measure) {
    return measure.quantities().stream()
        .filter(q -> !Measure.classes(q).equals(Measure.WHOLE))
        .map(q -> new NodePage.Key(Shapes.sample(conductor(q)), place(q)))
        .toList();
  }

  private static Conductor conductor(String quantity) {
    return Conductor.valueOf(Measure.classes(quantity).toUpperCase(Locale.ROOT));
  }
}
