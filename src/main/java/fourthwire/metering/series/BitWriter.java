package fourthwire.metering.series;

import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;
import java.nio.ByteOrder;
import java.util.Arrays;

/** Writes numbers of few bits one behind the other. */
final class BitWriter {
  private static final VarHandle WORDS =
      MethodHandles.byteArrayViewVarHandle(int[].class, ByteOrder.BIG_ENDIAN);

  private byte[] bytes;
  private int at;
  private long held;
  private int heldBits;

  BitWriter(int expectedBytes) {
    this.bytes = new byte[Math.max(64, expectedBytes)];
  }

  /** The lowest bits of a value, at most 64. */
  void put(long value, int bits) {
    if (bits > 32) {
      put(value >>> 32, bits - 32);
      put(value, 32);
      return;
    }
    held = held << bits | value & (1L << bits) - 1;
    heldBits += bits;
    if (heldBits >= 32) {
      flush();
    }
  }

  /** The lowest bits of each of these values, at most 64. */
  void putAll(long[] values, int count, int bits) {
    if (bits > 32) {
      for (int k = 0; k < count; k++) {
        put(values[k], bits);
      }
      return;
    }
    room(4 + count * bits / 8);
    long mask = (1L << bits) - 1;
    long word = held;
    int there = heldBits;
    int to = at;
    for (int k = 0; k < count; k++) {
      word = word << bits | values[k] & mask;
      there += bits;
      if (there >= 32) {
        there -= 32;
        WORDS.set(bytes, to, (int) (word >>> there));
        to += 4;
      }
    }
    held = word;
    heldBits = there;
    at = to;
  }

  private void room(int more) {
    if (at + more > bytes.length) {
      bytes = Arrays.copyOf(bytes, 2 * bytes.length + more);
    }
  }

  private void flush() {
    room(4);
    heldBits -= 32;
    WORDS.set(bytes, at, (int) (held >>> heldBits));
    at += 4;
  }

  byte[] bytes() {
    byte[] all = Arrays.copyOf(bytes, at + (heldBits + 7) / 8);
    for (int k = at; heldBits > 0; k++) {
      heldBits -= 8;
      all[k] = (byte) (heldBits >= 0 ? held >>> heldBits : held << -heldBits);
    }
    return all;
  }
}
