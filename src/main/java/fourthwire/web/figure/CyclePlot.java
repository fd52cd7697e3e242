package fourthwire.web.figure;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.Waveform;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** One cycle of each conductor's instantaneous value, summed from its orders 1 to 50. */
public final class CyclePlot {
  private static final double HEIGHT_PX = 208;
  private static final int SAMPLES = 240;
  private static final int STEPS = 3;
  private static final int UNITS_WIDE = 1000;
  private static final double BACKDROP_SHARE = 0.92;
  private static final List<Conductor> NEUTRAL_FIRST =
      List.of(Conductor.N, Conductor.L1, Conductor.L2, Conductor.L3);

  private CyclePlot() {}

  /**
   * The picture; the neutral is the heavy one, below the lines.
   *
   * @param unit of the spectra, {@code A} or {@code V}
   */
  public static String draw(Map<Conductor, Spectrum> spectra, String unit, String alternative) {
    Map<Conductor, Waveform> waves = new EnumMap<>(Conductor.class);
    spectra.forEach((conductor, s) -> waves.put(conductor, Waveform.of(s, SAMPLES)));
    return draw(Optional.empty(), waves, unit, alternative);
  }

  /**
   * The picture over another curve, faint and on a scale of its own: the voltage behind currents.
   *
   * @param waves each conductor's, with any direct component it has
   * @param unit of the waves
   */
  public static String drawOver(
      Spectrum backdrop, Map<Conductor, Waveform> waves, String unit, String alternative) {
    return draw(Optional.of(backdrop), waves, unit, alternative);
  }

  private static String draw(
      Optional<Spectrum> backdrop,
      Map<Conductor, Waveform> waves,
      String unit,
      String alternative) {
    double peak = waves.values().stream().mapToDouble(Waveform::peak).max().orElse(0);
    Ticks ticks = Ticks.upTo(peak, STEPS);
    Svg svg = Svg.picture("plot cycle", alternative);
    rules(svg, ticks, unit);
    svg.stretched(UNITS_WIDE, HEIGHT_PX);
    backdrop.map(b -> Waveform.of(b, SAMPLES)).ifPresent(w -> backdrop(svg, w));
    for (Conductor conductor : NEUTRAL_FIRST) {
      Waveform wave = waves.get(conductor);
      if (wave != null) {
        svg.add(
            "path",
            "class",
            "trace " + conductor.name().toLowerCase(Locale.ROOT),
            "d",
            path(wave, ticks.end()));
      }
    }
    return svg.close().done();
  }

  private static void backdrop(Svg svg, Waveform wave) {
    double end = wave.peak() > 0 ? wave.peak() / BACKDROP_SHARE : 1;
    svg.add("path", "class", "backdrop", "d", path(wave, end));
  }

  private static void rules(Svg svg, Ticks ticks, String unit) {
    for (double value : ticks.values()) {
      rule(svg, ticks, value, unit);
      if (value > 0) {
        rule(svg, ticks, -value, "");
      }
    }
    for (int quarter = 0; quarter <= 4; quarter++) {
      String x = Svg.share(quarter / 4.0);
      String anchor = quarter == 0 ? "start" : quarter == 4 ? "end" : "middle";
      svg.text(90 * quarter + "°", "x", x, "y", HEIGHT_PX + 18, "text-anchor", anchor);
    }
  }

  private static void rule(Svg svg, Ticks ticks, double value, String unit) {
    double y = y(value, ticks.end());
    String classes = value == 0 ? "axis" : "rule";
    svg.add("line", "class", classes, "x1", 0, "x2", "100%", "y1", y, "y2", y);
    String text = value == ticks.end() ? ticks.text(value) + "\u202f" + unit : ticks.text(value);
    svg.text(text, "x", 0, "dx", -6, "y", y + 4, "text-anchor", "end");
  }

  private static String path(Waveform wave, double end) {
    StringBuilder d = new StringBuilder("M");
    for (int k = 0; k <= wave.count(); k++) {
      double x = (double) UNITS_WIDE * k / wave.count();
      double y = y(wave.at(k % wave.count()), end);
      d.append(k == 0 ? "" : "L").append(Svg.rounded(x, 1)).append(' ').append(Svg.rounded(y, 1));
    }
    return d.toString();
  }

  private static double y(double value, double end) {
    return HEIGHT_PX / 2 * (1 - value / end);
  }
}
