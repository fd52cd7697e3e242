package fourthwire.config.demo;

import fourthwire.metering.RawFile;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import org.springframework.core.io.Resource;

/** A meter's file of the demo site. */
final class DemoFile implements RawFile {
  private final String name;
  private final byte[] bytes;

  private DemoFile(String name, byte[] bytes) {
    this.name = name;
    this.bytes = bytes;
  }

  static DemoFile of(Resource resource) {
    try {
      return new DemoFile(String.valueOf(resource.getFilename()), resource.getContentAsByteArray());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public String sha256() {
    try {
      return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
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
