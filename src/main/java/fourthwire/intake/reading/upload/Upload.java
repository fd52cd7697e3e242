package fourthwire.intake.reading.upload;

import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.format.Format;
import fourthwire.intake.reading.format.Part;
import fourthwire.intake.reading.pqdif.Pqdif;
import fourthwire.intake.reading.wave.ComtradeFormat;
import fourthwire.metering.RawFile;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import org.apache.commons.compress.archivers.zip.ZipArchiveEntry;
import org.apache.commons.compress.archivers.zip.ZipArchiveInputStream;

/** What was uploaded, zips opened, sorted out into a format. */
final class Upload {
  private static final int MOST_BYTES = 200_000_000;
  private static final int MOST_PARTS = 200;

  private final List<Part> parts = new ArrayList<>();
  private long unpacked;

  private Upload() {}

  /** The format of these files. */
  static Format format(List<RawFile> files) {
    Upload upload = new Upload();
    files.forEach(upload::take);
    return upload.sortOut();
  }

  private void take(RawFile file) {
    if (isZip(file)) {
      int before = parts.size();
      unpack(file);
      List<Part> unpackedParts = parts.subList(before, parts.size());
      if (unpackedParts.stream().anyMatch(p -> p.name().equals(LogSheet.CONTENT_TYPES))) {
        Part sheet = sheet(file, List.copyOf(unpackedParts));
        unpackedParts.clear();
        parts.add(sheet);
      }
    } else {
      parts.add(new Part(file.name(), file.length(), file::open));
    }
  }

  /** Parts that declare a document type could reach outside the file. */
  private static Part sheet(RawFile file, List<Part> workbook) {
    for (Part part : workbook) {
      String text = new String(part.bytes(MOST_BYTES), StandardCharsets.ISO_8859_1);
      if (part.ending().matches("xml|rels")
          && (text.contains("<!DOCTYPE") || text.indexOf(0) >= 0)) {
        throw new ReadingRefusedException(
            file.name()
                + " is a workbook in UTF-16 or declares a document type, which is refused. Save it"
                + " again as xlsx, or its sheet as CSV.");
      }
      if (LogSheet.namesNoColumn(text)) {
        throw new ReadingRefusedException(
            file.name() + " names a column that no workbook has. Save its sheet as CSV.");
      }
    }
    byte[] csv =
        LogSheet.csv(
            file.name(), new Part(file.name(), file.length(), file::open).bytes(MOST_BYTES));
    return new Part(file.name(), csv.length, () -> new ByteArrayInputStream(csv));
  }

  /** By its first bytes: a name may say anything. */
  private static boolean isZip(RawFile file) {
    try (InputStream in = file.open()) {
      byte[] start = in.readNBytes(4);
      return start.length == 4 && start[0] == 'P' && start[1] == 'K' && start[2] == 3;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private void unpack(RawFile file) {
    try (ZipArchiveInputStream zip =
        new ZipArchiveInputStream(file.open(), StandardCharsets.UTF_8.name(), true, true)) {
      for (ZipArchiveEntry e = zip.getNextEntry(); e != null; e = zip.getNextEntry()) {
        String name = e.getName().substring(e.getName().replace('\\', '/').lastIndexOf('/') + 1);
        if (!e.isDirectory() && !name.startsWith(".")) {
          byte[] bytes = unpacked(zip, file.name());
          parts.add(new Part(name, bytes.length, () -> new ByteArrayInputStream(bytes)));
        }
      }
    } catch (IOException e) {
      throw new ReadingRefusedException(file.name() + " is no zip that can be opened.");
    }
  }

  private byte[] unpacked(InputStream zip, String name) throws IOException {
    byte[] bytes = zip.readNBytes((int) (MOST_BYTES - unpacked + 1));
    unpacked += bytes.length;
    if (unpacked > MOST_BYTES || parts.size() >= MOST_PARTS) {
      throw new ReadingRefusedException(
          name
              + " unpacks to more than "
              + MOST_BYTES / 1_000_000
              + " MB or "
              + MOST_PARTS
              + " files; upload the meter's files without the zip.");
    }
    return bytes;
  }

  private Format sortOut() {
    List<Part> combined = ending("cff");
    List<Part> configurations = ending("cfg");
    if (combined.size() == 1 && configurations.isEmpty()) {
      return ComtradeFormat.ofCombined(combined.get(0));
    }
    if (configurations.size() == 1 && combined.isEmpty()) {
      return ComtradeFormat.of(configurations.get(0), data(configurations.get(0)));
    }
    if (!ending("dat").isEmpty() && configurations.isEmpty()) {
      throw new ReadingRefusedException(
          "A COMTRADE data file (.dat) needs its configuration file (.cfg): upload both, or a zip"
              + " of them.");
    }
    if (parts.size() == 1) {
      Part only = parts.get(0);
      return Pqdif.isOne(only.start(16)) ? PqdifFormat.of(only) : TextFormat.of(only);
    }
    throw new ReadingRefusedException(
        "One reading at a time: one CSV file, one xlsx workbook, one PQDIF file, one CFF file, or"
            + " one CFG file with its DAT file; found "
            + (parts.isEmpty()
                ? "none"
                : String.join(", ", parts.stream().map(Part::name).toList()))
            + ".");
  }

  private List<Part> ending(String ending) {
    return parts.stream().filter(p -> p.ending().equals(ending)).toList();
  }

  private Part data(Part configuration) {
    List<Part> data = ending("dat");
    if (data.size() == 1) {
      return data.get(0);
    }
    return data.stream()
        .filter(p -> p.stem().equals(configuration.stem()))
        .findFirst()
        .orElseThrow(
            () ->
                new ReadingRefusedException(
                    "The COMTRADE configuration "
                        + configuration.name()
                        + " needs its data file, "
                        + configuration.stem()
                        + ".dat: upload both, or a zip of them."));
  }
}
