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
    while (heldBits >= 8) {
      if (at == bytes.length) {
        bytes = Arrays.copyOf(bytes, 2 * at);
      }
      heldBits -= 8;
      bytes[at++] = (byte) (held >>> heldBits);
    }
  }

  byte[] bytes() {
    byte[] all = Arrays.copyOf(bytes, heldBits > 0 ? at + 1 : at);
    if (heldBits > 0) {
      all[at] = (byte) (held << 8 - heldBits);
    }
    return all;
  }
}
