package fourthwire.intake.survey;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.LocalDateTime;
import java.util.Map;
import java.util.zip.Deflater;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;

/** Writes zip files whose bytes depend on nothing but their content: every time stamp is fixed. */
final class ZipFiles {
  private static final LocalDateTime STAMP = LocalDateTime.of(2000, 1, 1, 0, 0);

  private ZipFiles() {}

  /** Packed, in the map's order. */
  static byte[] packed(Map<String, byte[]> files) {
    return write(files, Deflater.DEFAULT_COMPRESSION);
  }

  /** Hardly packed, for reading at once. */
  static byte[] stored(Map<String, byte[]> files) {
    return write(files, Deflater.NO_COMPRESSION);
  }

  private static byte[] write(Map<String, byte[]> files, int level) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (ZipOutputStream zip = new ZipOutputStream(bytes)) {
      zip.setLevel(level);
      for (Map.Entry<String, byte[]> file : files.entrySet()) {
        ZipEntry entry = new ZipEntry(file.getKey());
        entry.setTimeLocal(STAMP);
        zip.putNextEntry(entry);
        zip.write(file.getValue());
        zip.closeEntry();
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return bytes.toByteArray();
  }
}
