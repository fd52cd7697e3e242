package fourthwire.intake.reading.table;

import java.io.IOException;
import java.io.InputStream;
import java.util.Arrays;

/** Reads bytes in blocks that end where a row ends. */
final class Blocks {
  /** Small enough to stay near the processor and, for the collector, an array like any other. */
  private static final int SIZE = 1 << 18;

  private static final int LONGEST_ROW = 1 << 20;

  private final InputStream in;
  private final byte lineEnd;
  private final boolean quotes;
  private byte[] carry = new byte[0];
  private byte[] spare = new byte[0];
  private boolean ended;
  private long read;

  /**
   * Whole rows.
   *
   * @param bytes may be longer than {@code length}
   */
  record Block(byte[] bytes, int length) {}

  /**
   * @param lineEnd the last byte of a line end: LF, or CR where the file has no LF
   * @param quotes whether cells may be quoted, hence hold line ends
   */
  Blocks(InputStream in, byte lineEnd, boolean quotes) {
    this.in = in;
    this.lineEnd = lineEnd;
    this.quotes = quotes;
  }

  /** The next block; of length 0 at the end. */
  Block next() throws IOException {
    byte[] block = room(2 * carry.length);
    System.arraycopy(carry, 0, block, 0, carry.length);
    int length = carry.length;
    while (true) {
      int n = ended ? 0 : in.readNBytes(block, length, block.length - length);
      length += n;
      read += n;
      ended = ended || length < block.length;
      int cut = ended ? length : cut(block, length);
      if (cut > 0 || ended) {
        carry = Arrays.copyOfRange(block, cut, length);
        return new Block(block, cut);
      }
      if (length > LONGEST_ROW) {
        throw new TableException(
            "A row is longer than a million characters: this is no table of rows.");
      }
      block = Arrays.copyOf(block, 2 * block.length);
    }
  }

  private byte[] room(int least) {
    byte[] there = spare;
    spare = new byte[0];
    return there.length >= least && there.length >= SIZE ? there : new byte[Math.max(SIZE, least)];
  }

  /** Lets a block's bytes be overwritten. */
  void useAgain(Block block) {
    spare = block.bytes();
  }

  /** Bytes read so far. */
  long bytesRead() {
    return read;
  }

  /** The byte after the last line end that is in no quotes; 0 for none. */
  private int cut(byte[] block, int length) {
    int open = quotes ? quotes(block, length) % 2 : 0;
    for (int k = length - 1; k >= 0; k--) {
      if (block[k] == lineEnd && open == 0) {
        return k + 1;
      }
      open ^= quotes && block[k] == '"' ? 1 : 0;
    }
    return 0;
  }

  private static int quotes(byte[] block, int length) {
    int count = 0;
    for (int k = 0; k < length; k++) {
      count += block[k] == '"' ? 1 : 0;
    }
    return count;
  }
}
