package fourthwire.intake.reading;

import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import java.util.List;
import java.util.Map;

/**
 * How a meter's files are going to be read.
 *
 * @param kind log or capture
 * @param layout signature of the header: the same for every file that is laid out alike
 * @param mapping the full mapping: what was given, remembered or proposed
 * @param columns headers or channel names found, in order
 * @param confidence of each mapped column, by header
 * @param notes what was settled from the file and how, in sentences
 */
public record ReadingPlan(
    ReadingKind kind,
    String layout,
    ReadingMapping mapping,
    List<String> columns,
    Map<String, Confidence> confidence,
    List<String> notes) {
  /** Where a column's mapping comes from. */
  public enum Confidence {
    /** Given with the upload. */
    GIVEN("given"),
    /** Confirmed before for this meter and layout. */
    REMEMBERED("remembered"),
    /** The header is a quantity's name. */
    EXACT("exact name"),
    /** The header names conductor, quantity and unit in the trade's words. */
    CLEAR("clear words"),
    /** Taken from the conductor and unit alone. */
    LIKELY("likely");

    private final String word;

    Confidence(String word) {
      this.word = word;
    }

    /** How it is shown. */
    public String word() {
      return word;
    }
  }
}
