package fourthwire.intake.reading.comtrade;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads a configuration file line by line (IEEE C37.111-1999, clause 5; -1991 has no revision year,
 * no primary and secondary and writes dates month first; -2013 adds time codes).
 */
final class ConfigurationReader {
  private static final Pattern DATE_TIME =
      Pattern.compile(
          "(\\d{1,2})/(\\d{1,2})/(\\d{2,4})\\s*,\\s*(\\d{1,2}):(\\d{2}):(\\d{2})(?:[.,](\\d{1,9}))?");
  private static final Pattern OFFSET = Pattern.compile("([+-]?)(\\d{1,2})(?:h(\\d{2}))?");
  private static final int MOST_CHANNELS = 10_000;

  private final List<String> lines;
  private int next;

  ConfigurationReader(byte[] file) {
    this.lines = text(file).lines().toList();
  }

  /** UTF-8 where it is that, else ISO 8859-1; what follows a substitute character is padding. */
  private static String text(byte[] file) {
    String text;
    try {
      text = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(file)).toString();
    } catch (CharacterCodingException e) {
      text = new String(file, StandardCharsets.ISO_8859_1);
    }
    int end = text.indexOf(0x1A);
    String whole = end < 0 ? text : text.substring(0, end);
    return whole.startsWith("\uFEFF") ? whole.substring(1) : whole;
  }

  Configuration read() {
    String[] station = fields();
    int revision = station.length > 2 && !station[2].isEmpty() ? revision(station[2]) : 1991;
    String[] counts = fields();
    int analog = count(counts, 'A');
    int digital = count(counts, 'D');
    List<AnalogChannel> channels = new ArrayList<>();
    for (int k = 0; k < analog; k++) {
      channels.add(channel(fields()));
    }
    for (int k = 0; k < digital; k++) {
      fields();
    }
    double lineHz = number(fields(), 0, "the line frequency", 0);
    List<Configuration.Rate> rates = rates();
    String first = line();
    line();
    DataFormat format = DataFormat.of(line(), next);
    double multiplier = next < lines.size() ? number(fields(), 0, "the time multiplier", 1) : 1;
    Optional<String> offset = next < lines.size() ? offset(fields()[0]) : Optional.empty();
    Matcher start = DATE_TIME.matcher(first);
    boolean dated = start.find();
    boolean nanoseconds = dated && start.group(7) != null && start.group(7).length() > 6;
    return new Configuration(
        revision,
        List.copyOf(channels),
        digital,
        lineHz,
        rates,
        dated ? start(start, revision) : Optional.empty(),
        offset,
        format,
        multiplier,
        nanoseconds);
  }

  private String line() {
    if (next >= lines.size()) {
      throw new ComtradeException(
          "The configuration ends after line " + next + ", before all of its parts were there.");
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
      case "1991" -> 1991;
      case "1999" -> 1999;
      case "2001", "2013" -> 2013;
      default -> throw wrong("revision year", word, "1991, 1999 or 2013");
    };
  }

  private int count(String[] counts, char letter) {
    for (String count : counts) {
      String upper = count.toUpperCase(Locale.ROOT);
      if (!upper.isEmpty() && upper.charAt(upper.length() - 1) == letter) {
        String digits = upper.substring(0, upper.length() - 1).trim();
        if (digits.matches("\\d{1,5}") && Integer.parseInt(digits) <= MOST_CHANNELS) {
          return Integer.parseInt(digits);
        }
        throw wrong("number of channels", count, "a number up to " + MOST_CHANNELS);
      }
    }
    throw wrong("line", String.join(",", counts), "the numbers of channels, as in 8,8A,0D");
  }

  private AnalogChannel channel(String[] f) {
    if (f.length < 10) {
      throw wrong("analogue channel", String.join(",", f), "a line of at least 10 fields");
    }
    String side = f.length > 12 ? f[12].toUpperCase(Locale.ROOT) : "P";
    return new AnalogChannel(
        f[1],
        f[2],
        f[4],
        number(f, 5, "the multiplier", 1),
        number(f, 6, "the offset", 0),
        number(f, 7, "the skew", 0) * 1e-6,
        number(f, 9, "the end of the range", 99999),
        number(f, 10, "the primary rating", 1),
        number(f, 11, "the secondary rating", 1),
        side.startsWith("S"));
  }

  private double number(String[] f, int at, String what, double whenEmpty) {
    if (at >= f.length || f[at].isEmpty()) {
      return whenEmpty;
    }
    try {
      double value = Double.parseDouble(f[at]);
      if (Double.isFinite(value)) {
        return value;
      }
    } catch (NumberFormatException e) {
      throw wrong(what, f[at], "a number");
    }
    throw wrong(what, f[at], "a number");
  }

  private List<Configuration.Rate> rates() {
    int count = (int) number(fields(), 0, "the number of sample rates", 0);
    List<Configuration.Rate> rates = new ArrayList<>();
    for (int k = 0; k < Math.max(1, count); k++) {
      String[] f = fields();
      // No rate at all is written as one line of rate 0: the data's own times rule.
      rates.add(
          new Configuration.Rate(
              number(f, 0, "the sample rate", 0), (long) number(f, 1, "the last sample", 0)));
    }
    return List.copyOf(rates.stream().filter(r -> r.hertz() > 0).toList());
  }

  private static Optional<LocalDateTime> start(Matcher m, int revision) {
    int first = Integer.parseInt(m.group(1));
    int second = Integer.parseInt(m.group(2));
    int year = Integer.parseInt(m.group(3));
    boolean monthFirst = revision == 1991;
    String fraction = m.group(7) == null ? "0" : m.group(7);
    int nanos = Integer.parseInt((fraction + "000000000").substring(0, 9));
    try {
      return Optional.of(
          LocalDateTime.of(
              year < 100 ? year + (year < 70 ? 2000 : 1900) : year,
              monthFirst ? first : second,
              monthFirst ? second : first,
              Integer.parseInt(m.group(4)),
              Integer.parseInt(m.group(5)),
              Integer.parseInt(m.group(6)),
              nanos));
    } catch (java.time.DateTimeException e) {
      return Optional.empty();
    }
  }

  private static Optional<String> offset(String code) {
    Matcher m = OFFSET.matcher(code);
    if (!m.matches()) {
      return Optional.empty();
    }
    String minutes = m.group(3) == null ? "00" : m.group(3);
    return Optional.of(
        ("-".equals(m.group(1)) ? "-" : "+")
            + String.format(Locale.ROOT, "%02d", Integer.parseInt(m.group(2)))
            + ":"
            + minutes);
  }
}
