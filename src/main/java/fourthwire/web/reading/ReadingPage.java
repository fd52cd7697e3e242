package fourthwire.web.reading;

import fourthwire.metering.ReadingRepository;
import fourthwire.web.panel.NodePage;
import fourthwire.web.reading.series.CoverageMaker;
import java.util.List;
import java.util.Optional;

/**
 * What the page of a reading shows.
 *
 * @param heading its verdict in words; empty where there is none to tell
 * @param about of a log what its neutral carried, of a capture what was recorded; else empty
 * @param facts what was read: files, period, length, digest
 * @param faults what is wrong with it, and what was done about it
 * @param limits of a log: its percentiles against the limits of measured values
 * @param quantities of a log, as read and as corrected
 * @param capture of a capture: its currents, voltages and powers
 * @param orders of a capture: the spectrum in figures
 * @param view of a capture: what no node's page has
 */
record ReadingPage(
    long id,
    String meter,
    String node,
    String heading,
    String about,
    String kindKey,
    List<Fact> facts,
    List<String> notes,
    Faults faults,
    Optional<LimitsView> limits,
    Optional<Quantities> quantities,
    List<NodePage.Grid> capture,
    Optional<NodePage.Grid> orders,
    String spectrum,
    List<NodePage.Key> keys,
    String basis,
    Optional<CaptureView> view) {
  /**
   * What only the page of a capture shows.
   *
   * @param first waveforms of the first cycles
   * @param whole waveforms over the record; none where the first cycles are all of it
   * @param phasors the fundamentals
   * @param tables unbalance and standard intervals
   * @param folded harmonic groups, opened on demand
   * @param eventsBasis thresholds of the events
   */
  record CaptureView(
      Waves first,
      Waves whole,
      String phasors,
      List<NodePage.Grid> tables,
      List<NodePage.Grid> folded,
      String eventsBasis,
      List<EventRow> events) {}

  /** Pictures of voltages and currents; empty text for none. */
  record Waves(String voltages, String currents) {
    static final Waves NONE = new Waves("", "");

    /** Whether there is neither. */
    public boolean isEmpty() {
      return voltages.isEmpty() && currents.isEmpty();
    }
  }

  /** A dip, swell or interruption. */
  record EventRow(
      String kind, String from, String duration, String place, String extreme, String percent) {}

  /**
   * Statistics of a log's quantities.
   *
   * @param codes the public name of each row's quantity; empty for figures as corrected
   */
  record Quantities(NodePage.Grid grid, List<String> codes) {}

  /** A fact about the file. */
  record Fact(String key, String text) {}

  /**
   * A meter in the list.
   *
   * @param calendar which days its readings cover; empty where none has times
   */
  record Meter(
      String name, String node, Optional<CoverageMaker.Calendar> calendar, List<Row> readings) {}

  /** A reading of a meter. */
  record Row(long id, String kindKey, String period, String files, int found) {}

  /** Files whose columns are to be confirmed. */
  record Waiting(long id, ReadingRepository.MeterRef meter, String files, String asked) {}

  /** A place a file can come from. */
  record Place(String value, String text) {}
}
