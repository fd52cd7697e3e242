package fourthwire.web.reading;

import fourthwire.web.support.Verdict;
import fourthwire.web.support.Words;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Says first of a log what there is to know: how many limits it exceeds, and its faults. */
final class ReadingHeading {
  private final Words words;

  ReadingHeading(Words words) {
    this.words = words;
  }

  String of(Optional<LimitsView> limits, Faults faults) {
    List<LimitsView.Row> rows = limits.map(LimitsView::rows).orElse(List.of());
    int faulty = (int) faults.faults().stream().filter(f -> f.mended().isEmpty()).count();
    if (rows.isEmpty()) {
      return sentence(words.of("reading.verdict.faults", faulty, words.count(faulty)));
    }
    String verdict = sentence(held(rows));
    return faulty == 0
        ? verdict
        : words.of("reading.verdict.both", verdict, faulty, words.count(faulty));
  }

  private String held(List<LimitsView.Row> rows) {
    int all = rows.size();
    int over = count(rows, Verdict.ACT);
    int open = count(rows, Verdict.NOTE);
    String alone = all == 1 ? ".one" : "";
    if (over > 0) {
      return words.of(
          "reading.verdict.over" + alone, over, words.count(over), all, words.count(all));
    }
    return open == 0
        ? words.of("reading.verdict.within" + alone, all, words.count(all))
        : words.of("reading.verdict.open" + alone, open, words.count(open), all, words.count(all));
  }

  private static int count(List<LimitsView.Row> rows, Verdict verdict) {
    return (int) rows.stream().filter(r -> r.verdict() == verdict).count();
  }

  private static String sentence(String text) {
    return text.substring(0, 1).toUpperCase(Locale.ENGLISH) + text.substring(1);
  }
}
