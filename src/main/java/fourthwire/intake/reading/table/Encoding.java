package fourthwire.intake.reading.table;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.Charset;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.StandardCharsets;

/**
 * The encoding of a text file, from its byte order mark or its first bytes. What reads on sees
 * bytes in which every ASCII character is one byte: UTF-16 comes as UTF-8.
 *
 * @param charset of the bytes that {@link #open} gives
 */
record Encoding(Charset charset, Charset written, int mark) {
  private static final int LOOK = 1 << 16;
  private static final Charset WINDOWS_1252 = Charset.forName("windows-1252");

  /** Of a file that begins so. */
  static Encoding of(InputStream raw) throws IOException {
    byte[] head = raw.readNBytes(LOOK);
    Charset written = charset(head);
    boolean wide = written == StandardCharsets.UTF_16LE || written == StandardCharsets.UTF_16BE;
    return new Encoding(wide ? StandardCharsets.UTF_8 : written, written, mark(head));
  }

  /** The file's bytes, byte order mark taken off. */
  InputStream open(InputStream raw) throws IOException {
    raw.skipNBytes(mark);
    return charset == written ? raw : new Recoded(new InputStreamReader(raw, written));
  }

  private static int mark(byte[] b) {
    if (starts(b, 0xEF, 0xBB, 0xBF)) {
      return 3;
    }
    return starts(b, 0xFF, 0xFE) || starts(b, 0xFE, 0xFF) ? 2 : 0;
  }

  private static Charset charset(byte[] b) {
    if (starts(b, 0xFF, 0xFE) || zeros(b, 1) > zeros(b, 0)) {
      return StandardCharsets.UTF_16LE;
    }
    if (starts(b, 0xFE, 0xFF) || zeros(b, 0) > zeros(b, 1)) {
      return StandardCharsets.UTF_16BE;
    }
    return isUtf8(b) ? StandardCharsets.UTF_8 : WINDOWS_1252;
  }

  /** Zero bytes at even or odd places of the beginning: half of every plain character in UTF-16. */
  private static int zeros(byte[] b, int odd) {
    int zeros = 0;
    for (int k = odd; k < Math.min(b.length, 400); k += 2) {
      zeros += b[k] == 0 ? 1 : 0;
    }
    return zeros > Math.min(b.length, 400) / 8 ? zeros : 0;
  }

  private static boolean starts(byte[] b, int... with) {
    for (int k = 0; k < with.length; k++) {
      if (b.length <= k || (b[k] & 0xFF) != with[k]) {
        return false;
      }
    }
    return true;
  }

  /** What was looked at may end within a character. */
  private static boolean isUtf8(byte[] b) {
    CharsetDecoder decoder = StandardCharsets.UTF_8.newDecoder();
    return !decoder
        .decode(ByteBuffer.wrap(b), CharBuffer.allocate(b.length + 1), b.length < LOOK)
        .isError();
  }

  /** Characters as UTF-8, a part at a time. */
  private static final class Recoded extends InputStream {
    private static final int PART = 1 << 15;

    private final Reader in;
    private InputStream part = new ByteArrayInputStream(new byte[0]);
    private boolean ended;

    Recoded(Reader in) {
      this.in = in;
    }

    @Override
    public int read() throws IOException {
      return more() ? part.read() : -1;
    }

    @Override
    public int read(byte[] into, int offset, int length) throws IOException {
      return more() ? part.read(into, offset, length) : -1;
    }

    private boolean more() throws IOException {
      while (!ended && part.available() == 0) {
        char[] chars = new char[PART];
        int n = in.read(chars, 0, PART - 1);
        ended = n < 0;
        if (n > 0) {
          n += pairEnd(chars, n);
          part = new ByteArrayInputStream(new String(chars, 0, n).getBytes(StandardCharsets.UTF_8));
        }
      }
      return part.available() > 0;
    }

    /** A pair of surrogates is not cut in two. */
    private int pairEnd(char[] chars, int n) throws IOException {
      return Character.isHighSurrogate(chars[n - 1]) ? Math.max(0, in.read(chars, n, 1)) : 0;
    }

    @Override
    public void close() throws IOException {
      in.close();
    }
  }
}
