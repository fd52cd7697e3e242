package fourthwire.intake.reading.format;

import fourthwire.intake.reading.ReadingRefusedException;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Locale;

/**
 * One file of an upload, taken out of its zip where it came in one.
 *
 * @param name without folders
 * @param length bytes
 */
public record Part(String name, long length, Source source) {
  /** Where its bytes are. */
  public interface Source {
    /** Opens them from the start. */
    InputStream open() throws IOException;
  }

  /** Ending of the name, lower-case. */
  public String ending() {
    return name.substring(name.lastIndexOf('.') + 1).toLowerCase(Locale.ROOT);
  }

  /** Name without its ending, lower-case. */
  public String stem() {
    int dot = name.lastIndexOf('.');
    return (dot < 0 ? name : name.substring(0, dot)).toLowerCase(Locale.ROOT);
  }

  public InputStream open() {
    try {
      return source.open();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Its first bytes, fewer where it is shorter. */
  public byte[] start(int count) {
    try (InputStream in = open()) {
      return in.readNBytes(count);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** All its bytes; refused above this many. */
  public byte[] bytes(int most) {
    try (InputStream in = open()) {
      byte[] bytes = in.readNBytes(most + 1);
      if (bytes.length > most) {
        throw new ReadingRefusedException(
            name + " is larger than " + most / 1_000_000 + " MB, the most a capture may hold.");
      }
      return bytes;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
