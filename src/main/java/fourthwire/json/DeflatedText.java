package fourthwire.json;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.zip.DataFormatException;
import java.util.zip.Deflater;
import java.util.zip.GZIPInputStream;
import java.util.zip.Inflater;

/**
 * Texts of results deflated with a dictionary of texts like them, so that what all of them say
 * costs next to nothing in each.
 *
 * <p>The first byte is the number of the dictionary. A dictionary never changes, as what was stored
 * with it could not be read any more; a better one gets the next number. What is older than the
 * first dictionary is gzipped.
 */
final class DeflatedText {
  private static final int DICTIONARY_NUMBER = 1;
  private static final byte[] DICTIONARY = resource("node-dictionary-1.txt");
  private static final int GZIP_FIRST_BYTE = 0x1f;
  private static final int BUFFER = 8192;

  private DeflatedText() {}

  static byte[] of(String text) {
    Deflater deflater = new Deflater(Deflater.DEFAULT_COMPRESSION, true);
    try {
      deflater.setDictionary(DICTIONARY);
      deflater.setInput(text.getBytes(StandardCharsets.UTF_8));
      deflater.finish();
      ByteArrayOutputStream bytes = new ByteArrayOutputStream(BUFFER);
      bytes.write(DICTIONARY_NUMBER);
      byte[] buffer = new byte[BUFFER];
      while (!deflater.finished()) {
        bytes.write(buffer, 0, deflater.deflate(buffer));
      }
      return bytes.toByteArray();
    } finally {
      deflater.end();
    }
  }

  static String text(byte[] bytes) {
    try {
      byte[] text = bytes[0] == GZIP_FIRST_BYTE ? gunzipped(bytes) : inflated(bytes);
      return new String(text, StandardCharsets.UTF_8);
    } catch (DataFormatException e) {
      throw new IllegalStateException("a stored result is damaged", e);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static byte[] inflated(byte[] bytes) throws DataFormatException {
    if (bytes[0] != DICTIONARY_NUMBER) {
      throw new DataFormatException("no dictionary has the number " + bytes[0]);
    }
    Inflater inflater = new Inflater(true);
    try {
      inflater.setDictionary(DICTIONARY);
      inflater.setInput(bytes, 1, bytes.length - 1);
      ByteArrayOutputStream text = new ByteArrayOutputStream(BUFFER);
      byte[] buffer = new byte[BUFFER];
      while (!inflater.finished()) {
        int count = inflater.inflate(buffer);
        if (count == 0 && inflater.needsInput()) {
          throw new DataFormatException("it ends too early");
        }
        text.write(buffer, 0, count);
      }
      return text.toByteArray();
    } finally {
      inflater.end();
    }
  }

  private static byte[] gunzipped(byte[] bytes) throws IOException {
    try (GZIPInputStream zip = new GZIPInputStream(new ByteArrayInputStream(bytes))) {
      return zip.readAllBytes();
    }
  }

  private static byte[] resource(String name) {
    try (InputStream in = DeflatedText.class.getResourceAsStream(name)) {
      if (in == null) {
        throw new IllegalStateException("missing from the program: " + name);
      }
      return in.readAllBytes();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
