package fourthwire.intake.reading.table;

import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.Charset;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.StandardCharsets;

/** The encoding of a text file, from its byte order mark or its first bytes. */
final class Encoding {
  private static final int LOOK = 1 << 16;

  private Encoding() {}

  /** The file's characters, byte order mark taken off. */
  static Reader open(InputStream raw) throws IOException {
    BufferedInputStream in = new BufferedInputStream(raw, LOOK);
    in.mark(LOOK);
    byte[] head = in.readNBytes(LOOK);
    in.reset();
    in.skipNBytes(mark(head));
    return new InputStreamReader(in, charset(head));
  }

  private static int mark(byte[] b) {
    if (starts(b, 0xEF, 0xBB, 0xBF)) {
      return 3;
    }
    return starts(b, 0xFF, 0xFE) || starts(b, 0xFE, 0xFF) ? 2 : 0;
  }

  private static Charset charset(byte[] b) {
    if (starts(b, 0xFF, 0xFE) || b.length > 3 && b[0] != 0 && b[1] == 0 && b[3] == 0) {
      return StandardCharsets.UTF_16LE;
    }
    if (starts(b, 0xFE, 0xFF) || b.length > 3 && b[0] == 0 && b[1] != 0 && b[2] == 0) {
      return StandardCharsets.UTF_16BE;
    }
    return isUtf8(b) ? StandardCharsets.UTF_8 : Charset.forName("windows-1252");
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
    return !decoder.decode(ByteBuffer.wrap(b), CharBuffer.allocate(b.length + 1), false).isError();
  }
}
