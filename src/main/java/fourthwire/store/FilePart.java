package fourthwire.store;

import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;
import java.nio.ByteOrder;
import java.util.Arrays;

/**
 * A part of a file in about half its space where it is a table of figures: digits, marks and line
 * ends are so few different bytes that two of them fit in one. Far quicker than to look for
 * repetitions, of which figures have few, and no larger.
 *
 * <p>Packed: the length in four bytes, the fifteen commonest bytes, then the part two bytes at a
 * time, each pair the two numbers of its bytes in that list, or {@link #OTHER} and the pair as it
 * is. A first byte says whether a part is packed.
 */
final class FilePart {
  private static final byte PLAIN = 0;
  private static final byte PACKED = 1;
  private static final int COMMON = 15;
  private static final int HEAD = 1 + Integer.BYTES + COMMON;

  private static final VarHandle PAIRS =
      MethodHandles.byteArrayViewVarHandle(short[].class, ByteOrder.BIG_ENDIAN);

  /** No pair of two of the fifteen. */
  private static final byte OTHER = (byte) 0xff;

  private FilePart() {}

  /** Packs these bytes, or keeps them as they are where that takes less. */
  static byte[] pack(byte[] part) {
    byte[] packed = new byte[1 + part.length];
    int length = pack(part, packed);
    if (length > 0) {
      return Arrays.copyOf(packed, length);
    }
    packed[0] = PLAIN;
    System.arraycopy(part, 0, packed, 1, part.length);
    return packed;
  }

  /** The length of what was written; 0 where there is no room for it. */
  private static int pack(byte[] part, byte[] into) {
    if (into.length < HEAD) {
      return 0;
    }
    byte[] common = common(part);
    into[0] = PACKED;
    for (int k = 0; k < Integer.BYTES; k++) {
      into[1 + k] = (byte) (part.length >>> 8 * k);
    }
    System.arraycopy(common, 0, into, 1 + Integer.BYTES, COMMON);
    int[] number = new int[256];
    Arrays.fill(number, COMMON);
    for (int k = 0; k < COMMON; k++) {
      number[common[k] & 0xff] = k;
    }
    int at = HEAD;
    for (int k = 0; k < part.length; k += 2) {
      byte second = k + 1 < part.length ? part[k + 1] : common[0];
      int high = number[part[k] & 0xff];
      int low = number[second & 0xff];
      boolean pair = high < COMMON && low < COMMON;
      if (at + (pair ? 1 : 3) > into.length) {
        return 0;
      }
      into[at++] = pair ? (byte) (high << 4 | low) : OTHER;
      if (!pair) {
        into[at++] = part[k];
        into[at++] = second;
      }
    }
    return at;
  }

  private static byte[] common(byte[] part) {
    long[] count = new long[256];
    for (byte b : part) {
      count[b & 0xff]++;
    }
    // A count and its byte in one number, sorted together.
    for (int k = 0; k < count.length; k++) {
      count[k] = count[k] << 8 | k;
    }
    Arrays.sort(count);
    byte[] common = new byte[COMMON];
    for (int k = 0; k < COMMON; k++) {
      common[k] = (byte) count[count.length - 1 - k];
    }
    return common;
  }

  /**
   * Unpacks what {@link #pack} packed.
   *
   * @param into has room for the part, and a byte more where its length is odd
   * @return the part's length
   */
  static int unpack(byte[] packed, byte[] into) {
    if (packed[0] == PLAIN) {
      System.arraycopy(packed, 1, into, 0, packed.length - 1);
      return packed.length - 1;
    }
    int length = 0;
    for (int k = 0; k < Integer.BYTES; k++) {
      length |= (packed[1 + k] & 0xff) << 8 * k;
    }
    short[] pairs = pairs(packed);
    int at = HEAD;
    for (int k = 0; k < length; k += 2) {
      byte pair = packed[at++];
      if (pair == OTHER) {
        into[k] = packed[at++];
        into[k + 1] = packed[at++];
      } else {
        PAIRS.set(into, k, pairs[pair & 0xff]);
      }
    }
    return length;
  }

  /** The two bytes that each number stands for. */
  private static short[] pairs(byte[] packed) {
    short[] pairs = new short[256];
    for (int high = 0; high < COMMON; high++) {
      for (int low = 0; low < COMMON; low++) {
        int first = packed[1 + Integer.BYTES + high] & 0xff;
        int second = packed[1 + Integer.BYTES + low] & 0xff;
        pairs[high << 4 | low] = (short) (first << 8 | second);
      }
    }
    return pairs;
  }
}
