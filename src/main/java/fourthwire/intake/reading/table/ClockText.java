package fourthwire.intake.reading.table;

import java.time.ZoneOffset;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * A time of day as text, with the offset that may stand behind it.
 *
 * @param offsetSeconds from UTC
 */
record ClockText(long nanoOfDay, OptionalInt offsetSeconds) {
  private static final long MINUTE_NANOS = 60_000_000_000L;
  private static final Pattern CLOCK =
      Pattern.compile(
          "(\\d{1,2})[:.h]\\s?(\\d{2})(?:[:.]\\s?(\\d{2})(?:[.,:](\\d{1,9}))?)?(?:\\s*([ap])\\.?\\s?m\\.?)?\\s*"
              + "(?:\\(?([a-z]{1,5}|(?:utc|gmt)?\\s?[-+\u2212]\\d{1,2}:?(?:\\d{2})?)\\)?)?(?:\\[[\\w/]+\\])?\\s*");
  private static final Pattern COMPACT =
      Pattern.compile("(\\d{2})(\\d{2})(\\d{2})?(z|[-+]\\d{2}:?(?:\\d{2})?)?");

  /** Abbreviations with one meaning; hours from UTC. */
  private static final Map<String, Double> ZONES =
      Map.ofEntries(
          Map.entry("z", 0.0),
          Map.entry("utc", 0.0),
          Map.entry("gmt", 0.0),
          Map.entry("wet", 0.0),
          Map.entry("west", 1.0),
          Map.entry("cet", 1.0),
          Map.entry("mez", 1.0),
          Map.entry("cest", 2.0),
          Map.entry("mesz", 2.0),
          Map.entry("eet", 2.0),
          Map.entry("eest", 3.0),
          Map.entry("est", -5.0),
          Map.entry("edt", -4.0),
          Map.entry("cdt", -5.0),
          Map.entry("mst", -7.0),
          Map.entry("mdt", -6.0),
          Map.entry("pst", -8.0),
          Map.entry("pdt", -7.0));

  /** Of a text in lower case; empty where it is none. */
  static Optional<ClockText> of(String text) {
    Matcher compact = COMPACT.matcher(text);
    if (compact.matches()) {
      int seconds = compact.group(3) == null ? 0 : Integer.parseInt(compact.group(3));
      return at(number(compact, 1), number(compact, 2), seconds * 1_000_000_000L, compact.group(4));
    }
    Matcher m = CLOCK.matcher(text);
    if (!m.matches()) {
      return Optional.empty();
    }
    int hour = number(m, 1);
    String half = m.group(5);
    if (half != null && (hour < 1 || hour > 12)) {
      return Optional.empty();
    }
    long nanos = m.group(3) == null ? 0 : number(m, 3) * 1_000_000_000L;
    nanos += m.group(4) == null ? 0 : Long.parseLong((m.group(4) + "00000000").substring(0, 9));
    int of24 = half == null ? hour : hour % 12 + (half.equals("p") ? 12 : 0);
    return at(of24, number(m, 2), nanos, m.group(6));
  }

  private static int number(Matcher m, int group) {
    return Integer.parseInt(m.group(group));
  }

  /** 24:00 is the end of the day. */
  private static Optional<ClockText> at(int hour, int minute, long nanos, @Nullable String zone) {
    Optional<OptionalInt> offset = offset(zone);
    boolean can = hour < 24 || hour == 24 && minute == 0 && nanos == 0;
    return !can || minute > 59 || nanos >= 61_000_000_000L
        ? Optional.empty()
        : offset.map(o -> new ClockText((60L * hour + minute) * MINUTE_NANOS + nanos, o));
  }

  /** No offset where none is written; empty where what is written is none. */
  private static Optional<OptionalInt> offset(@Nullable String text) {
    if (text == null) {
      return Optional.of(OptionalInt.empty());
    }
    Double hours = ZONES.get(text);
    return hours != null
        ? Optional.of(OptionalInt.of((int) (3600 * hours)))
        : ofNumber(text).map(o -> OptionalInt.of(o.getTotalSeconds()));
  }

  /** An offset such as {@code +01:00}, {@code utc-5} or {@code gmt+0530}. */
  static Optional<ZoneOffset> ofNumber(String text) {
    Matcher m = Pattern.compile("(?:utc|gmt)?\\s?([-+\u2212])(\\d{1,2}):?(\\d{2})?").matcher(text);
    if (!m.matches() || Integer.parseInt(m.group(2)) > 14) {
      return Optional.empty();
    }
    int minutes = 60 * number(m, 2) + (m.group(3) == null ? 0 : number(m, 3));
    return Optional.of(
        ZoneOffset.ofTotalSeconds(m.group(1).equals("+") ? 60 * minutes : -60 * minutes));
  }
}
