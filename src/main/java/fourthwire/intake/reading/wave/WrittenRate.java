package fourthwire.intake.reading.wave;

import fourthwire.intake.reading.table.TextTable;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The samples a second that a line above the table tells. */
public final class WrittenRate {
  private static final Pattern LABEL =
      Pattern.compile(
          "(?i).*\\b(?:sampl(?:e|ing)[\\s_]*(?:rate|frequency)|samples per second|abtastrate"
              + "|samplefrequentie)(?![\\p{L}])(.*)");
  private static final Pattern NUMBER =
      Pattern.compile("(\\d+(?:\\.\\d+)?)\\s*(k?)(?:hz|s/s|sa/s|samples.*)?");

  /** Fewer could not show harmonics, and may be half of a number cut at its comma. */
  private static final double SLOWEST_HZ = 500;

  private WrittenRate() {}

  /** The rate; empty where none is written, or it can't be read in one way only. */
  public static OptionalDouble of(TextTable table) {
    List<String> cells = table.preamble();
    for (int k = 0; k < cells.size(); k++) {
      Matcher label = LABEL.matcher(cells.get(k));
      if (label.matches()) {
        String value = label.group(1);
        boolean unit = value.toLowerCase(Locale.ROOT).matches("\\W*(k?hz)?\\W*");
        String next = k + 1 < cells.size() ? cells.get(k + 1) : "";
        String kilo = unit && value.toLowerCase(Locale.ROOT).contains("khz") ? " khz" : "";
        return rate(unit ? next + kilo : value);
      }
    }
    return OptionalDouble.empty();
  }

  private static OptionalDouble rate(String text) {
    Matcher m =
        NUMBER.matcher(text.toLowerCase(Locale.ROOT).replaceAll("^[\\W_]+|[\\s)\\]]+$", ""));
    if (!m.matches()) {
      return OptionalDouble.empty();
    }
    double hz = Double.parseDouble(m.group(1)) * (m.group(2).isEmpty() ? 1 : 1000);
    return hz >= SLOWEST_HZ ? OptionalDouble.of(hz) : OptionalDouble.empty();
  }
}
