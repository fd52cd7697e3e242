package fourthwire.metering;

import java.io.IOException;
import java.io.InputStream;

/** A meter's file as it came. */
public interface RawFile {
  /** Its name, without folders. */
  String name();

  /** SHA-256 of its bytes, lower-case hexadecimal. */
  String sha256();

  /** Its length, bytes. */
  long length();

  /** Opens its bytes from the start, as often as asked; the caller closes. */
  InputStream open() throws IOException;
}
