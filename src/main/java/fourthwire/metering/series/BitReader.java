package fourthwire.metering.series;

import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;
import java.nio.ByteOrder;
import java.util.Arrays;

/** Reads what a {@link BitWriter} wrote. */
final class BitReader {
  private static final VarHandle WORD =
      MethodHandles.byteArrayViewVarHandle(long[].class, ByteOrder.BIG_ENDIAN);

  /** Most bits that one word holds wherever in a byte they begin. */
  private static final int IN_A_WORD = 57;

  private final byte[] bytes;
  private long bit;

  BitReader(byte[] bytes) {
    this.bytes = Arrays.copyOf(bytes, bytes.length + Long.BYTES);
  }

  /** The next number of so many bits, at most 64. */
  long get(int bits) {
    if (bits > IN_A_WORD) {
      long high = get(bits - 32);
      return high << 32 | get(32);
    }
    if (bits == 0) {
      return 0;
    }
    long word = (long) WORD.get(bytes, (int) (bit >>> 3));
    long value = word << (bit & 7) >>> 64 - bits;
    bit += bits;
    return value;
  }
}
