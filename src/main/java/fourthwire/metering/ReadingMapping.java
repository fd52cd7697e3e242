package fourthwire.metering;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Which columns or channels of a meter's file hold which quantity; the public contract, section 4.
 * What is empty is told by the file itself.
 *
 * @param sampleRateHz of a capture without a time column, samples a second
 * @param columns by header text, or channel name of a capture, in the file's order
 */
public record ReadingMapping(
    Optional<ReadingKind> kind,
    Time time,
    OptionalDouble sampleRateHz,
    Map<String, Column> columns) {
  /** Copies the columns, order kept. */
  public ReadingMapping {
    columns = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(columns));
  }

  /**
   * How time is written.
   *
   * @param columns headers of one time column, or of a date and a time column
   * @param format pattern of the columns joined by a blank, as in {@code dd/MM/yyyy HH:mm:ss}
   * @param zone time zone id, as in {@code Europe/Amsterdam}
   * @param intervalS length of one row, seconds
   */
  public record Time(
      List<String> columns,
      Optional<String> format,
      Optional<String> zone,
      Optional<Stamp> stamp,
      OptionalDouble intervalS) {
    /** Everything told by the file. */
    public static final Time FROM_FILE =
        new Time(
            List.of(),
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            OptionalDouble.empty());

    /** Copies the columns. */
    public Time {
      columns = List.copyOf(columns);
    }
  }

  /** Which end of its interval a row's time marks. */
  public enum Stamp {
    START,
    END;

    /** The word used in a mapping. */
    public String word() {
      return name().toLowerCase(java.util.Locale.ROOT);
    }
  }

  /** What a row's value is of its interval. */
  public enum Statistic {
    MEAN,
    MIN,
    MAX,
    INSTANT;

    /** The word used in a mapping. */
    public String word() {
      return name().toLowerCase(java.util.Locale.ROOT);
    }
  }

  /**
   * What one column holds.
   *
   * @param quantity name, as in {@code L1.rms_a}
   * @param factor from the column's unit to the quantity's
   */
  public record Column(String quantity, Statistic statistic, double factor) {}
}
