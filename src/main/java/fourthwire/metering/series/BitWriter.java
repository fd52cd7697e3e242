package fourthwire.metering.series;

import java.util.Arrays;

/** Writes numbers of few bits one behind the other. */
final class BitWriter {
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

  private void flush() {
    if (at + 4 > bytes.length) {
      bytes = Arrays.copyOf(bytes, 2 * bytes.length);
    }
    heldBits -= 32;
    int word = (int) (held >>> heldBits);
    bytes[at++] = (byte) (word >>> 24);
    bytes[at++] = (byte) (word >>> 16);
    bytes[at++] = (byte) (word >>> 8);
    bytes[at++] = (byte) word;
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
