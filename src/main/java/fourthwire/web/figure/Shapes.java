package fourthwire.web.figure;

import fourthwire.quantity.Conductor;
import java.util.Locale;

/** Small shapes that stand in a line of text; the word beside them says the same. */
public final class Shapes {
  private Shapes() {}

  /** A short piece of a conductor's line, as it is drawn in the pictures. */
  public static String sample(Conductor conductor) {
    return sample("trace " + conductor.name().toLowerCase(Locale.ROOT));
  }

  /** A short piece of a curve of a chart. */
  public static String sample(CurvePlot.Style style) {
    return sample("curve " + style.word());
  }

  /** A short piece of the faint curve behind others. */
  public static String backdrop() {
    return sample("backdrop");
  }

  private static String sample(String classes) {
    return new Svg()
        .open("svg", "class", "sample", "aria-hidden", "true")
        .add("line", "class", classes, "x1", 0, "x2", "100%", "y1", "50%", "y2", "50%")
        .done();
  }
}
