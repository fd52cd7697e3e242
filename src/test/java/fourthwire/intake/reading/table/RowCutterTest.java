package fourthwire.intake.reading.table;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Numbers of rows are those that the platform's decimal arithmetic reads, to the last digit. */
class RowCutterTest {
  private static final String[] OTHERS = {
    "",
    "NaN",
    "-",
    "1.2.3",
    "12a",
    "1e3",
    "-.5",
    "7.",
    ".",
    "/9",
    ":1",
    "1:",
    "é1",
    "123456789,",
    "€"
  };

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void plainNumbersOfAnyLengthAtAnyPlace(long seed) {
    Random random = new Random(seed);
    for (int turn = 0; turn < 400; turn++) {
      List<String> cells = new ArrayList<>();
      for (int k = random.nextInt(12); k >= 0; k--) {
        cells.add(random.nextInt(8) == 0 ? OTHERS[random.nextInt(OTHERS.length)] : number(random));
      }
      check(cells, random);
    }
  }

  private static String number(Random random) {
    StringBuilder digits = new StringBuilder();
    for (int k = random.nextInt(20); k >= 0; k--) {
      digits.append((char) ('0' + random.nextInt(10)));
    }
    if (random.nextBoolean()) {
      digits.insert(random.nextInt(digits.length() + 1), '.');
    }
    return (random.nextInt(4) == 0 ? "-" : "") + digits;
  }

  /** The row may end with the bytes; what stands behind them belongs to nobody. */
  private static void check(List<String> cells, Random random) {
    String row = String.join(";", cells);
    String end = random.nextBoolean() ? "\n" : "";
    byte[] block = (row + end + "4711;").getBytes(StandardCharsets.UTF_8);
    int to = (row + end).getBytes(StandardCharsets.UTF_8).length;
    RowCutter cutter = new RowCutter(';', StandardCharsets.UTF_8, false);
    assertThat(cutter.next(block, 0, to)).isEqualTo(to);
    for (int k = 0; k < cells.size(); k++) {
      String cell = cells.get(k);
      if (k == cutter.cells()) {
        assertThat(cell).as("no byte is left for a last cell").isEmpty();
      } else if (cell.matches("-?(\\d+\\.?\\d*|\\.\\d+)")) {
        assertThat(cutter.number(k, 0)).as(cell).isEqualTo(new BigDecimal(cell).doubleValue());
        assertThat(cutter.number(k, 3))
            .as(cell)
            .isEqualTo(new BigDecimal(cell).movePointRight(3).doubleValue());
      } else {
        assertThat(cutter.text(k)).isEqualTo(cell);
      }
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {7, 8, 9})
  void rowsEndWhereTheyEndHoweverFewCellsAreCut(long seed) {
    Random random = new Random(seed);
    StringBuilder text = new StringBuilder();
    for (int k = 0; k < 2000; k++) {
      text.append(random.nextInt(4) == 0 ? OTHERS[random.nextInt(OTHERS.length)] : number(random));
      text.append(random.nextInt(9) > 0 ? ";" : random.nextBoolean() ? "\n" : "\r\n");
    }
    byte[] block = text.toString().getBytes(StandardCharsets.UTF_8);
    RowCutter all = new RowCutter(';', StandardCharsets.UTF_8, false);
    RowCutter few = new RowCutter(';', StandardCharsets.UTF_8, false).first(2);
    for (int at = 0; at < block.length; at = all.next(block, at, block.length)) {
      int row = at;
      assertThat(few.next(block, row, block.length))
          .isEqualTo(
              new RowCutter(';', StandardCharsets.UTF_8, false).next(block, row, block.length));
      assertThat(few.cells()).isLessThanOrEqualTo(2);
    }
  }
}
