package fourthwire.web.api;

import fourthwire.metering.RawFile;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import org.springframework.web.multipart.MultipartFile;

/** An uploaded meter's file. */
public record UploadedFile(String name, String sha256, MultipartFile file) implements RawFile {
  /** The file as it was sent. */
  public static UploadedFile of(MultipartFile file) {
    return new UploadedFile(name(file), digest(file), file);
  }

  @Override
  public long length() {
    return file.getSize();
  }

  @Override
  public InputStream open() throws IOException {
    return file.getInputStream();
  }

  /** Without the folders some programs send along. */
  private static String name(MultipartFile file) {
    String sent = file.getOriginalFilename();
    String name = sent == null ? "" : sent.substring(sent.lastIndexOf('/') + 1);
    name = name.substring(name.lastIndexOf('\\') + 1).strip();
    return name.isEmpty() ? "readings" : name;
  }

  private static String digest(MultipartFile file) {
    try (DigestInputStream in =
        new DigestInputStream(file.getInputStream(), MessageDigest.getInstance("SHA-256"))) {
      in.transferTo(OutputStream.nullOutputStream());
      return HexFormat.of().formatHex(in.getMessageDigest().digest());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }
}
