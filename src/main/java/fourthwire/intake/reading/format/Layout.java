package fourthwire.intake.reading.format;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.zip.CRC32;

/** Signature of a file's header: the same for every file that is laid out alike. */
public final class Layout {
  private Layout() {}

  /** Of a format and the headings in order. */
  public static String of(String format, List<String> headings) {
    CRC32 sum = new CRC32();
    sum.update(String.join("\n", headings).getBytes(StandardCharsets.UTF_8));
    return String.format("%s-%d-%08x", format, headings.size(), sum.getValue());
  }
}
