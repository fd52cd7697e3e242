package fourthwire.store;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A part of a file comes back byte for byte, whatever stands in it. */
class FilePartTest {
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void anyBytesComeBack(long seed) {
    Random random = new Random(seed);
    for (int kinds = 1; kinds <= 256; kinds += random.nextInt(6) + 1) {
      byte[] part = new byte[random.nextInt(3000)];
      for (int k = 0; k < part.length; k++) {
        part[k] = (byte) (random.nextInt(20) == 0 ? random.nextInt() : random.nextInt(kinds) - 7);
      }
      byte[] packed = FilePart.pack(part);
      byte[] into = new byte[part.length + 1];
      assertThat(FilePart.unpack(packed, into)).isEqualTo(part.length);
      assertThat(Arrays.copyOf(into, part.length)).as("%d kinds of bytes", kinds).isEqualTo(part);
      assertThat(packed.length).isLessThanOrEqualTo(part.length + 1);
    }
  }

  @Test
  void figuresTakeHalfTheirSpace() {
    Random random = new Random(9);
    StringBuilder text = new StringBuilder();
    for (int k = 0; k < 20_000; k++) {
      text.append(random.nextInt(1000)).append('.').append(random.nextInt(1000));
      text.append(k % 8 == 0 ? '\n' : ',');
    }
    byte[] part = text.toString().getBytes(StandardCharsets.US_ASCII);
    assertThat(FilePart.pack(part).length).isLessThan(part.length * 51 / 100);
  }
}
