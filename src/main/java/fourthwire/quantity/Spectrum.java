package fourthwire.quantity;

import java.util.Arrays;
import java.util.function.IntFunction;

/**
 * The rms phasors of one conductor's current or voltage at orders 1 to {@value #HIGHEST_ORDER}.
 *
 * <p>Immutable. A direct component is not kept: the network is solved for alternating orders only.
 */
public final class Spectrum {
  /** The highest order kept, as in the definitions of THD and TDD of IEEE 519-2022, clause 3. */
  public static final int HIGHEST_ORDER = 50;

  /** A spectrum that is zero at every order. */
  public static final Spectrum ZERO = of(h -> Phasor.ZERO);

  private final double[] re;
  private final double[] im;

  private Spectrum(double[] re, double[] im) {
    this.re = re;
    this.im = im;
  }

  /** The spectrum whose phasor at each order 1 to 50 the function gives. */
  public static Spectrum of(IntFunction<Phasor> byOrder) {
    double[] re = new double[HIGHEST_ORDER + 1];
    double[] im = new double[HIGHEST_ORDER + 1];
    for (int h = 1; h <= HIGHEST_ORDER; h++) {
      Phasor p = byOrder.apply(h);
      re[h] = p.re();
      im[h] = p.im();
    }
    return new Spectrum(re, im);
  }

  /**
   * The spectrum held in two arrays indexed by order.
   *
   * @param re real parts, index 0 unused, length 51
   * @param im imaginary parts likewise
   */
  public static Spectrum of(double[] re, double[] im) {
    if (re.length != HIGHEST_ORDER + 1 || im.length != HIGHEST_ORDER + 1) {
      throw new IllegalArgumentException("a spectrum takes 51 values, index 0 unused");
    }
    double[] r = re.clone();
    double[] i = im.clone();
    r[0] = 0;
    i[0] = 0;
    return new Spectrum(r, i);
  }

  /** The phasor at this order. */
  public Phasor at(int order) {
    return new Phasor(re(order), im(order));
  }

  /** Real part at this order. */
  public double re(int order) {
    return re[checked(order)];
  }

  /** Imaginary part at this order. */
  public double im(int order) {
    return im[checked(order)];
  }

  /** Rms magnitude at this order. */
  public double magnitude(int order) {
    return Math.hypot(re(order), im(order));
  }

  /** Copies the parts into arrays of length 51 indexed by order. */
  public void copyTo(double[] reInto, double[] imInto) {
    System.arraycopy(re, 0, reInto, 0, re.length);
    System.arraycopy(im, 0, imInto, 0, im.length);
  }

  /** Total rms over orders 1 to 50. */
  public double rms() {
    return Math.sqrt(squareFrom(1));
  }

  /** Rms of orders 2 to 50. */
  public double distortionRms() {
    return Math.sqrt(squareFrom(2));
  }

  private double squareFrom(int lowest) {
    double sum = 0;
    for (int h = lowest; h <= HIGHEST_ORDER; h++) {
      sum += re[h] * re[h] + im[h] * im[h];
    }
    return sum;
  }

  /** Order by order sum. */
  public Spectrum plus(Spectrum other) {
    return of(h -> at(h).plus(other.at(h)));
  }

  /** Order by order difference. */
  public Spectrum minus(Spectrum other) {
    return of(h -> at(h).minus(other.at(h)));
  }

  /** Every phasor scaled by a real factor. */
  public Spectrum times(double factor) {
    return of(h -> at(h).times(factor));
  }

  private static int checked(int order) {
    if (order < 1 || order > HIGHEST_ORDER) {
      throw new IllegalArgumentException("order " + order + " is outside 1 to 50");
    }
    return order;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Spectrum s && Arrays.equals(re, s.re) && Arrays.equals(im, s.im);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(re) + Arrays.hashCode(im);
  }

  @Override
  public String toString() {
    return "Spectrum[rms " + rms() + ", fundamental " + magnitude(1) + "]";
  }
}
