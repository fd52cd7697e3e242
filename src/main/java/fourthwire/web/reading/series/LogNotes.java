package fourthwire.web.reading.series;

import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import fourthwire.web.figure.SeriesPlot;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** What is wrong with a log, numbered in the order of the reading's own page. */
final class LogNotes {
  private final LogView view;
  private final List<QualityFinding> quality;

  LogNotes(LogView view) {
    this.view = view;
    this.quality = view.log().entry().reading().quality();
  }

  /** Those of a stretch of time in the part shown; those of one stretch share a bar. */
  List<SeriesPlot.Note> bars() {
    Map<Period, String> numbers = new LinkedHashMap<>();
    for (int k = 0; k < quality.size(); k++) {
      String number = String.valueOf(k + 1);
      quality
          .get(k)
          .period()
          .filter(p -> isStretch(p) && isInside(p))
          .ifPresent(p -> numbers.merge(p, number, (all, one) -> all + " " + one));
    }
    List<SeriesPlot.Note> bars = new ArrayList<>();
    numbers.forEach(
        (p, of) ->
            bars.add(new SeriesPlot.Note(of, p.from().toEpochMilli(), p.to().toEpochMilli())));
    return bars;
  }

  /** Those of the part shown and of the whole log, in sentences. */
  List<SeriesPage.Note> rows() {
    List<SeriesPage.Note> rows = new ArrayList<>();
    for (int k = 0; k < quality.size(); k++) {
      QualityFinding q = quality.get(k);
      if (q.period().isEmpty() || isInside(q.period().get())) {
        rows.add(
            new SeriesPage.Note(String.valueOf(k + 1), when(q), view.names().in(q.sentence())));
      }
    }
    return rows;
  }

  private String when(QualityFinding q) {
    return q.period()
        .filter(this::isStretch)
        .map(
            p ->
                view.words()
                    .of(
                        "reading.period",
                        view.moments().minute(p.from()),
                        view.moments().minute(p.to())))
        .orElse(view.words().of("series.note.whole"));
  }

  /** How many lie outside the part shown. */
  int elsewhere() {
    return (int)
        quality.stream().filter(q -> q.period().isPresent() && !isInside(q.period().get())).count();
  }

  /** Not nearly the whole log, which marks nothing. */
  private boolean isStretch(Period period) {
    return period.length().compareTo(view.log().period().length().multipliedBy(9).dividedBy(10))
        < 0;
  }

  private boolean isInside(Period period) {
    Period shown = view.span().shown();
    return period.from().isBefore(shown.to()) && period.to().isAfter(shown.from());
  }
}
