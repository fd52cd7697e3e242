package fourthwire.web.figure;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayDeque;
import java.util.Deque;

/** Writes well-formed SVG, attribute by attribute; every text is escaped. */
final class Svg {
  private final StringBuilder out = new StringBuilder();
  private final Deque<String> open = new ArrayDeque<>();

  /** A picture of these classes with a text alternative; more attributes as name, value. */
  static Svg picture(String classes, String alternative, Object... more) {
    Svg svg = new Svg();
    svg.start("svg", "class", classes, "role", "img", "aria-label", alternative);
    svg.attributes(more).append('>');
    svg.open.push("svg");
    return svg;
  }

  /** Opens an element; attributes come as name, value, name, value … */
  Svg open(String element, Object... attributes) {
    start(element, attributes).append('>');
    open.push(element);
    return this;
  }

  /**
   * Opens an inner picture that fills the width whatever it is, so that curves stretch and letters
   * outside it do not.
   */
  Svg stretched(int unitsWide, double heightPx) {
    return stretched(0, heightPx, unitsWide, Math.round(heightPx));
  }

  /** The same so far down, in units of any size; more attributes as name, value. */
  Svg stretched(double topPx, double heightPx, long unitsWide, long unitsHigh, Object... more) {
    start("svg", "x", 0, "y", topPx, "width", "100%", "height", heightPx);
    attributes("viewBox", "0 0 " + unitsWide + " " + unitsHigh, "preserveAspectRatio", "none");
    attributes(more).append('>');
    open.push("svg");
    return this;
  }

  /** An element without content. */
  Svg add(String element, Object... attributes) {
    start(element, attributes).append("/>");
    return this;
  }

  /** A text element. */
  Svg text(String content, Object... attributes) {
    start("text", attributes).append('>').append(escaped(content)).append("</text>");
    return this;
  }

  /** An ordinal centred here; its letters are a span of their own that small screens leave out. */
  Svg ordinal(String ordinal, String x, double y) {
    String digits = ordinal.replaceAll("\\D", "");
    start("text", "x", x, "y", y, "text-anchor", "middle").append('>').append(digits);
    open.push("text");
    start("tspan", "class", "letters")
        .append('>')
        .append(escaped(ordinal.substring(digits.length())));
    open.push("tspan");
    return close().close();
  }

  /** Closes the element opened last. */
  Svg close() {
    out.append("</").append(open.pop()).append('>');
    return this;
  }

  /** Closes what is open; the whole text. */
  String done() {
    while (!open.isEmpty()) {
      close();
    }
    return out.toString();
  }

  /** A share of the width, 0 to 1, as a percentage. */
  static String share(double share) {
    return rounded(100 * share, 2) + "%";
  }

  /** A number with at most so many decimals. */
  static String rounded(double value, int decimals) {
    BigDecimal plain =
        BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_UP).stripTrailingZeros();
    return plain.signum() == 0 ? "0" : plain.toPlainString();
  }

  private StringBuilder start(String element, Object... attributes) {
    out.append('<').append(element);
    return attributes(attributes);
  }

  private StringBuilder attributes(Object... attributes) {
    for (int i = 0; i + 1 < attributes.length; i += 2) {
      Object value = attributes[i + 1];
      String text =
          value instanceof Double number ? rounded(number, 2) : escaped(String.valueOf(value));
      out.append(' ').append(attributes[i]).append("=\"").append(text).append('"');
    }
    return out;
  }

  /** A text as it may stand in markup. */
  static String escaped(String text) {
    return text.replace("&", "&amp;")
        .replace("<", "&lt;")
        .replace(">", "&gt;")
        .replace("\"", "&quot;");
  }
}
