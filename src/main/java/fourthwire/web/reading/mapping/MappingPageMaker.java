package fourthwire.web.reading.mapping;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan.Confidence;
import fourthwire.metering.Amount;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Stamp;
import fourthwire.metering.ReadingMapping.Statistic;
import fourthwire.metering.ReadingUploads;
import fourthwire.site.Practice;
import fourthwire.web.support.Names;
import fourthwire.web.support.Words;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.springframework.stereotype.Component;

/** Makes the page on which a log's columns are confirmed. */
@Component
class MappingPageMaker {
  /** More columns of one kind than this are folded, where nothing about them is open. */
  private static final int MOST_OPEN = 12;

  private static final String OPEN = "open";
  private static final DateTimeFormatter SECOND =
      DateTimeFormatter.ofPattern("EEEE d MMMM uuuu, HH:mm:ss", Locale.ENGLISH);
  private static final List<String> DEGREES = List.of("asked", "likely", "sure", "unread");

  /** The question that is open where no column is known at all. */
  private static final String ANY_COLUMN = "columns";

  private final Words words;

  MappingPageMaker(Words words) {
    this.words = words;
  }

  MappingPage make(ReadingUploads.Entry upload, LogProposal p, Practice practice) {
    Names names = new Names(practice);
    return new MappingPage(
        upload.id(),
        words.of("columns.meter", upload.meter().name(), upload.meter().node()),
        p.headings(),
        time(p.time()),
        p.questions().stream()
            .filter(q -> !q.part().equals(ANY_COLUMN) && !isOfAColumn(q.part(), p))
            .map(q -> sentence(q.message()))
            .distinct()
            .toList(),
        p.questions().stream().anyMatch(q -> q.part().equals(ANY_COLUMN)),
        groups(p),
        kinds(p),
        p.rows().stream().map(r -> when(r, p.time().mapped())).toList(),
        Measure.PLACES.stream()
            .map(
                v ->
                    new MappingPage.Choice(
                        v, v.equals("total") ? words.of("columns.total") : names.of(v)))
            .toList(),
        Measure.MEASURES.stream()
            .map(v -> new MappingPage.Choice(v, words.of("columns.measure." + v)))
            .toList(),
        Arrays.stream(Statistic.values())
            .map(s -> new MappingPage.Choice(s.word(), words.of("columns.statistic." + s.word())))
            .toList());
  }

  private static boolean isOfAColumn(String part, LogProposal p) {
    return p.columns().stream()
        .anyMatch(c -> part.startsWith("columns." + c.heading()) && !c.question().isEmpty());
  }

  private static String sentence(String message) {
    String start = message.substring(0, 1).toUpperCase(Locale.ENGLISH) + message.substring(1);
    return start.endsWith(".") ? start : start + ".";
  }

  private static MappingPage.TimeFields time(LogProposal.Time t) {
    ReadingMapping.Time m = t.mapped();
    return new MappingPage.TimeFields(
        m.columns().isEmpty() ? "" : m.columns().get(0),
        m.columns().size() < 2 ? "" : m.columns().get(1),
        t.calendar(),
        m.format().orElse(""),
        t.reason(),
        m.zone().orElse(""),
        m.stamp().orElse(Stamp.START).word(),
        m.intervalS().isPresent() ? trimmed(m.intervalS().getAsDouble()) : "");
  }

  private static String trimmed(double value) {
    return Math.rint(value) == value && Math.abs(value) < 1e15
        ? Long.toString((long) value)
        : Double.toString(value);
  }

  private MappingPage.When when(LogProposal.Row row, ReadingMapping.Time time) {
    String written =
        time.columns().stream()
            .map(c -> row.cells().getOrDefault(c, ""))
            .collect(Collectors.joining(" "));
    return new MappingPage.When(
        written,
        row.time()
            .map(t -> SECOND.format(t) + time.zone().map(z -> " (" + z + ")").orElse(""))
            .orElse(words.of("columns.time.open")));
  }

  private List<MappingPage.Group> groups(LogProposal p) {
    Map<String, List<MappingPage.ColumnRow>> byDegree = new LinkedHashMap<>();
    DEGREES.forEach(d -> byDegree.put(d, new ArrayList<>()));
    for (int k = 0; k < p.columns().size(); k++) {
      LogProposal.Column c = p.columns().get(k);
      byDegree.computeIfAbsent(degree(c), d -> new ArrayList<>()).add(row(k, c, p));
    }
    List<MappingPage.Group> groups = new ArrayList<>();
    byDegree.forEach(
        (degree, columns) -> {
          if (!columns.isEmpty()) {
            boolean folded = DEGREES.indexOf(degree) > 1 && columns.size() > MOST_OPEN;
            groups.add(new MappingPage.Group("columns." + degree, folded, columns));
          }
        });
    return groups;
  }

  /** What a column is so far; of what is not read, nothing. */
  private static String kind(LogProposal.Column c) {
    return c.mapped()
        .map(m -> Measure.of(m.quantity()).measure())
        .filter(m -> !m.isEmpty())
        .orElse(c.question().isEmpty() ? "" : OPEN);
  }

  private List<MappingPage.Kind> kinds(LogProposal p) {
    Map<String, Integer> counts = new LinkedHashMap<>();
    p.columns().forEach(c -> counts.merge(kind(c), 1, Integer::sum));
    counts.remove("");
    return counts.entrySet().stream()
        .filter(e -> e.getValue() > 1)
        .map(
            e ->
                new MappingPage.Kind(
                    e.getKey(),
                    e.getKey().equals(OPEN)
                        ? words.of("columns.kind.open")
                        : words.of("columns.measure." + e.getKey()),
                    e.getValue(),
                    e.getKey().equals(OPEN) || e.getKey().contains("_h_")))
        .toList();
  }

  private static String degree(LogProposal.Column c) {
    if (!c.question().isEmpty()) {
      return "asked";
    }
    return c.mapped().isEmpty()
        ? "unread"
        : c.confidence().filter(d -> d == Confidence.LIKELY).isPresent() ? "likely" : "sure";
  }

  private static MappingPage.ColumnRow row(int number, LogProposal.Column c, LogProposal p) {
    Optional<ReadingMapping.Column> m = c.mapped();
    String written =
        p.rows().stream()
            .map(r -> r.cells().getOrDefault(c.heading(), ""))
            .map(t -> t.isEmpty() ? "–" : t)
            .collect(Collectors.joining("  "));
    String understood =
        m.map(
                column ->
                    p.rows().stream()
                        .map(r -> understood(r.values().get(c.heading()), column.quantity()))
                        .collect(Collectors.joining("  ")))
            .orElse("");
    return new MappingPage.ColumnRow(
        number,
        kind(c),
        c.heading(),
        written,
        understood,
        m.map(column -> Measure.of(column.quantity())).orElse(new Measure("", "", "")),
        m.map(ReadingMapping.Column::statistic).orElse(Statistic.MEAN).word(),
        m.map(column -> trimmed(column.factor())).orElse("1"),
        c.question().isEmpty() ? "" : sentence(c.question()));
  }

  private static String understood(
      @org.jspecify.annotations.Nullable Double value, String quantity) {
    return value == null ? "–" : Amount.of(value, Amount.unit(quantity));
  }
}
