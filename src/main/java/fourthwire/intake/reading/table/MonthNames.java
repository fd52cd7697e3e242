package fourthwire.intake.reading.table;

import java.text.Normalizer;
import java.util.List;
import java.util.Locale;

/** Names of months as meters write them: English, German, Dutch, French, Spanish, Italian. */
final class MonthNames {
  private static final List<List<String>> STARTS =
      List.of(
          List.of("jan", "ene", "gen", "jae"),
          List.of("feb", "fev"),
          List.of("mar", "mrz", "mrt", "maa", "mae"),
          List.of("apr", "avr", "abr"),
          List.of("may", "mai", "mei", "mag"),
          List.of("jun", "juin", "giu"),
          List.of("jul", "juil", "lug"),
          List.of("aug", "aou", "ago"),
          List.of("sep", "set"),
          List.of("oct", "okt", "ott"),
          List.of("nov"),
          List.of("dec", "dez", "dic"));

  private MonthNames() {}

  /** 1 to 12; 0 where it is no month. */
  static int number(String name) {
    String plain =
        Normalizer.normalize(name.toLowerCase(Locale.ROOT), Normalizer.Form.NFD)
            .replaceAll("\\p{M}", "");
    for (int k = 0; k < STARTS.size(); k++) {
      if (STARTS.get(k).stream().anyMatch(plain::startsWith)) {
        return k + 1;
      }
    }
    return 0;
  }
}
