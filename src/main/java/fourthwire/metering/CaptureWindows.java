package fourthwire.metering;

import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * What the gapless 10/12-cycle windows of a capture come to (IEC 61000-4-7:2002+A1:2008, IEC
 * 61000-4-30:2015).
 *
 * @param count full windows
 * @param cycles in each
 * @param groups by quantity, {@code L1.i}, {@code L1.v} …: rms over all windows
 * @param intervals the standard ones that lie whole within the record, by length, then in time; of
 *     more than an hour those of 3 s are left out
 */
public record CaptureWindows(
    int count, int cycles, Map<String, HarmonicGroups> groups, List<Interval> intervals) {
  /** Copies the list. */
  public CaptureWindows {
    intervals = List.copyOf(intervals);
  }

  /**
   * Groups of one quantity, amps or volts.
   *
   * @param groups harmonic groups of orders 1, 2, 3 …
   * @param subgroups harmonic subgroups likewise
   * @param interharmonicGroups between orders 0 and 1, 1 and 2 …
   * @param interharmonicSubgroups centred ones, likewise
   */
  public record HarmonicGroups(
      List<Double> groups,
      List<Double> subgroups,
      List<Double> interharmonicGroups,
      List<Double> interharmonicSubgroups) {
    /** Copies the lists. */
    public HarmonicGroups {
      groups = List.copyOf(groups);
      subgroups = List.copyOf(subgroups);
      interharmonicGroups = List.copyOf(interharmonicGroups);
      interharmonicSubgroups = List.copyOf(interharmonicSubgroups);
    }
  }

  /**
   * An aggregation interval.
   *
   * @param length {@code 3s}, {@code 10min} or {@code 2h}
   * @param fromS when it begins, seconds after the first sample
   * @param toS when it ends
   * @param frequencyHz mean over it
   * @param rms by quantity, amps or volts, without the direct component
   * @param thdPercent by quantity, orders 2 to 50 on the fundamental
   * @param voltageUnbalancePercent negative on positive sequence; empty without three voltages
   */
  public record Interval(
      String length,
      double fromS,
      double toS,
      double frequencyHz,
      Map<String, Double> rms,
      Map<String, Double> thdPercent,
      OptionalDouble voltageUnbalancePercent) {}
}
