package fourthwire.intake.reading.unit;

import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.heading.Heading.Meaning;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Settles from the values what the headings of a log leave open: units that are not written, and
 * columns of no conductor. What the values do not settle stays open and is asked.
 *
 * <p>Powers go by {@link PowerUnits}, harmonics by {@link HarmonicUnits}; a power factor above one
 * is a percentage.
 */
public final class OpenUnits {
  private final OpenHeadings open;
  private final HarmonicUnits harmonics;

  private OpenUnits(OpenHeadings open) {
    this.open = open;
    this.harmonics = new HarmonicUnits(open);
  }

  /** The headings, settled, and sentences on what the values settled. */
  public record Settled(Map<String, Heading> headings, List<String> notes) {}

  /** Settles what can be settled. */
  public static Settled settle(Map<String, Heading> headings, SampledColumns values) {
    OpenHeadings open = new OpenHeadings(headings, values);
    new OpenUnits(open).settle(new PowerUnits(open));
    return new Settled(open.all(), open.notes());
  }

  private void settle(PowerUnits powers) {
    placeless();
    tellCounters();
    open.each(Meaning.LIKELY, ".*\\.rms_v", this::voltage);
    powers.settlePowers();
    powers.settleCurrents();
    harmonics.settle();
    open.each(Meaning.LIKELY, ".*_thd_percent", this::distortion);
    open.each(Meaning.CLEAR, ".*_factor", this::ratio);
    open.each(Meaning.LIKELY, "frequency_hz", h -> range(h, 40, 70));
    openNumbers();
  }

  /** A mean over lines stands beside the lines; alone it may be any. */
  private void placeless() {
    open.all()
        .replaceAll(
            (column, h) -> {
              boolean beside =
                  open.all().values().stream()
                      .anyMatch(o -> o != h && o.quantity().endsWith("." + h.quantity()));
              return h.meaning() == Meaning.PLACELESS && beside ? Heading.none() : h;
            });
  }

  /** Readings of a counter never fall, and stand far above a step. */
  private void tellCounters() {
    open.all()
        .forEach(
            (column, h) -> {
              if (h.quantity().endsWith("energy_wh") && open.values().isCounter(column)) {
                open.notes()
                    .add(
                        "\""
                            + column
                            + "\" never falls: it is the register of a counter, read as it stands;"
                            + " its differences are the energies of intervals.");
              }
            });
  }

  private Heading voltage(String column) {
    double usual = open.values().median(column);
    if (usual > 0.05 && usual < 1) {
      return open.scaled(column, 1e3, "kV, as no V could be that small");
    }
    return usual > 50 || !(usual > 0) ? open.of(column) : ask("the unit of this voltage: V or kV");
  }

  /** A distortion far below one percent may be a ratio. */
  private Heading distortion(String column) {
    Heading h = open.of(column);
    double least = h.quantity().contains("current") ? 1.5 : 0.3;
    double usual = open.values().median(column);
    Optional<double[]> made =
        harmonics.distortionMade(
            OpenHeadings.place(h), h.quantity().contains("current") ? "current" : "voltage");
    double ratio = open.values().ratio(Optional.of(open.values().of(column)), made);
    if (usual >= least || usual == 0 || OpenHeadings.within(ratio, 0.8, 1.25)) {
      return h;
    }
    return OpenHeadings.within(100 * ratio, 0.8, 1.25)
        ? open.scaled(column, 100, "a ratio, as its harmonics show")
        : ask("whether this distortion is in percent (factor 1) or a ratio (factor 100)");
  }

  private Heading ratio(String column) {
    Heading h = open.of(column);
    double usual = open.values().median(column);
    return h.factor() == 1 && usual > 1.05 && usual <= 100.5
        ? open.scaled(column, 0.01, "percent, as no power factor is above 1")
        : h;
  }

  private Heading range(String column, double from, double to) {
    double usual = open.values().median(column);
    return OpenHeadings.within(usual, from, to) || Double.isNaN(usual)
        ? open.of(column)
        : ask("the factor that makes hertz of these values");
  }

  /** Frequencies near 50 or 60 and volts of a low-voltage site show that points mark decimals. */
  private void openNumbers() {
    List<String> asked = open.values().openNumbers();
    boolean decimals = asked.stream().anyMatch(c -> isDecimal(open.of(c), open.values().median(c)));
    for (String column : asked) {
      if (!decimals && open.of(column).meaning() != Meaning.NONE) {
        open.all()
            .put(
                column,
                ask(
                    "whether its numbers have three decimals or thousands set apart: factor 1 reads"
                        + " 12.345 as about twelve, factor 1000 as about twelve thousand"));
      }
    }
  }

  private static boolean isDecimal(Heading h, double usual) {
    return h.quantity().equals("frequency_hz") && OpenHeadings.within(usual, 40, 70)
        || h.quantity().endsWith(".rms_v") && OpenHeadings.within(usual, 80, 1000)
        || h.quantity().endsWith("_factor");
  }

  private static Heading ask(String question) {
    return Heading.unclear(question);
  }
}
