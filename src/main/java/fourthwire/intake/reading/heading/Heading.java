package fourthwire.intake.reading.heading;

import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.Optional;

/**
 * What a heading says.
 *
 * @param meaning how far it could be understood
 * @param quantity the quantity's name where it is settled, else empty text
 * @param factor from the column's unit to the quantity's
 * @param question what it leaves open, for a meaning of {@code UNCLEAR}
 */
public record Heading(
    Meaning meaning, String quantity, Statistic statistic, double factor, String question) {
  /** How far a heading is understood. */
  public enum Meaning {
    /** It is a quantity's name. */
    EXACT,
    /** Conductor, quantity and unit are all named. */
    CLEAR,
    /** The unit is the plain one by practice: A, V, percent. */
    LIKELY,
    /** It names a quantity but leaves a choice open. */
    UNCLEAR,
    /** It names nothing known. */
    NONE
  }

  private static final Heading NONE = new Heading(Meaning.NONE, "", Statistic.MEAN, 1, "");

  /** Of a column of an interval log. */
  public static Heading ofLog(String text) {
    Optional<MeasuredQuantity> exact = MeasuredQuantity.ofLog(text.trim());
    if (exact.isPresent()) {
      return new Heading(Meaning.EXACT, text.trim(), Statistic.MEAN, 1, "");
    }
    return new LogHeading(Words.of(text, "")).read();
  }

  /**
   * Of a channel of a capture.
   *
   * @param phase phase identifier beside the name; empty text for none
   * @param unit unit beside the name; empty text where the name may hold it
   */
  public static Heading ofCapture(String text, String phase, String unit) {
    Optional<MeasuredQuantity> exact = MeasuredQuantity.ofCapture(text.trim());
    if (exact.isPresent()) {
      double factor = Unit.find(unit).map(Unit::factor).orElse(1.0);
      return new Heading(Meaning.EXACT, text.trim(), Statistic.INSTANT, factor, "");
    }
    return new CaptureHeading(Words.of(text, unit), phase).read();
  }

  static Heading none() {
    return NONE;
  }

  static Heading unclear(String question) {
    return new Heading(Meaning.UNCLEAR, "", Statistic.MEAN, 1, question);
  }
}
