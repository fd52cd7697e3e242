package fourthwire.web.figure;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import java.util.List;
import java.util.Locale;

/**
 * Fundamental phasors round one point: voltages long and thin, currents shorter and heavy, each
 * scaled to its own largest. 0° points right, angles grow against the clock.
 */
public final class PhasorPlot {
  private static final double VOLTAGE_REACH = 86;
  private static final double CURRENT_REACH = 58;
  private static final double LABEL_BEYOND = 10;

  private PhasorPlot() {}

  /**
   * A phasor.
   *
   * @param label as it stands at its end
   * @param conductor whose line style it has
   * @param isVoltage else a current
   */
  public record Arrow(String label, Conductor conductor, boolean isVoltage, Phasor phasor) {}

  /** The picture. */
  public static String draw(List<Arrow> arrows, String alternative) {
    Svg svg =
        Svg.picture("phasors", alternative)
            .open("svg", "x", 0, "y", 0, "viewBox", "-110 -110 220 220");
    svg.add("circle", "class", "rule", "r", VOLTAGE_REACH);
    svg.add("line", "class", "rule", "x1", -100, "x2", 100, "y1", 0, "y2", 0);
    svg.add("line", "class", "rule", "x1", 0, "x2", 0, "y1", -100, "y2", 100);
    for (Arrow a : arrows) {
      double reach = reach(a, arrows);
      double angle = Math.toRadians(a.phasor().degrees());
      double x = reach * Math.cos(angle);
      double y = -reach * Math.sin(angle);
      String kind = a.isVoltage() ? "voltage " : "current ";
      String classes = "trace " + kind + a.conductor().name().toLowerCase(Locale.ROOT);
      svg.add("line", "class", classes, "x1", 0, "y1", 0, "x2", x, "y2", y);
      double beyond = (reach + LABEL_BEYOND) / Math.max(reach, 1);
      svg.text(a.label(), "x", x * beyond, "y", y * beyond + 3, "text-anchor", "middle");
    }
    return svg.done();
  }

  private static double reach(Arrow a, List<Arrow> arrows) {
    double largest =
        arrows.stream()
            .filter(b -> b.isVoltage() == a.isVoltage())
            .mapToDouble(b -> b.phasor().magnitude())
            .max()
            .orElse(0);
    double whole = a.isVoltage() ? VOLTAGE_REACH : CURRENT_REACH;
    return largest > 0 ? whole * a.phasor().magnitude() / largest : 0;
  }
}
