package fourthwire.web.figure;

import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * One conductor's rail, large: a bed, a bar as long as its current's share of the scale, a dashed
 * mark at its ampacity, a diamond for each measured value. The neutral's bar is split by what heats
 * it.
 *
 * @param conductor whose
 * @param share bar length, as a share of the ampacity (or of the scale's base where {@code hollow})
 * @param hollow drawn as an outline: its ampacity is not known
 * @param parts of a split bar, in order; empty: one piece
 * @param measured shares at which a diamond stands
 * @param sure where the dark line goes from P5 to P95; empty: not known
 */
public record Rail(
    Conductor conductor,
    double share,
    boolean hollow,
    List<Part> parts,
    List<Double> measured,
    Optional<Sure> sure) {
  private static final double LINE_PX = 12;
  private static final double NEUTRAL_PX = 26;
  private static final double SMALLEST_LABEL = 0.07;

  /** Percentiles 5 and 95, as shares like the bar's. */
  public record Sure(double low, double high) {}

  /** A rail of which it is not known how sure it is. */
  public Rail(
      Conductor conductor, double share, boolean hollow, List<Part> parts, List<Double> measured) {
    this(conductor, share, hollow, parts, measured, Optional.empty());
  }

  /**
   * A piece of the neutral's bar.
   *
   * @param key its class: {@code unbalance}, {@code 3}, {@code 9}, {@code 15} or {@code other}
   * @param share of the bar, 0 to 1
   * @param label written inside where there is room
   */
  public record Part(String key, double share, String label) {}

  /**
   * The scale several rails share: what stands at their right end.
   *
   * @param end share of ampacity at the right end
   * @param marked whether the mark at 100 % is drawn
   */
  public record Scale(double end, boolean marked) {
    private static final double USUAL_END = 1.3;
    private static final double HEADROOM = 1.06;

    /** A scale that holds these shares. */
    public static Scale holding(List<Double> shares, boolean marked) {
      double longest = shares.stream().mapToDouble(Double::doubleValue).max().orElse(0);
      double least = marked ? USUAL_END : Math.max(longest, Double.MIN_NORMAL);
      return new Scale(Math.max(least, longest * HEADROOM), marked);
    }

    double at(double share) {
      return Math.max(0, Math.min(1, share / end));
    }
  }

  /** The rail as SVG. */
  public String draw(Scale scale, String alternative) {
    boolean heavy = conductor == Conductor.N;
    double bar = heavy ? NEUTRAL_PX : LINE_PX;
    double height = heavy ? 34 : 18;
    double top = (height - bar) / 2;
    String name = conductor.name().toLowerCase(Locale.ROOT);
    Svg svg = Svg.picture("rail " + name, alternative);
    svg.add("rect", "class", "bed", "x", 0, "y", top, "width", "100%", "height", bar);
    if (hollow) {
      svg.add(
          "rect",
          "class",
          "hollow",
          "x",
          0,
          "y",
          top + 1,
          "width",
          width(scale, share),
          "height",
          bar - 2);
    } else {
      pieces(svg, scale, top, bar);
    }
    sure.ifPresent(
        s ->
            svg.add(
                "line",
                "class",
                "span",
                "x1",
                Svg.share(scale.at(s.low())),
                "x2",
                Svg.share(scale.at(s.high())),
                "y1",
                height / 2,
                "y2",
                height / 2));
    if (scale.marked()) {
      String x = Svg.share(scale.at(1));
      svg.add("line", "class", "full-mark", "x1", x, "x2", x, "y1", -3, "y2", height + 3);
    }
    measured.forEach(m -> diamond(svg, scale.at(m), height / 2));
    return svg.done();
  }

  private void pieces(Svg svg, Scale scale, double top, double bar) {
    if (parts.isEmpty()) {
      svg.add(
          "rect", "class", "fill", "x", 0, "y", top, "width", width(scale, share), "height", bar);
      return;
    }
    double whole = parts.stream().mapToDouble(Part::share).sum();
    double from = 0;
    for (Part part : parts) {
      Part scaled = new Part(part.key(), part.share() / whole, part.label());
      piece(svg, scale, scaled, from, top, bar);
      from += scaled.share();
    }
  }

  private void piece(Svg svg, Scale scale, Part part, double from, double top, double bar) {
    double start = scale.at(share * from);
    double width = scale.at(share * (from + part.share())) - start;
    svg.add(
        "rect",
        "class",
        "fill part-" + part.key(),
        "x",
        Svg.share(start),
        "y",
        top,
        "width",
        Svg.share(width),
        "height",
        bar);
    if (from > 0) {
      String x = Svg.share(start);
      svg.add("line", "class", "gap", "x1", x, "x2", x, "y1", top, "y2", top + bar);
    }
    if (part.key().equals("3") && width > SMALLEST_LABEL) {
      svg.text(
          part.label(), "class", "on-n", "x", Svg.share(start), "dx", 6, "y", top + bar / 2 + 4.5);
    }
  }

  private static String width(Scale scale, double share) {
    return Svg.share(scale.at(share));
  }

  /** A diamond about this point: a measured value. */
  private static void diamond(Svg svg, double x, double y) {
    svg.open("svg", "x", Svg.share(x), "y", y);
    svg.add("path", "class", "diamond", "d", "M0-6L6 0L0 6L-6 0Z").close();
  }
}
