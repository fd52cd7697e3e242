package fourthwire.web.reading;

import fourthwire.metering.LogResult;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.quantity.Figure;
import fourthwire.web.panel.Grids;
import fourthwire.web.panel.NodePage;
import fourthwire.web.reading.series.Digits;
import fourthwire.web.reading.series.QuantityWords;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/** Words the statistics of a log's quantities. */
final class QuantitiesMaker {
  private static final String NEUTRAL = "N.rms_a";

  private final Words words;
  private final QuantityWords called;

  QuantitiesMaker(Words words, Names names) {
    this.words = words;
    this.called = new QuantityWords(words, names);
  }

  /** What the neutral carried, a sentence; empty text where it was not logged. */
  String neutral(LogResult log) {
    return Optional.ofNullable(log.quantities().get(NEUTRAL))
        .filter(q -> q.count() > 0)
        .map(
            q ->
                words.of(
                    "reading.neutral",
                    Numbers.of(q.mean(), "A"),
                    Numbers.of(q.p95(), "A"),
                    Numbers.of(q.max(), "A")))
        .orElse("");
  }

  /** What corrections changed stands below what was read. */
  ReadingPage.Quantities make(LogResult log, Optional<CorrectionRepository.Cleaned> cleaned) {
    Grids grid =
        new Grids(
            words,
            words.of(cleaned.isPresent() ? "reading.quantities.both" : "reading.quantities"),
            List.of(
                words.of("reading.quantity"),
                words.of("reading.count"),
                words.of("reading.min"),
                words.of("reading.mean"),
                words.of("reading.max"),
                words.of("reading.p95"),
                words.of("reading.p99")));
    List<String> codes = new ArrayList<>();
    log.quantities()
        .forEach(
            (name, q) -> {
              grid.row(called.of(name), figures(Optional.of(q)), decimals(q));
              codes.add(name);
              cleaned
                  .map(c -> Optional.ofNullable(c.log().quantities().get(name)))
                  .filter(c -> !c.equals(Optional.of(q)))
                  .ifPresent(
                      c -> {
                        grid.row(
                            words.of("reading.corrected", called.of(name)),
                            figures(c),
                            decimals(c.orElse(q)));
                        codes.add("");
                      });
            });
    NodePage.Grid done = grid.done();
    return new ReadingPage.Quantities(done, codes);
  }

  /** As many as tell figures apart that lie close together; of the count none. */
  private static List<OptionalInt> decimals(QuantitySummary q) {
    OptionalInt decimals = Digits.of(q.min(), q.max()).decimals();
    List<OptionalInt> row = new ArrayList<>(Collections.nCopies(6, decimals));
    row.set(0, OptionalInt.empty());
    return row;
  }

  private List<Figure> figures(Optional<QuantitySummary> summary) {
    Figure none = Figure.unknown(words.of("reading.corrected.none"));
    return summary
        .map(
            q ->
                List.of(
                    Figure.of(q.count()),
                    Figure.of(q.min()),
                    Figure.of(q.mean()),
                    Figure.of(q.max()),
                    Figure.of(q.p95()),
                    Figure.of(q.p99())))
        .orElse(List.of(Figure.of(0), none, none, none, none, none));
  }
}
