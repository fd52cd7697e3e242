package fourthwire.intake.survey;

import java.util.Locale;

/** Small helps for the texts of cells. */
final class Text {
  private static final char NO_BREAK_SPACE = '\u00a0';
  private static final char BYTE_ORDER_MARK = '\ufeff';

  private Text() {}

  /** Without the blanks around it, no-break spaces included. */
  static String trim(String text) {
    int from = 0;
    int to = text.length();
    while (from < to && isBlank(text.charAt(from))) {
      from++;
    }
    while (to > from && isBlank(text.charAt(to - 1))) {
      to--;
    }
    return text.substring(from, to);
  }

  /** A table's or column's name as compared: trimmed, in lower case. */
  static String key(String text) {
    return trim(text).toLowerCase(Locale.ROOT);
  }

  /** What an exception says; those of the formats always say something. */
  static String message(Exception e) {
    String message = e.getMessage();
    return message == null ? e.getClass().getSimpleName() : message;
  }

  private static boolean isBlank(char c) {
    return c == ' ' || c == '\t' || c == NO_BREAK_SPACE || c == BYTE_ORDER_MARK;
  }
}
