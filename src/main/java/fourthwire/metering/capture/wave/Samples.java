package fourthwire.metering.capture.wave;

import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Instantaneous values of one channel, volts or amps; NaN where none was recorded. Immutable.
 *
 * <p>Held to 24 bits, as {@code float}: no instrument's converter resolves more, and a long record
 * takes half the memory.
 */
public final class Samples {
  private final float[] values;
  private @Nullable Extremes extremes;

  private Samples(float[] values) {
    this.values = values;
  }

  /** Of these values. */
  public static Samples of(double... values) {
    float[] held = new float[values.length];
    for (int k = 0; k < held.length; k++) {
      held[k] = (float) values[k];
    }
    return new Samples(held);
  }

  /** How many there are. */
  public int count() {
    return values.length;
  }

  /** The sample at this place, from 0. */
  public double at(int k) {
    return values[k];
  }

  /** The ends of their range; looked for once. */
  public Extremes extremes() {
    Extremes found = extremes;
    if (found == null) {
      found = Extremes.of(values);
      extremes = found;
    }
    return found;
  }

  /** Copies samples from this place on. */
  public void copy(int from, int count, double[] into, int at) {
    for (int k = 0; k < count; k++) {
      into[at + k] = values[from + k];
    }
  }

  /** A copy of so many samples from the first. */
  public double[] first(int count) {
    double[] copy = new double[count];
    copy(0, count, copy, 0);
    return copy;
  }

  /** Each sample times a factor. */
  public Samples times(double factor) {
    float[] scaled = new float[values.length];
    for (int k = 0; k < scaled.length; k++) {
      scaled[k] = (float) (values[k] * factor);
    }
    return new Samples(scaled);
  }

  /** Sample by sample the sum of these, each times its factor. */
  public static Samples sum(List<Samples> of, double... factors) {
    float[] sum = new float[of.get(0).count()];
    for (int c = 0; c < factors.length; c++) {
      float[] x = of.get(c).values;
      float factor = (float) factors[c];
      for (int k = 0; k < sum.length; k++) {
        sum[k] += factor * x[k];
      }
    }
    return new Samples(sum);
  }

  /** The same with the samples that are missing taken from elsewhere. */
  public Samples filled(int from, double[] with) {
    float[] filled = values.clone();
    for (int k = 0; k < with.length; k++) {
      if (Float.isNaN(filled[from + k])) {
        filled[from + k] = (float) with[k];
      }
    }
    return new Samples(filled);
  }

  /** Gathers samples one by one. */
  public static final class Gatherer {
    private float[] values;
    private int count;

    /** With room for so many at first. */
    public Gatherer(int room) {
      this.values = new float[Math.max(1, room)];
    }

    /** Adds one. */
    public void add(double value) {
      if (count == values.length) {
        values = Arrays.copyOf(values, 2 * count);
      }
      values[count++] = (float) value;
    }

    /** What was gathered; the gatherer is not used again. */
    public Samples done() {
      return new Samples(count == values.length ? values : Arrays.copyOf(values, count));
    }
  }
}
