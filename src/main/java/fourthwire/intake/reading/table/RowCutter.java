package fourthwire.intake.reading.table;

import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;
import java.nio.ByteOrder;
import java.nio.charset.Charset;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Cuts bytes into rows and cells (RFC 4180, with any separator of one ASCII character): one row at
 * a time, as positions in the bytes themselves, so that reading makes no object for a cell. Digits
 * are added up on the way, so that a plain number is known when its end is found.
 *
 * <p>A blank as the separator stands for any number of blanks: columns that were lined up.
 */
final class RowCutter {
  private static final byte QUOTE = '"';

  private static final VarHandle EIGHT =
      MethodHandles.byteArrayViewVarHandle(long[].class, ByteOrder.LITTLE_ENDIAN);
  private static final long ONES = 0x0101010101010101L;
  private static final long ZEROS = '0' * ONES;

  /** Lifts a byte above nine into its high bit. */
  private static final long NINES_UP = 0x7676767676767676L;

  private static final long HIGH_BITS = 0x8080808080808080L;
  private static final long[] POWERS = {
    1, 10, 100, 1000, 10_000, 100_000, 1_000_000, 10_000_000, 100_000_000
  };

  /** A cell that is no plain number. */
  private static final byte STRANGE = -1;

  private final byte separator;
  private final Charset charset;
  private final boolean decimalComma;
  private final byte mark;
  private byte[] bytes = new byte[0];
  private int[] start = new int[256];
  private int[] end = new int[256];
  private long[] digits = new long[256];
  private byte[] decimals = new byte[256];
  private int cells;
  private int most = Integer.MAX_VALUE;

  RowCutter(char separator, Charset charset, boolean decimalComma) {
    this.separator = (byte) separator;
    this.charset = charset;
    this.decimalComma = decimalComma;
    // A comma that separates cells is a decimal comma within quotes only.
    this.mark = (byte) (!decimalComma ? '.' : separator == ',' ? 0 : ',');
  }

  /** Cuts no more than so many cells of a row, which must hold no line end in quotes. */
  RowCutter first(int mostCells) {
    most = mostCells;
    return this;
  }

  /**
   * Cuts the row that begins here.
   *
   * @param from its first byte
   * @param to the byte after the last there is
   * @return the first byte of the next row
   */
  int next(byte[] block, int from, int to) {
    bytes = block;
    cells = 0;
    int at = separator == ' ' ? skipBlanks(block, from, to) : from;
    while (true) {
      int cellEnd = at < to && block[at] == QUOTE ? quoted(at, to) : plain(at, to);
      at = cellEnd;
      if (at >= to) {
        return to;
      }
      byte c = block[at++];
      if (c == separator) {
        if (cells >= most) {
          return rowEnd(lineEnd(block, at, to), to);
        }
        at = separator == ' ' ? skipBlanks(block, at, to) : at;
        if (separator == ' ' && (at >= to || block[at] == '\n' || block[at] == '\r')) {
          return rowEnd(at, to);
        }
      } else {
        return rowEnd(at - 1, to);
      }
    }
  }

  private static int lineEnd(byte[] block, int from, int to) {
    int at = from;
    while (at + Long.BYTES <= to && !isLineEndIn((long) EIGHT.get(block, at))) {
      at += Long.BYTES;
    }
    while (at < to && block[at] != '\n' && block[at] != '\r') {
      at++;
    }
    return at;
  }

  private static boolean isLineEndIn(long eight) {
    return ((zeros(eight ^ '\n' * ONES) | zeros(eight ^ '\r' * ONES)) & HIGH_BITS) != 0;
  }

  /** Has the high bit of each byte that is zero. */
  private static long zeros(long eight) {
    return eight - ONES & ~eight;
  }

  private static int skipBlanks(byte[] block, int from, int to) {
    int at = from;
    while (at < to && block[at] == ' ') {
      at++;
    }
    return at;
  }

  /** Passes over one line end: LF, CR, or CR LF. */
  private int rowEnd(int at, int to) {
    if (at < to && bytes[at] == '\r') {
      return at + 1 < to && bytes[at + 1] == '\n' ? at + 2 : at + 1;
    }
    return Math.min(to, at + 1);
  }

  private int plain(int from, int to) {
    byte[] b = bytes;
    int first = from < to && b[from] == '-' ? from + 1 : from;
    int last = to - Long.BYTES + 1;
    int point = -1;
    long sum = 0;
    int at = first;
    while (at < last) {
      long eight = (long) EIGHT.get(b, at) ^ ZEROS;
      int count = digits(eight);
      sum = sum * POWERS[count] + number(eight, count);
      at += count;
      if (count < Long.BYTES) {
        if (b[at] != mark || point >= 0) {
          break;
        }
        point = at++;
      }
    }
    while (at < to && at >= last) {
      int digit = b[at] - '0';
      if (digit >= 0 && digit <= 9) {
        sum = 10 * sum + digit;
      } else if (b[at] == mark && point < 0) {
        point = at;
      } else {
        break;
      }
      at++;
    }
    int count = at - first - (point < 0 ? 0 : 1);
    int end = rest(b, at, to);
    add(from, end);
    if (end == at && count > 0 && count <= Numbers.MOST_DIGITS) {
      digits[cells - 1] = first == from ? sum : -sum;
      decimals[cells - 1] = (byte) (point < 0 ? 0 : at - point - 1);
    }
    return end;
  }

  /** How many of eight bytes, digits less their zero, are digits before the first that is none. */
  private static int digits(long eight) {
    long none = (eight + NINES_UP | eight) & HIGH_BITS;
    return Long.numberOfTrailingZeros(none) >>> 3;
  }

  /** The number that so many digits are: two by two, four by four, all eight at once. */
  private static long number(long eight, int count) {
    if (count == 0) {
      return 0;
    }
    long n = eight << Long.SIZE - Byte.SIZE * count;
    n = n * 10 + (n >>> 8) & 0x00ff00ff00ff00ffL;
    n = n * 100 + (n >>> 16) & 0x0000ffff0000ffffL;
    return n * 10_000 + (n >>> 32) & 0xffffffffL;
  }

  /** Passes over what is left of a cell. */
  private int rest(byte[] b, int from, int to) {
    byte end = separator;
    int at = from;
    while (at < to && b[at] != end && b[at] != '\n' && b[at] != '\r') {
      at++;
    }
    return at;
  }

  /** A cell in quotes; what stands between the closing quote and the separator is dropped. */
  private int quoted(int from, int to) {
    int at = from + 1;
    while (at < to && (bytes[at] != QUOTE || at + 1 < to && bytes[at + 1] == QUOTE)) {
      at += bytes[at] == QUOTE ? 2 : 1;
    }
    add(from + 1, Math.min(at, to));
    return Math.min(rest(bytes, at + 1, to), to);
  }

  private void add(int from, int to) {
    if (cells == start.length) {
      start = Arrays.copyOf(start, 2 * cells);
      end = Arrays.copyOf(end, 2 * cells);
      digits = Arrays.copyOf(digits, 2 * cells);
      decimals = Arrays.copyOf(decimals, 2 * cells);
    }
    start[cells] = from;
    decimals[cells] = STRANGE;
    end[cells++] = to;
  }

  /** Cells of this row. */
  int cells() {
    return cells;
  }

  /** Whether nothing stands in this row. */
  boolean isEmpty() {
    return cells == 0 || cells == 1 && isBlank(0);
  }

  private boolean isBlank(int cell) {
    for (int k = start[cell]; k < end[cell]; k++) {
      if (bytes[k] > ' ' || bytes[k] < 0) {
        return false;
      }
    }
    return true;
  }

  /** The bytes that the cells stand in. */
  byte[] bytes() {
    return bytes;
  }

  /** First byte of a cell. */
  int start(int cell) {
    return start[cell];
  }

  /** The byte after a cell's last. */
  int end(int cell) {
    return end[cell];
  }

  /** A cell's text, trimmed; empty beyond the row's end. */
  String text(int cell) {
    if (cell >= cells) {
      return "";
    }
    String text = new String(bytes, start[cell], end[cell] - start[cell], charset);
    return trimmed(text.indexOf('"') < 0 ? text : text.replace("\"\"", "\""));
  }

  /** Blanks of every kind, and the end marks of old systems, taken off both ends. */
  private static String trimmed(String text) {
    int from = 0;
    int to = text.length();
    while (from < to && isSpace(text.charAt(from))) {
      from++;
    }
    while (to > from && isSpace(text.charAt(to - 1))) {
      to--;
    }
    return text.substring(from, to);
  }

  private static boolean isSpace(char c) {
    return c <= ' ' || Character.isSpaceChar(c) || c == '\uFEFF';
  }

  /** All cells of this row as text. */
  List<String> texts() {
    List<String> texts = new ArrayList<>(cells);
    for (int k = 0; k < cells; k++) {
      texts.add(text(k));
    }
    return texts;
  }

  /** A cell as a number times ten to the power of {@code shift}. */
  double number(int cell, int shift) {
    if (cell >= cells) {
      return Numbers.BLANK;
    }
    return decimals[cell] == STRANGE
        ? Numbers.parse(bytes, start[cell], end[cell], charset, decimalComma, shift)
        : Numbers.scaled(digits[cell], decimals[cell] - shift);
  }
}
