package fourthwire.web.figure;

import fourthwire.quantity.Conductor;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * The four conductors in little, for a row of a list: their shares of ampacity over one mark at 100
 * %.
 */
public final class SmallRails {
  private static final double END = 1.3;
  private static final double STEP_PX = 6.5;
  private static final double LINE_PX = 3;
  private static final double NEUTRAL_PX = 5;

  private SmallRails() {}

  /**
   * The picture.
   *
   * @param shares of ampacity by conductor; empty where not known; absent: no such conductor
   */
  public static String draw(Map<Conductor, OptionalDouble> shares, String alternative) {
    Svg svg = Svg.picture("small-rails", alternative);
    double y = 1;
    for (Conductor conductor : Conductor.values()) {
      OptionalDouble share = shares.get(conductor);
      if (share != null) {
        rail(svg, conductor, share, y);
      }
      y += STEP_PX;
    }
    String mark = Svg.share(1 / END);
    svg.add("line", "class", "full-mark", "x1", mark, "x2", mark, "y1", 0, "y2", 26);
    return svg.done();
  }

  private static void rail(Svg svg, Conductor conductor, OptionalDouble share, double y) {
    double height = conductor == Conductor.N ? NEUTRAL_PX : LINE_PX;
    String name = conductor.name().toLowerCase(Locale.ROOT);
    svg.add("rect", "class", "bed", "x", 0, "y", y, "width", "100%", "height", height);
    if (share.isPresent()) {
      double width = Math.min(1, share.getAsDouble() / END);
      svg.add(
          "rect",
          "class",
          "fill " + name,
          "x",
          0,
          "y",
          y,
          "width",
          Svg.share(width),
          "height",
          height);
    }
  }
}
