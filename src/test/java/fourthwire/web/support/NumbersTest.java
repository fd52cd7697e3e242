package fourthwire.web.support;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.quantity.Figure;
import fourthwire.site.Practice;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * How numbers are written. Rounding half up to three digits, minus sign and thin space: ISO
 * 80000-1, clause 7 (from memory).
 */
class NumbersTest {
  @ParameterizedTest
  @CsvSource({
    "62.14, 62.1",
    "106.34, 106",
    "9.995, 10.0",
    "99.96, 100",
    "0.5, 0.500",
    "0.01234, 0.012",
    "1234.4, 1234",
    "0, 0",
    "-2.291, −2.29",
    "-0.0, 0"
  })
  void threeSignificantDigits(double value, String written) {
    assertThat(Numbers.of(value)).isEqualTo(written);
  }

  @Test
  void digitsStandInGroupsAndUnitsAfterAThinSpace() {
    assertThat(Numbers.of(12345, "A")).isEqualTo("12\u202f345\u202fA");
    assertThat(Numbers.of(0.0001)).isEqualTo("<\u202f0.001");
    assertThat(Numbers.plain(15, "%")).isEqualTo("15\u202f%");
    assertThat(Numbers.plain(0.50, "")).isEqualTo("0.5");
  }

  @ParameterizedTest
  @CsvSource({
    "1, 1st",
    "2, 2nd",
    "3, 3rd",
    "5, 5th",
    "11, 11th",
    "12, 12th",
    "13, 13th",
    "21, 21st",
    "22, 22nd",
    "23, 23rd",
    "49, 49th"
  })
  void ordersAreOrdinals(int order, String written) {
    assertThat(Numbers.ordinal(order)).isEqualTo(written);
  }

  @Test
  void aColumnIsPaddedToItsDecimals() {
    Reasons reasons = new Reasons();
    List<Column.Cell> cells =
        Column.of(
            List.of(
                Figure.of(62.1),
                Figure.of(106),
                Figure.unknown("no neutral"),
                Figure.unknown("no rating"),
                Figure.unknown("no neutral"),
                Figure.unknown("")),
            reasons);
    assertThat(cells)
        .extracting(Column.Cell::text)
        .containsExactly("62.1", "106\u2008\u2007", "–", "–", "–", "");
    assertThat(cells).extracting(Column.Cell::mark).containsExactly("", "", "a", "b", "a", "");
    assertThat(reasons.list())
        .extracting(Reasons.Reason::text)
        .containsExactly("no neutral", "no rating");
  }

  @Test
  void theNorthAmericanPracticeRenamesLinesAndNothingElse() {
    Names names = new Names(Practice.NORTH_AMERICA);
    assertThat(names.of("L1-L2")).isEqualTo("A-B");
    assertThat(names.in("L3 of panel LP-L1 carries 3 A, L1-L2-L3 do not."))
        .isEqualTo("C of panel LP-L1 carries 3 A, A-B-C do not.");
    assertThat(new Names(Practice.IEC).in("L3")).isEqualTo("L3");
  }
}
