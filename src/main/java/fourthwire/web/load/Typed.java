package fourthwire.web.load;

import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.regex.Pattern;

/** The form's fields as typed, and what is wrong with each. */
final class Typed {
  /** A thousand and more to some, one and a fraction to others. */
  private static final Pattern AMBIGUOUS = Pattern.compile("[+-]?[1-9]\\d{0,2},\\d{3}");

  /** A space, thin or not, before three digits that end a group. */
  private static final Pattern GROUPS =
      Pattern.compile("(?<=\\d)[ \\u00a0\\u202f](?=\\d{3}(?!\\d))");

  private final Words words;
  private final Map<String, String> values;
  private final Map<String, String> errors = new LinkedHashMap<>();

  Typed(Words words, Map<String, String> values) {
    this.words = words;
    this.values = values;
  }

  /** What stands in a field, without space around it; empty where nothing does. */
  String text(String field) {
    return values.getOrDefault(field, "").strip();
  }

  boolean has(String field) {
    return !text(field).isEmpty();
  }

  /**
   * A field's number; an error where it is none or out of range. A decimal comma is read too,
   * except where it may as well part thousands.
   */
  OptionalDouble number(String field, double low, double high) {
    String text = text(field);
    if (text.isEmpty()) {
      return OptionalDouble.empty();
    }
    if (AMBIGUOUS.matcher(text).matches()) {
      error(
          field,
          words.of("loads.error.comma", text, text.replace(",", ""), text.replace(',', '.')));
      return OptionalDouble.empty();
    }
    OptionalDouble value = parsed(text);
    if (value.isPresent() && value.getAsDouble() >= low && value.getAsDouble() <= high) {
      return value;
    }
    error(
        field,
        words.of(
            value.isPresent() ? "loads.error.range" : "loads.error.number",
            text,
            bound(low),
            bound(high)));
    return OptionalDouble.empty();
  }

  /**
   * A number with a decimal point or comma, its digits in groups of three parted by spaces or not
   * at all.
   */
  static OptionalDouble parsed(String text) {
    String whole = GROUPS.matcher(text).replaceAll("");
    try {
      double value = Double.parseDouble(whole.indexOf('.') < 0 ? whole.replace(',', '.') : whole);
      return Double.isFinite(value) ? OptionalDouble.of(value) : OptionalDouble.empty();
    } catch (NumberFormatException e) {
      return OptionalDouble.empty();
    }
  }

  /** Says what is wrong with a field; the first word on it stays. */
  void error(String field, String sentence) {
    errors.putIfAbsent(field, sentence);
  }

  Map<String, String> errors() {
    return errors;
  }

  /** A number as it could be typed. */
  static String bound(double value) {
    return value != 0 && Math.abs(value) < 1e-4
        ? new java.math.BigDecimal(value, new java.math.MathContext(3))
            .stripTrailingZeros()
            .toString()
            .replace("E", "e")
        : Numbers.plain(value, "");
  }
}
