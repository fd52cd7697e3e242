package fourthwire.intake.reading.comtrade;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Reads a configuration file line by line (IEEE C37.111-1999, clause 5; -1991 has no revision year,
 * no primary and secondary and writes dates month first; -2013 adds time codes). What recorders
 * leave out at the end takes its default; what they write wrongly in a place that no figure hangs
 * on is passed over.
 */
final class ConfigurationReader {
  private static final int MOST_CHANNELS = 10_000;
  private static final int LEAST_FIELDS = 7;
  private static final int FIELDS = 13;

  private final List<String> lines;
  private int next;

  ConfigurationReader(byte[] file) {
    this.lines = ConfigurationText.of(file).lines().toList();
  }

  Configuration read() {
    skipBlank();
    String[] station = fields();
    int revision = station.length > 2 ? revision(station[2]) : 1991;
    String[] counts = fields();
    int analog = count(counts, 'A', 1);
    int digital = count(counts, 'D', 2);
    List<AnalogChannel> channels = new ArrayList<>();
    for (int k = 0; k < analog; k++) {
      skipBlank();
      channels.add(channel(whole(fields())));
    }
    for (int k = 0; k < digital && more(); k++) {
      skipBlank();
      fields();
    }
    return rest(revision, channels, digital);
  }

  /** What stands below the channels; each part may be missing from some line on. */
  private Configuration rest(int revision, List<AnalogChannel> channels, int digital) {
    double lineHz = more() ? loose(fields(), 0, 0) : 0;
    List<Configuration.Rate> rates = rates();
    Optional<Stamp> start = stamp(revision);
    stamp(revision);
    Optional<DataFormat> format = more() ? DataFormat.find(line(), next) : Optional.empty();
    double multiplier = more() ? loose(fields(), 0, 1) : 1;
    Optional<String> offset = more() ? Stamp.offset(fields()[0]) : Optional.empty();
    return new Configuration(
        revision,
        List.copyOf(channels),
        digital,
        lineHz,
        rates,
        start.flatMap(Stamp::local),
        offset,
        format,
        multiplier,
        start.map(Stamp::isToTheNanosecond).orElse(false));
  }

  private boolean more() {
    return next < lines.size();
  }

  private void skipBlank() {
    while (more() && lines.get(next).isBlank()) {
      next++;
    }
  }

  private String line() {
    if (!more()) {
      throw new ComtradeException(
          "The configuration ends after line " + next + ", before all of its channels were there.");
    }
    return lines.get(next++);
  }

  private String[] fields() {
    String[] fields = line().split(",", -1);
    for (int k = 0; k < fields.length; k++) {
      fields[k] = fields[k].trim();
    }
    return fields;
  }

  private ComtradeException wrong(String what, String value, String accepted) {
    return new ComtradeException(
        "configuration, line "
            + next
            + ": "
            + what
            + " \""
            + value
            + "\" is not "
            + accepted
            + ".");
  }

  private int revision(String word) {
    return switch (word) {
      case "", "1991" -> 1991;
      case "1997", "1999", "2000" -> 1999;
      case "2001", "2013" -> 2013;
      default -> throw wrong("revision year", word, "1991, 1999 or 2013");
    };
  }

  /** By its letter; without letters, by its place behind the total. */
  private int count(String[] counts, char letter, int place) {
    for (String count : counts) {
      String upper = count.toUpperCase(Locale.ROOT);
      if (!upper.isEmpty() && upper.charAt(upper.length() - 1) == letter) {
        return count(count, upper.substring(0, upper.length() - 1).trim());
      }
    }
    if (counts.length > 2 && counts[place].matches("\\d+")) {
      return count(counts[place], counts[place]);
    }
    throw wrong("line", String.join(",", counts), "the numbers of channels, as in 8,8A,0D");
  }

  private int count(String written, String digits) {
    if (digits.matches("\\d{1,5}") && Integer.parseInt(digits) <= MOST_CHANNELS) {
      return Integer.parseInt(digits);
    }
    throw wrong("number of channels", written, "a number up to " + MOST_CHANNELS);
  }

  /** A name with commas in it made the line longer: its parts are put together again. */
  private static String[] whole(String[] f) {
    int more = f.length - FIELDS;
    if (more <= 0 || !f[f.length - 1].matches("(?i)[ps]\\w*")) {
      return f;
    }
    List<String> whole = new ArrayList<>(List.of(f[0]));
    whole.add(String.join(",", List.of(f).subList(1, 2 + more)));
    whole.addAll(List.of(f).subList(2 + more, f.length));
    return whole.toArray(String[]::new);
  }

  private AnalogChannel channel(String[] f) {
    if (f.length < LEAST_FIELDS) {
      throw wrong("analogue channel", String.join(",", f), "a line of at least 10 fields");
    }
    String side = f.length > 12 ? f[12].toUpperCase(Locale.ROOT) : "P";
    return new AnalogChannel(
        f[1],
        f[2],
        f[4],
        number(f, 5, "the multiplier", 1),
        number(f, 6, "the offset", 0),
        loose(f, 7, 0) * 1e-6,
        loose(f, 9, 99999),
        loose(f, 10, 1),
        loose(f, 11, 1),
        side.startsWith("S"));
  }

  private double number(String[] f, int at, String what, double whenEmpty) {
    if (at >= f.length || f[at].isEmpty()) {
      return whenEmpty;
    }
    double value = loose(f, at, Double.NaN);
    if (Double.isNaN(value)) {
      throw wrong(what, f[at], "a number");
    }
    return value;
  }

  /** A number that may be missing or no number. */
  private static double loose(String[] f, int at, double otherwise) {
    try {
      double value = at < f.length ? Double.parseDouble(f[at]) : otherwise;
      return Double.isFinite(value) ? value : otherwise;
    } catch (NumberFormatException e) {
      return otherwise;
    }
  }

  /** No rate at all is written as one line of rate 0, or not at all: the data's own times rule. */
  private List<Configuration.Rate> rates() {
    int count = more() ? (int) loose(fields(), 0, 0) : 0;
    List<Configuration.Rate> rates = new ArrayList<>();
    for (int k = 0; k < Math.max(1, count) && more() && !Stamp.isOne(lines.get(next)); k++) {
      String[] f = fields();
      rates.add(new Configuration.Rate(loose(f, 0, 0), (long) loose(f, 1, 0)));
    }
    return List.copyOf(rates.stream().filter(r -> r.hertz() > 0).toList());
  }

  /** A line of date and time; a data format in its place is left for later. */
  private Optional<Stamp> stamp(int revision) {
    if (!more() || DataFormat.isOne(lines.get(next))) {
      return Optional.empty();
    }
    return Stamp.of(line(), revision == 1991);
  }
}
