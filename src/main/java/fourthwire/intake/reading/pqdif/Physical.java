package fourthwire.intake.reading.pqdif;

import java.util.Arrays;
import java.util.Optional;

/** Physical types of values (IEEE 1159.3-2003, physical structure; from memory). */
enum Physical {
  BOOLEAN1(1, 1),
  BOOLEAN2(2, 2),
  BOOLEAN4(3, 4),
  CHAR1(10, 1),
  CHAR2(11, 2),
  INTEGER1(20, 1),
  INTEGER2(21, 2),
  INTEGER4(22, 4),
  UNSIGNED1(30, 1),
  UNSIGNED2(31, 2),
  UNSIGNED4(32, 4),
  REAL4(40, 4),
  REAL8(41, 8),
  COMPLEX8(42, 8),
  COMPLEX16(43, 16),
  MOMENT(50, 12),
  GUID(60, 16);

  private final int code;
  private final int bytes;

  Physical(int code, int bytes) {
    this.code = code;
    this.bytes = bytes;
  }

  int code() {
    return code;
  }

  int bytes() {
    return bytes;
  }

  static Optional<Physical> find(int code) {
    return Arrays.stream(values()).filter(p -> p.code == code).findFirst();
  }
}
