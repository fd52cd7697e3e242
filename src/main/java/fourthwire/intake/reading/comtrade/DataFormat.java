package fourthwire.intake.reading.comtrade;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;

/** How samples are written. */
enum DataFormat {
  ASCII(0),
  BINARY(2),
  BINARY32(4),
  FLOAT32(4);

  private static final int LOOKED_AT = 4000;

  private final int bytes;

  DataFormat(int bytes) {
    this.bytes = bytes;
  }

  /** Bytes of one analogue sample; 0 for text. */
  int bytes() {
    return bytes;
  }

  static boolean isOne(String word) {
    return named(word).isPresent();
  }

  private static Optional<DataFormat> named(String word) {
    String upper = word.replaceAll("[,;\\s]+$", "").trim().toUpperCase(Locale.ROOT);
    return Arrays.stream(values())
        .filter(f -> f.name().equals(upper) || f == BINARY && upper.equals("BINARY16"))
        .findFirst();
  }

  /** The one of this word; none is told by an empty line. */
  static Optional<DataFormat> find(String word, int line) {
    Optional<DataFormat> named = named(word);
    if (named.isEmpty() && !word.isBlank()) {
      throw new ComtradeException(
          "configuration, line "
              + line
              + ": data format \""
              + word.trim()
              + "\" is not one of "
              + Arrays.stream(values()).map(Enum::name).collect(Collectors.joining(", "))
              + ".");
    }
    return named;
  }

  /** By the look of the data: text is digits, signs and separators only. */
  static DataFormat guessed(byte[] data) {
    for (int k = 0; k < Math.min(data.length, LOOKED_AT); k++) {
      if ("0123456789+-.,eE \t\r\n\u001A".indexOf(data[k] & 0xFF) < 0) {
        return BINARY;
      }
    }
    return ASCII;
  }
}
