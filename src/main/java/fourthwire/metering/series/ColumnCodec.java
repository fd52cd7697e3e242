package fourthwire.metering.series;

import java.nio.ByteBuffer;
import java.util.Arrays;

/**
 * Codes a column of values in few bytes, without loss.
 *
 * <p>Instruments print few decimals: values that all are whole multiples of a power of ten are
 * coded as those whole numbers, 128 to a block, each block by its smallest number and as many bits
 * as its range needs, or by the steps between its numbers where these are smaller. Any other column
 * is kept as it is.
 */
public final class ColumnCodec {
  private static final int BLOCK = 128;
  private static final int MOST_DECIMALS = 9;
  private static final byte RAW = -1;
  private static final long LARGEST = 1L << 52;
  private static final long NONE = Long.MIN_VALUE;
  private static final int DELTA = 64;
  private static final double[] POWERS = new double[MOST_DECIMALS + 1];

  static {
    for (int d = 0; d <= MOST_DECIMALS; d++) {
      POWERS[d] = Double.parseDouble("1e" + d);
    }
  }

  private ColumnCodec() {}

  /** Codes these values; NaN means none and comes back as NaN. */
  public static byte[] encode(double[] values) {
    long[] whole = new long[values.length];
    for (int decimals = decimals(values); decimals <= MOST_DECIMALS; decimals++) {
      if (whole(values, decimals, whole)) {
        return packed(whole, (byte) decimals);
      }
    }
    ByteBuffer raw = ByteBuffer.allocate(1 + 8 * values.length).put(RAW);
    for (double v : values) {
      raw.putDouble(v);
    }
    return raw.array();
  }

  /** Codes whole numbers, such as milliseconds. */
  public static byte[] encode(long[] values) {
    return packed(values.clone(), (byte) 0);
  }

  /** Decimals that the first values need; all may need more. */
  private static int decimals(double[] values) {
    int decimals = 0;
    for (int k = 0; k < values.length; k += 1 + values.length / 16) {
      while (decimals < MOST_DECIMALS && !isWhole(values[k], decimals)) {
        decimals++;
      }
    }
    return decimals;
  }

  private static boolean isWhole(double v, int decimals) {
    return Double.isNaN(v) || Math.rint(v * POWERS[decimals]) / POWERS[decimals] == v;
  }

  /** Whether all values are whole multiples; the NaN are noted as none. */
  private static boolean whole(double[] values, int decimals, long[] into) {
    double power = POWERS[decimals];
    for (int k = 0; k < values.length; k++) {
      double v = values[k];
      double scaled = Math.rint(v * power);
      if (scaled / power == v && Math.abs(scaled) < LARGEST && (v != 0 || 1 / v > 0)) {
        into[k] = (long) scaled;
      } else if (Double.isNaN(v)) {
        into[k] = NONE;
      } else {
        return false;
      }
    }
    return true;
  }

  private static byte[] packed(long[] whole, byte decimals) {
    BitWriter out = new BitWriter(2 + whole.length * 3);
    long[] codes = new long[BLOCK];
    out.put(decimals, 8);
    for (int from = 0; from < whole.length; from += BLOCK) {
      block(whole, from, Math.min(whole.length, from + BLOCK), codes, out);
    }
    return out.bytes();
  }

  /** The smallest number (64 bits), how many bits, and the numbers above it, 0 for none. */
  private static void block(long[] whole, int from, int to, long[] codes, BitWriter out) {
    long low = Long.MAX_VALUE;
    long high = Long.MIN_VALUE;
    boolean full = to - from > 1;
    for (int k = from; k < to; k++) {
      long w = whole[k];
      if (w == NONE) {
        full = false;
      } else {
        low = Math.min(low, w);
        high = Math.max(high, w);
      }
    }
    int bits = low > high ? 0 : bits(high - low + 1);
    if (full && steps(whole, from, to, high - low, codes, out)) {
      return;
    }
    out.put(bits, 8);
    out.put(low, 64);
    for (int k = from; k < to; k++) {
      long w = whole[k];
      codes[k - from] = w == NONE ? 0 : w - low + 1;
    }
    out.putAll(codes, to - from, bits);
  }

  /** The first number and the steps from there, where these are smaller; whether they are. */
  private static boolean steps(
      long[] whole, int from, int to, long range, long[] codes, BitWriter out) {
    long low = Long.MAX_VALUE;
    long high = Long.MIN_VALUE;
    for (int k = from + 1; k < to; k++) {
      long step = whole[k] - whole[k - 1];
      low = Math.min(low, step);
      high = Math.max(high, step);
      if (high - low > range) {
        return false;
      }
    }
    int bits = bits(high - low);
    if (bits * (to - from) + 64 >= bits(range + 1) * (to - from)) {
      return false;
    }
    out.put(DELTA + bits, 8);
    out.put(whole[from], 64);
    out.put(low, 64);
    for (int k = from + 1; k < to; k++) {
      codes[k - from - 1] = whole[k] - whole[k - 1] - low;
    }
    out.putAll(codes, to - from - 1, bits);
    return true;
  }

  private static int bits(long largest) {
    return 64 - Long.numberOfLeadingZeros(largest);
  }

  /** The values that {@link #encode(double[])} coded. */
  public static double[] decode(byte[] coded, int length) {
    double[] values = new double[length];
    if (coded[0] == RAW) {
      ByteBuffer raw = ByteBuffer.wrap(coded, 1, coded.length - 1);
      Arrays.setAll(values, k -> raw.getDouble());
      return values;
    }
    long[] whole = decodeWhole(coded, length);
    double power = POWERS[coded[0]];
    for (int k = 0; k < length; k++) {
      values[k] = whole[k] == NONE ? Double.NaN : whole[k] / power;
    }
    return values;
  }

  /** The whole numbers that {@link #encode(long[])} coded. */
  public static long[] decodeWhole(byte[] coded, int length) {
    BitReader in = new BitReader(coded);
    in.get(8);
    long[] whole = new long[length];
    for (int from = 0; from < length; from += BLOCK) {
      int to = Math.min(length, from + BLOCK);
      int bits = (int) in.get(8);
      long low = in.get(64);
      if (bits >= DELTA) {
        long step = in.get(64);
        whole[from] = low;
        for (int k = from + 1; k < to; k++) {
          whole[k] = whole[k - 1] + step + in.get(bits - DELTA);
        }
      } else {
        for (int k = from; k < to; k++) {
          long above = in.get(bits);
          whole[k] = above == 0 ? NONE : low + above - 1;
        }
      }
    }
    return whole;
  }
}
