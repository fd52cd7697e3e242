package fourthwire.limits.loading;

import fourthwire.limits.Words;
import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;

/**
 * IEC 60364-5-52:2009, Annex E: in a four- or five-core cable the neutral's third harmonic heats
 * the cable beyond what the tables of three loaded conductors allow. To 33 % of third harmonic the
 * cable is chosen by the line current, above by the neutral current, with the factor of Table
 * E.52.1.
 *
 * <p>Our reading: the content is I3/I1 of the most loaded line; the neutral's real rms is used
 * rather than three times the third, so unbalance and the other triplens count. The factors are for
 * three lines and a neutral of their size; on fewer lines nothing is taken off.
 */
final class ThirdHarmonicContent {
  private static final PublishedTable TABLE =
      PublishedTable.beside(ThirdHarmonicContent.class, "iec60364-5-52-annex-e.csv");

  /** Above this content of other triplens the annex asks for lower factors than its table's. */
  static final double OTHER_TRIPLENS_PERCENT = 10;

  private ThirdHarmonicContent() {}

  static AmpacityFactors factors(NeutralCase c) {
    if (!c.isFourWire()) {
      return new AmpacityFactors(
          1, 1, () -> "Annex E is for three lines and a neutral", TABLE.basis());
    }
    double content = percent(c.mostLoadedLine().getValue());
    PublishedTable.Row row = row(content);
    double factor = row.number("factor");
    boolean onLine = row.text("size_on").equals("line");
    return new AmpacityFactors(
        onLine ? factor : 1,
        onLine ? 1 : factor,
        () ->
            "the third harmonic is %s %% of the fundamental on %s (%s: factor %s on the %s)"
                .formatted(
                    Words.number(content),
                    c.mostLoadedLine().getKey(),
                    band(row),
                    Words.number(factor),
                    onLine ? "line" : "neutral"),
        TABLE.basis());
  }

  /** I3/I1, percent; 0 where no fundamental flows. */
  static double percent(Spectrum line) {
    return percentOfFundamental(line, line.magnitude(3));
  }

  /** Orders 6, 9, 12, 15 … together on the fundamental, percent. */
  static double otherTriplensPercent(Spectrum line) {
    double sum = 0;
    for (int h = 6; h <= Spectrum.HIGHEST_ORDER; h += 3) {
      sum += line.magnitude(h) * line.magnitude(h);
    }
    return percentOfFundamental(line, Math.sqrt(sum));
  }

  static String basis() {
    return TABLE.basis();
  }

  private static double percentOfFundamental(Spectrum line, double amps) {
    double fundamental = line.magnitude(1);
    return fundamental > 0 ? 100 * amps / fundamental : 0;
  }

  private static String band(PublishedTable.Row row) {
    String from = row.text("above_percent");
    String to = row.text("up_to_percent");
    return to.isEmpty() ? "above " + from + " %" : from + " to " + to + " %";
  }

  private static PublishedTable.Row row(double content) {
    return TABLE.rows().stream()
        .filter(r -> content <= r.optional("up_to_percent").orElse(Double.POSITIVE_INFINITY))
        .findFirst()
        .orElseThrow();
  }
}
