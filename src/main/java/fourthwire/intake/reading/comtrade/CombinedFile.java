package fourthwire.intake.reading.comtrade;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The parts of a single-file record (CFF, IEEE C37.111-2013, clause 9). */
record CombinedFile(byte[] configuration, byte[] data) {
  private static final Pattern PART =
      Pattern.compile(
          "(?im)^(?:\u00EF\u00BB\u00BF)?---\\s*file type:\\s*([A-Z0-9"
              + " ]+?)\\s*(?::\\s*(\\d+))?\\s*---\\s*$");

  static CombinedFile of(byte[] file) {
    // One byte a character: positions in the text are positions in the bytes.
    String text = new String(file, StandardCharsets.ISO_8859_1);
    Matcher part = PART.matcher(text);
    byte[] configuration = new byte[0];
    byte[] data = new byte[0];
    boolean more = part.find();
    while (more) {
      String kind = part.group(1).toUpperCase(Locale.ROOT);
      String length = part.group(2);
      int from = afterLine(text, part.end());
      more = part.find(length == null ? from : Math.min(text.length(), from + bytes(length)));
      int to = length != null ? from + bytes(length) : more ? part.start() : text.length();
      if (kind.startsWith("CFG")) {
        configuration = Arrays.copyOfRange(file, from, Math.max(from, Math.min(to, file.length)));
      } else if (kind.startsWith("DAT")) {
        data = Arrays.copyOfRange(file, from, Math.max(from, Math.min(to, file.length)));
      }
    }
    if (configuration.length == 0 || data.length == 0) {
      throw new ComtradeException("A CFF file needs a CFG part and a DAT part.");
    }
    return new CombinedFile(configuration, data);
  }

  private static int afterLine(String text, int from) {
    int end = text.indexOf('\n', from);
    return end < 0 ? text.length() : end + 1;
  }

  private static int bytes(String digits) {
    if (digits.length() > 9) {
      throw new ComtradeException("A part of " + digits + " bytes is too large.");
    }
    return Integer.parseInt(digits);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof CombinedFile f
        && Arrays.equals(configuration, f.configuration)
        && Arrays.equals(data, f.data);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(configuration) + Arrays.hashCode(data);
  }

  @Override
  public String toString() {
    return "CombinedFile[" + configuration.length + " and " + data.length + " bytes]";
  }
}
