package fourthwire.intake.survey;

import java.util.function.BiFunction;
import java.util.function.Function;

/**
 * How the cells of a column are written.
 *
 * @param parser reads a cell that is not empty, given whether a comma may be a decimal sign; throws
 *     {@link IllegalArgumentException} with a sentence that says what is accepted
 * @param printer the canonical text of a value
 * @param standIn what a cell that could not be read counts as until the survey is refused
 * @param numeric whether a spreadsheet holds it as a number
 */
record Format<V>(
    BiFunction<String, Boolean, V> parser,
    Function<V, String> printer,
    V standIn,
    boolean numeric) {

  static <V> Format<V> ofText(Function<String, V> parser, Function<V, String> print, V standIn) {
    return new Format<>((text, comma) -> parser.apply(text), print, standIn, false);
  }

  V parse(String text, boolean decimalComma) {
    return parser.apply(text, decimalComma);
  }
}
