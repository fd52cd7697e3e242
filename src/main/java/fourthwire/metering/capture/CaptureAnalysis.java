package fourthwire.metering.capture;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.Period;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.capture.window.PhaseTrack;
import fourthwire.metering.capture.window.WindowAnalysis;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.SymmetricalComponents;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * Turns a waveform capture into what it says.
 *
 * <p>The fundamental is found from the samples, so the sampling need not be synchronous. A record
 * of ten cycles (60 Hz: twelve) or more is cut into gapless windows resampled to whole cycles; its
 * figures are their root mean squares, and groups and standard intervals come with them. A shorter
 * one, or one sampled unevenly, has orders 1 to 50 fitted to its largest whole number of cycles by
 * least squares, and nothing else. Rms and power are those of the samples without the direct
 * component: a current transformer passes none, so what an instrument shows there is its own
 * offset, reported in the findings. For a signal of harmonic orders all figures are exact within
 * 1e-5; noise of rms σ leaves about σ·√(2/samples) on each order.
 */
public final class CaptureAnalysis {
  /** Below this share a fundamental is noise; common practice, no source. */
  private static final double LEAST_FUNDAMENTAL = 1e-3;

  private final Capture capture;
  private final Capture whole;
  private final boolean complete;
  private final OptionalDouble nominalV;
  private final Extent extent;
  private final Optional<WindowAnalysis> windows;
  private final Channels channels;
  private final Neutral neutral;

  private CaptureAnalysis(Capture capture, double siteHz, OptionalDouble nominalV) {
    this.capture = capture;
    this.nominalV = nominalV;
    Optional<Capture> filled = new Gaps(capture, siteHz).filled();
    this.whole = filled.orElse(capture);
    this.complete = filled.isPresent();
    Extent found = new ExtentFinder(whole, siteHz).find();
    this.extent = complete ? found : found.withoutWindows();
    this.windows = extent.track().map(t -> WindowChannels.analysis(whole, extent, t));
    this.channels =
        windows
            .map(w -> WindowChannels.of(w, whole))
            .orElseGet(() -> FitChannels.of(whole, extent));
    this.neutral = Neutral.of(channels);
  }

  /**
   * Analyses a capture of a site whose nominal voltage is not known.
   *
   * @see #of(Capture, double, OptionalDouble, List)
   */
  public static Reading of(Capture capture, double siteHz, List<String> notes) {
    return of(capture, siteHz, OptionalDouble.empty(), notes);
  }

  /**
   * Analyses a capture.
   *
   * @param siteHz the site's frequency, 50 or 60, for a record too short to show its own
   * @param nominalV the site's line-to-neutral voltage at the meter
   * @param notes how the file was read, put before what is noted here
   * @throws fourthwire.metering.capture.fit.NoFundamentalException where there is no whole cycle of
   *     a fundamental
   */
  public static Reading of(
      Capture capture, double siteHz, OptionalDouble nominalV, List<String> notes) {
    return new CaptureAnalysis(capture, siteHz, nominalV).reading(notes);
  }

  private Reading reading(List<String> notes) {
    return new Reading(
        ReadingKind.CAPTURE,
        period(),
        capture.count(),
        capture.time().rateHz(),
        notes,
        new CaptureQuality(capture, extent, channels, neutral).findings(),
        Optional.empty(),
        Optional.of(result()));
  }

  private Optional<Period> period() {
    double span = capture.time().spanS(capture.count());
    return capture.start().map(from -> new Period(from, plus(from, span)));
  }

  private static Instant plus(Instant from, double seconds) {
    return from.plusNanos(Math.round(seconds * 1e9));
  }

  private CaptureResult result() {
    Map<Conductor, CaptureResult.CurrentFigures> current = new LinkedHashMap<>();
    Map<Conductor, Spectrum> spectrum = new LinkedHashMap<>();
    double largestLineA = largestLine(Channels.LINES.stream().map(l -> l + ".i").toList());
    for (Conductor c : Conductor.values()) {
      Optional<ChannelFigures> fit = c.isLine() ? channels.current(c) : neutral.fit();
      fit.ifPresent(
          f -> {
            current.put(c, currentFigures(f, largestLineA));
            spectrum.put(c, f.spectrum());
          });
    }
    Map<String, CaptureResult.VoltageFigures> voltage = new LinkedHashMap<>();
    Map<String, Spectrum> voltageSpectrum = new LinkedHashMap<>();
    double largestLineV =
        largestLine(
            voltageKeys().stream().filter(k -> k.startsWith("L")).map(k -> k + ".v").toList());
    for (String key : voltageKeys()) {
      ChannelFigures f = channels.find(key + ".v").orElseThrow();
      voltage.put(key, voltageFigures(f, largestLineV));
      voltageSpectrum.put(key, f.spectrum());
    }
    CapturePower power = CapturePower.of(channels, neutral);
    return new CaptureResult(
        extent.frequencyHz(),
        extent.cycles(),
        extent.basis(),
        current,
        percentOfMeanLine(),
        neutral.basis(),
        neutral
            .channel()
            .map(c -> Figure.of(c.rms()))
            .orElse(Figure.unknown("no channel is mapped as N")),
        voltage,
        spectrum,
        voltageSpectrum,
        power.total(),
        power.basis(),
        power.byLine(),
        unbalance(),
        windows.map(w -> new WindowFigures(w, extent, capture).of()),
        EventFinder.of(whole, clock(), nominalV),
        PictureMaker.of(capture, extent.cycles()),
        PictureMaker.closeUp(capture, extent.frequencyHz()));
  }

  /** The fundamental's clock, of any evenly sampled record. */
  private Optional<PhaseTrack> clock() {
    return extent.track().or(() -> steadyClock());
  }

  private Optional<PhaseTrack> steadyClock() {
    boolean even = whole.time().isEven() && complete;
    return even
        ? Optional.of(PhaseTrack.steady(whole.time().rateHz().orElseThrow() / extent.frequencyHz()))
        : Optional.empty();
  }

  private CaptureResult.Unbalance unbalance() {
    return new CaptureResult.Unbalance(
        sequences(".v", SymmetricalComponents::negativePercent, "voltages"),
        sequences(".i", SymmetricalComponents::negativePercent, "currents"),
        sequences(".i", SymmetricalComponents::zeroPercent, "currents"));
  }

  private Figure sequences(String kind, Function<SymmetricalComponents, Figure> of, String what) {
    List<Spectrum> lines =
        Channels.LINES.stream()
            .map(l -> channels.find(l + kind))
            .flatMap(Optional::stream)
            .map(ChannelFigures::spectrum)
            .toList();
    return lines.size() == 3
        ? of.apply(SymmetricalComponents.of(lines))
        : Figure.unknown("not all three lines' " + what + " were recorded");
  }

  /** The channels' own voltages; line-to-line ones that were only formed here are left out. */
  private List<String> voltageKeys() {
    return capture.channels().stream()
        .map(Capture.Channel::quantity)
        .filter(q -> q.endsWith(".v"))
        .map(q -> q.substring(0, q.length() - 2))
        .sorted()
        .toList();
  }

  private Figure percentOfMeanLine() {
    double mean = channels.meanLineA();
    return neutral
        .fit()
        .filter(n -> mean > 0)
        .map(n -> Figure.of(100 * n.rms() / mean))
        .orElse(Figure.unknown(mean > 0 ? neutral.basis() : "no line current"));
  }

  private CaptureResult.CurrentFigures currentFigures(ChannelFigures fit, double largestLineA) {
    return new CaptureResult.CurrentFigures(
        Figure.of(fit.rms()),
        Figure.of(fit.spectrum().at(1).magnitude()),
        thdPercent(fit, largestLineA),
        crest(fit));
  }

  private CaptureResult.VoltageFigures voltageFigures(ChannelFigures fit, double largestLineV) {
    return new CaptureResult.VoltageFigures(
        Figure.of(fit.rms()),
        Figure.of(fit.spectrum().at(1).magnitude()),
        thdPercent(fit, largestLineV),
        crest(fit));
  }

  private double largestLine(List<String> quantities) {
    return quantities.stream()
        .map(channels::find)
        .flatMap(Optional::stream)
        .mapToDouble(f -> f.spectrum().at(1).magnitude())
        .max()
        .orElse(0);
  }

  /**
   * On a fundamental that is only noise beside its channel or its lines, distortion says nothing.
   */
  private Figure thdPercent(ChannelFigures fit, double largestLine) {
    double fundamental = fit.spectrum().at(1).magnitude();
    return fundamental < LEAST_FUNDAMENTAL * Math.max(fit.rms(), largestLine)
        ? Figure.unknown(
            "the fundamental is below 0.1 % of the channel's rms or of the largest line's"
                + " fundamental: too small to refer to")
        : Distortion.thdPercent(fit.spectrum());
  }

  private static Figure crest(ChannelFigures fit) {
    double rms = fit.rms();
    return rms > 0 ? Figure.of(fit.peak() / rms) : Figure.unknown("nothing flows");
  }
}
