package fourthwire.metering.series;

/** Reads what a {@link BitWriter} wrote. */
final class BitReader {
  private final byte[] bytes;
  private int at;
  private long held;
  private int heldBits;

  BitReader(byte[] bytes) {
    this.bytes = bytes;
  }

  /** The next number of so many bits, at most 64. */
  long get(int bits) {
    if (bits > 32) {
      long high = get(bits - 32);
      return high << 32 | get(32);
    }
    while (heldBits < bits) {
      held = held << 8 | bytes[at++] & 0xFF;
      heldBits += 8;
    }
    heldBits -= bits;
    return held >>> heldBits & (1L << bits) - 1;
  }
}
