package fourthwire.metering.capture;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.Period;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Turns a waveform capture into what it says.
 *
 * <p>The fundamental is found from the samples, whatever rate the file states for it; spectra are
 * the least-squares fit of orders 1 to 50 over the largest whole number of cycles, so the sampling
 * need not be synchronous. Rms and power are those of the samples without the direct component: a
 * current transformer passes none, so what an instrument shows there is its own offset, reported in
 * the findings. For a signal of harmonic orders all figures are exact to rounding; noise of rms σ
 * leaves about σ·√(2/samples) on each order.
 *
 * <p>Not made here: the 10/12-cycle windows, groups and aggregation of IEC 61000-4-7 and -4-30.
 */
public final class CaptureAnalysis {
  /** Below this share a fundamental is noise; common practice, no source. */
  private static final double LEAST_FUNDAMENTAL = 1e-3;

  private final Capture capture;
  private final Window window;
  private final Fits fits;
  private final Neutral neutral;

  private CaptureAnalysis(Capture capture, double nominalHz) {
    this.capture = capture;
    this.window = Window.of(capture, nominalHz);
    this.fits = new Fits(capture, window);
    this.neutral = Neutral.of(fits);
  }

  /**
   * Analyses a capture.
   *
   * @param nominalHz the site's frequency, 50 or 60; the fundamental is looked for within 20 % of
   *     it
   * @param notes how the file was read, put before what is noted here
   * @throws NoFundamentalException where there is no whole cycle of a steady fundamental
   */
  public static Reading of(Capture capture, double nominalHz, List<String> notes) {
    return new CaptureAnalysis(capture, nominalHz).reading(notes);
  }

  private Reading reading(List<String> notes) {
    return new Reading(
        ReadingKind.CAPTURE,
        period(),
        capture.count(),
        capture.sampleRateHz(),
        notes,
        new CaptureQuality(capture, window, fits, neutral).findings(),
        Optional.empty(),
        Optional.of(result()));
  }

  private Optional<Period> period() {
    double[] t = capture.timesS();
    double span = t.length * t[t.length - 1] / (t.length - 1);
    return capture.start().map(from -> new Period(from, plus(from, span)));
  }

  private static Instant plus(Instant from, double seconds) {
    return from.plusNanos(Math.round(seconds * 1e9));
  }

  private CaptureResult result() {
    Map<Conductor, CaptureResult.CurrentFigures> current = new LinkedHashMap<>();
    Map<Conductor, Spectrum> spectrum = new LinkedHashMap<>();
    double largestLineA = largestLine(Fits.LINES.stream().map(l -> l + ".i").toList());
    for (Conductor c : Conductor.values()) {
      Optional<HarmonicFit> fit = c.isLine() ? fits.current(c) : neutral.fit();
      fit.ifPresent(
          f -> {
            current.put(c, currentFigures(f, largestLineA));
            spectrum.put(c, fits.spectrum(f));
          });
    }
    Map<String, CaptureResult.VoltageFigures> voltage = new LinkedHashMap<>();
    Map<String, Spectrum> voltageSpectrum = new LinkedHashMap<>();
    double largestLineV =
        largestLine(
            voltageKeys().stream().filter(k -> k.startsWith("L")).map(k -> k + ".v").toList());
    for (String key : voltageKeys()) {
      HarmonicFit f = fits.find(key + ".v").orElseThrow();
      voltage.put(key, voltageFigures(f, largestLineV));
      voltageSpectrum.put(key, fits.spectrum(f));
    }
    CapturePower power = CapturePower.of(fits, neutral);
    return new CaptureResult(
        window.frequencyHz(),
        window.cycles(),
        window.basis(),
        current,
        percentOfMeanLine(),
        neutral.basis(),
        neutral
            .channel()
            .map(c -> Figure.of(c.alternatingRms()))
            .orElse(Figure.unknown("no channel is mapped as N")),
        voltage,
        spectrum,
        voltageSpectrum,
        power.total(),
        power.basis(),
        power.byLine());
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
    double mean = fits.meanLineA();
    return neutral
        .fit()
        .filter(n -> mean > 0)
        .map(n -> Figure.of(100 * n.alternatingRms() / mean))
        .orElse(Figure.unknown(mean > 0 ? neutral.basis() : "no line current"));
  }

  private CaptureResult.CurrentFigures currentFigures(HarmonicFit fit, double largestLineA) {
    return new CaptureResult.CurrentFigures(
        Figure.of(fit.alternatingRms()),
        Figure.of(fit.at(1).magnitude()),
        thdPercent(fit, largestLineA),
        crest(fit));
  }

  private CaptureResult.VoltageFigures voltageFigures(HarmonicFit fit, double largestLineV) {
    return new CaptureResult.VoltageFigures(
        Figure.of(fit.alternatingRms()),
        Figure.of(fit.at(1).magnitude()),
        thdPercent(fit, largestLineV),
        crest(fit));
  }

  private double largestLine(List<String> quantities) {
    return quantities.stream()
        .map(fits::find)
        .flatMap(Optional::stream)
        .mapToDouble(f -> f.at(1).magnitude())
        .max()
        .orElse(0);
  }

  /**
   * On a fundamental that is only noise beside its channel or its lines, distortion says nothing.
   */
  private Figure thdPercent(HarmonicFit fit, double largestLine) {
    double fundamental = fit.at(1).magnitude();
    return fundamental < LEAST_FUNDAMENTAL * Math.max(fit.alternatingRms(), largestLine)
        ? Figure.unknown(
            "the fundamental is below 0.1 % of the channel's rms or of the largest line's"
                + " fundamental: too small to refer to")
        : Distortion.thdPercent(fits.spectrum(fit));
  }

  private static Figure crest(HarmonicFit fit) {
    double rms = fit.alternatingRms();
    return rms > 0 ? Figure.of(fit.peak() / rms) : Figure.unknown("nothing flows");
  }
}
