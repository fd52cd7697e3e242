package fourthwire.intake.reading.comtrade;

import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/** How samples are written. */
enum DataFormat {
  ASCII(0),
  BINARY(2),
  BINARY32(4),
  FLOAT32(4);

  private final int bytes;

  DataFormat(int bytes) {
    this.bytes = bytes;
  }

  /** Bytes of one analogue sample; 0 for text. */
  int bytes() {
    return bytes;
  }

  static DataFormat of(String word, int line) {
    return Arrays.stream(values())
        .filter(f -> f.name().equals(word.trim().toUpperCase(Locale.ROOT)))
        .findFirst()
        .orElseThrow(
            () ->
                new ComtradeException(
                    "configuration, line "
                        + line
                        + ": data format \""
                        + word.trim()
                        + "\" is not one of "
                        + Arrays.stream(values()).map(Enum::name).collect(Collectors.joining(", "))
                        + "."));
  }
}
