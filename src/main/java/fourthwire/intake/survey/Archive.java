package fourthwire.intake.survey;

import fourthwire.site.check.SurveyError;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.regex.Pattern;
import java.util.zip.CRC32;
import org.apache.commons.compress.archivers.zip.ZipArchiveEntry;
import org.apache.commons.compress.archivers.zip.ZipFile;
import org.apache.commons.compress.utils.SeekableInMemoryByteChannel;

/**
 * Unpacks a zip file in memory, entry by entry, and refuses what could do harm: bombs, path names
 * that lead elsewhere, encrypted and damaged files.
 */
final class Archive {
  private static final int MOST_ENTRIES = 1000;
  private static final int BLOCK = 16_384;
  private static final Pattern DRIVE = Pattern.compile("^[A-Za-z]:.*");

  /** A file in the zip. */
  @SuppressWarnings("ArrayRecordComponent")
  record Entry(String path, byte[] bytes) {}

  private Archive() {}

  /** Whether the bytes begin as a zip file does. */
  static boolean isZip(byte[] bytes) {
    return bytes.length >= 4
        && bytes[0] == 'P'
        && bytes[1] == 'K'
        && (bytes[2] == 3 && bytes[3] == 4 || bytes[2] == 5 && bytes[3] == 6);
  }

  /** The files in the zip, in its order; folders are left out. */
  static List<Entry> unpack(byte[] bytes, Guards guards) throws RefusedException {
    try (ZipFile zip =
        ZipFile.builder().setSeekableByteChannel(new SeekableInMemoryByteChannel(bytes)).get()) {
      List<ZipArchiveEntry> entries = Collections.list(zip.getEntriesInPhysicalOrder());
      if (entries.size() > MOST_ENTRIES) {
        throw refusal("The zip holds more than %d files.".formatted(MOST_ENTRIES));
      }
      List<Entry> unpacked = new ArrayList<>();
      for (ZipArchiveEntry entry : entries) {
        checkName(rawName(entry));
        if (!entry.isDirectory()) {
          unpacked.add(new Entry(entry.getName(), content(zip, entry, guards)));
        }
      }
      return unpacked;
    } catch (IOException | IllegalArgumentException e) {
      throw damaged("it is cut off, or its directory can't be read");
    }
  }

  private static byte[] content(ZipFile zip, ZipArchiveEntry entry, Guards guards)
      throws IOException, RefusedException {
    if (entry.getGeneralPurposeBit().usesEncryption()) {
      throw refusal("The zip is encrypted. Pack it again without a password.");
    }
    ByteArrayOutputStream content = new ByteArrayOutputStream();
    CRC32 checksum = new CRC32();
    byte[] block = new byte[BLOCK];
    try (InputStream stream = zip.getInputStream(entry)) {
      for (int n = stream.read(block); n >= 0; n = stream.read(block)) {
        guards.countUnpacked(n);
        checksum.update(block, 0, n);
        content.write(block, 0, n);
      }
    }
    if (checksum.getValue() != entry.getCrc()) {
      throw damaged("the checksum of " + entry.getName() + " does not match");
    }
    return content.toByteArray();
  }

  /** The name as written: the library turns backslashes into slashes. */
  private static String rawName(ZipArchiveEntry entry) {
    return new String(entry.getRawName(), StandardCharsets.ISO_8859_1);
  }

  private static void checkName(String name) throws RefusedException {
    boolean leadsElsewhere =
        name.startsWith("/")
            || name.contains("\\")
            || DRIVE.matcher(name).matches()
            || List.of(name.split("/")).contains("..")
            || name.chars().anyMatch(Character::isISOControl);
    if (leadsElsewhere) {
      throw refusal(
          "The zip holds a file with the path \""
              + name.replaceAll("\\p{Cntrl}", "?")
              + "\". Absolute paths, \"..\", backslashes and control characters are refused; put"
              + " the table files side by side in the zip.");
    }
  }

  private static RefusedException damaged(String reason) {
    return refusal("The zip is damaged (" + reason + "). Pack and send it again.");
  }

  private static RefusedException refusal(String message) {
    return new RefusedException(SurveyError.ofFile(message));
  }
}
