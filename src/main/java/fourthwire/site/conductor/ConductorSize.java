package fourthwire.site.conductor;

import fourthwire.quantity.PublishedTable;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A conductor's printed size: {@code 25 mm2}, {@code 4 AWG}, {@code 250 kcmil}.
 *
 * @param series which family of sizes it belongs to
 * @param size as its tables print it: {@code 25}, {@code 4}, {@code 1/0}, {@code 250}
 */
public record ConductorSize(Series series, String size) {
  /** What {@link #find} accepts, for messages. */
  public static final String ACCEPTED =
      "a size of IEC 60228 from 0.5 mm2 to 630 mm2 (25 mm2), from 14 AWG to 4/0 AWG (4 AWG), or"
          + " from 250 kcmil to 1000 kcmil (250 kcmil)";

  static final PublishedTable IEC_60228 =
      PublishedTable.beside(ConductorSize.class, "iec60228.csv");
  static final PublishedTable TABLE_8 =
      PublishedTable.beside(ConductorSize.class, "nec-chapter-9-table-8.csv");

  private static final Pattern METRIC = Pattern.compile("(\\d+(?:[.,]\\d+)?)\\s*mm(?:2|²)");
  private static final Pattern AWG = Pattern.compile("#?(\\d+(?:/0)?)\\s*awg");
  private static final Pattern KCMIL = Pattern.compile("(\\d+)\\s*(?:kcmil|mcm)");

  /** The families of sizes. */
  public enum Series {
    /** Square millimetres, IEC 60228. */
    METRIC,
    /** AWG and kcmil. */
    AMERICAN
  }

  /** The size written so; empty if it is none of the tables' sizes. */
  public static Optional<ConductorSize> find(String text) {
    String plain = text.strip().toLowerCase(Locale.ROOT);
    Matcher metric = METRIC.matcher(plain);
    if (metric.matches()) {
      return metric(Double.parseDouble(metric.group(1).replace(',', '.')));
    }
    Matcher awg = AWG.matcher(plain);
    if (awg.matches()) {
      return american(awg.group(1), false);
    }
    Matcher kcmil = KCMIL.matcher(plain);
    return kcmil.matches() ? american(kcmil.group(1), true) : Optional.empty();
  }

  private static Optional<ConductorSize> metric(double areaMm2) {
    return IEC_60228.rows().stream()
        .filter(row -> row.number("area_mm2") == areaMm2)
        .map(row -> new ConductorSize(Series.METRIC, row.text("area_mm2")))
        .findFirst();
  }

  /** The table prints AWG and kcmil in one column; from 250 up the numbers are kcmil. */
  private static Optional<ConductorSize> american(String size, boolean kcmil) {
    return TABLE_8.rows().stream()
        .map(row -> row.text("size"))
        .filter(size::equals)
        .filter(printed -> isKcmil(printed) == kcmil)
        .map(printed -> new ConductorSize(Series.AMERICAN, printed))
        .findFirst();
  }

  private static boolean isKcmil(String printed) {
    return !printed.contains("/") && Integer.parseInt(printed) >= 250;
  }

  /** As a survey writes it. */
  public String word() {
    if (series == Series.METRIC) {
      return size + " mm2";
    }
    return size + (isKcmil(size) ? " kcmil" : " AWG");
  }
}
