package fourthwire.metering.capture;

import fourthwire.metering.capture.fit.Fundamental;
import fourthwire.metering.capture.fit.HarmonicFit;
import fourthwire.metering.capture.fit.NoFundamentalException;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.quantity.Phasor;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Fills samples that were not recorded by the orders fitted to the cycles around them, so that a
 * few missing ones do not cost a record its windows.
 */
final class Gaps {
  private static final int CYCLES = 10;

  /** A stretch with less than this share recorded is not filled. */
  private static final double LEAST_RECORDED = 0.7;

  private final Capture capture;
  private final double siteHz;

  Gaps(Capture capture, double siteHz) {
    this.capture = capture;
    this.siteHz = siteHz;
  }

  /** The capture without gaps; empty where too much is missing or the sampling is uneven. */
  Optional<Capture> filled() {
    if (capture.channels().stream().allMatch(c -> capture.of(c).extremes().missing() == 0)) {
      return Optional.of(capture);
    }
    if (!capture.time().isEven()) {
      return Optional.empty();
    }
    try {
      List<Samples> filled = new ArrayList<>();
      for (Capture.Channel c : capture.channels()) {
        filled.add(filled(capture.of(c)));
      }
      return Optional.of(new Capture(capture.start(), capture.time(), capture.channels(), filled));
    } catch (NoFundamentalException e) {
      return Optional.empty();
    }
  }

  private Samples filled(Samples x) {
    double rate = capture.time().rateHz().orElseThrow();
    int stretch = (int) Math.min(x.count(), Math.round(CYCLES * rate / siteHz));
    Samples filled = x;
    for (int from = 0; from < x.count(); from += stretch) {
      int begin = Math.min(from, x.count() - stretch);
      double[] some = new double[stretch];
      x.copy(begin, stretch, some, 0);
      if (isMissing(some)) {
        filled = filled.filled(begin, modelled(some));
      }
    }
    return filled;
  }

  private static boolean isMissing(double[] x) {
    int missing = 0;
    for (double value : x) {
      missing += Double.isNaN(value) ? 1 : 0;
    }
    if (missing > (1 - LEAST_RECORDED) * x.length) {
      throw new NoFundamentalException("too many samples are missing");
    }
    return missing > 0;
  }

  private double[] modelled(double[] x) {
    double[] t = capture.time().first(x.length);
    double hertz = new Fundamental(t, List.of(x), siteHz).hertz();
    int orders =
        (int)
            Math.min(
                50, Math.floor(LEAST_RECORDED * capture.time().rateHz().orElseThrow() / hertz / 2));
    HarmonicFit fit = HarmonicFit.of(t, x, x.length, hertz, orders);
    double[] model = new double[x.length];
    for (int k = 0; k < x.length; k++) {
      double sum = 0;
      for (int h = 1; h <= orders && Double.isNaN(x[k]); h++) {
        Phasor p = fit.at(h);
        double angle = 2 * Math.PI * h * hertz * t[k];
        sum += p.re() * Math.sin(angle) + p.im() * Math.cos(angle);
      }
      model[k] = fit.direct() + Math.sqrt(2) * sum;
    }
    return model;
  }
}
