package fourthwire.intake.survey;

import fourthwire.quantity.Conductor;
import fourthwire.site.Lines;
import fourthwire.site.VectorGroup;
import fourthwire.site.conductor.ConductorSize;
import java.time.DateTimeException;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import java.time.format.DateTimeParseException;
import java.time.temporal.TemporalAccessor;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Function;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** The formats that the survey's columns are written in. */
final class Formats {
  private static final int LONGEST_TEXT = 500;
  private static final int LONGEST_NAME = 100;
  private static final Pattern SERIAL_DAY = Pattern.compile("\\d{5}(\\.\\d+)?");
  private static final LocalDateTime SERIAL_EPOCH = LocalDateTime.of(1899, 12, 30, 0, 0);
  private static final double SECONDS_A_DAY = 86_400;

  /** Free text on one line. */
  static final Format<String> TEXT = Format.ofText(t -> line(t, LONGEST_TEXT), t -> t, "");

  /** A name, or the name of something else. */
  static final Format<String> NAME = Format.ofText(t -> line(t, LONGEST_NAME), t -> t, "");

  /** The name of a supply, transformer or panel. */
  static final Format<String> NODE_NAME = Format.ofText(Formats::nodeName, t -> t, "");

  /** A conductor's cross-section. */
  static final Format<String> SIZE = Format.ofText(Formats::size, t -> t, "");

  /** Conductors of a circuit. */
  static final Format<Lines> LINES = Format.ofText(Formats::lines, Lines::word, Lines.L1);

  /** A list of lines, such as L1-L3; N may stand with them and is dropped. */
  static final Format<List<Conductor>> LINE_LIST =
      Format.ofText(
          t -> conductors(t).stream().filter(Conductor::isLine).toList(),
          Formats::joined,
          List.of());

  /** A list of conductors, such as L1-N. */
  static final Format<List<Conductor>> CONDUCTOR_LIST =
      Format.ofText(Formats::conductors, Formats::joined, List.of());

  /** A transformer's connection. */
  static final Format<VectorGroup> CONNECTION =
      Format.ofText(VectorGroup::parse, VectorGroup::symbol, VectorGroup.parse("Dyn11"));

  /** A time zone of the tz database, or an offset. */
  static final Format<String> ZONE = Format.ofText(Formats::zone, t -> t, "");

  /** A local date and time; an offset from UTC may stand behind it. */
  static final Format<LocalDateTime> TIME =
      Format.ofText(Formats::time, DateTimeFormatter.ISO_LOCAL_DATE_TIME::format, SERIAL_EPOCH);

  private Formats() {}

  static Format<Double> number(Range range) {
    return new Format<>(
        (text, comma) -> range.checked(Numbers.parse(text, comma)),
        Numbers::print,
        Double.NaN,
        true);
  }

  static Format<Integer> integer(int lowest, int highest) {
    return new Format<>(
        (text, comma) -> whole(Numbers.parse(text, comma), lowest, highest),
        String::valueOf,
        0,
        true);
  }

  /** One of the words of an enumeration; upper and lower case do not matter. */
  static <E extends Enum<E>> Format<E> word(Class<E> type, Function<E, String> word) {
    List<E> all = List.of(type.getEnumConstants());
    return Format.ofText(t -> oneOf(t, all, word), word, all.get(0));
  }

  /** One of a few whole numbers. */
  static Format<Integer> oneOf(int... accepted) {
    List<Integer> all = Arrays.stream(accepted).boxed().toList();
    return new Format<>(
        (text, comma) -> {
          double value = Numbers.parse(text, comma);
          return all.stream()
              .filter(a -> a == value)
              .findFirst()
              .orElseThrow(
                  () -> new IllegalArgumentException("Accepted are " + listed(all, a -> "" + a)));
        },
        String::valueOf,
        all.get(0),
        true);
  }

  private static <E> E oneOf(String text, List<E> all, Function<E, String> word) {
    return all.stream()
        .filter(e -> word.apply(e).equalsIgnoreCase(text))
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException("Accepted are " + listed(all, word)));
  }

  private static <E> String listed(List<E> all, Function<E, String> word) {
    return all.stream().map(word).collect(Collectors.joining(", ", "", "."));
  }

  private static int whole(double value, int lowest, int highest) {
    if (value != Math.rint(value) || value < lowest || value > highest) {
      throw new IllegalArgumentException(
          highest == Integer.MAX_VALUE
              ? "The value must be a whole number of at least %d.".formatted(lowest)
              : "The value must be a whole number from %d to %d.".formatted(lowest, highest));
    }
    return (int) value;
  }

  private static String line(String text, int longest) {
    if (text.chars().anyMatch(Character::isISOControl)) {
      throw new IllegalArgumentException(
          "Control characters (line breaks, tabs and the like) are not accepted.");
    }
    if (text.length() > longest) {
      throw new IllegalArgumentException("At most %d characters are accepted.".formatted(longest));
    }
    return text;
  }

  private static String nodeName(String text) {
    if (text.equals(".") || text.equals("..")) {
      throw new IllegalArgumentException(
          "A supply, transformer or panel can't be called . or .., which stand for folders in"
              + " addresses.");
    }
    if (text.contains("/") || text.contains(":")) {
      throw new IllegalArgumentException(
          "The characters / and : can't stand in the name of a supply, transformer or panel.");
    }
    return line(text, LONGEST_NAME);
  }

  private static String size(String text) {
    return ConductorSize.find(text)
        .map(ConductorSize::word)
        .orElseThrow(
            () -> new IllegalArgumentException("Accepted is " + ConductorSize.ACCEPTED + "."));
  }

  private static Lines lines(String text) {
    return Lines.find(text)
        .orElseThrow(
            () ->
                new IllegalArgumentException(
                    "Accepted are "
                        + listed(List.of(Lines.values()), Lines::word)
                        + " A, B, C may stand for L1, L2, L3."));
  }

  private static List<Conductor> conductors(String text) {
    List<Conductor> found = new ArrayList<>();
    for (String part : text.toUpperCase(Locale.ROOT).split("[-,;+ ]+", -1)) {
      Conductor conductor = conductor(part);
      if (found.contains(conductor)) {
        throw new IllegalArgumentException(conductor + " is named twice.");
      }
      found.add(conductor);
    }
    return List.copyOf(found);
  }

  private static Conductor conductor(String part) {
    return switch (part) {
      case "L1", "A" -> Conductor.L1;
      case "L2", "B" -> Conductor.L2;
      case "L3", "C" -> Conductor.L3;
      case "N" -> Conductor.N;
      default ->
          throw new IllegalArgumentException(
              "Accepted are conductors joined by a hyphen, such as L1, L2-L3 or L1-L2-L3.");
    };
  }

  private static String joined(List<Conductor> conductors) {
    return conductors.stream().map(Conductor::name).collect(Collectors.joining("-"));
  }

  private static String zone(String text) {
    try {
      return ZoneId.of(text).getId();
    } catch (DateTimeException e) {
      throw new IllegalArgumentException(
          "This is no time zone. Accepted are names of the tz database such as Europe/Vienna or"
              + " America/Chicago, UTC, and offsets such as +02:00.",
          e);
    }
  }

  private static LocalDateTime time(String text) {
    if (SERIAL_DAY.matcher(text).matches()) {
      return SERIAL_EPOCH.plusSeconds(Math.round(Double.parseDouble(text) * SECONDS_A_DAY));
    }
    try {
      return LocalDateTime.from(parsedTime(text));
    } catch (DateTimeParseException e) {
      throw new IllegalArgumentException(
          "This is no date and time. Write it as 2026-03-14T09:30 or 2026-03-14 09:30:00, in the"
              + " site's local time, or with an offset from UTC, as 2026-03-14T09:30+01:00.",
          e);
    }
  }

  /** The instant of a time that is written with its offset from UTC, as a date with that offset. */
  static Optional<OffsetDateTime> withOffset(String text) {
    try {
      return parsedTime(text) instanceof OffsetDateTime time ? Optional.of(time) : Optional.empty();
    } catch (DateTimeParseException e) {
      return Optional.empty();
    }
  }

  private static TemporalAccessor parsedTime(String text) {
    String iso = text.replaceFirst("\\s+(?=\\d)", "T").replaceFirst("\\s+(?=[-+Zz])", "");
    return DateTimeFormatter.ISO_DATE_TIME.parseBest(
        iso, OffsetDateTime::from, LocalDateTime::from);
  }
}
