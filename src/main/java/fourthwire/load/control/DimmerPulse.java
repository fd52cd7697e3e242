package fourthwire.load.control;

import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;

/**
 * The current of a fired R-L from its firing to its end, and what it adds to each order.
 *
 * <p>With p the steady current that all orders would drive, i(x) = p(x) - p(a)·exp(-(x - a)·R/X)
 * from the firing a on, until it falls to zero at b. Its integrals with sines and cosines are
 * closed forms: products of two orders leave ∫ cos kx = (sin kb - sin ka)/k and ∫ sin kx = (cos ka
 * - cos kb)/k at their sum and difference, the exponential (e^(-D + jhb) - e^(jha))/(jh - R/X), D =
 * (b - a)·R/X. Angles in radians of the fundamental. Workspace of one thread.
 */
final class DimmerPulse {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;

  /** Places to the highest order's period at which the current's end is looked for. */
  private static final int PLACES = 8;

  private static final int LEAST_PLACES = 90;
  private static final int BISECTIONS = 50;

  /** Phasors of the steady current; as values in time they are over √2. */
  final double[] re = new double[ORDERS + 1];

  final double[] im = new double[ORDERS + 1];

  /** Whether there are odd orders only. */
  boolean halfWave;

  private final double[] sines = new double[2 * ORDERS + 1];
  private final double[] cosines = new double[2 * ORDERS + 1];

  private int step;
  private int highest;
  private double decay;
  private double fired;
  private double atFiring;

  /** Takes a voltage over R and X. */
  void set(double[] eRe, double[] eIm, double ohm, double reactance) {
    decay = reactance > 0 ? ohm / reactance : Double.POSITIVE_INFINITY;
    halfWave = true;
    highest = 1;
    for (int h = 1; h <= ORDERS; h++) {
      double x = h * reactance;
      double square = ohm * ohm + x * x;
      re[h] = (eRe[h] * ohm + eIm[h] * x) / square;
      im[h] = (eIm[h] * ohm - eRe[h] * x) / square;
      if (re[h] != 0 || im[h] != 0) {
        highest = h;
        halfWave &= h % 2 == 1;
      }
    }
    step = halfWave ? 2 : 1;
  }

  /**
   * Adds a pulse to the spectrum.
   *
   * @param from where it is fired
   * @param toNext to the next firing
   * @param sign of the voltage then
   * @return false where it would last beyond the next firing
   */
  boolean add(double from, double toNext, int sign, PortSpectra into) {
    fired = from;
    atFiring = steady(from);
    double end = extinction(sign, toNext);
    if (Double.isNaN(end)) {
      return false;
    }
    integrals(fired, end);
    for (int h = 1; h <= ORDERS; h += step) {
      addOrder(h, end, into);
    }
    if (!halfWave) {
      addDirect(end, into);
    }
    return true;
  }

  /** ∫ sin kx and ∫ cos kx between two angles. */
  private void integrals(double a, double b) {
    double sinA = Math.sin(a);
    double cosA = Math.cos(a);
    double sinB = Math.sin(b);
    double cosB = Math.cos(b);
    double sa = 0;
    double ca = 1;
    double sb = 0;
    double cb = 1;
    cosines[0] = b - a;
    for (int k = 1; k <= 2 * ORDERS; k++) {
      double next = sa * cosA + ca * sinA;
      ca = ca * cosA - sa * sinA;
      sa = next;
      next = sb * cosB + cb * sinB;
      cb = cb * cosB - sb * sinB;
      sb = next;
      sines[k] = (ca - cb) / k;
      cosines[k] = (sb - sa) / k;
    }
  }

  private void addOrder(int h, double end, PortSpectra into) {
    double withSine = 0;
    double withCosine = 0;
    for (int n = 1; n <= highest; n += step) {
      int apart = Math.abs(n - h);
      double sine = n > h ? sines[apart] : -sines[apart];
      withSine += re[n] * (cosines[apart] - cosines[n + h]) + im[n] * (sines[n + h] - sine);
      withCosine += re[n] * (sines[n + h] + sine) + im[n] * (cosines[apart] + cosines[n + h]);
    }
    double share = step / Math.PI;
    into.re[0][h] += share * (0.5 * withSine);
    into.im[0][h] += share * (0.5 * withCosine);
    if (decay < Double.POSITIVE_INFINITY) {
      addDecay(h, end, share * atFiring, into);
    }
  }

  /** Mean over the cycle, amps. */
  private void addDirect(double end, PortSpectra into) {
    double charge = 0;
    for (int n = 1; n <= highest; n++) {
      charge += re[n] * sines[n] + im[n] * cosines[n];
    }
    if (decay < Double.POSITIVE_INFINITY) {
      charge -= atFiring * (1 - Math.exp(-(end - fired) * decay)) / decay;
    }
    into.direct[0] += Math.sqrt(2) * charge / (2 * Math.PI);
  }

  private void addDecay(int h, double end, double size, PortSpectra into) {
    double left = Math.exp(-(end - fired) * decay);
    double real = left * Math.cos(h * end) - Math.cos(h * fired);
    double imaginary = left * Math.sin(h * end) - Math.sin(h * fired);
    double factor = size / (decay * decay + h * h);
    into.re[0][h] += factor * (decay * imaginary + h * real);
    into.im[0][h] += factor * (decay * real - h * imaginary);
  }

  private double steady(double at) {
    double sin = Math.sin(step * at);
    double cos = Math.cos(step * at);
    double s = Math.sin(at);
    double c = Math.cos(at);
    double sum = 0;
    for (int h = 1; h <= highest; h += step) {
      sum += re[h] * s + im[h] * c;
      double next = s * cos + c * sin;
      c = c * cos - s * sin;
      s = next;
    }
    return sum;
  }

  private double current(double at) {
    double p = steady(at);
    return decay == Double.POSITIVE_INFINITY ? p : p - atFiring * Math.exp(-(at - fired) * decay);
  }

  /** Where the current falls back to zero; NaN where it does not before the next firing. */
  private double extinction(int sign, double toNext) {
    int places = Math.max(LEAST_PLACES, PLACES / 2 * highest);
    double width = toNext / places;
    double before = fired;
    for (int n = 1; n <= places; n++) {
      double at = fired + n * width;
      if (sign * current(at) <= 0) {
        return n == 1 && sign * current(fired + 0.1 * width) <= 0
            ? fired
            : bisect(before, at, sign);
      }
      before = at;
    }
    return Double.NaN;
  }

  private double bisect(double low, double high, int sign) {
    double a = low;
    double b = high;
    for (int n = 0; n < BISECTIONS; n++) {
      double middle = (a + b) / 2;
      if (sign * current(middle) > 0) {
        a = middle;
      } else {
        b = middle;
      }
    }
    return (a + b) / 2;
  }
}
