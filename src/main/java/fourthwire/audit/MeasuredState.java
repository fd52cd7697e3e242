package fourthwire.audit;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;

/**
 * What one meter or clamp reading says of a node, beside the computed figures.
 *
 * @param meter the meter's name, or "clamp reading"
 * @param reading id of the stored reading; empty for a clamp reading in the survey
 * @param period from when to when; empty where the clock time is not known
 * @param basis what the figures are: means, highest interval, one capture …, one sentence
 * @param neutral the measured neutral current, unknown where none was measured
 * @param currentSpectrum from a capture; empty for a log
 * @param demand the node's demand current I_L, unknown where the reading is too short for it
 */
public record MeasuredState(
    String meter,
    OptionalLong reading,
    Optional<Span> period,
    String basis,
    Map<Conductor, DesignState.LineCurrent> lines,
    DesignState.NeutralCurrent neutral,
    Map<String, DesignState.LineVoltage> voltage,
    PowerFigures power,
    Map<Conductor, Spectrum> currentSpectrum,
    Demand demand) {
  /** A reading that tells no demand current. */
  public MeasuredState(
      String meter,
      OptionalLong reading,
      Optional<Span> period,
      String basis,
      Map<Conductor, DesignState.LineCurrent> lines,
      DesignState.NeutralCurrent neutral,
      Map<String, DesignState.LineVoltage> voltage,
      PowerFigures power,
      Map<Conductor, Spectrum> currentSpectrum) {
    this(
        meter,
        reading,
        period,
        basis,
        lines,
        neutral,
        voltage,
        power,
        currentSpectrum,
        Demand.NONE);
  }

  /**
   * The demand current I_L (IEEE 519-2022, 3.1).
   *
   * @param amps fundamental, rms
   * @param basis from what it was formed, a few words; empty where there is none
   */
  public record Demand(Figure amps, String basis) {
    /** Of what is too short for one. */
    public static final Demand NONE = new Demand(Figure.unknown("too short for a demand"), "");
  }

  /** From when to when, in the site's time; both alike for a single moment. */
  public record Span(OffsetDateTime from, OffsetDateTime to) {
    private static final DateTimeFormatter MOMENT =
        DateTimeFormatter.ofPattern("uuuu-MM-dd HH:mm:ss[.SSS]");

    /** In words, to the second; to the millisecond where it is shorter than that. */
    public String text() {
      String text = from.equals(to) ? written(from) : written(from) + " to " + written(to);
      return from.getOffset().equals(ZoneOffset.UTC) ? text + " UTC" : text;
    }

    private String written(OffsetDateTime moment) {
      boolean brief = from.plusSeconds(2).isAfter(to) && from.isBefore(to);
      String text = MOMENT.format(moment);
      return brief ? text : text.substring(0, text.indexOf('.'));
    }
  }
}
