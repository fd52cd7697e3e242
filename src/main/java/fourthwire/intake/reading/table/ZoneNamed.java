package fourthwire.intake.reading.table;

import java.time.DateTimeException;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The time zone that a heading of times, or a line above the table, names. */
public final class ZoneNamed {
  private static final Pattern OFFSET =
      Pattern.compile("\\b(?:utc|gmt)\\s?(?:([-+\u2212]\\s?\\d{1,2}:?(?:\\d{2})?))?(?![\\w/])");
  private static final Pattern LABEL = Pattern.compile("(?i)time\\s?zone\\b\\s*[:=]?\\s*(.*)");
  private static final Pattern REGION = Pattern.compile("[A-Z][A-Za-z]+/[A-Z][A-Za-z_/]+");

  /** In capitals: est and west are words too. */
  private static final Pattern ABBREVIATION =
      Pattern.compile(
          "(?<![\\p{L}\\d])(?:[ECMP][SD]T|A[KD]?[SD]T|HST|N[SD]T|[IBMJK]ST|MSK|W?EST|WET|CES?T|ME[SZ]Z?"
              + "|EES?T|A[ECW][SD]T|NZ[SD]T|SAST|SGT|HKT|GST|BRT)(?![\\p{L}\\d])");

  private ZoneNamed() {}

  /**
   * The abbreviation of a zone that a heading of times, or a line above the table, writes: it
   * leaves open whether summer time is kept, often the zone too.
   *
   * @param headings of the time columns
   */
  public static Optional<String> abbreviation(TextTable table, List<String> headings) {
    List<String> texts = new ArrayList<>(headings);
    List<String> cells = table.preamble();
    for (int k = 0; k < cells.size(); k++) {
      if (LABEL.matcher(cells.get(k)).find()) {
        texts.addAll(cells.subList(k, Math.min(k + 2, cells.size())));
      }
    }
    return texts.stream()
        .map(ABBREVIATION::matcher)
        .filter(Matcher::find)
        .map(Matcher::group)
        .findFirst();
  }

  /**
   * The zone; empty where none is named, or only an abbreviation that leaves summer time open.
   *
   * @param headings of the time columns
   */
  public static Optional<ZoneId> of(TextTable table, List<String> headings) {
    for (String heading : headings) {
      Optional<ZoneId> zone = offset(heading);
      if (zone.isPresent()) {
        return zone;
      }
    }
    List<String> cells = table.preamble();
    for (int k = 0; k < cells.size(); k++) {
      Matcher label = LABEL.matcher(cells.get(k));
      if (label.find()) {
        String value =
            label.group(1).isBlank() && k + 1 < cells.size() ? cells.get(k + 1) : label.group(1);
        return offset(value).or(() -> region(value));
      }
    }
    return Optional.empty();
  }

  private static Optional<ZoneId> offset(String text) {
    Matcher m = OFFSET.matcher(text.toLowerCase(Locale.ROOT));
    if (!m.find()) {
      return Optional.empty();
    }
    return m.group(1) == null
        ? Optional.of(ZoneId.of("UTC"))
        : ClockText.ofNumber(m.group(1).replace(" ", "")).map(o -> o);
  }

  private static Optional<ZoneId> region(String text) {
    Matcher m = REGION.matcher(text);
    try {
      return m.find() ? Optional.of(ZoneId.of(m.group())) : Optional.empty();
    } catch (DateTimeException e) {
      return Optional.empty();
    }
  }
}
