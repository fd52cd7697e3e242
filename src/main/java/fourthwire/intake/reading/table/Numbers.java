package fourthwire.intake.reading.table;

import java.math.BigDecimal;
import java.nio.charset.Charset;
import java.util.Locale;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Numbers as cells hold them. */
final class Numbers {
  /** What a blank, or a mark for "not measured", is read as. */
  static final double BLANK = Double.NaN;

  /** What a text that is neither number nor blank is read as. */
  static final double UNREADABLE = Double.NEGATIVE_INFINITY;

  private static final Set<String> MARKS =
      Set.of(
          "",
          "n/a",
          "n.a.",
          "na",
          "#n/a",
          "#na",
          "nan",
          "null",
          "none",
          "nil",
          "ol",
          "o.l",
          "o.l.",
          "ovl",
          "ovld",
          "ovf",
          "ovfl",
          "overload",
          "overflow",
          "over",
          "overrange",
          "over range",
          "over-range",
          "or",
          "ul",
          "under",
          "underrange",
          "inf",
          "infinity",
          "invalid",
          "inv",
          "inval",
          "err",
          "error",
          "fail",
          "fault",
          "bad",
          "missing",
          "void",
          "no data",
          "nodata",
          "#div/0!",
          "#value!",
          "#num!",
          "#ref!",
          "#null!",
          "#name?",
          "n.v.",
          "k.a.",
          "n.d.",
          "nd",
          "off",
          "x",
          "xx",
          "xxx",
          "(null)",
          "<null>",
          "undef",
          "undefined",
          "not available",
          "not measured");

  /** More digits than a double holds exactly in every case. */
  static final int MOST_DIGITS = 15;

  /** Signs alone, in any number: {@code -}, {@code ----}, {@code ***}, {@code ?}. */
  private static final Pattern SIGNS = Pattern.compile("[-–—*?.#_/\\s]*");

  /** A limit is no value: {@code >600}, {@code < 0.1}. */
  private static final Pattern BEYOND = Pattern.compile("[<>≤≥].*");

  /** A unit that some write behind every number; one with a prefix is not passed over. */
  static final String UNIT = "(?:%|VA|V|A|W|[vV][aA][rR]|Hz|°)";

  private static final Pattern UNIT_BEHIND = Pattern.compile("(?<=[\\d.,])\\s?" + UNIT + "$");

  /** A negative number as accounts write it. */
  private static final Pattern IN_BRACKETS =
      Pattern.compile("\\(\\s*([\\d.,][\\d.,\\s'’]*?(?:[eE][+-]?\\d+)?)\\s*\\)");

  private static final Pattern BLANKS = Pattern.compile("[\\s\\h\\uFEFF\\u001A]+");
  private static final Pattern ENDS = Pattern.compile("^[-+]+|[!*]+$");
  private static final Pattern PLAIN =
      Pattern.compile("[+-]?(\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d{1,3})?");

  /**
   * Digits in groups of three, by comma or point as the decimal mark leaves, blank or apostrophe.
   */
  private static final Pattern GROUPED_BY_COMMA =
      Pattern.compile("[+-]?\\d{1,3}(?:[, '’]\\d{3})+(?:\\.\\d*)?");

  private static final Pattern GROUPED_BY_POINT =
      Pattern.compile("[+-]?\\d{1,3}(?:[. '’]\\d{3})+(?:,\\d*)?");

  private static final double[] POWERS = new double[23];

  static {
    POWERS[0] = 1;
    for (int k = 1; k < POWERS.length; k++) {
      POWERS[k] = POWERS[k - 1] * 10;
    }
  }

  private Numbers() {}

  /**
   * The number in these bytes times ten to the power of {@code shift}: at once where it is plain
   * digits with blanks around them, anything longer or stranger the slow way.
   */
  static double parse(
      byte[] text, int from, int to, Charset charset, boolean decimalComma, int shift) {
    byte mark = (byte) (decimalComma ? ',' : '.');
    int k = from;
    int end = to;
    while (k < end && text[k] == ' ') {
      k++;
    }
    while (end > k && text[end - 1] == ' ') {
      end--;
    }
    if (k == end) {
      return BLANK;
    }
    boolean negative = text[k] == '-';
    k += negative ? 1 : 0;
    long digits = 0;
    int first = k;
    int point = -1;
    for (; k < end; k++) {
      int digit = text[k] - '0';
      if (digit >= 0 && digit <= 9) {
        digits = 10 * digits + digit;
      } else if (text[k] == mark && point < 0) {
        point = k;
      } else {
        return slow(text(text, from, to, charset), decimalComma, shift);
      }
    }
    int count = k - first - (point < 0 ? 0 : 1);
    return count == 0 || count > MOST_DIGITS
        ? slow(text(text, from, to, charset), decimalComma, shift)
        : scaled(negative ? -digits : digits, (point < 0 ? 0 : k - point - 1) - shift);
  }

  /**
   * Digits with so many of them decimals: up to 15 digits one exact division or product, hence
   * correctly rounded (Clinger, 1990).
   */
  static double scaled(long digits, int decimals) {
    if (decimals > 22 || decimals < -22) {
      return new BigDecimal(digits).scaleByPowerOfTen(-decimals).doubleValue();
    }
    return decimals >= 0 ? digits / POWERS[decimals] : digits * POWERS[-decimals];
  }

  private static String text(byte[] text, int from, int to, Charset charset) {
    return new String(text, from, to - from, charset).replace('\0', ' ');
  }

  private static double slow(String text, boolean decimalComma, int shift) {
    if (text.equals("NaN")) {
      return BLANK;
    }
    String plain = plain(text);
    if (isMark(plain)) {
      return BLANK;
    }
    String number = ungrouped(plain, decimalComma);
    if (!PLAIN.matcher(number).matches()) {
      return UNREADABLE;
    }
    double value = new BigDecimal(number).scaleByPowerOfTen(shift).doubleValue();
    return Double.isFinite(value) ? value : UNREADABLE;
  }

  /** Blanks of every kind as one, a true minus as the hyphen, a unit behind taken off. */
  private static String plain(String text) {
    String plain = BLANKS.matcher(text).replaceAll(" ").trim().replace('\u2212', '-');
    plain = negative(UNIT_BEHIND.matcher(plain).replaceFirst(""));
    return plain.startsWith("- ") || plain.startsWith("+ ")
        ? plain.charAt(0) + plain.substring(2)
        : plain;
  }

  /** A number in brackets with the sign it stands for; any other text as it is. */
  static String negative(String text) {
    if (!text.startsWith("(")) {
      return text;
    }
    Matcher m = IN_BRACKETS.matcher(text);
    return m.matches() ? "-" + m.group(1) : text;
  }

  /** Whether a text is digits with at most one mark between them, as nearly all cells are. */
  static boolean isPlain(String text) {
    int marks = 0;
    int length = text.length();
    for (int k = 0; k < length; k++) {
      char c = text.charAt(k);
      if (c == '.' || c == ',') {
        marks++;
      } else if (c < '0' || c > '9') {
        return false;
      }
    }
    return length > 0 && marks <= 1 && marks < length;
  }

  /** Whether a text stands for "not measured" or "beyond the range". */
  static boolean isMark(String text) {
    if (text.isEmpty() || Character.isDigit(text.charAt(0))) {
      return text.isEmpty() || text.startsWith("1.#");
    }
    String word = text.toLowerCase(Locale.ROOT).trim();
    String bare = ENDS.matcher(word).replaceAll("").trim();
    return SIGNS.matcher(word).matches() || MARKS.contains(bare) || BEYOND.matcher(word).matches();
  }

  private static String ungrouped(String plain, boolean decimalComma) {
    boolean grouped = (decimalComma ? GROUPED_BY_POINT : GROUPED_BY_COMMA).matcher(plain).matches();
    String digits = grouped ? plain.replaceAll(decimalComma ? "[. '’]" : "[, '’]", "") : plain;
    return decimalComma ? digits.replace(',', digits.contains(".") ? '?' : '.') : digits;
  }
}
