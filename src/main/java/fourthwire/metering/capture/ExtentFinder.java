package fourthwire.metering.capture;

import fourthwire.metering.capture.fit.Fundamental;
import fourthwire.metering.capture.fit.NoFundamentalException;
import fourthwire.metering.capture.fit.RoughFrequency;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import fourthwire.metering.capture.window.PhaseTrack;
import fourthwire.metering.capture.window.WindowAnalysis;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Finds the fundamental of a capture and how many whole cycles of it there are: by least squares in
 * a short or uneven record, by following its angle in a long one.
 */
final class ExtentFinder {
  /** A cycle may lack this share: a record of four cycles is often a hair short of them. */
  private static final double LACKING = 0.02;

  private static final int FOLLOWED_FROM_CYCLES = 30;
  private static final double ROUGH_S = 0.4;
  private static final int PLACES = 5;
  private static final double LEAST_SHARE = 0.1;

  private final Capture capture;
  private final TimeAxis time;
  private final double siteHz;

  /**
   * Of a capture.
   *
   * @param siteHz the site's frequency, for a record too short to show one
   */
  ExtentFinder(Capture capture, double siteHz) {
    this.capture = capture;
    this.time = capture.time();
    this.siteHz = siteHz;
  }

  /**
   * Finds it.
   *
   * @throws NoFundamentalException where there is no whole cycle of a fundamental
   */
  Extent find() {
    if (time.count() < 8) {
      throw new NoFundamentalException(
          "The capture has " + time.count() + " samples a channel: at least one cycle is needed.");
    }
    List<Samples> voltages = channels(".v");
    List<Samples> currents = channels(".i");
    if (voltages.isEmpty() && currents.isEmpty()) {
      throw new NoFundamentalException("The capture holds no line's voltage or current.");
    }
    if (voltages.isEmpty() || currents.isEmpty()) {
      return of(voltages.isEmpty() ? currents : voltages);
    }
    // Voltages carry the fundamental best; one that was not connected shows none.
    try {
      return of(voltages);
    } catch (NoFundamentalException e) {
      return of(currents);
    }
  }

  private List<Samples> channels(String kind) {
    return capture.channels().stream()
        .filter(c -> c.quantity().startsWith("L") && c.quantity().endsWith(kind))
        .map(capture::of)
        .filter(x -> !x.extremes().isFlat())
        .toList();
  }

  private Extent of(List<Samples> channels) {
    if (channels.isEmpty()) {
      throw new NoFundamentalException("No line's voltage or current moves.");
    }
    boolean followed =
        time.isEven() && time.spanS(time.count()) * siteHz >= FOLLOWED_FROM_CYCLES * 1.25;
    return followed ? followed(channels) : fitted(channels);
  }

  private Extent followed(List<Samples> channels) {
    double rate = time.rateHz().orElseThrow();
    double rough = rough(channels);
    PhaseTrack track = PhaseTrack.of(channels, rate / rough);
    if (!(track.share() > LEAST_SHARE)) {
      throw none();
    }
    double hertz = rate / track.samplesPerCycle();
    return extent(hertz, Extent.Certainty.FOUND, Optional.of(track));
  }

  /** Where the record is strongest: part of it may be without a supply. */
  private double rough(List<Samples> channels) {
    int n = (int) Math.min(time.count(), time.rateHz().orElseThrow() * ROUGH_S);
    List<double[]> strongest = List.of();
    double most = -1;
    for (int place = 0; place < PLACES; place++) {
      int from = (int) ((long) (time.count() - n) * place / (PLACES - 1));
      List<double[]> some = channels.stream().map(x -> part(x, from, n)).toList();
      double energy = some.stream().mapToDouble(ExtentFinder::energy).sum();
      if (energy > 1.1 * most) {
        most = energy;
        strongest = some;
      }
    }
    return RoughFrequency.hertz(time.first(n), strongest);
  }

  private static double[] part(Samples x, int from, int count) {
    double[] part = new double[count];
    x.copy(from, count, part, 0);
    return part;
  }

  private static double energy(double[] x) {
    double energy = 0;
    for (double value : x) {
      energy += Double.isNaN(value) ? 0 : value * value;
    }
    return energy;
  }

  private Extent fitted(List<Samples> channels) {
    Fundamental fundamental =
        new Fundamental(
            time.first(time.count()),
            channels.stream().map(x -> x.first(x.count())).toList(),
            siteHz);
    double hertz = fundamental.hertz();
    Extent.Certainty certainty =
        !fundamental.settled()
            ? Extent.Certainty.NOMINAL
            : fundamental.isSteady() ? Extent.Certainty.FOUND : Extent.Certainty.UNSTEADY;
    Optional<PhaseTrack> track =
        time.isEven()
            ? Optional.of(PhaseTrack.steady(time.rateHz().orElseThrow() / hertz))
            : Optional.empty();
    return extent(hertz, certainty, track);
  }

  private Extent extent(double hertz, Extent.Certainty certainty, Optional<PhaseTrack> track) {
    double span = time.spanS(time.count());
    double run = track.map(t -> t.cyclesAt(time.count())).orElse(span * hertz);
    int cycles = (int) Math.floor(run + LACKING);
    if (cycles < 1) {
      throw new NoFundamentalException(
          String.format(
              Locale.ROOT,
              "The capture is %.1f ms long: at least one cycle of %.0f Hz is needed.",
              1000 * span,
              siteHz));
    }
    double nominal = hertz > 55 ? 60 : 50;
    int end =
        (int) Math.round(track.map(t -> t.positionAt(cycles)).orElse(time.count() * cycles / run));
    int samples = Math.min(time.count(), end);
    int inWindows = track.map(t -> WindowAnalysis.ordersAt(t.samplesPerCycle())).orElse(0);
    boolean windows = cycles >= Extent.standardCycles(nominal) && inWindows > 0;
    return new Extent(
        hertz,
        certainty,
        cycles,
        samples,
        windows ? inWindows : orders(samples, hertz),
        nominal,
        track.filter(t -> windows));
  }

  private int orders(int samples, double hertz) {
    int resolved = (int) Math.ceil(0.5 / (time.longestStepS(samples) * hertz) - 0.5) - 1;
    if (resolved < 1) {
      throw new NoFundamentalException(
          "The samples stand too far apart: more than two to a cycle are needed.");
    }
    return Math.min(Spectrum.HIGHEST_ORDER, resolved);
  }

  private static NoFundamentalException none() {
    return new NoFundamentalException(
        "No fundamental was found between 40 and 72 Hz: check the capture's sample rate.");
  }
}
