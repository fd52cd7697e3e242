package fourthwire.quantity;

/**
 * A complex rms amount of one order: amps, volts, ohms or siemens, as the name of its holder says.
 *
 * <p>Sine reference: X∠φ at order h stands for √2·X·sin(hωt + φ).
 *
 * @param re real part
 * @param im imaginary part
 */
public record Phasor(double re, double im) {
  /** Nothing at all. */
  public static final Phasor ZERO = new Phasor(0, 0);

  /** The phasor of this magnitude at this angle in degrees. */
  public static Phasor polar(double magnitude, double degrees) {
    double radians = Math.toRadians(degrees);
    return new Phasor(magnitude * Math.cos(radians), magnitude * Math.sin(radians));
  }

  /** Length, rms. */
  public double magnitude() {
    return Math.hypot(re, im);
  }

  /** Angle in degrees, in (-180, 180]; 0 for the zero phasor. */
  public double degrees() {
    double degrees = Math.toDegrees(Math.atan2(im, re));
    return degrees == -180 ? 180 : degrees + 0.0;
  }

  /** This plus the other. */
  public Phasor plus(Phasor other) {
    return new Phasor(re + other.re, im + other.im);
  }

  /** This minus the other. */
  public Phasor minus(Phasor other) {
    return new Phasor(re - other.re, im - other.im);
  }

  /** Complex product. */
  public Phasor times(Phasor other) {
    return new Phasor(re * other.re - im * other.im, re * other.im + im * other.re);
  }

  /** Complex quotient; the divisor must not be zero. */
  public Phasor over(Phasor other) {
    double d = other.re * other.re + other.im * other.im;
    return new Phasor((re * other.re + im * other.im) / d, (im * other.re - re * other.im) / d);
  }

  /** Scaled by a real factor. */
  public Phasor times(double factor) {
    return new Phasor(re * factor, im * factor);
  }

  /** Turned forward by this many degrees. */
  public Phasor turned(double degrees) {
    return times(polar(1, degrees));
  }

  /** Complex conjugate. */
  public Phasor conjugate() {
    return new Phasor(re, -im);
  }
}
