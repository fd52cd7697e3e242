package fourthwire.testsupport;

import fourthwire.metering.RawFile;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.GeneralSecurityException;
import java.security.MessageDigest;
import java.util.HexFormat;

/** Meters' files, in memory and on disk. */
public final class RawFiles {
  private RawFiles() {}

  /** Of these bytes. */
  public static RawFile of(String name, byte[] bytes) {
    return new Held(name, bytes);
  }

  /** Of a text in UTF-8. */
  public static RawFile of(String name, String text) {
    return of(name, text.getBytes(StandardCharsets.UTF_8));
  }

  /** A file on disk; its digest is not told. */
  public static RawFile of(Path file) {
    return new OnDisk(file);
  }

  private record Held(String name, byte[] bytes) implements RawFile {
    @Override
    public String sha256() {
      try {
        return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
      } catch (GeneralSecurityException e) {
        throw new IllegalStateException(e);
      }
    }

    @Override
    public long length() {
      return bytes.length;
    }

    @Override
    public InputStream open() {
      return new ByteArrayInputStream(bytes);
    }
  }

  private record OnDisk(Path path) implements RawFile {
    @Override
    public String name() {
      return String.valueOf(path.getFileName());
    }

    @Override
    public String sha256() {
      return "";
    }

    @Override
    public long length() {
      return path.toFile().length();
    }

    @Override
    public InputStream open() throws IOException {
      return Files.newInputStream(path);
    }
  }
}
