package fourthwire.metering;

import java.util.List;
import java.util.Map;

/**
 * Dips, swells and interruptions of a capture, by the rms of one cycle refreshed every half cycle
 * (IEC 61000-4-30:2015, 5.4 and 5.5).
 *
 * @param basis thresholds and reference, in sentences; or why none were looked for
 * @param lowestV lowest half-cycle rms by line ({@code L1}) or pair, volts; none of a record that
 *     is shorter than a cycle
 * @param highestV highest likewise
 * @param events in time
 */
public record VoltageEvents(
    String basis, Map<String, Double> lowestV, Map<String, Double> highestV, List<Event> events) {
  /** Copies the list. */
  public VoltageEvents {
    events = List.copyOf(events);
  }

  /** Kinds of event. */
  public enum Kind {
    DIP("dip"),
    SWELL("swell"),
    INTERRUPTION("interruption");

    private final String word;

    Kind(String word) {
      this.word = word;
    }

    /** The word used in the public interface. */
    public String word() {
      return word;
    }
  }

  /**
   * An event of all lines taken together.
   *
   * @param fromS when it begins, seconds after the first sample
   * @param durationS how long it lasts within the record
   * @param whole whether it begins and ends within the record
   * @param place the line or pair that went furthest
   * @param extremeV its lowest or highest half-cycle rms
   * @param percent of the reference voltage
   */
  public record Event(
      Kind kind,
      double fromS,
      double durationS,
      boolean whole,
      String place,
      double extremeV,
      double percent) {}
}
