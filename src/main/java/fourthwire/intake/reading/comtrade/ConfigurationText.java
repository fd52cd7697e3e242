package fourthwire.intake.reading.comtrade;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;

/** The text of a configuration, whatever it is encoded in. */
final class ConfigurationText {
  private static final char SUBSTITUTE = 0x1A;
  private static final String ORDER_MARK = "\uFEFF";

  private ConfigurationText() {}

  /**
   * UTF-16 where it begins with its mark, UTF-8 where it is that, else ISO 8859-1; what follows a
   * substitute character is padding.
   */
  static String of(byte[] file) {
    String text = decoded(file);
    int end = text.indexOf(SUBSTITUTE);
    String whole = end < 0 ? text : text.substring(0, end);
    return whole.startsWith(ORDER_MARK) ? whole.substring(1) : whole;
  }

  private static String decoded(byte[] file) {
    int mark = file.length < 2 ? 0 : (file[0] & 0xFF) << 8 | file[1] & 0xFF;
    if (mark == 0xFEFF || mark == 0xFFFE) {
      return new String(file, StandardCharsets.UTF_16);
    }
    try {
      return StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(file)).toString();
    } catch (CharacterCodingException e) {
      return new String(file, StandardCharsets.ISO_8859_1);
    }
  }
}
